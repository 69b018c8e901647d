package org.modestead.engine.recording;

import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;

/**
 * Channels told apart by the shape of what they recorded, so that whatever is drawn for them follows a channel wherever it stands, whichever sign and unit
 * it has. With central moments {@code m_k = Σ (y - mean)^k} over all samples of all runs, channels are sorted by their kurtosis {@code m_4/m_2²}, which
 * neither offset nor factor changes; the sign is that of {@code m_3}, which turns with the channel.
 *
 * <p>Channels of the very same kurtosis keep the order in which they are given.
 */
final class ChannelsByShape {

    private final int[] order;
    private final int[] signs;

    private ChannelsByShape(int[] order, int[] signs) {
        this.order = order;
        this.signs = signs;
    }

    /**
     * @param runs at least one, all of n channels
     */
    static ChannelsByShape of(List<Run> runs) {
        double[] means = means(runs);
        int n = means.length;
        double[] second = new double[n];
        double[] third = new double[n];
        double[] fourth = new double[n];
        for (Run run : runs) {
            double[] values = run.values().data;
            for (int k = 0; k < run.samples() * n; k++) {
                int channel = k % n;
                double away = values[k] - means[channel];
                double square = away * away;
                second[channel] += square;
                third[channel] += away * square;
                fourth[channel] += square * square;
            }
        }
        int[] order = IntStream.range(0, n).boxed()
                .sorted(Comparator.comparingDouble(channel -> second[channel] == 0 ? 0 : fourth[channel] / (second[channel] * second[channel])))
                .mapToInt(Integer::intValue).toArray();
        return new ChannelsByShape(order, IntStream.range(0, n).map(channel -> third[channel] < 0 ? -1 : 1).toArray());
    }

    private static double[] means(List<Run> runs) {
        int n = runs.get(0).values().numCols;
        double[] means = new double[n];
        int count = 0;
        for (Run run : runs) {
            double[] values = run.values().data;
            for (int k = 0; k < run.samples() * n; k++) {
                means[k % n] += values[k];
            }
            count += run.samples();
        }
        for (int channel = 0; channel < n; channel++) {
            means[channel] /= count;
        }
        return means;
    }

    /** Returns the channel at a place, 0 the one of the least kurtosis. */
    int at(int place) {
        return order[place];
    }

    /** Returns the sign of a channel, +1 or -1. */
    int sign(int channel) {
        return signs[channel];
    }
}
