package org.modestead.engine.watch;

import java.util.Objects;
import java.util.OptionalDouble;
import org.modestead.engine.FitFault;
import org.modestead.engine.spectrum.ComparisonLimits;
import org.modestead.engine.spread.SpreadPlan;

/**
 * How a stored spectrum is watched.
 *
 * @param window recorded time of a window in time units; empty: chosen from the modes and the recordings of the model
 * @param anyVerdict whether modes are watched whatever their verdict, not only those that stand or settle
 * @param leastShare energy share from which on a mode is watched, in [0, 1]
 * @param limits up to where a mode of a window may be the stored one
 * @param weight w of the newest window in the moving average, in [0.05, 0.5]
 * @param falseAlarmEvery windows between false alarms on the mean, over all modes and figures together, at least 10
 * @param worth which changes are worth an alarm
 * @param baseline bootstrap of the stored fit
 * @param windowReplicates resampled fits of every window, which tell how well it determines its modes; 0 for none
 */
public record WatchPlan(OptionalDouble window, boolean anyVerdict, double leastShare, ComparisonLimits limits, double weight,
        double falseAlarmEvery, Worth worth, SpreadPlan baseline, int windowReplicates) {

    /**
     * Changes too small to matter raise no alarm, however certain they are.
     *
     * @param frequency relative change of the frequency from which on it matters, in [0, 1)
     * @param assurance modal assurance down to which a shape counts as the same, in (0, 1]
     */
    public record Worth(double frequency, double assurance) {

        /** Any change of the frequency that can be told; shapes below 0.98. */
        public static final Worth DEFAULT = new Worth(0, 0.98);

        /** Checks the ranges. */
        public Worth {
            if (!(frequency >= 0 && frequency < 1 && assurance > 0 && assurance <= 1)) {
                throw new FitFault("watch", "a change matters from " + frequency + " of the frequency and a modal assurance below " + assurance
                        + " on", "give a share of the frequency below 1 and a modal assurance above 0");
            }
        }

        /** Returns how far the charted value must lie from its centre at least. */
        double least(Quantity quantity, double scale, double centre) {
            return switch (quantity) {
                case FREQUENCY -> Math.log1p(frequency);
                case DAMPING -> 0;
                case SHAPE -> quantity.chart(assurance, scale) - centre;
            };
        }
    }

    /** Window chosen, modes that stand or settle with 1 % of the signal, weight 0.25, one false alarm in 1000 windows. */
    public static final WatchPlan DEFAULT = new WatchPlan(OptionalDouble.empty(), false, 0.01, new ComparisonLimits(0.5, 0.2), 0.25, 1000,
            Worth.DEFAULT, SpreadPlan.DEFAULT, 40);

    static final double LEAST_WEIGHT = 0.05;
    static final double LARGEST_WEIGHT = 0.5;
    private static final double LEAST_WINDOWS = 10;
    private static final int LEAST_REPLICATES = 20;

    /** Checks the ranges. */
    public WatchPlan {
        Objects.requireNonNull(window);
        Objects.requireNonNull(limits);
        Objects.requireNonNull(worth);
        Objects.requireNonNull(baseline);
        if (window.isPresent() && !(window.getAsDouble() > 0 && Double.isFinite(window.getAsDouble()))) {
            throw new FitFault("watch", "a window of " + window.getAsDouble(), "give a positive length of time");
        }
        if (!(weight >= LEAST_WEIGHT && weight <= LARGEST_WEIGHT)) {
            throw new FitFault("watch", "the newest window has the weight " + weight, "give a weight between " + LEAST_WEIGHT + " and "
                    + LARGEST_WEIGHT);
        }
        if (!(falseAlarmEvery >= LEAST_WINDOWS && Double.isFinite(falseAlarmEvery))) {
            throw new FitFault("watch", "a false alarm was allowed every " + falseAlarmEvery + " windows", "allow one every "
                    + LEAST_WINDOWS + " windows or less often");
        }
        if (windowReplicates != 0 && windowReplicates < LEAST_REPLICATES) {
            throw new FitFault("watch", windowReplicates + " resampled fits a window were asked for", "give 0 or at least "
                    + LEAST_REPLICATES);
        }
    }

    /** Returns the same plan with windows of a stated length. */
    public WatchPlan withWindow(double length) {
        return new WatchPlan(OptionalDouble.of(length), anyVerdict, leastShare, limits, weight, falseAlarmEvery, worth, baseline, windowReplicates);
    }

    /** Returns the same plan with another number of resampled fits of every window. */
    public WatchPlan withWindowReplicates(int fits) {
        return new WatchPlan(window, anyVerdict, leastShare, limits, weight, falseAlarmEvery, worth, baseline, fits);
    }

    /** Returns the same plan for modes of any verdict. */
    public WatchPlan withAnyVerdict() {
        return new WatchPlan(window, true, leastShare, limits, weight, falseAlarmEvery, worth, baseline, windowReplicates);
    }
}
