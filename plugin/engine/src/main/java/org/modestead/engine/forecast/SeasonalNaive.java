package org.modestead.engine.forecast;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.recording.Preparation;

/**
 * The baseline "as one season ago", in recorded units: {@code y(t+h) = y(t+h-m⌈h/m⌉)}.
 *
 * <p>Hyndman and Athanasopoulos, "Forecasting: Principles and Practice", OTexts 2021, section 5.2.
 *
 * @param preparation of the snapshots
 * @param step Δt in time units, positive
 * @param season m, steps in one season, at least 1
 */
record SeasonalNaive(Preparation preparation, double step, int season) implements ForecastRoute {

    @Override
    public String id() {
        return "seasonal-naive";
    }

    @Override
    public int memory() {
        return season;
    }

    @Override
    public DMatrixRMaj forecast(DMatrixRMaj history, int steps) {
        int n = history.numCols;
        DMatrixRMaj out = new DMatrixRMaj(steps, n);
        for (int h = 1; h <= steps; h++) {
            int back = season * ((h + season - 1) / season);
            int source = history.numRows - 1 + h - back;
            for (int c = 0; c < n; c++) {
                out.set(h - 1, c, history.get(source, c) - trend(c, back));
            }
        }
        return out;
    }

    private double trend(int channel, int steps) {
        return preparation.slope()[channel] * steps * step / preparation.scale()[channel];
    }
}
