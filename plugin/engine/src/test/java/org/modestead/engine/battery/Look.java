package org.modestead.engine.battery;

import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.SegmentPlan;

/**
 * The functions a system is looked at through. The same whatever the noise: the analyst does not know it.
 *
 * @param name unique for one system
 * @param estimator of the operator
 * @param depth delay depth
 * @param rank of the fit
 */
record Look(String name, Estimator estimator, int depth, int rank) {

    private static final SegmentPlan SEGMENTS = new SegmentPlan(10, 10);
    private static final int LANDMARKS = 100;

    static Look delays(int depth, int rank) {
        return new Look("delays-" + depth, new LinearEstimator(), depth, rank);
    }

    static Look monomials(int degree, int rank) {
        return new Look("monomials-" + degree, new DictionaryEstimator(Dictionary.monomials(degree)), 1, rank);
    }

    /** The circle's own harmonics, one channel of period 1. */
    static Look fourier(int order) {
        return new Look("fourier-" + order, new DictionaryEstimator(Dictionary.fourier(order, 1)), 1, 2 * order + 1);
    }

    static Look exponential(int rank) {
        return generator("exponential", rank, "rate", 1);
    }

    static Look polynomial(int degree, int rank) {
        return generator("polynomial", rank, "degree", degree, "offset", 1);
    }

    static Look gaussian(double scale, int rank) {
        return generator("gaussian", rank, "scale", scale);
    }

    /** The dual space of the state space with its Euclidean norm. */
    static Look linearKernel(int rank) {
        return new Look("linear-kernel-step", new KernelStepEstimator(Motions.kernel("linear"), LANDMARKS), 1, rank);
    }

    static Look step(String family, int rank, Object... parameters) {
        return new Look(family + "-step", new KernelStepEstimator(Motions.kernel(family, parameters), LANDMARKS), 1, rank);
    }

    private static Look generator(String family, int rank, Object... parameters) {
        return new Look(family, new OccupationEstimator(Motions.kernel(family, parameters), SEGMENTS, 1), 1, rank);
    }
}
