package org.modestead.engine.forecast;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.recording.Preparation;

/**
 * The baseline "as on average": the mean of all that was recorded of the run up to the origin, in recorded units.
 *
 * <p>Where a trend line of slope b was taken out, the prepared value therefore falls by {@code b Δt / scale} for every
 * step between the middle of the history and the time forecast.
 *
 * <p>Hyndman and Athanasopoulos, "Forecasting: Principles and Practice", OTexts 2021, section 5.2.
 *
 * @param preparation of the snapshots
 * @param step Δt in time units, positive
 */
record RunMean(Preparation preparation, double step) implements ForecastRoute {

    @Override
    public String id() {
        return "mean";
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
        double middle = (history.numRows - 1) / 2.0;
        DMatrixRMaj out = new DMatrixRMaj(steps, history.numCols);
        for (int c = 0; c < history.numCols; c++) {
            double mean = mean(history, c);
            double fall = preparation.slope()[c] * step / preparation.scale()[c];
            for (int h = 1; h <= steps; h++) {
                out.set(h - 1, c, mean - fall * (middle + h));
            }
        }
        return out;
    }

    private static double mean(DMatrixRMaj history, int channel) {
        double sum = 0;
        for (int k = 0; k < history.numRows; k++) {
            sum += history.get(k, channel);
        }
        return sum / history.numRows;
    }
}
