package org.modestead.engine.checks;

import java.util.Arrays;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.basis.FunctionBasis;

/**
 * A dictionary of functions named one by one, as anyone may write who implements the interface.
 *
 * @param functions of a state
 */
record ListedFunctions(List<StateFunction> functions) implements Dictionary, FunctionBasis {

    /** A number that belongs to a state. */
    interface StateFunction {
        double of(double[] state);
    }

    static ListedFunctions of(StateFunction... functions) {
        return new ListedFunctions(List.of(functions));
    }

    @Override
    public FunctionBasis on(int stateSize) {
        return this;
    }

    @Override
    public int size() {
        return functions.size();
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        DMatrixRMaj out = new DMatrixRMaj(states.numRows, size());
        for (int i = 0; i < states.numRows; i++) {
            double[] state = Arrays.copyOfRange(states.data, i * states.numCols, (i + 1) * states.numCols);
            for (int j = 0; j < size(); j++) {
                out.set(i, j, functions.get(j).of(state));
            }
        }
        return out;
    }

    @Override
    public String describe() {
        return size() + " listed functions";
    }
}
