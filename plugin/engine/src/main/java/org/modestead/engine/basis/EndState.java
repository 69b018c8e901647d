package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * The state at one end of a segment, read off a cubic fitted by least squares to the samples next to it, so that noise
 * of a single sample does not enter the action of the generator undamped.
 */
public final class EndState {

    private static final int COEFFICIENTS = 4;

    private EndState() {}

    /**
     * @param times length p, rising
     * @param states p x N
     * @param atStart first or last time
     * @param samples how many samples enter; below 5 the sample itself is taken, and never more than p
     * @return length N
     */
    public static double[] of(double[] times, DMatrixRMaj states, boolean atStart, int samples) {
        int p = times.length;
        int used = Math.min(samples, p);
        int end = atStart ? 0 : p - 1;
        if (used <= COEFFICIENTS) {
            return java.util.Arrays.copyOfRange(states.data, end * states.numCols, (end + 1) * states.numCols);
        }
        int first = atStart ? 0 : p - used;
        double length = times[first + used - 1] - times[first];
        DMatrixRMaj design = new DMatrixRMaj(used, COEFFICIENTS);
        for (int i = 0; i < used; i++) {
            double u = (times[first + i] - times[end]) / length;
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
