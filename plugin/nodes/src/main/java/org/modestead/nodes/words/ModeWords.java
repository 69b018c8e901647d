package org.modestead.nodes.words;

import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeIntervals;

/** A mode in words, with as many digits as its figures bear. */
public final class ModeWords {
    /** Below this frequency in cycles per time unit people count how long a cycle lasts. */
    private static final double SLOW = 0.1;
    /** Damping ratio that changes the size of a cycle by less than 0.3 %. */
    private static final double UNDAMPED = 5e-4;

    private ModeWords() {}

    /**
     * Returns for example {@code 1.52 Hz, damping ratio 1.8 %}, each with its interval in brackets where there is one, or {@code no oscillation, halves every 12.3 s}.
     *
     * @param mode any
     * @param unit of time
     */
    public static String headline(Mode mode, TimeUnit unit) {
        if (mode.constant()) {
            return "the constant part, which every system has";
        }
        if (Double.isInfinite(mode.rate().re())) {
            return "gone within one step";
        }
        if (!mode.oscillates()) {
            return "no oscillation, " + change(mode, unit);
        }
        return cycleWithin(mode, unit) + ", " + damping(mode, unit);
    }

    /** Returns the frequency of an oscillating mode, or how long a cycle lasts where that is easier to grasp. */
    public static String cycle(Mode mode, TimeUnit unit) {
        return mode.frequency() < SLOW ? "one cycle every " + unit.span(mode.period())
                : Digits.frequency(mode.frequency(), unit.frequency());
    }

    /** Returns the same with the interval in which it may lie; without it where there is none or an end is not known. */
    private static String cycleWithin(Mode mode, TimeUnit unit) {
        boolean slow = mode.frequency() < SLOW;
        return mode.intervals().map(found -> slow ? found.period() : found.frequency())
                .filter(found -> Double.isFinite(found.low()) && Double.isFinite(found.high()))
                .map(found -> slow ? "one cycle every " + new Estimate(mode.period(), found).span(unit.name())
                        : new Estimate(mode.frequency(), found).figure(unit.frequency()))
                .orElse(cycle(mode, unit));
    }

    private static String damping(Mode mode, TimeUnit unit) {
        if (Math.abs(mode.dampingRatio()) < UNDAMPED) {
            return "next to no damping";
        }
        String growing = mode.rate().re() > 0 ? ", growing: " + change(mode, unit) : "";
        return "damping ratio " + new Estimate(mode.dampingRatio(), mode.intervals().map(ModeIntervals::dampingRatio).orElse(Interval.UNKNOWN)).percent()
                + growing;
    }

    /** Returns {@code doubles every …}, {@code halves every …} or {@code neither grows nor decays}. */
    public static String change(Mode mode, TimeUnit unit) {
        double time = mode.doublingTime();
        if (Double.isInfinite(time)) {
            return "neither grows nor decays";
        }
        return (time > 0 ? "doubles every " : "halves every ") + unit.span(Math.abs(time));
    }
}
