package org.modestead.engine.refine;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebra.Svd;
import org.modestead.engine.linalg.Matrices;

/**
 * Residuals r and their derivative J at some rates, {@code r(α + δ) ≈ r + J δ}, with columns of J scaled to length 1:
 * {@code J = U S Vᵀ diag(lengths)}.
 *
 * @param lengths of the columns of J; 1 for a rate that the samples do not feel, whose scaled column is 0
 * @param svd of the scaled derivative
 * @param tangent {@code Uᵀ r}, k x 1: what of the residual a change of rates can take away
 * @param norm of r
 */
record LinearisedFit(double[] lengths, Svd svd, DMatrixRMaj tangent, double norm) {

    /** A rate with a smaller share in an undecided direction is not touched by it. */
    private static final double UNTOUCHED = 1e-8;

    static LinearisedFit of(DMatrixRMaj derivative, DMatrixRMaj residuals) {
        DMatrixRMaj scaled = derivative.copy();
        double[] lengths = new double[derivative.numCols];
        double floor = 0;
        for (int k = 0; k < lengths.length; k++) {
            lengths[k] = NormOps_DDRM.normF(CommonOps_DDRM.extractColumn(derivative, k, null));
            floor = Math.max(floor, Math.ulp(1.0) * lengths[k]);
        }
        for (int k = 0; k < lengths.length; k++) {
            boolean felt = lengths[k] > floor;
            CommonOps_DDRM.scaleCol(felt ? 1 / lengths[k] : 0, scaled, k);
            lengths[k] = felt ? lengths[k] : 1;
        }
        Svd svd = LinearAlgebra.installed().svd(scaled);
        return new LinearisedFit(lengths, svd, Matrices.transposeProduct(svd.u(), residuals), NormOps_DDRM.normF(residuals));
    }

    /**
     * The damped step {@code -(JᵀJ + μ diag(lengths)²)⁻¹ Jᵀ r}.
     *
     * <p>Marquardt, J. SIAM 11:431, 1963.
     *
     * @param damping μ, positive
     */
    double[] step(double damping) {
        DMatrixRMaj along = tangent.copy();
        for (int i = 0; i < along.numRows; i++) {
            double s = svd.values()[i];
            along.data[i] *= -s / (s * s + damping);
        }
        double[] step = Matrices.product(svd.v(), along).data;
        for (int k = 0; k < lengths.length; k++) {
            step[k] /= lengths[k];
        }
        return step;
    }

    /** Returns the length of {@code Uᵀ r}. */
    double removable() {
        return NormOps_DDRM.normF(tangent);
    }

    /**
     * Returns {@code √((JᵀJ)⁻¹_kk)} for every column.
     *
     * @return NaN where rounding decides
     */
    double[] spreads() {
        return variances(0);
    }

    /** Returns the entries of {@code (JᵀJ)⁻¹} beside its diagonal, {@code (k, k + 1)}; NaN where rounding decides. */
    double[] neighbours() {
        return variances(1);
    }

    /** {@code √((JᵀJ)⁻¹_kk)} for 0 apart, {@code (JᵀJ)⁻¹_(k, k+1)} for 1. */
    private double[] variances(int apart) {
        double floor = Math.ulp(1.0) * svd.u().numRows * svd.values()[0];
        double[] out = new double[lengths.length - apart];
        for (int k = 0; k < out.length; k++) {
            double sum = 0;
            for (int i = 0; i < svd.values().length; i++) {
                sum += part(k, i, floor) * part(k + apart, i, floor);
            }
            out[k] = apart == 0 ? Math.sqrt(sum) / lengths[k] : sum / (lengths[k] * lengths[k + apart]);
        }
        return out;
    }

    private double part(int k, int direction, double floor) {
        double share = svd.v().get(k, direction);
        return svd.values()[direction] > floor ? share / svd.values()[direction] : Math.abs(share) < UNTOUCHED ? 0 : Double.NaN;
    }
}
