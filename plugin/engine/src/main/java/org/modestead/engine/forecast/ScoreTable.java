package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.forecast.Backtest.Errors;

/**
 * Scores on the holdout, one row a method and horizon.
 *
 * @param rows by method and horizon
 * @param doubts horizons left out, few origins, forecasts that had to be limited
 */
record ScoreTable(List<ScoreRow> rows, List<Doubt> doubts) {

    private static final int FEW_ORIGINS = 5;
    // Coverage this much below the promise is said aloud; less is within the scatter of some ten independent errors.
    private static final double MISSED = 0.1;

    static ScoreTable of(ForecastTask task, List<Judged> methods, ErrorUnits units) {
        List<ScoreRow> rows = new ArrayList<>();
        for (Judged method : methods) {
            for (int horizon : task.scoreSteps()) {
                if (origins(method, horizon) > 0) {
                    rows.add(row(task, method, units, horizon));
                }
            }
        }
        return new ScoreTable(rows, doubts(task, methods, units, rows));
    }

    private static long origins(Judged method, int horizon) {
        return method.holdout().errors().stream().filter(e -> e.leads() >= horizon).count();
    }

    private static ScoreRow row(ForecastTask task, Judged method, ErrorUnits units, int horizon) {
        List<Errors> reaching = method.holdout().errors().stream().filter(e -> e.leads() >= horizon).toList();
        double[] pooled = reaching.stream().flatMapToDouble(e -> scaled(e, horizon, units.pooled())).toArray();
        double mase = Scores.mean(reaching.stream().flatMapToDouble(e -> scaled(e, horizon, units.scaled()))
                .map(Math::abs).filter(e -> !Double.isNaN(e)));
        List<double[]> held = reaching.stream().filter(task.bands()::judges)
                .flatMap(e -> bandScores(e, method.bands(), units, horizon, 1 - task.plan().coverage()).stream()).toList();
        return new ScoreRow(method.route().id(), horizon * task.step(), Scores.rmse(pooled), Scores.mae(pooled), mase,
                Scores.mean(held.stream().mapToDouble(s -> s[0])), Scores.mean(held.stream().mapToDouble(s -> s[1])));
    }

    private static DoubleStream scaled(Errors errors, int horizon, double[] factor) {
        DMatrixRMaj values = errors.values();
        int n = values.numCols;
        return IntStream.range(0, horizon * n).mapToDouble(k -> values.data[k] * factor[k % n]);
    }

    // Each entry: 1 or 0 for inside or outside, and the interval score. Both depend on the error alone, not on the value.
    private static List<double[]> bandScores(Errors errors, Bands bands, ErrorUnits units, int horizon, double alpha) {
        List<double[]> out = new ArrayList<>();
        for (int lead = 1; lead <= horizon; lead++) {
            for (int c = 0; c < errors.values().numCols; c++) {
                double half = bands.halfWidth(lead, c) * units.pooled()[c];
                double error = errors.values().get(lead - 1, c) * units.pooled()[c];
                if (!Double.isNaN(half)) {
                    out.add(new double[] {Math.abs(error) <= half ? 1 : 0, Scores.interval(-half, half, error, alpha)});
                }
            }
        }
        return out;
    }

    private static List<Doubt> doubts(ForecastTask task, List<Judged> methods, ErrorUnits units, List<ScoreRow> rows) {
        if (methods.get(0).holdout().errors().isEmpty()) {
            return List.of(new Doubt("no-holdout",
                    "The snapshots hold back nothing that can be forecast: the forecast is not scored."));
        }
        List<Doubt> out = new ArrayList<>();
        addHorizonDoubts(task, methods.get(0), out);
        for (Judged method : methods) {
            addMethodDoubts(method, methods.get(0), out);
        }
        addUnitDoubts(units, out);
        rows.stream().filter(row -> row.method().equals(rows.get(0).method()))
                .filter(row -> row.coverage() < task.plan().coverage() - MISSED)
                .min(Comparator.comparingDouble(ScoreRow::coverage))
                .ifPresent(row -> out.add(missed(row, task.plan().coverage())));
        rows.stream().filter(row -> row.method().equals(rows.get(0).method()))
                .forEach(own -> better(rows, own).ifPresent(naive -> out.add(naiveIsBetter(naive, own))));
        return out;
    }

    private static Doubt missed(ScoreRow row, double promised) {
        return new Doubt("bands-too-narrow", "Up to horizon " + Summary.figure(row.horizon()) + " the bands held only "
                + Summary.percent(row.coverage()) + " of the holdout instead of " + Summary.percent(promised)
                + ": the errors there are larger than those they were calibrated on.");
    }

    private static Doubt naiveIsBetter(ScoreRow naive, ScoreRow own) {
        return new Doubt("naive-is-better", "At horizon " + Summary.figure(own.horizon()) + " " + naive.method()
                + " has the smaller error (RMSE " + Summary.figure(naive.rmse()) + " against " + Summary.figure(own.rmse())
                + "): the fitted operator adds nothing there.");
    }

    private static Optional<ScoreRow> better(List<ScoreRow> rows, ScoreRow own) {
        return rows.stream().filter(row -> row.horizon() == own.horizon() && row.rmse() < own.rmse())
                .filter(row -> Stream.of(Route.values()).noneMatch(route -> route.word().equals(row.method())))
                .min(Comparator.comparingDouble(ScoreRow::rmse));
    }

    private static void addUnitDoubts(ErrorUnits units, List<Doubt> out) {
        if (units.mixed()) {
            out.add(new Doubt("mixed-units", "Scores pool channels of different units that were not scaled; the channel with"
                    + " the largest numbers decides them. Scale the channels when building the snapshots."));
        }
        if (DoubleStream.of(units.scaled()).anyMatch(Double::isNaN)) {
            out.add(new Doubt("no-naive-scale", "At least one channel does not change in training from one season (or step)"
                    + " to the next, or no training run is that long; it is left out of the scaled error (mase)."));
        }
    }

    private static void addHorizonDoubts(ForecastTask task, Judged route, List<Doubt> out) {
        for (int horizon : task.scoreSteps()) {
            long origins = origins(route, horizon);
            String time = Summary.figure(horizon * task.step());
            if (origins == 0) {
                out.add(new Doubt("horizon-beyond-holdout", "The holdout is too short to score a horizon of " + time + " ("
                        + horizon + " steps; it reaches " + task.observedLeads() + ")."));
            } else if (origins < FEW_ORIGINS) {
                out.add(new Doubt("few-origins", "Scores at horizon " + time + " rest on " + origins + " origin"
                        + (origins == 1 ? "" : "s") + " only."));
            }
        }
    }

    private static void addMethodDoubts(Judged method, Judged route, List<Doubt> out) {
        String name = method.route().id();
        int origins = method.holdout().errors().size();
        if (method.holdout().limited() > 0) {
            out.add(new Doubt("score-limited", "In scoring, " + method.holdout().limited() + " values of method " + name
                    + " overflow or go beyond 1000 times the training range; they count at that limit."));
        }
        if (origins < route.holdout().errors().size()) {
            out.add(new Doubt("fewer-origins", "Method " + name + " is scored from " + origins + " origins, the others from "
                    + route.holdout().errors().size() + ": earlier ones lack its history of " + method.route().memory()
                    + " samples."));
        }
    }
}
