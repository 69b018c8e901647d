package org.modestead.engine.forecast;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.recording.DelayEmbedding;

/** The delay-embedded state at one sample of a series that is still growing. */
final class DelayState {

    private DelayState() {}

    /**
     * Stacks {@code [y_k, y_(k-s), ..., y_(k-(d-1)s)]}.
     *
     * @param samples p x n
     * @param newest k, at least the reach of the delays
     * @return new 1 x (n d) matrix
     */
    static DMatrixRMaj at(DMatrixRMaj samples, int newest, DelayEmbedding delay) {
        int n = samples.numCols;
        DMatrixRMaj state = new DMatrixRMaj(1, n * delay.depth());
        for (int d = 0; d < delay.depth(); d++) {
            System.arraycopy(samples.data, (newest - d * delay.spacing()) * n, state.data, d * n, n);
        }
        return state;
    }
}
