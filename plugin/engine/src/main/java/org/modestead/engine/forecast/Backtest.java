package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;

/**
 * Rolling-origin errors of one route: forecast from many origins of each series, always with the history up to the
 * origin alone.
 *
 * <p>Tashman, "Out-of-sample tests of forecasting accuracy", Int. J. Forecasting 16:437, 2000.
 *
 * @param errors one entry an origin, by series and time
 * @param limited number of forecast values that were not finite or absurd and counted at the limit of {@link Region}
 */
record Backtest(List<Errors> errors, int limited) {

    // Evenly spaced origins are enough for a mean or a quantile; the number of forecast samples bounds the time it takes.
    private static final int MOST_ORIGINS = 200;
    private static final int FEWEST_ORIGINS = 30;
    private static final int SAMPLES = 20_000;

    /**
     * Errors from one origin.
     *
     * @param series index of the series
     * @param origin index of the last known sample
     * @param values forecast minus observed, leads x n, prepared units; as many leads as were asked for and observed
     */
    record Errors(int series, int origin, DMatrixRMaj values) {

        /** Returns the number of lead times. */
        int leads() {
            return values.numRows;
        }
    }

    /**
     * Forecasts from at most 200 origins (fewer for long leads, but no fewer than 30), evenly spaced, the first of
     * every series among them.
     *
     * @param memory samples of history before the first origin, at least that of the route: the same for routes that
     *     are to be compared
     * @param leads longest lead time in steps, at least 1
     */
    static Backtest of(ForecastRoute route, List<Series> all, int memory, int leads, Region region, Progress progress) {
        List<Start> starts = Start.perSeries(all, memory, origins(leads));
        return from(starts, Collections.nCopies(starts.size(), route), all, leads, region, progress);
    }

    /**
     * Forecasts from given origins, each with a route of its own.
     *
     * @param starts origins with at least the memory of their route before them
     * @param routes one a start
     * @param leads longest lead time in steps, at least 1
     */
    static Backtest from(List<Start> starts, List<ForecastRoute> routes, List<Series> all, int leads, Region region,
            Progress progress) {
        List<Errors> errors = new ArrayList<>();
        int limited = 0;
        for (int k = 0; k < starts.size(); k++) {
            progress.checkCancelled();
            int origin = starts.get(k).origin();
            Series series = all.get(starts.get(k).series());
            DMatrixRMaj values = forecast(routes.get(k), series, origin, leads);
            limited += limit(values, region);
            errors.add(new Errors(starts.get(k).series(), origin, minusObserved(values, series, origin)));
        }
        return new Backtest(List.copyOf(errors), limited);
    }

    private static int origins(int leads) {
        return Math.max(FEWEST_ORIGINS, Math.min(MOST_ORIGINS, SAMPLES / leads));
    }

    private static DMatrixRMaj forecast(ForecastRoute route, Series series, int origin, int leads) {
        int observed = Math.min(leads, series.length() - 1 - origin);
        int used = route.used(origin + 1);
        return route.forecast(series.history(origin, used), series.inputs(origin, used, observed), observed);
    }

    private static int limit(DMatrixRMaj values, Region region) {
        int limited = 0;
        for (int k = 0; k < values.data.length; k++) {
            int channel = k % values.numCols;
            if (region.absurd(channel, values.data[k])) {
                values.data[k] = region.limited(channel, values.data[k]);
                limited++;
            }
        }
        return limited;
    }

    private static DMatrixRMaj minusObserved(DMatrixRMaj values, Series series, int origin) {
        int offset = (origin + 1) * values.numCols;
        for (int k = 0; k < values.data.length; k++) {
            values.data[k] -= series.values().data[offset + k];
        }
        return values;
    }
}
