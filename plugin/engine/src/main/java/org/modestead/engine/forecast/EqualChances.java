package org.modestead.engine.forecast;

import java.util.Arrays;

/**
 * Equally likely values, summed up so that each score takes a search and not a pass: calibration and holdout of many runs would
 * otherwise be multiplied.
 *
 * @param middle m, what is subtracted from every value so that sums cancel little
 * @param rising n values x_i - m, sorted
 * @param sums of the first k of them, k from 0 to n
 * @param weighted the same of {@code τ_i (x_i - m)}, {@code τ_i = (i - 1/2)/n}
 */
record EqualChances(double middle, double[] rising, double[] sums, double[] weighted) {

    /** @param values any order, without NaN; not modified */
    static EqualChances of(double[] values) {
        double[] rising = values.clone();
        Arrays.sort(rising);
        int n = rising.length;
        double middle = n == 0 ? 0 : rising[n / 2];
        double[] sums = new double[n + 1];
        double[] weighted = new double[n + 1];
        for (int i = 0; i < n; i++) {
            rising[i] -= middle;
            sums[i + 1] = sums[i] + rising[i];
            weighted[i + 1] = weighted[i] + (i + 0.5) / n * rising[i];
        }
        return new EqualChances(middle, rising, sums, weighted);
    }

    int count() {
        return rising.length;
    }

    /**
     * Returns {@link Scores#crps} of the values at what was observed, y: twice the mean over i of {@code τ_i (y - x_i)} below y
     * and {@code (1 - τ_i) (x_i - y)} above. With k values below, {@code Σ τ_i = k²/2n} there and {@code Σ (1 - τ_i) = (n-k)²/2n} above.
     */
    double crps(double observed) {
        int n = rising.length;
        double y = observed - middle;
        int found = Arrays.binarySearch(rising, y);
        int k = found < 0 ? -found - 1 : found;
        double below = y * k * k / (2.0 * n) - weighted[k];
        double above = sums[n] - sums[k] - (weighted[n] - weighted[k]) - y * (n - k) * (n - k) / (2.0 * n);
        return 2 * (below + above) / n;
    }
}
