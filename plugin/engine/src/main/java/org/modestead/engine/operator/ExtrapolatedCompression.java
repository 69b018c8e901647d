package org.modestead.engine.operator;

import java.util.function.Function;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.FunctionBasis;

/**
 * A compression whose action is extrapolated to no noise once it is written in orthonormal functions; the four arrays are those of the
 * data.
 *
 * @param plain as the data give it
 * @param noise finds what noise adds to the moments of given functions
 */
record ExtrapolatedCompression(Compression plain, Function<OrthonormalCompression, NoiseMoments> noise) implements Compression {

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
        OrthonormalCompression whitened = plain.whiten(largest);
        return whitened.corrected(NoisyStep.of(whitened.action(), noise.apply(whitened)));
    }
}
