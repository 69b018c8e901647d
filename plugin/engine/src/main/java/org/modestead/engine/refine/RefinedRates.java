package org.modestead.engine.refine;

import java.util.List;
import org.ejml.data.DMatrixRMaj;

/**
 * Rates and weights with the smallest residual sum.
 *
 * @param model the terms at the rates found
 * @param growthErrors standard error of the growth of each term, 0 where it is not free, NaN where rounding decides
 * @param angularErrors standard error of the angular frequency of each term, likewise
 * @param crossCovariances covariance of growth and angular frequency of each term, 0 unless both are free, NaN where rounding decides
 * @param weights one q x c matrix ξ a run, in the order of the runs
 * @param residualSum sum of squared residuals over all runs and channels
 * @param degreesOfFreedom samples less free rates and weights
 * @param iterations steps taken
 * @param convergence how the search ended
 * @param offset distance from the minimum relative to the standard errors: the part of the residual that a change of rates
 *     could still take away, per free rate, relative to the residual standard deviation (Bates and Watts, Technometrics
 *     23:179, 1981); below 0.001 the search is over for every practical purpose
 */
public record RefinedRates(
        RateModel model,
        double[] growthErrors,
        double[] angularErrors,
        double[] crossCovariances,
        List<DMatrixRMaj> weights,
        double residualSum,
        int degreesOfFreedom,
        int iterations,
        Convergence convergence,
        double offset) {

    /** How the search ended. */
    public enum Convergence {
        /** No change of the rates takes a noticeable part of the residual away. */
        CONVERGED,
        /** No step made the residual smaller, although its slope says that there should be one. */
        STALLED,
        /** The number of iterations ran out. */
        UNFINISHED
    }

    /** Takes an immutable copy. */
    public RefinedRates {
        weights = List.copyOf(weights);
    }

    /** Returns the residual standard deviation, {@code √(residualSum / degreesOfFreedom)}. */
    public double residualDeviation() {
        return Math.sqrt(residualSum / degreesOfFreedom);
    }
}
