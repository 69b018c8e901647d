package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.modestead.engine.Doubt;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.forecast.Backtest.Errors;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;
import org.modestead.engine.wellposed.Verdict;

/**
 * Backtest over rolling origins: forecast the holdout again and again from later and later origins, each time knowing
 * only what came before, and hold the operator against the naive methods.
 *
 * <p>All methods start from the same origins, evenly spaced over those from which the whole horizon is observed. With
 * {@link Refit#EVERY_ORIGIN} the operator is fitted anew before each, by the same estimator, rank and ridge, to what
 * {@link KnownAt} allows. Detrending and scaling stay those of the training part, which precedes every origin.
 *
 * <p><b>Bands</b> are calibrated once, with the operator at hand, on the calibration part or the first half of the
 * holdout; only origins outside it count for coverage and interval score.
 *
 * <p>Tashman, "Out-of-sample tests of forecasting accuracy", Int. J. Forecasting 16:437, 2000.
 */
public final class RollingOrigin {

    private RollingOrigin() {}

    /**
     * Runs a plan.
     *
     * @param snapshots of the fit, with a holdout
     * @param operator fitted to their training part
     * @param verdict on its modes, where they were checked
     * @param plan how to backtest
     * @param progress told about origins
     * @return never null
     * @throws ForecastFault if the parts do not belong together or no origin is left
     * @throws FitFault if a fit before an origin fails
     */
    public static BacktestResult run(Snapshots snapshots, FittedOperator operator, Optional<Verdict> verdict,
            BacktestPlan plan, Progress progress) {
        Spectrum spectrum = SpectrumExtractor.extract(operator, progress.part(0, 0));
        ForecastTask task = task(snapshots, operator, spectrum, plan);
        RouteChoice choice = RouteChoice.of(plan.forecast().route(), verdict);
        List<ForecastRoute> atHand = Methods.of(task, operator, spectrum, choice.route());
        List<Start> starts = starts(task, atHand, plan);
        List<List<ForecastRoute>> routes = plan.refit() == Refit.NEVER ? Collections.nCopies(starts.size(), atHand)
                : refitted(task, operator, choice.route(), starts, progress.part(0, 0.8));
        List<Judged> judged = judge(task, atHand, starts, routes, progress.part(0.8, 1));
        ErrorUnits units = ErrorUnits.of(snapshots, task.scaleSeason());
        ScoreTable scores = ScoreTable.of(task, judged, units);
        progress.report(1, "backtest done");
        List<String> summary = new ArrayList<>(List.of(choice.sentence(), sentence(task, starts, plan)));
        summary.addAll(Summary.judged(task, judged.get(0), units, scores.rows()));
        DistributionScores.sentence(task, judged, units).ifPresent(summary::add);
        PercentScores.sentence(task, judged).ifPresent(summary::add);
        List<Doubt> doubts = new ArrayList<>(choice.doubts());
        doubts.addAll(task.doubts(operator));
        doubts.addAll(judged.get(0).bandDoubts(task, false));
        doubts.addAll(scores.doubts());
        return new BacktestResult(scores.rows(), errors(task, judged), choice.route(), summary, doubts);
    }

    private static ForecastTask task(Snapshots snapshots, FittedOperator operator, Spectrum spectrum, BacktestPlan plan) {
        ForecastTask task = ForecastTask.of(snapshots, operator, spectrum, plan.forecast());
        if (task.observedLeads() == 0) {
            throw new ForecastFault("backtest", "the snapshots hold back nothing that can be forecast",
                    "keep a holdout longer than the delays when building them");
        }
        return plan.forecast().horizon().isPresent() ? task : task.withSteps((task.observedLeads() + 3) / 4);
    }

    private static List<Start> starts(ForecastTask task, List<ForecastRoute> methods, BacktestPlan plan) {
        int memory = Math.max(task.memory(), methods.stream().mapToInt(ForecastRoute::memory).max().orElse(1));
        int observed = task.observedLeads(memory);
        if (observed == 0) {
            throw new ForecastFault("backtest", "no holdout run has a sample after " + memory + " samples of history",
                    "a shorter season or longer holdout runs are needed");
        }
        return Start.spread(task.holdout(), memory, Math.min(task.steps(), observed), plan.origins());
    }

    private static List<List<ForecastRoute>> refitted(ForecastTask task, FittedOperator operator, Route used,
            List<Start> starts, Progress progress) {
        List<List<ForecastRoute>> out = new ArrayList<>();
        for (int k = 0; k < starts.size(); k++) {
            Series series = task.holdout().get(starts.get(k).series());
            double time = series.times()[starts.get(k).origin()];
            Progress own = progress.part((double) k / starts.size(), (k + 1.0) / starts.size());
            own.report(0, "fitting before origin " + (k + 1) + " of " + starts.size());
            Snapshots known = KnownAt.of(task.snapshots(), series.id(), time, task.step());
            FittedOperator fit = OperatorFitter.fit(known, operator.estimator(), new RankRule.Fixed(operator.rank()),
                    operator.ridge(), own);
            out.add(Methods.of(task, fit, SpectrumExtractor.extract(fit, own.part(1, 1)), used));
        }
        return out;
    }

    private static List<Judged> judge(ForecastTask task, List<ForecastRoute> atHand, List<Start> starts,
            List<List<ForecastRoute>> routes, Progress progress) {
        List<Judged> out = new ArrayList<>();
        for (int m = 0; m < atHand.size(); m++) {
            int method = m;
            progress.report((double) m / atHand.size(), "scoring " + atHand.get(m).id());
            Backtest holdout = Backtest.from(starts, routes.stream().map(all -> all.get(method)).toList(), task.holdout(),
                    task.leads(), task.region(), progress);
            out.add(Judged.of(task, atHand.get(m), holdout, progress));
        }
        return out;
    }

    private static List<ErrorRow> errors(ForecastTask task, List<Judged> judged) {
        return judged.stream().flatMap(method -> method.holdout().errors().stream()
                .flatMap(errors -> task.scoreSteps().stream().filter(lead -> lead <= errors.leads())
                        .flatMap(lead -> IntStream.range(0, errors.values().numCols)
                                .mapToObj(c -> row(task, method.route().id(), errors, lead, c))))).toList();
    }

    private static ErrorRow row(ForecastTask task, String method, Errors errors, int lead, int channel) {
        Series series = task.holdout().get(errors.series());
        double recorded = errors.values().get(lead - 1, channel) * task.snapshots().preparation().scale()[channel];
        return new ErrorRow(method, series.id(), series.times()[errors.origin()], lead * task.step(), channel, recorded);
    }

    private static String sentence(ForecastTask task, List<Start> starts, BacktestPlan plan) {
        String fit = plan.refit() == Refit.NEVER ? "the operator was fitted once, to the training part"
                : "the operator was fitted anew before each, to the training part and the run up to the origin";
        return Summary.length(task) + ", from " + starts.size() + (starts.size() == 1 ? " origin" : " origins")
                + " in the holdout; " + fit + ".";
    }
}
