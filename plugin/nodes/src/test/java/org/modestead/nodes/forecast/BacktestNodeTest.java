package org.modestead.nodes.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.modestead.engine.forecast.BacktestPlan;
import org.modestead.engine.forecast.ForecastFault;
import org.modestead.engine.forecast.ForecastPlan;
import org.modestead.engine.forecast.Origin;
import org.modestead.engine.forecast.Refit;
import org.modestead.engine.forecast.Route;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.testing.Ringing;
import org.modestead.nodes.testing.Steps;

class BacktestNodeTest {

    private static NodeResult backtest(Table table, Map<String, Object> prepared, Map<String, Object> raw) {
        Map<String, Object> settings = new HashMap<>(prepared);
        settings.put("time-column", "time");
        settings.put("run-column", "run");
        Object snapshots = Steps.run("snapshot-builder", Map.of("table", table), settings).outputs().get("snapshots");
        Object operator = Steps.run("operator-fitter", Map.of("snapshots", snapshots), Map.of()).outputs().get("operator");
        Map<String, Object> inputs = new HashMap<>(Map.of("snapshots", snapshots, "operator", operator));
        if (raw.getOrDefault("route", "auto").equals("auto")) {
            Object spectrum = Steps.run("spectrum-extractor", Map.of("operator", operator), Map.of()).outputs()
                    .get("spectrum");
            inputs.put("verdict", Steps.run("wellposedness-checker", Map.of("snapshots", snapshots, "operator", operator,
                    "spectrum", spectrum), Map.of()).outputs().get("verdict"));
        }
        return Steps.run("backtest", inputs, raw);
    }

    private static BacktestPlan plan(Map<String, Object> raw) {
        return BacktestSettings.plan(SettingsReader.read(new BacktestNode(), raw).settings().orElseThrow());
    }

    @Test
    void defaultsAreThoseOfTheEngineAndEverySettingReachesItsPlace() {
        assertEquals(BacktestPlan.DEFAULT, plan(Map.of()));
        ForecastPlan forecast = new ForecastPlan(Route.MODAL, Origin.RECORDING_END, OptionalDouble.of(2), 0.8, 12,
                List.of(0.5, 1.0));
        assertEquals(new BacktestPlan(forecast, 7, Refit.NEVER), plan(Map.of("route", "modal", "horizon", 2, "coverage",
                0.8, "season", 12, "score-horizons", List.of(0.5, 1), "origins", 7, "refit", "never")));
    }

    @Test
    void scoresAndErrorsHoldEveryMethodAndTheOperatorBeatsTheNaiveOnesOnARinging() {
        NodeResult result = backtest(Ringing.numbers(5), Map.of("holdout", "run-share"), Map.of("route", "projection"));
        assertEquals(List.of("method", "horizon", "rmse", "mae", "mase", "coverage", "interval_score"),
                ((Table) result.outputs().get("scores")).schema().names());
        assertEquals(List.of("method", "run", "origin", "horizon", "channel", "error"),
                ((Table) result.outputs().get("errors")).schema().names());
        Set<String> methods = new TreeSet<>(Steps.column(result, "scores", "method"));
        assertEquals(Set.of("projection", "modal", "persistence", "seasonal-naive", "drift", "mean"), methods);
        assertEquals(methods, new TreeSet<>(Steps.column(result, "errors", "method")));
        assertEquals(Set.of("x", "y"), new TreeSet<>(Steps.column(result, "errors", "channel")));
        List<String> rows = Steps.column(result, "scores", "method");
        double own = Steps.number(result, "scores", "rmse", rows.indexOf("projection"));
        for (String naive : List.of("persistence", "seasonal-naive", "drift", "mean")) {
            assertTrue(own < 1e-6 * Steps.number(result, "scores", "rmse", rows.indexOf(naive)), naive);
        }
        assertEquals(List.of("scores"), result.figures().stream().map(figure -> figure.id()).toList());
        assertEquals(6, result.figures().get(0).layers().size(), "one curve a method");
    }

    @Test
    void theVerdictDecidesTheRouteAndTheFirstSentenceSaysSo() {
        NodeResult result = backtest(Ringing.numbers(5), Map.of("holdout", "run-share"), Map.of());
        String route = Steps.column(result, "scores", "method").get(0);
        assertTrue(result.summary().get(0).startsWith("Forecast by the " + route + " route: the verdict on the modes is"),
                result.summary().get(0));
    }

    @Test
    void originsAreWrittenAsRecorded() {
        NodeResult result = backtest(Ringing.dateTimes(4), Map.of("time-unit", "h", "holdout", "run-share"),
                Map.of("origins", 1, "horizon", 0.5));
        assertEquals(CellType.DATE_TIME, ((Table) result.outputs().get("errors")).schema().columns().get(2).type());
        assertTrue(Steps.column(result, "errors", "origin").get(0).startsWith("2026-03-04T"));
    }

    @Test
    void withoutAHoldoutItSaysWhatIsMissing() {
        ForecastFault fault = assertThrows(ForecastFault.class, () -> backtest(Ringing.numbers(4), Map.of(), Map.of()));
        assertTrue(fault.getMessage().contains("holdout"), fault.getMessage());
    }
}
