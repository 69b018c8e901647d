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

    private static final double LEAST_PIVOT = 1e-6;

    /** @return empty when A is too close to rank deficient */
    static Optional<TallQr> of(DMatrixRMaj a) {
        return round(a).flatMap(first -> round(first.q).map(second -> new TallQr(second.q, Matrices.product(second.r, first.r))));
    }

    private static Optional<TallQr> round(DMatrixRMaj a) {
        Optional<DMatrixRMaj> factor = LinearAlgebra.installed().cholesky(Matrices.gram(a));
        if (factor.isEmpty()) {
            return Optional.empty();
        }
        DMatrixRMaj r = factor.get();
        double smallest = Double.POSITIVE_INFINITY;
        double largest = 0;
        for (int i = 0; i < r.numRows; i++) {
            smallest = Math.min(smallest, r.get(i, i));
            largest = Math.max(largest, r.get(i, i));
        }
        if (!(smallest > LEAST_PIVOT * largest)) {
            return Optional.empty();
        }
        return Optional.of(new TallQr(LinearAlgebra.installed().divideByUpper(a, r), r));
    }
}
