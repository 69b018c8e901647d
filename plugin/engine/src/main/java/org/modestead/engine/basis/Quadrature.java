package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.modestead.engine.RecordingFault;

/**
 * Weights w with {@code ∫ h(t) dt ≈ Σ w_j h(t_j)} over uneven sample times: on every interval the polynomial through the
 * six nearest samples is integrated exactly, so the error is O(Δ⁶) on smooth data. The degree drops where there are fewer
 * samples, and where samples so nearly coincide that the weights of one interval would add up to more than {@value #WILD}
 * times its length in magnitude: noise of a sample would enter the integral that many times enlarged.
 *
 * <p>Davis and Rabinowitz, <i>Methods of Numerical Integration</i>, 2nd ed., section 2.3 (interpolatory rules).
 */
public final class Quadrature {

    private static final int DEGREE = 5;
    private static final double WILD = 10;

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
        double[] weights = new double[p];
        for (int k = 0; k < p - 1; k++) {
            addInterval(times, k, weights);
        }
        return weights;
    }

    private static void addInterval(double[] times, int k, double[] weights) {
        if (!(times[k + 1] > times[k])) {
            throw new RecordingFault("quadrature", "sample times around " + times[k] + " do not rise", "times must rise");
        }
        for (int degree = Math.min(DEGREE, times.length - 1); degree >= 1; degree--) {
            int first = Math.min(Math.max(k - degree / 2, 0), times.length - 1 - degree);
            DMatrixRMaj rule = new DMatrixRMaj(degree + 1, 1);
            if (degree == 1 || solved(times, k, first, rule) && NormOps_DDRM.inducedP1(rule) <= WILD) {
                add(rule, times, k, first, weights);
                return;
            }
        }
    }

    /** Matches the moments {@code ∫_0^1 u^i du = 1/(i+1)} on the interval scaled to length one. */
    private static boolean solved(double[] times, int k, int first, DMatrixRMaj rule) {
        int count = rule.numRows;
        double h = times[k + 1] - times[k];
        DMatrixRMaj powers = new DMatrixRMaj(count, count);
        DMatrixRMaj moments = new DMatrixRMaj(count, 1);
        for (int j = 0; j < count; j++) {
            double u = (times[first + j] - times[k]) / h;
            double power = 1;
            for (int i = 0; i < count; i++) {
                powers.set(i, j, power);
                power *= u;
            }
            moments.set(j, 0, 1.0 / (j + 1));
        }
        return CommonOps_DDRM.solve(powers, moments, rule);
    }

    /** The trapezoid where nothing better was found. */
    private static void add(DMatrixRMaj rule, double[] times, int k, int first, double[] weights) {
        double h = times[k + 1] - times[k];
        if (rule.numRows == 2) {
            weights[k] += h / 2;
            weights[k + 1] += h / 2;
            return;
        }
        for (int j = 0; j < rule.numRows; j++) {
            weights[first + j] += h * rule.data[j];
        }
    }
}
