package org.modestead.engine.forecast;

import java.util.Arrays;

/**
 * Width of a prediction band from errors on data the fit never saw.
 *
 * <p>With n calibration scores s_i = |error|, the threshold is the k-th smallest, {@code k = ⌈(n+1)(1-α)⌉}. If the
 * scores and the next one are exchangeable, the next one stays below it with probability at least 1-α (exactly
 * {@code k/(n+1)} for distinct scores). <b>Errors of one time series are not exchangeable</b>: neighbours resemble each
 * other and the system may change, so the coverage holds only roughly and is measured on the holdout.
 *
 * <p>Vovk, Gammerman and Shafer, "Algorithmic Learning in a Random World", Springer 2005; Lei, G'Sell, Rinaldo,
 * Tibshirani and Wasserman, "Distribution-free predictive inference for regression", J. Amer. Stat. Assoc. 113:1094, 2018.
 */
final class SplitConformal {

    // (n+1)(1-α) that should be whole must not be lifted to the next integer by rounding: 100 · 0.55 = 55.00000000000001.
    private static final double ROUNDING = 1e-9;

    private SplitConformal() {}

    /**
     * Returns k.
     *
     * @param n number of calibration scores, at least 0
     * @param coverage 1-α in (0, 1)
     * @return rank of the threshold, from 1; n + 1 when n scores are too few
     */
    static int rank(int n, double coverage) {
        return (int) Math.ceil((n + 1) * coverage - ROUNDING);
    }

    /**
     * Returns the threshold.
     *
     * @param scores calibration scores, any order; not modified
     * @param coverage 1-α in (0, 1)
     * @return k-th smallest score; infinite when k &gt; n
     */
    static double threshold(double[] scores, double coverage) {
        int k = rank(scores.length, coverage);
        if (k > scores.length) {
            return Double.POSITIVE_INFINITY;
        }
        double[] sorted = scores.clone();
        Arrays.sort(sorted);
        return sorted[k - 1];
    }
}
