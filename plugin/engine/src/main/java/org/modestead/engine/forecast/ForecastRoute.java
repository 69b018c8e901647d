package org.modestead.engine.forecast;

import org.ejml.data.DMatrixRMaj;

/**
 * One way to continue a run: a function of its history alone, at a fixed time step, in prepared units.
 *
 * <p>Implementations are immutable and thread-safe.
 */
public interface ForecastRoute {

    /** Returns the word used in tables. */
    String id();

    /** Returns how many samples of history a forecast needs, at least 1. */
    int memory();

    /**
     * Returns how many samples of history are to be handed over: the memory, unless more sharpens the forecast.
     *
     * @param available samples recorded up to the origin, at least {@link #memory()}
     * @return in [memory, available]
     */
    default int used(int available) {
        return memory();
    }

    /**
     * Continues a run.
     *
     * @param history samples up to the origin, newest last, at least {@link #memory()} x n, prepared units, one step
     *     apart; not modified
     * @param steps how many to forecast, at least 1
     * @return new steps x n matrix, prepared units; entries may overflow, the caller judges
     */
    DMatrixRMaj forecast(DMatrixRMaj history, int steps);

    /**
     * Continues a run whose inputs are known; a route that knows nothing of inputs does not read them.
     *
     * @param history as above
     * @param inputs (history rows + steps) x q: those at the samples of the history and at the steps to come
     * @param steps how many to forecast, at least 1
     * @return as above
     */
    default DMatrixRMaj forecast(DMatrixRMaj history, DMatrixRMaj inputs, int steps) {
        return forecast(history, steps);
    }
}
