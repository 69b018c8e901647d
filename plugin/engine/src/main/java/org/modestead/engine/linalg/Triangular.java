package org.modestead.engine.linalg;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.decomposition.TriangularSolver_DDRM;

/** Inverses of triangular matrices. */
public final class Triangular {

    private Triangular() {}

    /**
     * Returns L⁻¹.
     *
     * @param lower n x n, lower triangular with a diagonal that is not 0; not modified
     */
    public static DMatrixRMaj inverseOfLower(DMatrixRMaj lower) {
        int n = lower.numRows;
        DMatrixRMaj inverse = CommonOps_DDRM.identity(n);
        TriangularSolver_DDRM.solveL(lower.data, inverse.data, n, n);
        return inverse;
    }

    /**
     * Returns R⁻¹.
     *
     * @param upper n x n, upper triangular with a diagonal that is not 0; not modified
     */
    public static DMatrixRMaj inverseOfUpper(DMatrixRMaj upper) {
        DMatrixRMaj inverse = inverseOfLower(CommonOps_DDRM.transpose(upper, null));
        CommonOps_DDRM.transpose(inverse);
        return inverse;
    }
}
