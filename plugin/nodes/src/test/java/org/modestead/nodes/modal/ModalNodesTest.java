package org.modestead.nodes.modal;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.testing.Ringing;
import org.modestead.nodes.testing.Steps;

/** Stabilisation, comparison of shapes and groups of channels, on recordings whose modes are known. */
class ModalNodesTest {

    // the signal generator's pump house: surge, whirl, bearing resonance (the draining does not oscillate)
    private static final double[] FREQUENCIES = {0.62, 1.37, 2.9};
    private static final double[] DAMPING = {0.02, -0.006, 0.012};

    private static NodeResult operator(Object table, int rank, Map<String, Object> more) {
        Map<String, Object> prepared = new HashMap<>(Map.of("time-column", "time", "time-unit", "s", "run-column", "run"));
        prepared.putAll(more);
        Object snapshots = Steps.run("snapshot-builder", Map.of("table", table), prepared).outputs().get("snapshots");
        return Steps.run("operator-fitter", Map.of("snapshots", snapshots), Map.of("rank-rule", "fixed", "rank", rank));
    }

    private static final Map<String, Object> DELAYS = Map.of("resampling", "uniform", "step", 0.1, "delay-depth", 10, "scaling", "std",
            "detrend", "mean");

    private static final Object PUMP_HOUSE = operator(Steps.run("signal-generator", Map.of(), Map.of()).outputs().get("table"), 7, DELAYS)
            .outputs().get("operator");

    private static NodeResult ringing(Map<String, Object> settings) {
        return Steps.run("spectrum-extractor", Map.of("operator", operator(Ringing.numbers(3), 2, Map.of()).outputs().get("operator")), settings);
    }

    @Test
    void linesOfManyOrdersAreTheOscillationsThatTheRecordingWasMadeOf() {
        NodeResult found = Steps.run("stabilisation", Map.of("operator", PUMP_HOUSE), Map.of("least-orders", 8));
        List<Integer> oscillating = IntStream.range(0, Steps.column(found, "lines", "line").size())
                .filter(i -> Steps.number(found, "lines", "frequency", i) > 0).boxed().toList();
        assertEquals(3, oscillating.size(), Steps.texts(found, "lines").toString());
        for (int k = 0; k < 3; k++) {
            // as the test workflow demands of the second branch: 1 % of the frequency, and 0.0004 of the damping ratio, 2 % of the surge's
            assertEquals(FREQUENCIES[k], Steps.number(found, "lines", "frequency", oscillating.get(k)), 0.01 * FREQUENCIES[k]);
            assertEquals(DAMPING[k], Steps.number(found, "lines", "damping_ratio", oscillating.get(k)), 4e-4);
        }
        assertTrue(found.summary().get(1).contains("0.620 Hz, damping ratio 2.0 %"), found.summary().toString());
    }

    @Test
    void thePoleTableHoldsEveryOrderAndWhatWasKept() {
        NodeResult found = Steps.run("stabilisation", Map.of("operator", PUMP_HOUSE), Map.of("highest-order", 8));
        assertEquals(List.of("2", "4", "6", "8"), Steps.column(found, "poles", "order").stream().distinct().toList());
        List<String> flags = Steps.column(found, "poles", "stable_frequency");
        assertTrue(flags.contains("true") && flags.contains("false"));
        assertEquals("false", flags.get(0), "nothing before the first order");
        int still = Steps.column(found, "poles", "frequency").indexOf("0.0");
        if (still >= 0) {
            assertEquals("", Steps.column(found, "poles", "damping_ratio").get(still), "nothing oscillates");
            assertEquals("", Steps.column(found, "poles", "period").get(still));
        }
        assertEquals("highest-order", Steps.check("stabilisation", Map.of("highest-order", 3)).get(0).key());
    }

    @Test
    void theDiagramTellsByShapeInWordsWithThePowerBehindIt() {
        Figure figure = Steps.run("stabilisation", Map.of("operator", PUMP_HOUSE), Map.of()).figures().get(0);
        assertEquals(Figure.Kind.MARKS, figure.kind());
        assertTrue(figure.right().isPresent() && figure.layers().stream().anyMatch(Figure.Backdrop.class::isInstance));
        List<Figure.Points> points = figure.layers().stream().filter(Figure.Points.class::isInstance).map(Figure.Points.class::cast).toList();
        Map<String, Figure.Mark> marks = new HashMap<>();
        points.forEach(layer -> marks.merge(layer.name(), layer.mark(), (a, b) -> {
            assertEquals(a, b, "one name, one shape");
            return a;
        }));
        assertEquals(marks.size(), marks.values().stream().distinct().count());
        assertTrue(marks.keySet().stream().allMatch(name -> name.length() > 8 && !name.toLowerCase(Locale.ROOT).matches("[a-z]")), marks.toString());
        assertTrue(points.stream().flatMap(layer -> layer.labels().stream()).anyMatch("2.90 Hz"::equals));
    }

    @Test
    void aSpectrumComparedWithItselfIsOneOnTheDiagonal() {
        Object spectrum = Steps.run("spectrum-extractor", Map.of("operator", PUMP_HOUSE), Map.of()).outputs().get("spectrum");
        NodeResult compared = Steps.run("shape-comparison", Map.of("spectrum-a", spectrum), Map.of());
        List<List<String>> rows = Steps.texts(compared, "assurance");
        assertEquals(16, rows.size(), "four modes");
        for (List<String> row : rows) {
            assertEquals(row.get(0).equals(row.get(1)), Boolean.parseBoolean(row.get(8)));
            assertTrue(!row.get(0).equals(row.get(1)) || Math.abs(Double.parseDouble(row.get(7)) - 1) < 1e-12, row.toString());
        }
        assertTrue(compared.summary().get(0).startsWith("Of different modes, mode "), compared.summary().toString());
        assertEquals("modal-assurance", compared.figures().get(0).id());
    }

