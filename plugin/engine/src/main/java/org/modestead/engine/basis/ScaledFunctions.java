package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * Functions, each times a number.
 *
 * @param functions b
 * @param factors one a function; not modified
 */
public record ScaledFunctions(FunctionBasis functions, double[] factors) implements FunctionBasis {

    @Override
    public int size() {
        return functions.size();
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        DMatrixRMaj values = functions.evaluate(states);
        CommonOps_DDRM.multCols(values, factors);
        return values;
    }

    @Override
    public String describe() {
        return functions.describe();
    }
}
