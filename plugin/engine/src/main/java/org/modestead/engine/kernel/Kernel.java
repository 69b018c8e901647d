package org.modestead.engine.kernel;

import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;

/**
 * A positive definite function K(x, y); with it comes the Hilbert space H whose reproducing kernel it is, that is the
 * functions through which the signal is looked at.
 *
 * <p>Aronszajn, "Theory of reproducing kernels", Trans. AMS 68:337, 1950.
 */
public interface Kernel {

    /** Returns family and parameters, enough to make the kernel again; never null. */
    KernelSpec spec();

    /**
     * Returns what is known about the space: whether it holds constants and coordinates, in words and numbers.
     *
     * @return never null
     */
    SpaceFacts space();

    /**
     * Evaluates the kernel at all pairs of rows.
     *
     * @param x p x N, one point a row; not modified
     * @param y q x N, one point a row; not modified
     * @return new p x q matrix with entry (i, j) = K(x_i, y_j)
     */
    DMatrixRMaj matrix(DMatrixRMaj x, DMatrixRMaj y);

    /**
     * Evaluates K(x_i, x_i) for all rows.
     *
     * @param x p x N; not modified
     * @return length p
     */
    double[] diagonal(DMatrixRMaj x);

    /**
     * Returns ‖x^α‖² in the space: what a monomial, and with it every polynomial, weighs there.
     *
     * @param exponents α, one a state component, each at least 0
     * @return empty when the monomial is not in the space or its norm is not known
     */
    default OptionalDouble monomialNormSquared(int... exponents) {
        return OptionalDouble.empty();
    }
}
