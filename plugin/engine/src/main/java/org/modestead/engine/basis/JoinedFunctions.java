package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.linalg.Matrices;

/**
 * Functions of the state, then functions of state and inputs, all evaluated at {@code [x, u]}.
 *
 * @param stateSize N, leading columns that are the state
 * @param ofState read the leading columns alone
 * @param ofBoth read all columns
 */
public record JoinedFunctions(int stateSize, FunctionBasis ofState, FunctionBasis ofBoth) implements FunctionBasis {

    @Override
    public int size() {
        return ofState.size() + ofBoth.size();
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj arguments) {
        DMatrixRMaj states = Matrices.block(arguments, 0, arguments.numRows, 0, stateSize);
        return CommonOps_DDRM.concatColumnsMulti(ofState.evaluate(states), ofBoth.evaluate(arguments));
    }

    @Override
    public String describe() {
        return ofState.describe() + " and " + ofBoth.describe();
    }
}
