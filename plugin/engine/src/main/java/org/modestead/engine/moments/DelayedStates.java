package org.modestead.engine.moments;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;

/** Delay-embedded, prepared states of neighbouring samples, in the order of columns of {@link DelayEmbedding}. */
final class DelayedStates {

    private DelayedStates() {}

    /**
     * @param times of the samples
     * @param values as recorded, row by row, n numbers a row
     * @param from first state; state k has sample k + reach as its newest
     * @param to one past the last state
     * @return (to - from) x N
     */
    static DMatrixRMaj of(DelayEmbedding delay, double[] times, double[] values, int n, Preparation preparation, int from, int to) {
        int samples = to - from + delay.reach();
        double[] prepared = new double[samples * n];
        for (int k = 0, at = 0; k < samples; k++) {
            for (int c = 0; c < n; c++, at++) {
                prepared[at] = preparation.prepare(c, times[from + k], values[(from + k) * n + c]);
            }
        }
        DMatrixRMaj out = new DMatrixRMaj(to - from, n * delay.depth());
        for (int k = 0; k < out.numRows; k++) {
            for (int d = 0; d < delay.depth(); d++) {
                int sample = k + delay.reach() - d * delay.spacing();
                System.arraycopy(prepared, sample * n, out.data, k * out.numCols + d * n, n);
            }
        }
        return out;
    }
}
