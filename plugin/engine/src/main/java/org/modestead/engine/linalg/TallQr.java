package org.modestead.engine.linalg;

import java.util.Optional;
import org.ejml.data.DMatrixRMaj;

/**
 * {@code A = Q R} of a tall matrix by two rounds of Cholesky factorisation, {@code AᵀA = RᵀR}, {@code Q = A R⁻¹}: nearly all
 * of the work is matrix products. The second round makes Q orthonormal to rounding where the condition of A is below about
 * 1e7; beyond that the factorisation is not offered.
 *
 * <p>Yamamoto, Nakatsukasa, Yanagisawa and Fukaya, Electron. Trans. Numer. Anal. 44:306, 2015.
 *
 * @param q m x n, orthonormal columns
 * @param r n x n, upper triangular
 */
record TallQr(DMatrixRMaj q, DMatrixRMaj r) {

    /** @return empty when A is too close to rank deficient */
    static Optional<TallQr> of(DMatrixRMaj a) {
        return round(a).flatMap(first -> round(first.q).map(second -> new TallQr(second.q, Matrices.product(second.r, first.r))));
    }

    private static Optional<TallQr> round(DMatrixRMaj a) {
        return GramFactor.of(Matrices.gram(a)).map(r -> new TallQr(LinearAlgebra.installed().divideByUpper(a, r), r));
    }
}
