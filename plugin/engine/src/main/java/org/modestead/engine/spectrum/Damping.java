package org.modestead.engine.spectrum;

import org.modestead.engine.linalg.Complex;

/**
 * The damping of one oscillating mode in the terms different trades use, all from the damping ratio
 * {@code ζ = -Re λ/|λ|}:
 *
 * <pre>
 *   logarithmic decrement   δ = 2πζ/√(1-ζ²)               ln of the ratio of neighbouring peaks
 *   half-power points       ω±²/ω_n² = 1 - 2ζ² ± 2ζ√(1-ζ²)  where the power of a forced displacement is half its peak
 *   dynamic amplification   1/(2ζ√(1-ζ²))                 peak displacement over static displacement
 * </pre>
 *
 * <p>Formulas of one degree of freedom with viscous damping (Meirovitch, <i>Fundamentals of Vibrations</i>, chapters 2
 * and 3). {@code ζ ≈ (f₂-f₁)/(2 f_n)} is an approximation, 0.25 % high at ζ = 5 %.
 *
 * @param ratio ζ in (-1, 1); negative grows
 */
public record Damping(double ratio) {

    /** Checks the range. */
    public Damping {
        if (!(ratio > -1 && ratio < 1)) {
            throw new IllegalArgumentException("a damping ratio of " + ratio
                    + " does not oscillate: it must lie in (-1, 1)");
        }
    }

    /** Returns the damping of a rate λ that oscillates, ω not 0. */
    public static Damping ofRate(Complex rate) {
        return new Damping(-rate.re() / rate.abs());
    }

    /** Returns the damping whose logarithmic decrement is δ: {@code ζ = δ/√(4π²+δ²)}. */
    public static Damping ofLogarithmicDecrement(double decrement) {
        return new Damping(decrement / Math.hypot(2 * Math.PI, decrement));
    }

    /** Returns the rate {@code λ = -ζω_n + iω_n√(1-ζ²)} at a natural (undamped) frequency in cycles per time unit. */
    public Complex rate(double naturalFrequency) {
        double natural = 2 * Math.PI * naturalFrequency;
        return new Complex(-ratio * natural, natural * root());
    }

    /** Returns δ, per cycle. */
    public double logarithmicDecrement() {
        return 2 * Math.PI * ratio / root();
    }

    /** Returns the number of cycles after which the amplitude is halved, {@code ln 2/δ}; negative: doubled. */
    public double cyclesToHalf() {
        return Math.log(2) / logarithmicDecrement();
    }

    /** Returns {@code ω₋/ω_n}, the lower half-power point; needs {@code 0 < ζ < sin(π/8) ≈ 0.383}. */
    public double lowerHalfPower() {
        return halfPower(-1);
    }

    /** Returns {@code ω₊/ω_n}, the upper half-power point; needs {@code 0 < ζ < sin(π/8) ≈ 0.383}. */
    public double upperHalfPower() {
        return halfPower(1);
    }

    /** Returns {@code (ω₊-ω₋)/(2ω_n)}, close to ζ where ζ is small. */
    public double halfPowerBandwidth() {
        return (upperHalfPower() - lowerHalfPower()) / 2;
    }

    /** Returns the peak of the forced displacement over the static displacement; needs {@code 0 < ζ < 1/√2}. */
    public double amplification() {
        if (!(ratio > 0 && ratio < Math.sqrt(0.5))) {
            throw new IllegalArgumentException("a damping ratio of " + ratio + " has no resonance peak");
        }
        return 1 / (2 * ratio * root());
    }

    private double halfPower(int side) {
        if (!(ratio > 0 && ratio < Math.sin(Math.PI / 8))) {
            throw new IllegalArgumentException("a damping ratio of " + ratio + " has no two half-power points");
        }
        return Math.sqrt(1 - 2 * ratio * ratio + side * 2 * ratio * root());
    }

    private double root() {
        return Math.sqrt((1 - ratio) * (1 + ratio));
    }
}
