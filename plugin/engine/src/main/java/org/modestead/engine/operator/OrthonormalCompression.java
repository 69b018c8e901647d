package org.modestead.engine.operator;

import java.util.Arrays;
import java.util.Optional;
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
 * @param action R x R: {@code <A q_j, q_i>}, after ridge and noise correction
 * @param second R x R: {@code <A q_j, A q_i>} in the data inner product, {@code <A* q_j, A* q_i>} in the kernel space
 * @param observable R x N: {@code <g_k, q_i>} for the full-state observable g
 * @param singular R singular values of the whitening, falling, positive
 * @param snapshots number of snapshot pairs or occupation functions behind it
 * @param innerProduct in which the q are orthonormal
 * @param evolution step map or generator
 * @param noisy what was measured, where the action is corrected for noise
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
        Evolution evolution,
        Optional<NoisyStep> noisy) {

    /** Without a noise correction. */
    public OrthonormalCompression(FunctionBasis basis, DMatrixRMaj map, DMatrixRMaj action, DMatrixRMaj second,
            DMatrixRMaj observable, double[] singular, int snapshots, InnerProduct innerProduct, Evolution evolution) {
        this(basis, map, action, second, observable, singular, snapshots, innerProduct, evolution, Optional.empty());
    }

    /** The same functions with the action corrected for noise. */
    OrthonormalCompression corrected(NoisyStep step) {
        return new OrthonormalCompression(basis, map, step.corrected(singular), second, observable, singular, snapshots,
                innerProduct, evolution, Optional.of(step));
    }

    /** Returns the action as the data give it, before any noise correction. */
    DMatrixRMaj measured() {
        return noisy.map(NoisyStep::measured).orElse(action);
    }

    /** Returns R. */
    public int rank() {
        return singular.length;
    }

    /**
     * Returns the compression onto the leading r functions; a noise correction is made anew for them.
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
        OrthonormalCompression head = new OrthonormalCompression(basis, Matrices.block(map, 0, map.numRows, 0, r),
                Matrices.block(action, 0, r, 0, r), Matrices.block(second, 0, r, 0, r),
                Matrices.block(observable, 0, r, 0, observable.numCols), Arrays.copyOf(singular, r), snapshots, innerProduct,
                evolution);
        return noisy.map(step -> head.corrected(step.leading(r))).orElse(head);
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
