package org.modestead.engine.forecast;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.recording.Preparation;

/**
 * The baseline "it goes on as it went on the whole": the line through the first and the last sample recorded of the run,
 * {@code y(T+h) = y_T + h (y_T - y_1) / (T-1)}. With one sample known it stays as it is.
 *
 * <p>The same line in recorded and in prepared units, since a trend line that was taken out is a line too.
 *
 * <p>Hyndman and Athanasopoulos, "Forecasting: Principles and Practice", OTexts 2021, section 5.2.
 *
 * @param preparation of the snapshots
 * @param step Δt in time units, positive
 */
record Drift(Preparation preparation, double step) implements ForecastRoute {

    @Override
    public String id() {
        return "drift";
    }

    @Override
    public int memory() {
        return 1;
    }

    @Override
    public int used(int available) {
        return available;
    }

    @Override
    public DMatrixRMaj forecast(DMatrixRMaj history, int steps) {
        if (history.numRows == 1) {
            return new Persistence(preparation, step).forecast(history, steps);
        }
        int newest = history.numRows - 1;
        DMatrixRMaj out = new DMatrixRMaj(steps, history.numCols);
        for (int c = 0; c < history.numCols; c++) {
            double last = history.get(newest, c);
            double rise = (last - history.get(0, c)) / newest;
            for (int h = 1; h <= steps; h++) {
                out.set(h - 1, c, last + h * rise);
            }
        }
        return out;
    }
}
