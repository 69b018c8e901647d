package org.modestead.engine.recording;

import java.util.Arrays;
import java.util.List;
import org.modestead.engine.RecordingFault;

/** The number every channel is divided by, from the training samples of all runs together. */
final class ChannelScales {
    /** A spread below this share of the largest value is rounding: some hundred units in the last place. */
    private static final double ROUNDING = 1e-13;

    private ChannelScales() {}

    /**
     * Returns the scale of each channel.
     *
     * <p>STD: the standard deviation of the detrended training samples about their mean (divisor: number of samples).
     * UNIT_GROUP: the root of the mean of these variances over the channels that share a unit.
     *
     * @param training recorded values; only the training samples are read
     * @param channels for units and names
     * @param trend what is subtracted before
     * @param scaling kind of scale
     * @throws RecordingFault if a channel, or all channels of a unit, do not vary beyond rounding
     */
    static double[] fit(List<Piece> training, List<Channel> channels, Detrending trend, Scaling scaling) {
        int n = channels.size();
        double[] scale = new double[n];
        Arrays.fill(scale, 1);
        if (scaling == Scaling.NONE) {
            return scale;
        }
        double[] mean = Detrending.mean(training, n);
        double[] largest = new double[n];
        double[] variance = variance(training, mean, trend, largest);
        for (int c = 0; c < n; c++) {
            double size = 0;
            double sum = 0;
            int members = 0;
            for (int other = 0; other < n; other++) {
                if (other == c || scaling == Scaling.UNIT_GROUP && sameUnit(channels.get(c), channels.get(other))) {
                    sum += variance[other];
                    size = Math.max(size, largest[other]);
                    members++;
                }
            }
            scale[c] = Math.sqrt(sum / members);
            if (!(scale[c] > ROUNDING * size)) {
                throw stillFault(channels.get(c), members, scale[c]);
            }
        }
        return scale;
    }

    private static boolean sameUnit(Channel one, Channel other) {
        return !one.unit().isEmpty() && one.unit().equals(other.unit());
    }

    private static RecordingFault stillFault(Channel channel, int members, double deviation) {
        String group = members == 1 ? "" : " and the other channels in " + channel.unit();
        return new RecordingFault("channel " + channel.name(), "its training samples" + group
                + " do not vary beyond rounding (standard deviation " + Wording.number(deviation) + " after detrending)",
                "leave the channel out or choose another scaling");
    }

    private static double[] variance(List<Piece> training, double[] mean, Detrending trend, double[] largest) {
        int n = mean.length;
        double[] slope = trend.slope();
        double[] sum = new double[n];
        long count = 0;
        for (Piece piece : training) {
            int samples = piece.samples(Snapshots.Part.TRAINING);
            double[] data = piece.values().data;
            for (int k = 0, at = 0; k < samples; k++) {
                double time = piece.times()[k] - trend.origin();
                for (int c = 0; c < n; c++, at++) {
                    double deviation = data[at] - mean[c] - slope[c] * time;
                    sum[c] += deviation * deviation;
                    largest[c] = Math.max(largest[c], Math.abs(data[at]));
                }
            }
            count += samples;
        }
        for (int c = 0; c < n; c++) {
            sum[c] /= count;
        }
        return sum;
    }
}
