package org.modestead.engine.choose;

import java.util.Arrays;

/**
 * Squared errors on successive blocks of the same held-out data. Two candidates are compared block by block, so that blocks that
 * are harder for both count for nothing.
 *
 * @param squared mean squared error of every block, relative to the spread of all blocks
 */
record BlockErrors(double[] squared) {

    /** Relative errors below this are rounding. */
    private static final double ROUNDING = 1e-10;

    /** Returns the root of the mean. */
    double relative() {
        return Math.sqrt(Arrays.stream(squared).average().orElse(Double.NaN));
    }

    /**
     * Returns whether these errors are no larger than others within noise: the mean of the differences is at most its standard
     * error, or these are rounding. Breiman, Friedman, Olshen and Stone, <i>Classification and Regression Trees</i>, Wadsworth 1984,
     * section 3.4.3 (rule of one standard error), here with paired differences.
     *
     * @param best same number of blocks
     */
    boolean asGoodAs(BlockErrors best) {
        int n = squared.length;
        double mean = 0;
        for (int k = 0; k < n; k++) {
            mean += (squared[k] - best.squared[k]) / n;
        }
        double scatter = 0;
        for (int k = 0; k < n; k++) {
            scatter += Math.pow(squared[k] - best.squared[k] - mean, 2);
        }
        double standardError = n < 2 ? 0 : Math.sqrt(scatter / (n - 1) / n);
        return mean <= standardError || relative() < ROUNDING;
    }
}
