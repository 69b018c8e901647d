package org.modestead.engine.spectrum;

import java.util.Objects;

/**
 * Where the figures of a mode may lie, given how they vary from recording to recording.
 *
 * <p>Frequency, period and doubling time follow from the ends of the rate's interval. Doubling time runs through infinity
 * where the growth rate passes zero, period where the frequency reaches it: there one end is missing.
 *
 * @param level share of recordings whose interval should hold the truth, in (0, 1)
 * @param growth of σ, the real part of the rate, per time unit
 * @param turning of ω, the imaginary part of the rate, both ends at least 0
 * @param dampingRatio of -σ/|λ|, both ends in [-1, 1]
 * @param amplitude in prepared units, both ends at least 0
 */
public record ModeIntervals(double level, Interval growth, Interval turning, Interval dampingRatio, Interval amplitude) {

    private static final double TWO_PI = 2 * Math.PI;

    /** Checks that nothing is left out. */
    public ModeIntervals {
        Objects.requireNonNull(growth);
        Objects.requireNonNull(turning);
        Objects.requireNonNull(dampingRatio);
        Objects.requireNonNull(amplitude);
    }

    /** Returns the interval of the damped frequency ω/2π. */
    public Interval frequency() {
        return new Interval(turning.low() / TWO_PI, turning.high() / TWO_PI);
    }

    /** Returns the interval of the period 2π/ω, without an upper end where ω may be 0. */
    public Interval period() {
        return new Interval(finite(TWO_PI / turning.high()), finite(TWO_PI / turning.low()));
    }

    /**
     * Returns the interval of the doubling time ln 2/σ (negative: minus the halving time). Where σ may be 0, a growing mode
     * has no upper end and a fading one no lower end: it may take for ever, or even turn into the other.
     *
     * @param fitted σ of the mode
     */
    public Interval doublingTime(double fitted) {
        boolean grows = growth.high() > 0;
        boolean fades = growth.low() < 0;
        double low = grows && fades && fitted <= 0 ? Double.NaN : finite(Math.log(2) / growth.high());
        double high = grows && fades && fitted > 0 ? Double.NaN : finite(Math.log(2) / growth.low());
        return new Interval(low, high);
    }

    private static double finite(double value) {
        return Double.isFinite(value) ? value : Double.NaN;
    }
}
