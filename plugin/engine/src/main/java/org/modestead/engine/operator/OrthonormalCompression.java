package org.modestead.engine.operator;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.linalg.Matrices;

/**
 * The operator seen through R orthonormal functions q_1..q_R, ordered so that the leading r of them are the
 * compression of rank r: nested subspaces, the rungs of the ladder.
 *
 * @param basis functions b_1..b_p from which the q are combined
 * @param map p x R: {@code q_j = Σ_i map_ij b_i}
 * @param action R x R: {@code <A q_j, q_i>}
 * @param second R x R: {@code <A q_j, A q_i>} in the data inner product, {@code <A* q_j, A* q_i>} in the kernel space
 * @param observable R x N: {@code <g_k, q_i>} for the full-state observable g
 * @param singular R singular values of the whitening, falling, positive
 * @param snapshots number of snapshot pairs or occupation functions behind it
 * @param innerProduct in which the q are orthonormal
 * @param evolution step map or generator
 */
public record OrthonormalCompression(
        FunctionBasis basis,
        DMatrixRMaj map,
        DMatrixRMaj action,
        DMatrixRMaj second,
        DMatrixRMaj observable,
        double[] singular,
        int snapshots,
        InnerProduct innerProduct,
        Evolution evolution) {

    /** Returns R. */
    public int rank() {
        return singular.length;
    }

    /**
     * Returns the compression onto the leading r functions.
     *
     * @param r in [1, R]
     */
    public OrthonormalCompression leading(int r) {
        if (r == rank()) {
            return this;
        }
        if (r < 1 || r > rank()) {
            throw new IllegalArgumentException("rank " + r + " is not in [1, " + rank() + "]");
        }
        return new OrthonormalCompression(basis, Matrices.block(map, 0, map.numRows, 0, r), Matrices.block(action, 0, r, 0, r),
                Matrices.block(second, 0, r, 0, r), Matrices.block(observable, 0, r, 0, observable.numCols),
                java.util.Arrays.copyOf(singular, r), snapshots, innerProduct, evolution);
    }

    /**
     * Evaluates the orthonormal functions.
     *
     * @param states p x N
     * @return p x R with entry (i, j) = q_j(x_i)
     */
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        DMatrixRMaj values = basis.evaluate(states);
        DMatrixRMaj out = new DMatrixRMaj(states.numRows, map.numCols);
        CommonOps_DDRM.mult(values, map, out);
        return out;
    }
}
