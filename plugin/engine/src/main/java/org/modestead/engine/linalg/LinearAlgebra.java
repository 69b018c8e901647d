package org.modestead.engine.linalg;

import java.util.ServiceLoader;
import org.ejml.data.DMatrixRMaj;

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

    /** Returns name and version for the record of a run. */
    String name();

    /** Returns A B. */
    DMatrixRMaj multiply(DMatrixRMaj a, DMatrixRMaj b);

    /** Returns Aᵀ B. */
    DMatrixRMaj multiplyTransA(DMatrixRMaj a, DMatrixRMaj b);

    /** Returns A Bᵀ. */
    DMatrixRMaj multiplyTransB(DMatrixRMaj a, DMatrixRMaj b);

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
