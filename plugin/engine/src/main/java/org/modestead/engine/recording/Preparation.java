package org.modestead.engine.recording;

/**
 * How recorded values became prepared ones, channel by channel, and the way back.
 *
 * <pre>    prepared = (recorded - offset - slope * (time - origin)) / scale</pre>
 *
 * @param origin time at which the trend line equals the offset, in the time unit
 * @param offset per channel, length n, in the channel's unit
 * @param slope per channel, length n, in the channel's unit per time unit; 0 without linear detrending
 * @param scale per channel, length n, positive; 1 without scaling
 */
public record Preparation(double origin, double[] offset, double[] slope, double[] scale) {

    /** Checks that the lengths agree. */
    public Preparation {
        if (offset.length != slope.length || offset.length != scale.length) {
            throw new IllegalArgumentException("offset, slope and scale must have one entry a channel");
        }
    }

    /** Leaves n channels as they are. */
    public static Preparation identity(int n) {
        double[] ones = new double[n];
        java.util.Arrays.fill(ones, 1);
        return new Preparation(0, new double[n], new double[n], ones);
    }

    /** Returns the prepared value of a recorded one. */
    public double prepare(int channel, double time, double recorded) {
        return (recorded - trend(channel, time)) / scale[channel];
    }

    /** Returns the recorded value of a prepared one. */
    public double restore(int channel, double time, double prepared) {
        return prepared * scale[channel] + trend(channel, time);
    }

    private double trend(int channel, double time) {
        return offset[channel] + slope[channel] * (time - origin);
    }
}
