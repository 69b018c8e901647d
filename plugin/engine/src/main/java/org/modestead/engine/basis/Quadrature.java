package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.RecordingFault;

/**
 * Weights w with {@code ∫ h(t) dt ≈ Σ w_j h(t_j)} over uneven sample times: on every interval the polynomial through the
 * six nearest samples is integrated exactly, so the error is O(Δ⁶) on smooth data; with fewer samples the degree drops.
 *
 * <p>Davis and Rabinowitz, <i>Methods of Numerical Integration</i>, 2nd ed., section 2.3 (interpolatory rules).
 */
public final class Quadrature {

    private static final int DEGREE = 5;

    private Quadrature() {}

    /**
     * @param times length p at least 2, strictly rising
     * @return length p; the weights sum to last minus first time
     */
    public static double[] weights(double[] times) {
        int p = times.length;
        if (p < 2) {
            throw new RecordingFault("quadrature", "a segment has " + p + " sample", "a segment needs at least 2 samples");
        }
        int degree = Math.min(DEGREE, p - 1);
        double[] weights = new double[p];
        for (int k = 0; k < p - 1; k++) {
            int first = Math.min(Math.max(k - degree / 2, 0), p - 1 - degree);
            addInterval(times, k, first, degree, weights);
        }
        return weights;
    }

    /** Matches the moments {@code ∫_0^1 u^i du = 1/(i+1)} on the interval scaled to length one. */
    private static void addInterval(double[] times, int k, int first, int degree, double[] weights) {
        double h = times[k + 1] - times[k];
        DMatrixRMaj powers = new DMatrixRMaj(degree + 1, degree + 1);
        DMatrixRMaj moments = new DMatrixRMaj(degree + 1, 1);
        for (int j = 0; j <= degree; j++) {
            double u = (times[first + j] - times[k]) / h;
            double power = 1;
            for (int i = 0; i <= degree; i++) {
                powers.set(i, j, power);
                power *= u;
            }
            moments.set(j, 0, 1.0 / (j + 1));
        }
        DMatrixRMaj solution = new DMatrixRMaj(degree + 1, 1);
        if (!CommonOps_DDRM.solve(powers, moments, solution)) {
            throw new RecordingFault("quadrature", "sample times around " + times[k] + " coincide", "times must rise");
        }
        for (int j = 0; j <= degree; j++) {
            weights[first + j] += h * solution.data[j];
        }
    }
}
