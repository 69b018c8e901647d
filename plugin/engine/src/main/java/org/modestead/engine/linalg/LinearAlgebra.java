package org.modestead.engine.linalg;

import java.util.List;
import java.util.Optional;
import java.util.ServiceLoader;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;

/**
 * The few dense operations the engine spends its time in, so that a faster library can stand in for EJML. Found by
 * {@link ServiceLoader}; EJML when nothing else is there. Results are new matrices; arguments are not modified.
 * Implementations are thread-safe.
 */
public interface LinearAlgebra {

    /** Returns the implementation found when the engine was first used. */
    static LinearAlgebra installed() {
        return Installed.FOUND;
    }

    /** Returns name and version for the record of a run: what has computed so far. */
    String name();

    /** Returns what a reader must know of it, for example that a faster library is there but could not be loaded. */
    default List<Doubt> doubts() {
        return List.of();
    }

    /** Returns A B. */
    DMatrixRMaj multiply(DMatrixRMaj a, DMatrixRMaj b);

    /** Returns Aᵀ B. */
    DMatrixRMaj multiplyTransA(DMatrixRMaj a, DMatrixRMaj b);

    /** Returns A Bᵀ. */
    DMatrixRMaj multiplyTransB(DMatrixRMaj a, DMatrixRMaj b);

    /** Returns Aᵀ A, exactly symmetric. */
    DMatrixRMaj gram(DMatrixRMaj a);

    /**
     * Returns the upper triangular R of positive diagonal with {@code Rᵀ R = A}.
     *
     * @param a symmetric; only one triangle is read
     * @return empty when A is not positive definite to rounding
     */
    Optional<DMatrixRMaj> cholesky(DMatrixRMaj a);

    /**
     * Returns {@code A R⁻¹}.
     *
     * @param upper R, n x n, upper triangular with a diagonal that is not 0
     */
    DMatrixRMaj divideByUpper(DMatrixRMaj a, DMatrixRMaj upper);

    /**
     * Decomposes a matrix with at least as many rows as columns by reflections, {@code A = Q R}.
     *
     * @throws org.modestead.engine.FitFault if an entry is not finite
     */
    Qr qr(DMatrixRMaj a);

    /**
     * Decomposes a symmetric matrix, {@code A = U diag(values) Uᵀ}, values falling.
     *
     * @throws org.modestead.engine.FitFault if an entry is not finite or it does not converge
     */
    SymmetricEigen symmetricEigen(DMatrixRMaj a);

    /**
     * Decomposes any matrix in the compact form {@code A = U diag(s) Vᵀ}, s falling, k = min(m, n).
     *
     * @throws org.modestead.engine.FitFault if an entry is not finite or it does not converge
     */
    Svd svd(DMatrixRMaj a);

    /**
     * Eigenvalues and right eigenvectors of a real square matrix.
     *
     * @throws org.modestead.engine.FitFault if an entry is not finite or it does not converge
     */
    GeneralEigen eigen(DMatrixRMaj a);

    /**
     * @param q m x n, orthonormal columns
     * @param r n x n, upper triangular, diagonal of any sign
     */
    record Qr(DMatrixRMaj q, DMatrixRMaj r) {}

    /**
     * @param values falling, length n
     * @param vectors n x n, orthonormal columns in the order of the values
     */
    record SymmetricEigen(double[] values, DMatrixRMaj vectors) {}

    /**
     * @param u m x k, orthonormal columns
     * @param values s, falling, length k
     * @param v n x k, orthonormal columns
     */
    record Svd(DMatrixRMaj u, double[] values, DMatrixRMaj v) {}

    /** Holds what was found, so that it is looked for once. */
    final class Installed {
        private static final LinearAlgebra FOUND = ServiceLoader.load(LinearAlgebra.class, LinearAlgebra.class.getClassLoader())
                .findFirst().orElseGet(EjmlAlgebra::new);

        private Installed() {}
    }
}
