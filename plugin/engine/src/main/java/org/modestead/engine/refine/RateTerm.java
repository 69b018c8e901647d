package org.modestead.engine.refine;

import org.modestead.engine.linalg.Complex;

/**
 * One term of a sum of exponentials: its start values and which of them are free. Rates are in 1/time unit, angular
 * frequencies in radians/time unit.
 */
public sealed interface RateTerm {

    /** Returns the real part of the rate. */
    double growth();

    /** Returns the number of real functions of the term, 1 or 2. */
    int functions();

    /**
     * The function {@code e^(growth t)}.
     *
     * @param growth rate
     * @param free whether it is fitted
     */
    record Real(double growth, boolean free) implements RateTerm {
        @Override
        public int functions() {
            return 1;
        }
    }

    /**
     * The functions {@code e^(growth t) cos(angular t)} and {@code e^(growth t) sin(angular t)}, a conjugate pair of rates.
     *
     * @param growth real part of the rate
     * @param angular imaginary part, not 0
     * @param growthFree whether the real part is fitted
     * @param angularFree whether the imaginary part is fitted
     */
    record Pair(double growth, double angular, boolean growthFree, boolean angularFree) implements RateTerm {
        @Override
        public int functions() {
            return 2;
        }
    }

    /** Returns the constant function. */
    static RateTerm constant() {
        return new Real(0, false);
    }

    /**
     * Returns a steady oscillation.
     *
     * @param period in time units, positive
     * @param free whether the period is fitted
     */
    static RateTerm periodic(double period, boolean free) {
        return new Pair(0, 2 * Math.PI / period, false, free);
    }

    /** Returns a term that starts from a rate found by another fit, all of it free; either of a pair stands for both. */
    static RateTerm from(Complex rate) {
        return rate.im() == 0 ? new Real(rate.re(), true) : new Pair(rate.re(), Math.abs(rate.im()), true, true);
    }
}
