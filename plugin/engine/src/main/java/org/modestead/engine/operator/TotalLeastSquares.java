package org.modestead.engine.operator;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.Matrices;

/**
 * Total least squares among the leading r functions: with {@code X} their samples in the scale of the data (m x r) and
 * {@code Y} those one step later, {@code [X Y] = U Σ [V_1; V_2]ᵀ} is cut to its leading r singular values, which leaves
 * the map {@code X K = Y}, {@code K = V_1⁻ᵀ V_2ᵀ}. The bias of least squares is gone where the noise is of the same size in
 * all components of X and Y. A function about which the leading directions say nothing is carried to zero.
 *
 * <p>Hemati, Rowley, Deem and Cattafesta, Theor. Comput. Fluid Dyn. 31:349, 2017, after reduction to the leading r
 * directions of X.
 */
final class TotalLeastSquares {

    private TotalLeastSquares() {}

    /**
     * @param moved (R + k) x r: the functions after a step, in an orthonormal frame that begins with the functions
     * @param singular their singular values s, at least r
     * @return r x r action on the orthonormal functions, {@code s_i K_ij / s_j}
     */
    static DMatrixRMaj action(DMatrixRMaj moved, double[] singular) {
        int r = moved.numCols;
        DMatrixRMaj joint = new DMatrixRMaj(moved.numRows, 2 * r);
        CommonOps_DDRM.insert(moved, joint, 0, r);
        for (int i = 0; i < r; i++) {
            joint.set(i, i, 1);
        }
        for (int j = 0; j < 2 * r; j++) {
            CommonOps_DDRM.scaleCol(singular[j % r], joint, j);
        }
        DMatrixRMaj v = LinearAlgebra.installed().svd(joint).v();
        DMatrixRMaj now = CommonOps_DDRM.transpose(Matrices.block(v, 0, r, 0, r), null);
        DMatrixRMaj next = CommonOps_DDRM.transpose(Matrices.block(v, r, 2 * r, 0, r), null);
        CommonOps_DDRM.pinv(now.copy(), now);
        DMatrixRMaj action = Matrices.product(now, next);
        for (int i = 0; i < r; i++) {
            for (int j = 0; j < r; j++) {
                action.set(i, j, action.get(i, j) * singular[i] / singular[j]);
            }
        }
        return action;
    }
}
