package org.modestead.engine.spread;

/** Quantiles of the standard normal and of Student's distribution, to the few digits that an interval needs. */
public final class NormalQuantiles {

    private NormalQuantiles() {}

    /**
     * Returns Φ(x), absolute error below 1e-7 (Abramowitz and Stegun 26.2.17).
     *
     * @param x any
     */
    static double probability(double x) {
        double t = 1 / (1 + 0.2316419 * Math.abs(x));
        double series = t * (0.319381530 + t * (-0.356563782 + t * (1.781477937 + t * (-1.821255978 + t * 1.330274429))));
        double tail = Math.exp(-x * x / 2) / Math.sqrt(2 * Math.PI) * series;
        return x > 0 ? 1 - tail : tail;
    }

    /**
     * Returns the z with Φ(z) = p by bisection.
     *
     * @param p in (0, 1); beyond 1e-7 from either end the nearest quantile that can be told
     */
    static double normal(double p) {
        double low = -5.2;
        double high = 5.2;
        while (high - low > 1e-9) {
            double middle = (low + high) / 2;
            if (probability(middle) < p) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return (low + high) / 2;
    }

    /**
     * Returns the quantile of Student's distribution, by its expansion in 1/n (Abramowitz and Stegun 26.7.5).
     *
     * @param p in (0, 1)
     * @param n degrees of freedom, at least 3; error below 0.02 for p in [0.025, 0.975]
     */
    public static double student(double p, double n) {
        double x = normal(p);
        double x2 = x * x;
        double g1 = x * (x2 + 1) / 4;
        double g2 = x * ((5 * x2 + 16) * x2 + 3) / 96;
        double g3 = x * (((3 * x2 + 19) * x2 + 17) * x2 - 15) / 384;
        double g4 = x * ((((79 * x2 + 776) * x2 + 1482) * x2 - 1920) * x2 - 945) / 92160;
        return x + (g1 + (g2 + (g3 + g4 / n) / n) / n) / n;
    }
}
