package org.modestead.engine.operator;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;

/**
 * Tikhonov ridge: the solution of {@code (G + ρ s_1² I) K = M} instead of {@code G K = M}. In the orthonormal functions row i of
 * the compressed operator is multiplied by {@code s_i² / (s_i² + ρ s_1²)}.
 */
public final class Ridge {

    private Ridge() {}

    /**
     * Applies a ridge.
     *
     * @param compression without one
     * @param ridge ρ relative to the largest squared singular value, at least 0
     * @return the same compression for 0
     * @throws FitFault if the ridge is negative or not finite, or meets a noise correction or a structure
     */
    public static OrthonormalCompression apply(OrthonormalCompression compression, double ridge) {
        if (!(ridge >= 0) || Double.isInfinite(ridge)) {
            throw new FitFault("ridge", "the ridge is " + ridge, "give 0 or a small positive number");
        }
        if (ridge == 0) {
            return compression;
        }
        if (compression.noisy().isPresent()) {
            throw new FitFault("ridge", "a ridge of " + ridge + " shrinks what the noise correction restores",
                    "set the ridge to 0, or fit without noise correction");
        }
        if (compression.imposed().isPresent()) {
            throw new FitFault("ridge", "a ridge of " + ridge + " beside an operator made " + compression.imposed().get().structure().words(),
                    "set the ridge to 0: the structure steadies the fit");
        }
        DMatrixRMaj action = compression.action().copy();
        for (int i = 0; i < compression.rank(); i++) {
            scaleRow(action, i, shrinkage(compression.singular(), i, ridge));
        }
        return new OrthonormalCompression(compression.basis(), compression.map(), action, compression.second(), compression.observable(),
                compression.singular(), compression.snapshots(), compression.innerProduct(), compression.evolution(),
                compression.noisy(), compression.inputs(), compression.imposed());
    }

    /**
     * Returns the action {@code <A q_j, q_i>} as the data give it, before ridge or noise correction were applied.
     *
     * @param compression with the ridge applied
     * @param ridge that was applied
     */
    public static DMatrixRMaj removed(OrthonormalCompression compression, double ridge) {
        DMatrixRMaj action = compression.measured().copy();
        for (int i = 0; i < compression.rank(); i++) {
            scaleRow(action, i, 1 / shrinkage(compression.singular(), i, ridge));
        }
        return action;
    }

    private static double shrinkage(double[] singular, int i, double ridge) {
        double squared = Math.pow(singular[i] / singular[0], 2);
        return squared / (squared + ridge);
    }

    private static void scaleRow(DMatrixRMaj a, int row, double factor) {
        for (int j = 0; j < a.numCols; j++) {
            a.data[row * a.numCols + j] *= factor;
        }
    }
}
