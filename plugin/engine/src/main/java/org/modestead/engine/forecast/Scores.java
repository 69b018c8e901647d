package org.modestead.engine.forecast;

import java.util.stream.DoubleStream;
import java.util.stream.IntStream;

/** The formulas by which forecasts are judged. */
final class Scores {

    private Scores() {}

    /** Returns {@code sqrt(mean e²)}; NaN for no errors. */
    static double rmse(double[] errors) {
        return Math.sqrt(mean(DoubleStream.of(errors).map(e -> e * e)));
    }

    /** Returns {@code mean |e|}; NaN for no errors. */
    static double mae(double[] errors) {
        return mean(DoubleStream.of(errors).map(Math::abs));
    }

    /** Returns the mean absolute error in percent, {@code 100 mean |e|/|y|}, for observed y; NaN for no errors. */
    static double percent(double[] errors, double[] observed) {
        return mean(IntStream.range(0, errors.length).mapToDouble(k -> 100 * Math.abs(errors[k] / observed[k])));
    }

    /** Returns the symmetric one, {@code 200 mean |e|/(|y| + |y + e|)}: of the mean of observed and forecast. */
    static double symmetricPercent(double[] errors, double[] observed) {
        return mean(IntStream.range(0, errors.length).mapToDouble(k -> 200 * Math.abs(errors[k])
                / (Math.abs(observed[k]) + Math.abs(observed[k] + errors[k]))));
    }

    /**
     * Returns the scale of the mean absolute scaled error: the mean absolute error {@code mean |y_t - y_(t-m)|} of the
     * (seasonal) naive one-season forecast over training alone, so that the score does not depend on the holdout.
     *
     * <p>Hyndman and Koehler, "Another look at measures of forecast accuracy", Int. J. Forecasting 22:679, 2006.
     *
     * @param runs training values of one channel, run by run
     * @param season m, at least 1
     * @return NaN when no run is longer than m
     */
    static double naiveScale(Iterable<double[]> runs, int season) {
        double sum = 0;
        int count = 0;
        for (double[] y : runs) {
            for (int t = season; t < y.length; t++) {
                sum += Math.abs(y[t] - y[t - season]);
                count++;
            }
        }
        return count == 0 ? Double.NaN : sum / count;
    }

    /**
     * Returns the interval score {@code (u-l) + (2/α)(l-y)⁺ + (2/α)(y-u)⁺}: the width, and a fine for missing.
     *
     * <p>Winkler, "A decision-theoretic approach to interval estimation", J. Amer. Stat. Assoc. 67:187, 1972; Gneiting
     * and Raftery, "Strictly proper scoring rules, prediction, and estimation", J. Amer. Stat. Assoc. 102:359, 2007, eq. 43.
     *
     * @param low l
     * @param high u, at least l
     * @param observed y
     * @param alpha α in (0, 1), one minus the coverage aimed at
     */
    static double interval(double low, double high, double observed, double alpha) {
        double miss = Math.max(0, low - observed) + Math.max(0, observed - high);
        return high - low + 2 / alpha * miss;
    }

    /**
     * Returns the pinball score of a quantile: {@code τ (y-q)} above it, {@code (1-τ) (q-y)} below. Its mean is smallest
     * where q is the τ-quantile of y.
     *
     * <p>Gneiting and Raftery, J. Amer. Stat. Assoc. 102:359, 2007, section 6. The interval score is 2/α times the pinball
     * scores of both ends, the levels α/2 and 1-α/2.
     *
     * @param level τ in (0, 1)
     * @param quantile q
     * @param observed y
     */
    static double pinball(double level, double quantile, double observed) {
        return observed >= quantile ? level * (observed - quantile) : (1 - level) * (quantile - observed);
    }

    /**
     * Returns the continuous ranked probability score of equally likely values: the area {@code ∫ (F(x) - 1{x >= y})² dx}
     * between their distribution function F and that of the observed value, in its unit; for one value the absolute error.
     * It is twice the mean pinball score of the values as quantiles at the levels {@code (i - 1/2)/n}.
     *
     * <p>Gneiting and Raftery, J. Amer. Stat. Assoc. 102:359, 2007, section 4.2; Laio and Tamea, Hydrol. Earth Syst. Sci. 11:1267,
     * 2007, for the quantiles.
     *
     * @param rising n at least 1 values, sorted
     * @param observed y
     */
    static double crps(double[] rising, double observed) {
        return EqualChances.of(rising).crps(observed);
    }

    /** Returns the mean, NaN of nothing. */
    static double mean(DoubleStream values) {
        return values.average().orElse(Double.NaN);
    }
}
