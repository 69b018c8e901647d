package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.Triangular;

/**
 * Orthonormal functions of a kernel's space that span the sections at a few landmarks,
 * {@code q(x) = C⁻¹ k(x)} with {@code k_i(x) = K(x, z_i)} and {@code K(z, z) = C Cᵀ}.
 *
 * <p>Landmarks are chosen greedily: always the point whose section is farthest from the span so far (partial Cholesky
 * with diagonal pivoting), until the farthest is at rounding distance. Touches {@code m r} kernel values and never forms
 * an m x m matrix. Harbrecht, Peters and Schneider, Appl. Numer. Math. 62:428, 2012.
 *
 * @param kernel K
 * @param landmarks z, r x N
 * @param inverseTransposed C⁻ᵀ, r x r, upper triangular
 */
public record LandmarkFeatures(Kernel kernel, DMatrixRMaj landmarks, DMatrixRMaj inverseTransposed) implements FunctionBasis {

    /**
     * Chooses landmarks among points.
     *
     * @param kernel K
     * @param points m x N
     * @param largest most landmarks, at least 1
     * @param progress polled once a landmark
     */
    public static LandmarkFeatures choose(Kernel kernel, DMatrixRMaj points, int largest, Progress progress) {
        PivotedCholesky.Pivots pivots = PivotedCholesky.choose(kernel, points, largest, progress);
        DMatrixRMaj inverse = Triangular.inverseOfLower(pivots.lower());
        CommonOps_DDRM.transpose(inverse);
        return new LandmarkFeatures(kernel, pivots.points(), inverse);
    }

    @Override
    public int size() {
        return landmarks.numRows;
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        return Matrices.product(kernel.matrix(states, landmarks), inverseTransposed);
    }

    @Override
    public String describe() {
        return size() + " landmark functions, " + kernel.spec().label();
    }
}
