package org.modestead.engine.forecast;

import org.modestead.engine.Progress;

/**
 * A route with its bands and its errors on the holdout.
 *
 * @param route that was judged
 * @param bands calibrated on its own errors
 * @param calibrationOrigins number of origins behind the bands
 * @param holdout errors on the holdout
 */
record Judged(ForecastRoute route, Bands bands, int calibrationOrigins, Backtest holdout) {

    static Judged of(ForecastTask task, ForecastRoute route, Progress progress) {
        int memory = Math.max(task.memory(), route.memory());
        int leads = task.leads();
        Backtest calibration = Backtest.of(route, task.bands().calibration(), memory, leads, task.region(), progress);
        Bands bands = Bands.of(calibration.errors(), leads, task.snapshots().channels().size(), task.plan().coverage());
        return new Judged(route, bands, calibration.errors().size(),
                Backtest.of(route, task.holdout(), memory, leads, task.region(), progress));
    }
}
