package org.modestead.engine.kernel;

import java.util.function.DoubleUnaryOperator;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Matrices;

/**
 * A kernel that depends on {@code x·y} only, {@code K(x, y) = f(x·y)}.
 *
 * @param spec family and parameters
 * @param space facts about the space
 * @param profile f, with non-negative Taylor coefficients (Schoenberg 1942)
 */
record DotProductKernel(KernelSpec spec, SpaceFacts space, DoubleUnaryOperator profile) implements Kernel {

    @Override
    public DMatrixRMaj matrix(DMatrixRMaj x, DMatrixRMaj y) {
        DMatrixRMaj out = Matrices.productTranspose(x, y);
        for (int i = 0; i < out.data.length; i++) {
            out.data[i] = profile.applyAsDouble(out.data[i]);
        }
        return out;
    }

    @Override
    public double[] diagonal(DMatrixRMaj x) {
        double[] out = SquaredNorms.ofRows(x);
        for (int i = 0; i < out.length; i++) {
            out[i] = profile.applyAsDouble(out[i]);
        }
        return out;
    }
}
