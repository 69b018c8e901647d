package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;

/**
 * A route with its bands and its errors on the holdout.
 *
 * @param route that was judged
 * @param bands calibrated on its own errors
 * @param distribution of these errors
 * @param calibrationOrigins number of origins behind both
 * @param holdout errors on the holdout
 */
record Judged(ForecastRoute route, Bands bands, ErrorDistribution distribution, int calibrationOrigins, Backtest holdout) {

    static Judged of(ForecastTask task, ForecastRoute route, Progress progress) {
        Backtest holdout = Backtest.of(route, task.holdout(), memory(task, route), task.leads(), task.region(), progress);
        return of(task, route, holdout, progress);
    }

    /** Calibrates the bands of a route whose errors on the holdout are already known. */
    static Judged of(ForecastTask task, ForecastRoute route, Backtest holdout, Progress progress) {
        int leads = task.leads();
        Backtest calibration = Backtest.of(route, task.bands().calibration(), memory(task, route), leads, task.region(),
                progress);
        int channels = task.snapshots().channels().size();
        Bands bands = Bands.of(calibration.errors(), leads, channels, task.plan().coverage());
        ErrorDistribution distribution = ErrorDistribution.of(calibration.errors(), leads, channels);
        return new Judged(route, bands, distribution, calibration.errors().size(), holdout);
    }

    private static int memory(ForecastTask task, ForecastRoute route) {
        return Math.max(task.memory(), route.memory());
    }

    /**
     * Returns what a reader must know about the bands.
     *
     * @param beyond whether they go on at leads that no calibration reaches
     */
    List<Doubt> bandDoubts(ForecastTask task, boolean beyond) {
        int reach = bands.reach();
        String promised = Summary.percent(task.plan().coverage());
        if (reach == 0) {
            return List.of(new Doubt("no-bands", "The forecast has no bands: " + calibrationOrigins + " origins outside"
                    + " training are too few for " + promised + " coverage; keep a calibration part or a longer holdout."));
        }
        List<Doubt> out = new ArrayList<>();
        out.add(new Doubt("bands-not-exchangeable", "The bands promise " + promised + " coverage only for exchangeable"
                + " errors; errors of a time series are not, so trust the coverage measured on the holdout."));
        if (reach < task.steps() && beyond) {
            out.add(new Doubt("bands-extrapolated", "Errors were seen up to " + Summary.figure(reach * task.step()) + " (" + reach + " of "
                    + task.steps() + " steps) ahead; beyond, the bands widen as the operator lets noise pile up and as fits to"
                    + " resampled runs differ: they are as good as the operator, and no holdout has seen them."));
        } else if (reach < task.steps()) {
            out.add(new Doubt("bands-end", "Bands reach " + Summary.figure(reach * task.step()) + " (" + reach + " of "
                    + task.steps() + " steps) ahead; for longer ones keep a longer calibration part."));
        }
        if (task.bands().halved() && task.plan().origin() == Origin.BEFORE_HOLDOUT) {
            out.add(new Doubt("bands-seen", "The bands were calibrated on " + task.bands().words() + ", which the forecast"
                    + " table covers: do not count how often it lies inside them; the score table uses only the other"
                    + " half."));
        }
        return out;
    }
}
