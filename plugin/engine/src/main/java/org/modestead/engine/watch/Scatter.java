package org.modestead.engine.watch;

import java.util.Arrays;

/**
 * Middle and spread of figures, told by quantiles where a few of them have gone astray: the deviation is that between the 5 % and the
 * 95 % quantile over 3.29, as it is for normal figures.
 *
 * @param sorted rising, finite
 */
record Scatter(double[] sorted) {

    private static final double TAIL = 0.05;
    private static final double TAILS_APART = 3.2897073;
    private static final double NORMAL_MAD = 1.4826;

    /** Leaves out what is not finite. */
    static Scatter of(double[] values) {
        return new Scatter(Arrays.stream(values).filter(Double::isFinite).sorted().toArray());
    }

    int count() {
        return sorted.length;
    }

    double mean() {
        return Arrays.stream(sorted).average().orElse(Double.NaN);
    }

    /** Returns the deviation with n - 1, NaN of fewer than two. */
    double standard() {
        double mean = mean();
        return count() < 2 ? Double.NaN : Math.sqrt(Arrays.stream(sorted).map(v -> (v - mean) * (v - mean)).sum() / (count() - 1));
    }

    double median() {
        return quantile(0.5);
    }

    /** Returns the deviation by outer quantiles, NaN of fewer than two. */
    double deviation() {
        return count() < 2 ? Double.NaN : (quantile(1 - TAIL) - quantile(TAIL)) / TAILS_APART;
    }

    /** Returns what lies within so many deviations of the median, these told by the median distance from it (Hampel 1974). */
    Scatter within(double deviations) {
        double middle = median();
        double reach = deviations * NORMAL_MAD * of(Arrays.stream(sorted).map(v -> Math.abs(v - middle)).toArray()).median();
        return reach > 0 ? new Scatter(Arrays.stream(sorted).filter(v -> Math.abs(v - middle) <= reach).toArray()) : this;
    }

    private double quantile(double p) {
        if (count() == 0) {
            return Double.NaN;
        }
        double at = Math.max(0, Math.min(count() - 1, p * (count() + 1) - 1));
        int k = Math.min((int) at, Math.max(0, count() - 2));
        return count() == 1 ? sorted[0] : sorted[k] + (at - k) * (sorted[k + 1] - sorted[k]);
    }
}
