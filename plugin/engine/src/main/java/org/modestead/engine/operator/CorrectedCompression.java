package org.modestead.engine.operator;

import java.util.function.UnaryOperator;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.FunctionBasis;

/**
 * A compression whose action is corrected once it is written in orthonormal functions, by what noise adds or by a structure it must
 * have; the four arrays are those of the data.
 *
 * @param plain as the data give it
 * @param correction of the compression in orthonormal functions
 */
record CorrectedCompression(Compression plain, UnaryOperator<OrthonormalCompression> correction) implements Compression {

    @Override
    public FunctionBasis basis() {
        return plain.basis();
    }

    @Override
    public DMatrixRMaj gram() {
        return plain.gram();
    }

    @Override
    public DMatrixRMaj action() {
        return plain.action();
    }

    @Override
    public DMatrixRMaj second() {
        return plain.second();
    }

    @Override
    public DMatrixRMaj observable() {
        return plain.observable();
    }

    @Override
    public OrthonormalCompression whiten(int largest) {
        return correction.apply(plain.whiten(largest));
    }
}
