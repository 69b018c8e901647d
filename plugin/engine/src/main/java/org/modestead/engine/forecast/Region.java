package org.modestead.engine.forecast;

import java.util.Arrays;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/**
 * The box of prepared values that training sampled, channel by channel.
 *
 * @param low smallest value per channel, length n
 * @param high largest value per channel, length n
 */
public record Region(double[] low, double[] high) {

    /** Beyond the box by more than this share of its width, a forecast is called extrapolation. */
    static final double MARGIN = 0.1;
    /** Further from the middle of the box than this many widths, a forecast is cut. */
    static final double LIMIT = 1e3;

    /** Returns the box of the training samples. */
    public static Region of(Snapshots snapshots) {
        int n = snapshots.channels().size();
        double[] low = new double[n];
        double[] high = new double[n];
        Arrays.fill(low, Double.POSITIVE_INFINITY);
        Arrays.fill(high, Double.NEGATIVE_INFINITY);
        for (Run run : snapshots.training()) {
            for (int k = 0; k < run.values().data.length; k++) {
                low[k % n] = Math.min(low[k % n], run.values().data[k]);
                high[k % n] = Math.max(high[k % n], run.values().data[k]);
            }
        }
        return new Region(low, high);
    }

    /** Returns whether a prepared value lies outside the box with its margin. */
    public boolean leaves(int channel, double value) {
        double margin = MARGIN * width(channel);
        return value < low[channel] - margin || value > high[channel] + margin;
    }

    /** Returns whether a prepared value is not finite or beyond any sense. */
    boolean absurd(int channel, double value) {
        return !(Math.abs(value - middle(channel)) <= LIMIT * width(channel));
    }

    /** Returns the value, or when it is absurd the limit on its side (the upper one for NaN). */
    double limited(int channel, double value) {
        if (!absurd(channel, value)) {
            return value;
        }
        return middle(channel) + (value < middle(channel) ? -LIMIT : LIMIT) * width(channel);
    }

    private double middle(int channel) {
        return 0.5 * low[channel] + 0.5 * high[channel];
    }

    // A channel that never moved has no width of its own; its size, or 1 at zero, stands in.
    private double width(int channel) {
        double width = high[channel] - low[channel];
        return width > 0 ? width : Math.max(1, Math.abs(high[channel]));
    }
}