    @Test
    void twoPreparationsOfOneRecordingPairAllTheirModes() {
        Map<String, Object> other = new HashMap<>(DELAYS);
        other.put("scaling", "none");
        other.put("delay-depth", 14);
        Object table = Steps.run("signal-generator", Map.of(), Map.of()).outputs().get("table");
        Object a = Steps.run("spectrum-extractor", Map.of("operator", PUMP_HOUSE), Map.of()).outputs().get("spectrum");
        Object b = Steps.run("spectrum-extractor", Map.of("operator", operator(table, 7, other).outputs().get("operator")), Map.of())
                .outputs().get("spectrum");
        NodeResult compared = Steps.run("shape-comparison", Map.of("spectrum-a", a, "spectrum-b", b), Map.of("largest-change", 0.05));
        List<List<String>> paired = Steps.texts(compared, "assurance").stream().filter(row -> row.get(8).equals("true")).toList();
        assertEquals(4, paired.size(), Steps.texts(compared, "assurance").toString());
        // the same motions whatever the preparation: noise of 1 % leaves shapes alike to a hundredth
        assertTrue(paired.stream().allMatch(row -> Double.parseDouble(row.get(7)) > 0.99), paired.toString());
        assertTrue(compared.summary().get(0).startsWith("4 modes of a found again in b"), compared.summary().toString());
    }

    @Test
    void spectraWithoutACommonChannelAreRefused() {
        Object a = Steps.run("spectrum-extractor", Map.of("operator", PUMP_HOUSE), Map.of()).outputs().get("spectrum");
        Object b = ringing(Map.of()).outputs().get("spectrum");
        FitFault fault = assertThrows(FitFault.class, () -> Steps.run("shape-comparison", Map.of("spectrum-a", a, "spectrum-b", b), Map.of()));
        assertTrue(fault.getMessage().contains("suction_pressure") && fault.getMessage().contains("x, y"), fault.getMessage());
    }

    @Test
    void groupsByListTellSharesThatAddUpAndLeaveNoChannelOut() {
        NodeResult grouped = ringing(Map.of("grouping", "named", "channel-groups", "pressure: x"));
        assertEquals(List.of("pressure", "others"), Steps.column(grouped, "groups", "group"));
        // x = cos, y = 2 sin of one motion, not scaled: energies 1 and 4
        assertEquals(0.2, Steps.number(grouped, "groups", "energy_share", 0), 1e-9);
        assertEquals(0.8, Steps.number(grouped, "groups", "energy_share", 1), 1e-9);
        assertEquals(0.5, Steps.number(grouped, "groups", "magnitude", 0), 1e-9);
        assertEquals(Math.PI / 2, Math.abs(Steps.number(grouped, "groups", "phase", 0)), 1e-9);
        assertEquals(1, Steps.number(grouped, "groups", "in_step", 0), 1e-12);
        List<String> figures = grouped.figures().stream().map(Figure::id).toList();
        assertTrue(figures.containsAll(List.of("group-shares", "group-shape-1")), figures.toString());
    }

    @Test
    void groupsByNameTakeWhatStandsBeforeTheSeparator() {
        NodeResult grouped = Steps.run("spectrum-extractor", Map.of("operator", PUMP_HOUSE), Map.of("grouping", "prefix", "shape-modes", 1));
        assertEquals(List.of("suction", "discharge", "flow", "sump", "motor", "bearing", "casing"), Steps.column(grouped, "groups", "group"));
        assertEquals("2", Steps.column(grouped, "groups", "channels").get(5), "bearing_vibration and bearing_temperature");
        double sum = IntStream.range(0, 7).mapToDouble(i -> Steps.number(grouped, "groups", "energy_share", i)).sum();
        assertEquals(1, sum, 1e-12);
    }

    @Test
    void withoutGroupsTheTableIsEmptyAndNothingIsDrawn() {
        NodeResult plain = ringing(Map.of());
        assertEquals(List.of(), Steps.texts(plain, "groups"));
        assertFalse(plain.figures().stream().anyMatch(figure -> figure.id().startsWith("group")));
    }

    @Test
    void mistakesInTheListOfGroupsAreToldWithTheNearestName() {
        SettingFault fault = assertThrows(SettingFault.class, () -> Steps.run("spectrum-extractor", Map.of("operator", PUMP_HOUSE),
                Map.of("grouping", "named", "channel-groups", "p: suction_presure")));
        assertTrue(fault.getMessage().contains("no channel suction_presure, perhaps you meant suction_pressure"), fault.getMessage());
        Map<String, String> wrong = Map.of("", "no group is listed", "x, y", "names no group with channels", "a: x; a: y", "is taken",
                "a: x; b: x", "listed twice", "others: x", "is taken");
        wrong.forEach((text, seen) -> {
            List<String> told = new ArrayList<>(Steps.check("spectrum-extractor", Map.of("grouping", "named", "channel-groups", text)).stream()
                    .map(problem -> problem.seen()).toList());
            assertTrue(told.size() == 1 && told.get(0).contains(seen), text + ": " + told);
        });
        assertEquals(List.of(), Steps.check("spectrum-extractor", Map.of("channel-groups", "anything")), "not grouped by list");
    }
}
