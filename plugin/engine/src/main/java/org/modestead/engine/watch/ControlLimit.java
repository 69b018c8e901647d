package org.modestead.engine.watch;

/**
 * The limit of a control chart ({@link RunLength}) whose centre and deviation were themselves estimated from few windows.
 *
 * <p>A centre off by chance, or a deviation estimated too small, makes a chart alarm again and again (Jones, Champ and Rigdon,
 * Technometrics 43:156, 2001). So the limit h is that at which the rate of false alarms has the value asked for <em>on average over
 * what the estimates may be</em>:
 *
 * <pre>    E[1 / L(h; -δ/ρ, 1/ρ)] = rate,   δ ~ N(0, 1/K),   ρ² ~ χ²_ν/ν</pre>
 *
 * with K windows behind the centre and ν degrees of freedom behind the deviation. The fewer they are, the wider the limit.
 *
 * @param weight w of the newest window, in (0, 1)
 * @param height h, in deviations of one window
 */
record ControlLimit(double weight, double height) {

    private static final int CENTRES = 6;
    private static final int DEVIATIONS = 16;
    private static final double REACH = 4;
    private static final double LEAST_RATIO = 0.05;
    private static final double TALLEST = 60;
    private static final double FEWEST_WINDOWS = 2;
    private static final double PROPER = 1e-4;

    /**
     * @param weight w
     * @param rate of false alarms per window, in (0, 1)
     * @param pieces K, windows behind the centre, at least 1
     * @param degrees ν of the deviation, at least 1
     */
    static ControlLimit of(double weight, double rate, double pieces, double degrees) {
        double spread = Math.sqrt(weight / (2 - weight));
        double low = spread;
        double high = 2 * spread;
        double lowRate = excess(weight, low, rate, pieces, degrees);
        double highRate = excess(weight, high, rate, pieces, degrees);
        while (highRate > 0 && high < TALLEST * spread) {
            low = high;
            lowRate = highRate;
            high *= 1.3;
            highRate = excess(weight, high, rate, pieces, degrees);
        }
        // Illinois: false position whose idle end is halved
        while (high - low > PROPER * high && highRate < 0 && lowRate > 0) {
            double middle = (low * highRate - high * lowRate) / (highRate - lowRate);
            double at = excess(weight, middle, rate, pieces, degrees);
            if (Math.abs(at) < PROPER) {
                return new ControlLimit(weight, middle);
            }
            if (at > 0) {
                low = middle;
                lowRate = at;
                highRate /= 2;
            } else {
                high = middle;
                highRate = at;
                lowRate /= 2;
            }
        }
        return new ControlLimit(weight, high);
    }

    /** Logarithm of the mean rate of false alarms over the one wanted. */
    private static double excess(double weight, double height, double wanted, double pieces, double degrees) {
        return Math.log(rate(weight, height, pieces, degrees) / wanted);
    }

    /** Mean rate of false alarms per window; both integrals by the midpoint rule, four deviations wide. */
    static double rate(double weight, double height, double pieces, double degrees) {
        double least = Math.max(LEAST_RATIO, 1 - REACH / Math.sqrt(2 * degrees));
        double most = 1 + REACH / Math.sqrt(2 * degrees);
        double sum = 0;
        double weights = 0;
        for (int k = 0; k < DEVIATIONS; k++) {
            double ratio = least + (most - least) * (k + 0.5) / DEVIATIONS;
            double chance = Math.exp((degrees - 1) * Math.log(ratio) - degrees * (ratio * ratio - 1) / 2);
            for (int j = 0; j < CENTRES; j++) {
                double off = REACH * (j + 0.5) / CENTRES;
                double share = chance * Math.exp(-off * off / 2);
                sum += share / RunLength.of(weight, height, off / Math.sqrt(pieces) / ratio, 1 / ratio);
                weights += share;
            }
        }
        return sum / weights;
    }

    /** Returns a limit that is at least so wide, in deviations of one window. */
    ControlLimit atLeast(double least) {
        return least > height ? new ControlLimit(weight, least) : this;
    }

    /** Returns after how many windows on the mean a lasting change of so many deviations of one window is found; two at least. */
    double windowsToFind(double change) {
        return Math.max(FEWEST_WINDOWS, RunLength.of(weight, height, change, 1));
    }

    /** Returns the smallest change, in deviations of one window, that is found within so many windows on the mean. */
    double smallestFound(double windows) {
        double low = 0;
        double high = Math.max(TALLEST, 3 * height);
        while (high - low > PROPER * high) {
            double middle = (low + high) / 2;
            if (windowsToFind(middle) > windows) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return high;
    }

    /**
     * Returns how far a score counts: one window alone, however far out, must not leave the limit, two in a row must. Between
     * {@code h/(w(2-w))}, where two suffice, and {@code h/w}, where one would.
     */
    double clip() {
        return 0.75 * height / weight;
    }
}
