package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.kernel.Kernel;

/**
 * Kernel sections {@code b_i(x) = K(x, x_i)}.
 *
 * @param kernel K
 * @param centres x_i, m x N; not modified
 */
public record KernelSections(Kernel kernel, DMatrixRMaj centres) implements FunctionBasis {

    @Override
    public int size() {
        return centres.numRows;
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        return kernel.matrix(states, centres);
    }

    @Override
    public String describe() {
        return centres.numRows + " kernel sections, " + kernel.spec().label();
    }
}
