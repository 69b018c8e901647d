package org.modestead.engine.moments;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.FunctionBasis;

/**
 * The constant 1, then the state's components. With the constant among them, sums follow every shift and scale of the components.
 *
 * @param stateSize N
 */
record ConstantAndCoordinates(int stateSize) implements FunctionBasis {

    @Override
    public int size() {
        return stateSize + 1;
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        DMatrixRMaj out = new DMatrixRMaj(states.numRows, stateSize + 1);
        for (int i = 0; i < states.numRows; i++) {
            out.data[i * out.numCols] = 1;
            System.arraycopy(states.data, i * stateSize, out.data, i * out.numCols + 1, stateSize);
        }
        return out;
    }

    @Override
    public String describe() {
        return "1 and " + stateSize + " state components";
    }
}
