package org.modestead.engine.forecast;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;

/** What was done and how it came out, in sentences. */
final class Summary {

    private static final int DIGITS = 5;
    // Beyond this many decimals or trailing zeros a power of ten reads better.
    private static final int PLAIN = 9;

    private Summary() {}

    static List<String> of(ForecastTask task, RouteChoice choice, Judged used, ErrorUnits units, List<ScoreRow> rows) {
        List<String> out = new ArrayList<>();
        out.add(choice.sentence());
        out.add(horizon(task));
        out.addAll(judged(task, used, units, rows));
        return out;
    }

    /** Returns how the bands were made and how the forecasts scored. */
    static List<String> judged(ForecastTask task, Judged used, ErrorUnits units, List<ScoreRow> rows) {
        List<String> out = new ArrayList<>();
        if (used.bands().reach() > 0) {
            out.add(percent(task.plan().coverage()) + " bands calibrated on " + task.bands().words() + ", "
                    + used.calibrationOrigins() + " origins.");
        }
        if (!rows.isEmpty()) {
            out.add("Scores over the holdout, averaged over lead times up to the horizon, in " + units.words()
                    + "; scaled errors (mase) against " + scale(task) + ".");
            double shortest = rows.stream().mapToDouble(ScoreRow::horizon).min().orElseThrow();
            double longest = rows.stream().mapToDouble(ScoreRow::horizon).max().orElseThrow();
            rows.stream().filter(row -> row.horizon() == shortest || row.horizon() == longest)
                    .map(row -> score(task, row)).forEach(out::add);
        }
        return out;
    }

    private static String horizon(ForecastTask task) {
        String from = task.plan().origin() == Origin.RECORDING_END ? "the end of every run"
                : "the last state before the holdout of every run";
        return length(task) + ", from " + from + ".";
    }

    /** Returns the horizon in time units and steps. */
    static String length(ForecastTask task) {
        return horizon(task, task.steps() * task.step()) + ", " + task.steps() + " steps of " + figure(task.step());
    }

    private static String horizon(ForecastTask task, double time) {
        String unit = task.snapshots().time().unit();
        return "Horizon " + figure(time) + (unit.isEmpty() ? "" : " " + unit);
    }

    private static String scale(ForecastTask task) {
        return task.season().isPresent() ? "a season of " + task.season().getAsInt() + " steps" : "one step";
    }

    private static String score(ForecastTask task, ScoreRow row) {
        return horizon(task, row.horizon()) + ", " + row.method() + ": RMSE " + figure(row.rmse()) + ", MASE "
                + (Double.isNaN(row.mase()) ? "unknown" : figure(row.mase())) + ".";
    }

    /** Returns a share as it is written in sentences. */
    static String percent(double share) {
        return figure(100 * share) + " %";
    }

    /** Returns a number as it is written in sentences: at most five significant digits, no trailing zeros. */
    static String figure(double value) {
        if (!Double.isFinite(value)) {
            return Double.toString(value);
        }
        BigDecimal rounded = new BigDecimal(value, new MathContext(DIGITS)).stripTrailingZeros();
        boolean plain = Math.abs(rounded.scale()) <= PLAIN;
        return plain ? rounded.toPlainString() : rounded.toString();
    }
}
