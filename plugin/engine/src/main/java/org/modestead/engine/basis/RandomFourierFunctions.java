package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Matrices;

/**
 * Waves {@code cos(ω_i·x)/√D} and {@code sin(ω_i·x)/√D}, first all cosines: their product summed over the functions is
 * {@code Σ cos(ω_i·(x-y))/D}, which tends to a kernel K(x - y) when the ω are drawn from its spectral measure.
 *
 * @param frequencies ω, D x N
 * @param description what they are
 */
public record RandomFourierFunctions(DMatrixRMaj frequencies, String description) implements FunctionBasis {

    @Override
    public int size() {
        return 2 * frequencies.numRows;
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        DMatrixRMaj angles = Matrices.productTranspose(states, frequencies);
        int waves = frequencies.numRows;
        double scale = 1 / Math.sqrt(waves);
        DMatrixRMaj out = new DMatrixRMaj(states.numRows, size());
        for (int i = 0; i < states.numRows; i++) {
            for (int j = 0; j < waves; j++) {
                double angle = angles.data[i * waves + j];
                out.data[i * out.numCols + j] = scale * Math.cos(angle);
                out.data[i * out.numCols + waves + j] = scale * Math.sin(angle);
            }
        }
        return out;
    }

    @Override
    public String describe() {
        return size() + " " + description;
    }
}
