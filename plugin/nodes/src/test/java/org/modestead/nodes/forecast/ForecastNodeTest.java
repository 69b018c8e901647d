package org.modestead.nodes.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.modestead.engine.forecast.ForecastPlan;
import org.modestead.engine.forecast.Origin;
import org.modestead.engine.forecast.Route;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.testing.Ringing;
import org.modestead.nodes.testing.Steps;

class ForecastNodeTest {

    private static NodeResult forecast(Table table, Map<String, Object> prepared, Map<String, Object> raw) {
        Map<String, Object> settings = new HashMap<>(prepared);
        settings.put("time-column", "time");
        settings.put("run-column", "run");
        Object snapshots = Steps.run("snapshot-builder", Map.of("table", table), settings).outputs().get("snapshots");
        Object operator = Steps.run("operator-fitter", Map.of("snapshots", snapshots),
                Map.of()).outputs().get("operator");
        Object spectrum = Steps.run("spectrum-extractor", Map.of("operator", operator),
                Map.of()).outputs().get("spectrum");
        return Steps.run("forecast", Map.of("snapshots", snapshots, "operator", operator, "spectrum", spectrum), raw);
    }

    private static ForecastPlan plan(Map<String, Object> raw) {
        return ForecastSettings.plan(SettingsReader.read(new ForecastNode(), raw).settings().orElseThrow());
    }

    @Test
    void defaultsAreThoseOfTheEngineAndEverySettingReachesItsPlace() {
        assertEquals(ForecastPlan.DEFAULT, plan(Map.of()));
        assertEquals(new ForecastPlan(Route.MODAL, Origin.BEFORE_HOLDOUT, OptionalDouble.of(2), 0.8, 12, List.of(0.5,
                1.0)),
                plan(Map.of("route", "modal", "origin", "before-holdout", "horizon", 2, "coverage", 0.8, "season", 12,
                        "score-horizons",
                        List.of(0.5, 1))));
        assertEquals(Route.PROJECTION, plan(Map.of("route", "projection")).route());
    }

    @Test
    void aNoiseFreeRingingIsForecastAsItGoesOn() {
        NodeResult result = forecast(Ringing.numbers(4), Map.of("holdout", "run-share", "holdout-run-share", 0.25),
                Map.of("horizon", 0.5, "route", "projection"));
        Table table = (Table) result.outputs().get("forecast");
        assertEquals(List.of("run", "time", "channel", "value", "low", "high", "route", "beyond"), table.schema().names());
        assertEquals(CellType.DOUBLE, table.schema().columns().get(1).type());
        List<String> first = Steps.texts(result, "forecast").get(0);
        double time = Double.parseDouble(first.get(1));
        assertEquals(Ringing.SAMPLES * Ringing.STEP, time, 1e-12);
        assertEquals("x", first.get(2));
        double omega = 2 * Math.PI * Ringing.FREQUENCY;
        double sigma = -Ringing.DAMPING / Math.sqrt(1 - Ringing.DAMPING * Ringing.DAMPING) * omega;
        // least squares on noise-free samples; run r0 starts at phase 0
        assertEquals(Math.exp(sigma * time) * Math.cos(omega * time), Double.parseDouble(first.get(3)), 1e-9);
        assertEquals("projection", first.get(6));
    }

    @Test
    void scoresNameTheNaiveMethodsToo() {
        NodeResult result = forecast(Ringing.numbers(5), Map.of("holdout", "run-share"), Map.of("horizon", 0.5));
        List<String> methods = Steps.column(result, "scores", "method");
        assertTrue(methods.containsAll(List.of("projection", "persistence")), methods.toString());
        double own = Steps.number(result, "scores", "rmse", methods.indexOf("projection"));
        double naive = Steps.number(result, "scores", "rmse", methods.indexOf("persistence"));
        assertTrue(own < 1e-6 * naive, own + " against " + naive);
        assertEquals("scores", result.figures().get(result.figures().size() - 1).id());
    }

    @Test
    void timesOfForecastAndReconstructionAreWrittenAsRecorded() {
        NodeResult result = forecast(Ringing.dateTimes(4), Map.of("time-unit", "h"), Map.of("horizon", 0.2));
        assertEquals(CellType.DATE_TIME,
                ((Table) result.outputs().get("reconstruction")).schema().columns().get(1).type());
        assertEquals("2026-03-01T06:00", Steps.column(result, "reconstruction", "time").get(0));
        // 60 samples of 3 minutes from six o'clock; the step is the median of hours resolved to 6e-11
        assertTrue(Steps.column(result, "forecast", "time").get(0).startsWith("2026-03-01T09:00"));
    }

    @Test
    void withoutAHoldoutThereAreNoBandsNoScoresAndADoubt() {
        NodeResult result = forecast(Ringing.numbers(4), Map.of(), Map.of("horizon", 0.2));
        assertEquals(List.of(), Steps.texts(result, "scores"));
        assertEquals("", Steps.column(result, "forecast", "low").get(0), "a missing cell, not a number");
        assertTrue(!result.doubts().isEmpty());
        assertThrows(IndexOutOfBoundsException.class, () -> Steps.number(result, "scores", "rmse", 0));
    }
}
