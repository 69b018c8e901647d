package org.modestead.nodes.data;

/**
 * A mode that is known because the data were made from it: {@code e^(λ t)} with {@code λ = σ + iω}.
 *
 * @param name for people, lower case with dashes
 * @param frequency damped frequency ω/2π in cycles per time unit, 0 for a mode that only grows or decays
 * @param growth σ, e-folds per time unit; negative decays
 */
record TrueMode(String name, double frequency, double growth) {

    private static final double TWO_PI = 2 * Math.PI;

    /**
     * An oscillation given as practice does: {@code σ = -ζω/√(1-ζ²)}.
     *
     * @param frequency damped frequency in cycles per time unit, positive
     * @param dampingRatio ζ in (-1, 1); negative grows
     */
    static TrueMode oscillation(String name, double frequency, double dampingRatio) {
        double growth = -dampingRatio * TWO_PI * frequency / Math.sqrt(1 - dampingRatio * dampingRatio);
        return new TrueMode(name, frequency, growth);
    }

    /** A mode that loses half its size in every {@code halvingTime}. */
    static TrueMode decay(String name, double halvingTime) {
        return new TrueMode(name, 0, -StrictMath.log(2) / halvingTime);
    }

    /** Returns ω in radians per time unit. */
    double angularFrequency() {
        return TWO_PI * frequency;
    }

    /** Returns {@code -σ/|λ|}; 0 for λ = 0. */
    double dampingRatio() {
        double size = StrictMath.hypot(growth, angularFrequency());
        return size == 0 ? 0 : -growth / size;
    }

    /** Returns {@code ln 2/σ}: time to double, or minus the time to halve; infinite for σ = 0. */
    double doublingTime() {
        return growth == 0 ? Double.POSITIVE_INFINITY : StrictMath.log(2) / growth;
    }
}
