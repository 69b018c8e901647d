package org.modestead.engine.operator;

import org.modestead.engine.linalg.Complex;

/** What kind of operator was fitted, and how its eigenvalues become rates in continuous time. */
public sealed interface Evolution {

    /**
     * Returns the rate λ (per time unit) of an eigenvalue.
     *
     * @param eigenvalue of the compressed operator
     * @return λ; real part -∞ for the eigenvalue 0 of a step map
     */
    Complex rate(Complex eigenvalue);

    /** Returns the largest frequency (cycles per time unit) that can be told apart; infinite for a generator. */
    double aliasingLimit();

    /**
     * Returns the time over which the operator carries functions at once.
     *
     * @param sampling time from sample to sample, for a generator, which knows no step of its own
     */
    double step(double sampling);

    /**
     * The Koopman operator of one time step: {@code λ = log(μ)/Δt}, principal branch, so frequencies above
     * {@code 1/(2Δt)} appear folded.
     *
     * @param step Δt in time units, positive
     */
    record StepMap(double step) implements Evolution {
        @Override
        public Complex rate(Complex eigenvalue) {
            return eigenvalue.log().times(1 / step);
        }

        @Override
        public double aliasingLimit() {
            return 1 / (2 * step);
        }

        @Override
        public double step(double sampling) {
            return step;
        }
    }

    /**
     * The Liouville generator, {@code A g = f · ∇g}; eigenvalues are rates already.
     *
     * @param contraction a of the scaled generator {@code A g(x) = a f(x) · ∇g(a x)}; 1 for the plain generator
     */
    record Generator(double contraction) implements Evolution {
        @Override
        public Complex rate(Complex eigenvalue) {
            return eigenvalue;
        }

        @Override
        public double aliasingLimit() {
            return Double.POSITIVE_INFINITY;
        }

        @Override
        public double step(double sampling) {
            return sampling;
        }
    }
}
