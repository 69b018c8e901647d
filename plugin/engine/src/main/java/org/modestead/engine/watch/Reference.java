package org.modestead.engine.watch;

import java.util.Arrays;
import java.util.stream.IntStream;

/**
 * What a quantity of a mode was on the recordings of the model, in charted units, and from where on it has changed.
 *
 * @param quantity which
 * @param scale ζ₀ of the mode
 * @param centre middle of the windows of the model's recordings
 * @param deviation of a full window about it
 * @param windows number of windows behind it, 0 where they were too few and the stored fit and its bootstrap stand for them
 * @param ownSpread middle of what the windows tell of their own spread; NaN when not known
 * @param widened factor by which the deviation was widened because neighbouring windows resemble each other, at least 1
 * @param limit of the chart
 */
public record Reference(Quantity quantity, double scale, double centre, double deviation, int windows, double ownSpread, double widened,
        ControlLimit limit) {

    /** Fewest windows from which a deviation is told. */
    static final int FEWEST = 6;

    private static final int ENOUGH_TO_TRIM = 8;
    private static final double ASTRAY = 4;
    private static final int ENOUGH_TO_CORRELATE = 10;
    private static final double MOST_CORRELATED = 0.9;

    /**
     * What the bootstrap of the stored fit says.
     *
     * @param stored figure of the mode, charted
     * @param deviation of a full window: that of the stored fit times the root of how many windows its recordings hold
     * @param pieces independent pieces behind it
     * @param windows how many windows the recordings of the fit would fill
     */
    record Bootstrap(double stored, double deviation, double pieces, double windows) {}

    /**
     * @param quantity which
     * @param scale ζ₀
     * @param charted the quantity in the windows of the model's recordings, NaN where the mode was not found
     * @param lengths recorded time of those windows over the length of a full one
     * @param own their own spreads, NaN where not known
     * @param bootstrap of the stored fit; its deviation NaN where there is none
     * @param limits of charts
     * @param worth which changes are worth an alarm
     * @return its deviation NaN where nothing tells it
     */
    static Reference of(Quantity quantity, double scale, double[] charted, double[] lengths, double[] own, Bootstrap bootstrap,
            ControlLimits limits, WatchPlan.Worth worth) {
        Scatter all = Scatter.of(charted);
        Scatter kept = all.count() >= ENOUGH_TO_TRIM ? all.within(ASTRAY) : all;
        if (kept.count() < FEWEST) {
            double degrees = Math.max(3, bootstrap.pieces() - 1);
            double windows = Math.max(1, bootstrap.windows());
            return new Reference(quantity, scale, bootstrap.stored(), bootstrap.deviation(), 0, Double.NaN, 1,
                    limits.of(windows, degrees).atLeast(worth.least(quantity, scale, bootstrap.stored()) / bootstrap.deviation()));
        }
        double centre = kept.mean();
        double[] weighted = IntStream.range(0, charted.length).filter(k -> kept.sorted()[0] <= charted[k]
                && charted[k] <= kept.sorted()[kept.count() - 1]).mapToDouble(k -> (charted[k] - centre) * Math.sqrt(lengths[k])).toArray();
        double scattered = Math.sqrt(Arrays.stream(weighted).map(v -> v * v).sum() / (kept.count() - 1));
        double widened = widening(weighted);
        double deviation = widened * (bootstrap.deviation() > scattered ? bootstrap.deviation() : scattered);
        return new Reference(quantity, scale, centre, deviation, kept.count(), Scatter.of(own).median(), widened,
                limits.of(kept.count(), degrees(kept.count(), bootstrap)).atLeast(worth.least(quantity, scale, centre) / deviation));
    }

    /**
     * Degrees of freedom behind the larger of two deviations that were told independently: both must be too small for it to be, so that the
     * chance of a ratio ρ falls with the sum of their degrees. The bootstrap counts for no more than the windows.
     */
    private static double degrees(int windows, Bootstrap bootstrap) {
        double other = bootstrap.deviation() > 0 ? Math.max(0, Math.min(windows, bootstrap.pieces()) - 1) : 0;
        return windows - 1 + other;
    }

    /** A mean of neighbours that resemble each other by r scatters as {@code (1 + r)/(1 - r)} times as many would. */
    private static double widening(double[] deviations) {
        double squares = Arrays.stream(deviations).map(v -> v * v).sum();
        double neighbours = IntStream.range(1, deviations.length).mapToDouble(k -> deviations[k] * deviations[k - 1]).sum();
        double alike = Math.min(MOST_CORRELATED, neighbours / squares);
        boolean certain = deviations.length >= ENOUGH_TO_CORRELATE && alike > 2 / Math.sqrt(deviations.length);
        return certain ? Math.sqrt((1 + alike) / (1 - alike)) : 1;
    }

    /** Returns whether there are limits at all. */
    public boolean known() {
        return deviation > 0 && Double.isFinite(deviation) && Double.isFinite(centre);
    }

    /**
     * Returns how many deviations a figure lies from the centre, clipped so that no window alone alarms. A window that determines its
     * modes worse than those of the model, by its own resampled fits, counts for less.
     *
     * @param sighting in the window
     * @param length recorded time of the window over that of a full one
     */
    double score(Sighting sighting, double length) {
        double own = sighting.spread(quantity) / ownSpread;
        double unsure = own > 1 ? own : 1;
        double score = (quantity.chart(sighting.figure(quantity), scale) - centre) / (deviation * unsure) * Math.sqrt(length);
        return Double.isNaN(score) ? score : Math.max(-limit.clip(), Math.min(limit.clip(), score));
    }

    /** Returns the figure that lies so many deviations from the centre. */
    public double figure(double deviations) {
        return quantity.figure(centre + deviations * deviation, scale);
    }

    /** Returns the figure at which the moving average leaves the limits below (-1) or above (1). */
    public double limitFigure(int side) {
        return figure(side * limit.height());
    }

    /** Returns the limit of the moving average, in deviations of one window. */
    public double limitHeight() {
        return limit.height();
    }

    /** Returns the smallest lasting change of the figure, at its dangerous side, that is found within so many windows on the mean. */
    public double smallestFound(double windows) {
        return Math.abs(figure(limit.smallestFound(windows)) - figure(0));
    }

    /** Returns after how many windows on the mean a lasting change of the figure is found. */
    public double windowsToFind(double changed) {
        return limit.windowsToFind(Math.abs(quantity.chart(changed, scale) - centre) / deviation);
    }
}
