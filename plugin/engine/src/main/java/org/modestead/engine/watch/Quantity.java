package org.modestead.engine.watch;

import org.modestead.engine.spectrum.Mode;

/** What is watched of a mode, and how it is turned into a figure that scatters nearly normally. */
public enum Quantity {
    /** Frequency f, charted as {@code ln f}. */
    FREQUENCY("frequency") {
        @Override
        double chart(double value, double scale) {
            return Math.log(value);
        }

        @Override
        double figure(double charted, double scale) {
            return Math.exp(charted);
        }
    },
    /** Damping ratio ζ, charted as {@code arsinh(ζ/ζ₀)}: like a logarithm where it is large, straight through zero. */
    DAMPING("damping") {
        @Override
        double chart(double value, double scale) {
            double over = Math.abs(value) / scale;
            return Math.copySign(Math.log(over + Math.hypot(over, 1)), value);
        }

        @Override
        double figure(double charted, double scale) {
            return scale * Math.sinh(charted);
        }
    },
    /**
     * Modal assurance, charted as {@code (1 - MAC)^(1/3)}: what noise takes from 1 is a sum of squares, and the cube root of such a sum is
     * nearly normal (Wilson and Hilferty, Proc. Natl. Acad. Sci. 17:684, 1931).
     */
    SHAPE("shape") {
        @Override
        double chart(double value, double scale) {
            return Math.cbrt(Math.max(0, 1 - value));
        }

        @Override
        double figure(double charted, double scale) {
            return 1 - charted * charted * charted;
        }
    };

    private final String word;

    Quantity(String word) {
        this.word = word;
    }

    /** Returns the word used in tables. */
    public String word() {
        return word;
    }

    /** Returns whether only one direction is a change for the worse: a shape can only become less alike. */
    boolean oneSided() {
        return this == SHAPE;
    }

    /**
     * Returns ζ₀ of a stored mode: its damping ratio, but at least the one that shrinks it by 1/e over a window, {@code 1/(2π cycles)}, since
     * smaller ones look alike there.
     *
     * @param stored mode
     * @param length of a window in time units
     */
    static double scale(Mode stored, double length) {
        return Math.max(1 / (2 * Math.PI * stored.frequency() * length), Math.abs(stored.dampingRatio()));
    }

    /** Returns the charted value of a figure. */
    abstract double chart(double value, double scale);

    /** Returns the figure of a charted value. */
    abstract double figure(double charted, double scale);
}
