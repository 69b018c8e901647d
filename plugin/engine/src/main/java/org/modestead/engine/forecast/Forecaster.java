package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;

/**
 * Reconstructs what was recorded, forecasts what comes, puts bands around it and holds it against naive baselines.
 *
 * <p><b>Bands</b> are split-conformal ({@link SplitConformal}), per lead time and channel, calibrated on the calibration
 * part or else on the first half of the holdout, and go on beyond the leads observed there by the operator and the spread of the
 * fit where these can be told ({@link BandsBeyond}). <b>Scores</b> are rolling-origin errors over the holdout
 * ({@link ScoreRow}) for both routes and the naive methods: persistence, the seasonal naive forecast where there is a
 * season, drift and mean. Coverage
 * and interval score come only from origins that the bands were not calibrated on; point scores from all.
 *
 * <p><b>Time step.</b> That of the snapshots; uneven snapshots are forecast at the median training step, and what is
 * observed is interpolated linearly to it for the scores.
 */
public final class Forecaster {

    private Forecaster() {}

    /**
     * Runs a plan.
     *
     * @param snapshots of the fit, or others prepared alike
     * @param operator fitted to snapshots with the same channels, delays, preparation and step
     * @param spectrum of that operator
     * @param verdict on its modes, where they were checked
     * @param plan what to forecast
     * @param progress told about runs and methods
     * @return never null; no value of the forecast table is infinite or NaN
     * @throws ForecastFault if the parts do not belong together, no run is long enough, the season is longer than
     *     training, or the origin is before a holdout that does not exist
     */
    public static ForecastResult run(Snapshots snapshots, FittedOperator operator, Spectrum spectrum,
            Optional<Verdict> verdict, ForecastPlan plan, Progress progress) {
        ForecastTask task = ForecastTask.of(snapshots, operator, spectrum, plan);
        RouteChoice choice = RouteChoice.of(plan.route(), verdict);
        List<Judged> methods = judge(task, Methods.of(task, operator, spectrum, choice.route()), progress.part(0, 0.7));
        ErrorUnits units = ErrorUnits.of(snapshots, task.scaleSeason());
        ScoreTable scores = ScoreTable.of(task, methods, units);
        Judged used = methods.get(0);
        Optional<BandsBeyond> beyond = BandsBeyond.of(task, operator, used.bands(), progress.part(0.7, 0.75));
        ForecastTable table = ForecastTable.of(task, used.route(), used.bands(), beyond, progress.part(0.75, 0.9));
        Reconstruction reconstruction = Reconstruction.of(snapshots, operator, progress.part(0.9, 1));
        progress.report(1, "forecast done");
        List<String> summary = new ArrayList<>(Summary.of(task, choice, used, units, scores.rows()));
        DistributionScores.sentence(task, methods, units).ifPresent(summary::add);
        PercentScores.sentence(task, methods).ifPresent(summary::add);
        List<Doubt> doubts = new ArrayList<>(choice.doubts());
        doubts.addAll(task.doubts(operator));
        doubts.addAll(table.doubts());
        doubts.addAll(used.bandDoubts(task, beyond.isPresent()));
        doubts.addAll(scores.doubts());
        doubts.addAll(reconstruction.doubts());
        return new ForecastResult(table.rows(), reconstruction.rows(), scores.rows(), choice.route(),
                summary, doubts);
    }

    private static List<Judged> judge(ForecastTask task, List<ForecastRoute> routes, Progress progress) {
        List<Judged> out = new ArrayList<>();
        for (ForecastRoute route : routes) {
            progress.report((double) out.size() / routes.size(), "scoring " + route.id());
            out.add(Judged.of(task, route, progress));
        }
        return out;
    }
}
