package org.modestead.engine.moments;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.FitFault;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebra.Svd;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.ThinSvd;

/**
 * Combinations of functions that are about orthonormal on a sample: with {@code F = U S Vᵀ} there, {@code W = V S⁻¹ √m} and back
 * {@code R = S Vᵀ/√m}. Sums of squares of {@code F W} over the whole recording are then near the identity, and the singular values of F follow
 * from them to {@code ε s_1}; those of the plain sums {@code FᵀF} would be lost below {@code √ε s_1}. That is the preconditioned Cholesky QR of
 * Fukaya, Kannan, Nakatsukasa, Yamamoto and Yanagisawa, SIAM J. Sci. Comput. 42:A477, 2020. Directions weaker than {@value #FLOOR} of
 * the strongest are stretched no further.
 *
 * @param map W, P x P
 * @param back R, P x P, {@code W R = 1}
 */
public record Conditioner(DMatrixRMaj map, DMatrixRMaj back) {

    private static final double FLOOR = 1e-8;

    /**
     * @param values F on the sample, m x P
     * @throws FitFault if they are not finite or all zero
     */
    static Conditioner of(DMatrixRMaj values) {
        int size = values.numCols;
        DMatrixRMaj tall = values.numRows >= size ? values : padded(values);
        Svd svd = tall.numRows > 4 * size ? ThinSvd.of(tall, size) : LinearAlgebra.installed().svd(tall);
        if (svd.values().length < size) {
            svd = LinearAlgebra.installed().svd(tall);
        }
        double first = svd.values()[0];
        if (!(first > 0) || Double.isInfinite(first)) {
            throw new FitFault("first rows", "the largest singular value of the functions is " + first,
                    "the functions must be finite and must not all vanish there");
        }
        double[] sizes = new double[size];
        double root = Math.sqrt(values.numRows);
        for (int j = 0; j < size; j++) {
            sizes[j] = Math.max(svd.values()[j], FLOOR * first) / root;
        }
        DMatrixRMaj map = svd.v().copy();
        CommonOps_DDRM.divideCols(map, sizes);
        DMatrixRMaj back = CommonOps_DDRM.transpose(svd.v(), null);
        CommonOps_DDRM.multRows(sizes, back);
        return new Conditioner(map, back);
    }

    private static DMatrixRMaj padded(DMatrixRMaj values) {
        DMatrixRMaj out = new DMatrixRMaj(values.numCols, values.numCols);
        CommonOps_DDRM.insert(values, out, 0, 0);
        return out;
    }

    /** Returns the conditioned functions, m x P. */
    DMatrixRMaj apply(DMatrixRMaj values) {
        return Matrices.product(values, map);
    }
}
