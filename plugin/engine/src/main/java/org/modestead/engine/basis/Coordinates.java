package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;

/**
 * The state components themselves, {@code b_i(x) = x_i}.
 *
 * @param size N
 */
public record Coordinates(int size) implements FunctionBasis {

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        return states.copy();
    }

    @Override
    public DMatrixRMaj values(DMatrixRMaj states) {
        return states;
    }

    @Override
    public String describe() {
        return size + " state components";
    }
}
