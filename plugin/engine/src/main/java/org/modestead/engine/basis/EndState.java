package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * The state at one sample, read off a cubic fitted by least squares to the samples around it, so that noise of a single
 * sample does not enter the action of the generator undamped. In the middle of a run the cubic reaches to both sides, which
 * damps far more than at the ends of a run, where it can reach to one side only.
 */
public final class EndState {

    private static final int COEFFICIENTS = 4;

    private EndState() {}

    /**
     * @param times length p, rising
     * @param states p x N
     * @param at index of the sample, in [0, p)
     * @param samples how many samples enter, as evenly around it as the run allows; below 5 the sample itself is taken, and
     *     never more than p
     * @return length N
     */
    public static double[] of(double[] times, DMatrixRMaj states, int at, int samples) {
        int p = times.length;
        int used = Math.min(samples, p);
        if (used <= COEFFICIENTS) {
            return java.util.Arrays.copyOfRange(states.data, at * states.numCols, (at + 1) * states.numCols);
        }
        int first = Math.max(0, Math.min(p - used, at - used / 2));
        double length = times[first + used - 1] - times[first];
        DMatrixRMaj design = new DMatrixRMaj(used, COEFFICIENTS);
        for (int i = 0; i < used; i++) {
            double u = (times[first + i] - times[at]) / length;
            for (int j = 0; j < COEFFICIENTS; j++) {
                design.set(i, j, Math.pow(u, j));
            }
        }
        DMatrixRMaj values = CommonOps_DDRM.extract(states, first, first + used, 0, states.numCols);
        DMatrixRMaj fit = new DMatrixRMaj(COEFFICIENTS, states.numCols);
        CommonOps_DDRM.solve(design, values, fit);
        return java.util.Arrays.copyOf(fit.data, states.numCols);
    }
}
