package org.modestead.engine.linalg;

import java.util.List;
import org.ejml.data.ZMatrixRMaj;

/**
 * Eigenvalues and right eigenvectors of a real square matrix, {@code A v_j = λ_j v_j}.
 *
 * <p>Complex eigenvalues come in neighbouring conjugate pairs, positive imaginary part first, with conjugate vectors.
 * The vectors may be nearly dependent when A is nearly defective: look at their condition before trusting
 * {@code A = V Λ V⁻¹}.
 *
 * @param values length n, in no particular order otherwise
 * @param vectors n x n, columns of Euclidean length 1 whose largest entry is real and positive
 */
public record GeneralEigen(List<Complex> values, ZMatrixRMaj vectors) {

    /** Takes an immutable copy. */
    public GeneralEigen {
        values = List.copyOf(values);
    }
}
