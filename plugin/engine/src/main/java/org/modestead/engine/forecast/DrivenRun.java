package org.modestead.engine.forecast;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.InputEffect;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.DelayEmbedding;

/**
 * A run that grows sample by sample under known inputs.
 *
 * @param compression whose functions read state and inputs
 * @param effect of the inputs
 * @param delay of the states
 * @param samples those known and, later, those forecast, p x n; written as they become known
 * @param inputs at the same times, p x q
 */
record DrivenRun(OrthonormalCompression compression, InputEffect effect, DelayEmbedding delay, DMatrixRMaj samples, DMatrixRMaj inputs) {

    /**
     * @param history at least the reach of the delays and one sample
     * @param inputs those at the samples of the history and at the steps to come
     * @param steps to be forecast
     */
    static DrivenRun of(OrthonormalCompression compression, DelayEmbedding delay, DMatrixRMaj history, DMatrixRMaj inputs, int steps) {
        DMatrixRMaj samples = new DMatrixRMaj(history.numRows + steps, history.numCols);
        System.arraycopy(history.data, 0, samples.data, 0, history.getNumElements());
        return new DrivenRun(compression, compression.inputs().orElseThrow(), delay, samples, inputs);
    }

    /** Returns {@code [x, u]} at one sample, 1 row. */
    DMatrixRMaj arguments(int newest) {
        return effect.arguments(DelayState.at(samples, newest, delay), inputs, newest);
    }

    /** Writes a sample: the leading entries of a row. */
    void write(int sample, DMatrixRMaj row) {
        System.arraycopy(row.data, 0, samples.data, sample * samples.numCols, samples.numCols);
    }

    /** Returns the last samples. */
    DMatrixRMaj last(int steps) {
        return Matrices.block(samples, samples.numRows - steps, samples.numRows, 0, samples.numCols);
    }
}
