package org.modestead.engine.linalg;

import java.util.Optional;
import org.ejml.data.DMatrixRMaj;

/** The Cholesky factor of a Gram matrix, offered where the columns it is of are of a condition below about 1e7. */
final class GramFactor {

    private static final double LEAST_PIVOT = 1e-6;

    private GramFactor() {}

    /**
     * @param gram n x n, {@code AᵀA} or {@code A Aᵀ}
     * @return R, n x n, upper triangular, {@code RᵀR} = gram; empty when A is too close to rank deficient
     */
    static Optional<DMatrixRMaj> of(DMatrixRMaj gram) {
        return LinearAlgebra.installed().cholesky(gram).filter(GramFactor::isSafe);
    }

    private static boolean isSafe(DMatrixRMaj r) {
        double smallest = Double.POSITIVE_INFINITY;
        double largest = 0;
        for (int i = 0; i < r.numRows; i++) {
            smallest = Math.min(smallest, r.get(i, i));
            largest = Math.max(largest, r.get(i, i));
        }
        return smallest > LEAST_PIVOT * largest;
    }
}
