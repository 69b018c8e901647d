package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;

/**
 * Reconstructs what was recorded, forecasts what comes, puts bands around it and holds it against naive baselines.
 *
 * <p><b>Bands</b> are split-conformal ({@link SplitConformal}), per lead time and channel, calibrated on the calibration
 * part or else on the first half of the holdout. <b>Scores</b> are rolling-origin errors over the holdout
 * ({@link ScoreRow}) for both routes, persistence and, where there is a season, the seasonal naive forecast. Coverage
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
    public static ForecastResult run(Snapshots snapshots, FittedOperator operator, Spectrum spectrum, Optional<Verdict> verdict,
            ForecastPlan plan, Progress progress) {
        ForecastTask task = ForecastTask.of(snapshots, operator, spectrum, plan);
        RouteChoice choice = RouteChoice.of(plan.route(), verdict);
        List<Judged> methods = judge(task, routes(task, operator, spectrum, choice.route()), progress.part(0, 0.7));
        ErrorUnits units = ErrorUnits.of(snapshots, task.scaleSeason());
        ScoreTable scores = ScoreTable.of(task, methods, units);
        Judged used = methods.get(0);
        ForecastTable table = ForecastTable.of(task, used.route(), used.bands(), progress.part(0.7, 0.9));
        Reconstruction reconstruction = Reconstruction.of(snapshots, operator, progress.part(0.9, 1));
        progress.report(1, "forecast done");
        List<Doubt> doubts = new ArrayList<>(choice.doubts());
        doubts.addAll(inputDoubts(task, operator));
        doubts.addAll(table.doubts());
        doubts.addAll(bandDoubts(task, used));
        doubts.addAll(scores.doubts());
        doubts.addAll(baselineDoubts(task, scores.rows()));
        doubts.addAll(reconstruction.doubts());
        return new ForecastResult(table.rows(), reconstruction.rows(), scores.rows(), choice.route(),
                summary(task, choice, used, units, scores.rows()), doubts);
    }

    // The route of the forecast table comes first.
    private static List<ForecastRoute> routes(ForecastTask task, FittedOperator operator, Spectrum spectrum, Route used) {
        ForecastRoute modal = new ModalRoute(operator, spectrum, task.step());
        ForecastRoute projection = new ProjectionRoute(operator, task.step());
        Preparation preparation = task.snapshots().preparation();
        List<ForecastRoute> out = new ArrayList<>(used == Route.MODAL ? List.of(modal, projection) : List.of(projection, modal));
        out.add(new Persistence(preparation, task.step()));
        task.season().ifPresent(season -> out.add(new SeasonalNaive(preparation, task.step(), season)));
        return out;
    }

    private static List<Judged> judge(ForecastTask task, List<ForecastRoute> routes, Progress progress) {
        List<Judged> out = new ArrayList<>();
        for (ForecastRoute route : routes) {
            progress.report((double) out.size() / routes.size(), "scoring " + route.id());
            out.add(Judged.of(task, route, progress));
        }
        return out;
    }

    private static List<Doubt> inputDoubts(ForecastTask task, FittedOperator operator) {
        List<Doubt> out = new ArrayList<>();
        Snapshots snapshots = task.snapshots();
        if (snapshots.step().isEmpty()) {
            out.add(new Doubt("uneven-times", "The recording is sampled unevenly: forecasts are " + figure(task.step())
                    + " apart (the median training step), and observed values are interpolated linearly to these times for the scores."));
        }
        if (!snapshots.inputs().isEmpty()) {
            out.add(new Doubt("inputs-not-forecast", "The forecast does not know what the " + snapshots.inputs().size()
                    + " inputs will do; it continues as the training runs behaved on the whole."));
        }
        if (operator.evolution() instanceof Evolution.Generator generator && generator.contraction() != 1) {
            out.add(new Doubt("scaled-generator", "The forecast reads the scaled generator (factor " + figure(generator.contraction())
                    + ") as that of the flow itself; the further the factor is from 1, the rougher that is."));
        }
        return out;
    }

    private static List<Doubt> bandDoubts(ForecastTask task, Judged used) {
        int reach = used.bands().reach();
        List<Doubt> out = new ArrayList<>();
        if (reach == 0) {
            out.add(new Doubt("no-bands", "The forecast has no bands: " + used.calibrationOrigins()
                    + " origins outside training are too few for " + percent(task) + " coverage; keep a calibration part or a longer holdout."));
            return out;
        }
        out.add(new Doubt("bands-not-exchangeable", "The bands promise " + percent(task) + " coverage only for exchangeable errors;"
                + " errors of a time series are not, so trust the coverage measured on the holdout."));
        if (reach < task.steps()) {
            out.add(new Doubt("bands-end", "Bands reach " + figure(reach * task.step()) + " (" + reach + " of " + task.steps()
                    + " steps) ahead; for longer ones keep a longer calibration part."));
        }
        if (task.bands().halved() && task.plan().origin() == Origin.BEFORE_HOLDOUT) {
            out.add(new Doubt("bands-seen", "The bands were calibrated on " + task.bands().words() + ", which the forecast table covers:"
                    + " do not count how often it lies inside them; the score table uses only the other half."));
        }
        return out;
    }

    private static List<Doubt> baselineDoubts(ForecastTask task, List<ScoreRow> rows) {
        return rows.stream().filter(row -> row.method().equals(rows.get(0).method()))
                .flatMap(row -> better(rows, row).stream()).map(row -> new Doubt("naive-is-better",
                        "At horizon " + figure(row.horizon()) + " " + row.method() + " has the smaller error (RMSE " + figure(row.rmse())
                                + "): the fitted operator adds nothing there.")).toList();
    }

    private static Optional<ScoreRow> better(List<ScoreRow> rows, ScoreRow own) {
        return rows.stream().filter(row -> row.horizon() == own.horizon() && row.rmse() < own.rmse())
                .filter(row -> !row.method().equals(Route.MODAL.word()) && !row.method().equals(Route.PROJECTION.word()))
                .min(java.util.Comparator.comparingDouble(ScoreRow::rmse));
    }

    private static List<String> summary(ForecastTask task, RouteChoice choice, Judged used, ErrorUnits units, List<ScoreRow> rows) {
        List<String> out = new ArrayList<>();
        out.add(choice.sentence());
        String unit = task.snapshots().time().unit();
        out.add("Horizon " + figure(task.steps() * task.step()) + (unit.isEmpty() ? "" : " " + unit) + ", " + task.steps() + " steps of "
                + figure(task.step()) + (task.plan().origin() == Origin.RECORDING_END
                        ? ", from the end of every run." : ", from the last state before the holdout of every run."));
        if (used.bands().reach() > 0) {
            out.add(percent(task) + " bands calibrated on " + task.bands().words() + ", " + used.calibrationOrigins() + " origins.");
        }
        if (!rows.isEmpty()) {
            out.add("Scores over the holdout, averaged over lead times up to the horizon, in " + units.words() + "; scaled errors (mase) against "
                    + (task.season().isPresent() ? "a season of " + task.season().getAsInt() + " steps." : "one step."));
            rows.stream().filter(row -> row.horizon() == rows.get(0).horizon() || row.horizon() == last(rows).horizon())
                    .forEach(row -> out.add("Horizon " + figure(row.horizon()) + ", " + row.method() + ": RMSE " + figure(row.rmse())
                            + ", MASE " + figure(row.mase()) + "."));
        }
        return out;
    }

    private static ScoreRow last(List<ScoreRow> rows) {
        return rows.get(rows.size() - 1);
    }

    private static String percent(ForecastTask task) {
        return String.format(Locale.ROOT, "%.4g %%", 100 * task.plan().coverage());
    }

    private static String figure(double value) {
        return String.format(Locale.ROOT, "%.5g", value);
    }
}
