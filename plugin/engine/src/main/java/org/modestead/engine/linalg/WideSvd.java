package org.modestead.engine.linalg;

import java.util.Arrays;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.linalg.LinearAlgebra.Svd;

/**
 * The singular triples of a wide matrix of good condition, by what {@link TallQr} does to its transposed, which is never formed: with
 * {@code A Aᵀ = RᵀR}, {@code B = R⁻ᵀ A}, {@code B Bᵀ = TᵀT} and {@code (T R)ᵀ = U S Wᵀ} follows {@code A = U S (Bᵀ T⁻¹ W)ᵀ}. Beside A only B and
 * the right vectors are as large as A.
 *
 * <p>Yamamoto, Nakatsukasa, Yanagisawa and Fukaya, Electron. Trans. Numer. Anal. 44:306, 2015.
 */
final class WideSvd {

    private WideSvd() {}

    /**
     * @param a m x n, n at least m
     * @param largest most triples wanted, at least 1
     * @return m or as many triples as wanted; empty when A is too close to rank deficient
     */
    static Optional<Svd> of(DMatrixRMaj a, int largest) {
        return factor(a).flatMap(r -> {
            DMatrixRMaj b = Matrices.product(inverseTransposed(r), a);
            return factor(b).map(t -> {
                Svd small = LinearAlgebra.installed().svd(CommonOps_DDRM.transpose(Matrices.product(t, r), null));
                int k = Math.min(largest, small.values().length);
                DMatrixRMaj turn = Matrices.transposeProduct(inverseTransposed(t), Matrices.block(small.v(), 0, small.v().numRows, 0, k));
                return new Svd(Matrices.block(small.u(), 0, small.u().numRows, 0, k), Arrays.copyOf(small.values(), k),
                        Matrices.transposeProduct(b, turn));
            });
        });
    }

    /** R of {@code A Aᵀ = RᵀR}. */
    private static Optional<DMatrixRMaj> factor(DMatrixRMaj a) {
        return GramFactor.of(Matrices.productTranspose(a, a));
    }

    /** R⁻ᵀ. */
    private static DMatrixRMaj inverseTransposed(DMatrixRMaj r) {
        return Triangular.inverseOfLower(CommonOps_DDRM.transpose(r, null));
    }
}
