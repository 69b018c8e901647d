package org.modestead.engine.operator;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.FunctionBasis;

/**
 * A compression whose action is given a structure once it is written in orthonormal functions; the four arrays are those of the data.
 *
 * @param free as the data give it
 * @param structure imposed at every rank
 */
record ConstrainedCompression(Compression free, Structure structure) implements Compression {

    @Override
    public FunctionBasis basis() {
        return free.basis();
    }

    @Override
    public DMatrixRMaj gram() {
        return free.gram();
    }

    @Override
    public DMatrixRMaj action() {
        return free.action();
    }

    @Override
    public DMatrixRMaj second() {
        return free.second();
    }

    @Override
    public DMatrixRMaj observable() {
        return free.observable();
    }

    @Override
    public OrthonormalCompression whiten(int largest) {
        return free.whiten(largest).constrained(structure);
    }
}
