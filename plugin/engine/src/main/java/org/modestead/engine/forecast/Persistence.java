package org.modestead.engine.forecast;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.recording.Preparation;

/**
 * The baseline "it stays as it is": the last recorded value for ever.
 *
 * <p>In recorded units; where a trend line of slope b was taken out, the prepared value therefore falls by
 * {@code b Δt / scale} a step.
 *
 * @param preparation of the snapshots
 * @param step Δt in time units, positive
 */
record Persistence(Preparation preparation, double step) implements ForecastRoute {

    @Override
    public String id() {
        return "persistence";
    }

    @Override
    public int memory() {
        return 1;
    }

    @Override
    public DMatrixRMaj forecast(DMatrixRMaj history, int steps) {
        return new SeasonalNaive(preparation, step, 1).forecast(history, steps);
    }
}
