package org.modestead.engine.operator;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebra.Svd;
import org.modestead.engine.linalg.LinearAlgebra.SymmetricEigen;
import org.modestead.engine.linalg.Matrices;

/**
 * The geometric mean of the step forward and the inverted step backward: noise shrinks both alike, so that the shrinkage
 * cancels. It is {@code (A_f A_b⁻¹)^(1/2)} where the two commute; in general {@code A = A_f (A_f⁻¹ A_b⁻¹)^(1/2)}, which
 * spares the choice among the many square roots, because with the action M and the second moment N of orthonormal functions
 * {@code A_f = M}, {@code A_b = N⁻¹ Mᵀ} and {@code A_f⁻¹ A_b⁻¹ = (MᵀM)⁻¹ N} has eigenvalues of at least 1. With
 * {@code M = U S Vᵀ}:
 *
 * <pre>    A = U (S⁻¹ Vᵀ N V S⁻¹)^(1/2) S Vᵀ</pre>
 *
 * <p>What the step forward carries to zero stays zero.
 *
 * <p>Dawson, Hemati, Williams and Rowley, Exp. Fluids 57:42, 2016; the mean as in Bhatia, Positive Definite Matrices,
 * Princeton 2007, chapter 4.
 */
final class ForwardBackward {

    private ForwardBackward() {}

    /**
     * @param step M, r x r
     * @param second N, r x r
     * @return A, r x r
     */
    static DMatrixRMaj action(DMatrixRMaj step, DMatrixRMaj second) {
        Svd svd = LinearAlgebra.installed().svd(step);
        double floor = Math.ulp(1.0) * step.numRows * svd.values()[0];
        int rank = 0;
        while (rank < step.numRows && svd.values()[rank] > floor) {
            rank++;
        }
        double[] values = Arrays.copyOf(svd.values(), rank);
        DMatrixRMaj u = Matrices.block(svd.u(), 0, step.numRows, 0, rank);
        DMatrixRMaj v = Matrices.block(svd.v(), 0, step.numRows, 0, rank);
        DMatrixRMaj stretched = v.copy();
        CommonOps_DDRM.divideCols(stretched, values);
        DMatrixRMaj growth = Matrices.transposeProduct(stretched, Matrices.product(second, stretched));
        DMatrixRMaj mean = Matrices.product(u, root(growth));
        CommonOps_DDRM.multCols(mean, values);
        return Matrices.productTranspose(mean, v);
    }

    /** Square root of a symmetric positive definite matrix. */
    private static DMatrixRMaj root(DMatrixRMaj a) {
        SymmetricEigen eigen = LinearAlgebra.installed().symmetricEigen(a);
        DMatrixRMaj scaled = eigen.vectors().copy();
        CommonOps_DDRM.multCols(scaled, Arrays.stream(eigen.values()).map(value -> Math.sqrt(Math.max(0, value))).toArray());
        return Matrices.productTranspose(scaled, eigen.vectors());
    }
}
