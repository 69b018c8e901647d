package org.modestead.engine.operator;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.FunctionBasis;

/**
 * A compression of very many snapshot pairs held by a few rows that have the same products: with {@code F = U F_0} and {@code F' = U F'_0 + Z}, U
 * of orthonormal columns that Z is orthogonal to, all that is ever formed of F and F' are products in which U cancels.
 */
public final class FoldedCompression {

    private FoldedCompression() {}

    /**
     * @param functions p
     * @param now F_0, k x p
     * @param next F'_0 with rows below that have the products of Z, k x p
     * @param target g_0, k x N
     * @param innerProduct which of the readings of {@link FactoredCompression}
     * @param evolution step map
     * @param correction for noise, in the data inner product only
     * @param pairs number of snapshot pairs it stands for
     */
    public static Compression of(FunctionBasis functions, DMatrixRMaj now, DMatrixRMaj next, DMatrixRMaj target, InnerProduct innerProduct,
            Evolution evolution, NoiseCorrection correction, long pairs) {
        int count = (int) Math.min(Integer.MAX_VALUE, pairs);
        return new CorrectedCompression(new FactoredCompression(functions, now, next, target, innerProduct, evolution, correction),
                whitened -> whitened.of(count));
    }
}
