package org.modestead.engine.moments;

import java.util.Arrays;

/**
 * Count, mean, squared deviations and range of every channel over samples that train. Two of them merge by
 *
 * <pre>    M = M_a + M_b + (mean_b - mean_a)² m_a m_b / (m_a + m_b)</pre>
 *
 * Chan, Golub and LeVeque, The American Statistician 37:242, 1983.
 *
 * @param count m, number of samples
 * @param mean per channel
 * @param squares sum of squared deviations from the mean, per channel
 * @param low smallest value, per channel
 * @param high largest value, per channel
 */
public record ChannelMoments(long count, double[] mean, double[] squares, double[] low, double[] high) {

    /** Of no samples. */
    static ChannelMoments none(int channels) {
        double[] low = new double[channels];
        double[] high = new double[channels];
        Arrays.fill(low, Double.POSITIVE_INFINITY);
        Arrays.fill(high, Double.NEGATIVE_INFINITY);
        return new ChannelMoments(0, new double[channels], new double[channels], low, high);
    }

    /**
     * Of the samples of one block, in two passes.
     *
     * @param values row by row, n numbers a row
     * @param from first row
     * @param to one past the last row, above {@code from}
     */
    static ChannelMoments of(double[] values, int n, int from, int to) {
        ChannelMoments out = none(n);
        int count = to - from;
        for (int c = 0; c < n; c++) {
            double first = values[from * n + c];
            double sum = 0;
            for (int k = from; k < to; k++) {
                double value = values[k * n + c];
                sum += value - first;
                out.low[c] = Math.min(out.low[c], value);
                out.high[c] = Math.max(out.high[c], value);
            }
            out.mean[c] = first + sum / count;
            for (int k = from; k < to; k++) {
                double deviation = values[k * n + c] - out.mean[c];
                out.squares[c] += deviation * deviation;
            }
        }
        return new ChannelMoments(count, out.mean, out.squares, out.low, out.high);
    }

    /** Returns those of both together. */
    public ChannelMoments plus(ChannelMoments other) {
        if (count == 0 || other.count == 0) {
            return count == 0 ? other : this;
        }
        int n = mean.length;
        ChannelMoments out = none(n);
        double share = (double) other.count / (count + other.count);
        for (int c = 0; c < n; c++) {
            double apart = other.mean[c] - mean[c];
            out.mean[c] = mean[c] + apart * share;
            out.squares[c] = squares[c] + other.squares[c] + apart * apart * share * count;
            out.low[c] = Math.min(low[c], other.low[c]);
            out.high[c] = Math.max(high[c], other.high[c]);
        }
        return new ChannelMoments(count + other.count, out.mean, out.squares, out.low, out.high);
    }

    /** Returns the variance of a channel, divisor m. */
    double variance(int channel) {
        return squares[channel] / count;
    }

    /** Returns the largest size of a value of a channel. */
    double largest(int channel) {
        return Math.max(Math.abs(low[channel]), Math.abs(high[channel]));
    }
}
