package org.modestead.nodes.words;

import org.modestead.engine.spectrum.Mode;

/** A mode in words, with as many digits as its figures bear. */
public final class ModeWords {
    private ModeWords() {}

    /**
     * Returns for example {@code 1.52 Hz, damping ratio 1.8 %} or {@code no oscillation, halves every 12.3 s}.
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
        String growing = mode.rate().re() > 0 ? ", growing: " + change(mode, unit) : "";
        return Digits.frequency(mode.frequency(), unit.frequency()) + ", damping ratio "
                + Digits.percent(mode.dampingRatio())
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
