package org.modestead.nodes.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.testing.Ringing;
import org.modestead.nodes.testing.Steps;

/** From a table to a verdict through the nodes, on recordings whose modes are known in closed form. */
class ChainTest {

    // double precision over a 120 x 2 least-squares fit of noise-free samples
    private static final double CLEAN = 1e-9;

    private record Chain(NodeResult snapshots, NodeResult operator, NodeResult spectrum, NodeResult verdict) {

        static Chain of(Table table, Map<String, Object> snapshotSettings, Map<String, Object> fitSettings,
            Map<String, Object> kernel) {
            Map<String, Object> prepared = new HashMap<>(snapshotSettings);
            prepared.put("time-column", "time");
            prepared.put("run-column", "run");
            prepared.putIfAbsent("holdout", "run-share");
            NodeResult snapshots = Steps.run("snapshot-builder", Map.of("table", table), prepared);
            Map<String, Object> fitInputs = new HashMap<>(Map.of("snapshots", snapshots.outputs().get("snapshots")));
            if (!kernel.isEmpty()) {
                fitInputs.put("kernel", Steps.run("kernel-chooser", fitInputs, kernel).outputs().get("kernel"));
            }
            NodeResult operator = Steps.run("operator-fitter", fitInputs, fitSettings);
            NodeResult spectrum = Steps.run("spectrum-extractor", Map.of("operator", operator.outputs().get("operator")),
                    Map.of());
            NodeResult verdict = Steps.run("wellposedness-checker", Map.of("snapshots",
                    snapshots.outputs().get("snapshots"), "operator",
                    operator.outputs().get("operator"), "spectrum", spectrum.outputs().get("spectrum")), Map.of());
            return new Chain(snapshots, operator, spectrum, verdict);
        }
    }

    private static Chain ringing() {
        return Chain.of(Ringing.numbers(5), Map.of("time-unit", "s"), Map.of("rank-rule", "fixed", "rank", 2), Map.of());
    }

    @Test
    void aRingingPairIsOneRowWithItsFrequencyDampingAndPeriod() {
        NodeResult spectrum = ringing().spectrum();
        assertEquals(List.of("1"), Steps.column(spectrum, "modes", "mode"));
        assertEquals(Ringing.FREQUENCY, Steps.number(spectrum, "modes", "frequency", 0), CLEAN);
        assertEquals(Ringing.DAMPING, Steps.number(spectrum, "modes", "damping_ratio", 0), CLEAN);
        assertEquals(1 / Ringing.FREQUENCY, Steps.number(spectrum, "modes", "period", 0), CLEAN);
        double growth = Steps.number(spectrum, "modes", "lambda_real", 0);
        assertEquals(Math.log(2) / growth, Steps.number(spectrum, "modes", "doubling_time", 0), CLEAN);
        assertEquals(1, Steps.number(spectrum, "modes", "energy_share", 0), CLEAN);
        assertEquals(List.of(""), Steps.column(spectrum, "modes", "verdict"), "not judged yet");
    }

    @Test
    void theShapeTableTellsMagnitudeAndPhaseAgainstTheLargestChannel() {
        NodeResult spectrum = ringing().spectrum();
        assertEquals(List.of("x", "y"), Steps.column(spectrum, "shapes", "channel"));
        assertEquals(2, ((Table) spectrum.outputs().get("shapes")).rowCount().orElseThrow());
        double ratio = Steps.number(spectrum, "shapes", "magnitude", 1) / Steps.number(spectrum, "shapes", "magnitude",
                0);
        assertEquals(2, ratio, CLEAN);
        assertEquals(0, Steps.number(spectrum, "shapes", "phase", 1), CLEAN);
        assertEquals(Math.PI / 2, Math.abs(Steps.number(spectrum, "shapes", "phase", 0)), CLEAN);
    }

    @Test
    void theFindingTableBeginsWithTheOverallVerdictAndEachModeWithItsOwn() {
        NodeResult verdict = ringing().verdict();
        List<String> modes = Steps.column(verdict, "findings", "mode");
        List<String> checks = Steps.column(verdict, "findings", "check");
        assertEquals("0", modes.get(0));
        assertEquals("verdict", checks.get(0));
        assertEquals("verdict", checks.get(modes.indexOf("1")));
        assertEquals(2, checks.stream().filter("verdict"::equals).count(), "one overall, one a mode");
        assertEquals(1, new HashSet<>(Steps.column(verdict, "modes", "verdict")).size());
        assertTrue(List.of("stands", "settles", "drifts", "absent", "undecided").contains(Steps.column(verdict, "modes",
                "verdict").get(0)));
    }

    @Test
    void residualsAloneAreToldOfEveryModeAndDecideNothing() {
        Chain chain = ringing();
        NodeResult residuals = Steps.run("wellposedness-checker", Map.of("snapshots", chain.snapshots().outputs().get("snapshots"), "operator",
                chain.operator().outputs().get("operator"), "spectrum", chain.spectrum().outputs().get("spectrum")), Map.of("extent", "residuals"));
        assertEquals(List.of("verdict", "verdict", "holdout-residual"), Steps.column(residuals, "findings", "check"));
        assertEquals(0, Steps.number(residuals, "findings", "value", 2), CLEAN);
        assertEquals(List.of(), Steps.column(residuals, "ladder", "rank"));
        assertEquals(List.of("undecided"), Steps.column(residuals, "modes", "verdict"));
    }

    @Test
    void picturesCanBeSelectedByMode() {
        Chain chain = ringing();
        Figure plane = chain.spectrum().figures().get(0);
        assertEquals(Figure.Kind.COMPLEX_PLANE, plane.kind());
        assertTrue(plane.layers().stream().anyMatch(layer -> layer.selection().equals("mode:1")));
        List<String> ids = new ArrayList<>();
        List.of(chain.snapshots(), chain.operator(), chain.spectrum(), chain.verdict()).forEach(result -> {
            List<String> own = result.figures().stream().map(Figure::id).toList();
            assertEquals(own.size(), new HashSet<>(own).size(), own.toString());
            ids.addAll(own);
        });
        assertTrue(ids.containsAll(List.of("recording", "singular-values", "eigenvalues", "shape-1-magnitude")),
                ids.toString());
    }

    @Test
    void dateTimesCountedInHoursGiveCyclesPerHour() {
        Chain chain = Chain.of(Ringing.dateTimes(5), Map.of("time-unit", "h"), Map.of("rank-rule", "fixed", "rank", 2),
                Map.of());
        // 3 minutes in hours since 1970 resolve 6e-11 h, so steps and rates to some 1e-8
        assertEquals(Ringing.FREQUENCY, Steps.number(chain.spectrum(), "modes", "frequency", 0), 1e-6);
    }

    @Test
    void theSameTableGivesTheSameTables() {
        Chain first = ringing();
        Chain second = ringing();
        assertEquals(Steps.texts(first.spectrum(), "shapes"), Steps.texts(second.spectrum(), "shapes"));
        for (String port : List.of("findings", "ladder", "modes")) {
            assertEquals(Steps.texts(first.verdict(), port), Steps.texts(second.verdict(), port), port);
        }
        assertEquals(Steps.texts(first.operator(), "fit"), Steps.texts(second.operator(), "fit"));
    }

    @ParameterizedTest(name = "{0} {1}: {3}")
    @CsvSource({"affine, 1, 0, stands", "affine, 0, 1, drifts", "square, 0, 0, absent"})
    void flowsWithAndWithoutModesInTheExponentialSpaceAreToldApart(String flow, double a, double b, String grade) {
        // DESIGN section 4, worked figures: 40 runs of length 0.4, kernel exp(xy), generator
        NodeResult data = Steps.run("signal-generator", Map.of(), Map.of("scenario", "flows", "flow", flow, "a", a, "b",
                b));
        Chain chain = Chain.of((Table) data.outputs().get("table"), Map.of("holdout", "run-share"),
                Map.of("estimator", "generator", "segment-samples", 0, "rank-rule", "fixed", "rank", 7), Map.of("family",
                        "exponential"));
        assertTrue(chain.verdict().summary().get(0).startsWith("Overall: " + grade), chain.verdict().summary().get(0));
        assertTrue(Steps.column(chain.verdict(), "modes", "verdict").contains(grade));
    }

    @Test
    void intervalsHoldTheFiguresOfANoisyRecordingAndStayEmptyWhenNotAskedFor() {
        NodeResult data = Steps.run("signal-generator", Map.of(), Map.of("scenario", "pump-house", "gaps", 0,
                "dropouts", 0, "jitter", 0));
        NodeResult snapshots = Steps.run("snapshot-builder", Map.of("table", data.outputs().get("table")), Map.of("time-column", "time",
                "run-column", "run", "time-unit", "s", "detrend", "mean", "scaling", "std", "delay-depth", 20));
        NodeResult operator = Steps.run("operator-fitter", Map.of("snapshots", snapshots.outputs().get("snapshots")),
                Map.of("rank-rule", "fixed", "rank", 7));
        Map<String, Object> input = Map.of("operator", operator.outputs().get("operator"));
        NodeResult with = Steps.run("spectrum-extractor", input, Map.of());
        NodeResult without = Steps.run("spectrum-extractor", input, Map.of("intervals", "none"));
        assertEquals(Steps.column(without, "modes", "lambda_real"), Steps.column(with, "modes", "lambda_real"));
        assertEquals("", Steps.column(without, "modes", "frequency_low").get(0));
        int surge = 0;
        while (Steps.number(with, "modes", "frequency", surge) < 0.5) {
            surge++;
        }
        double low = Steps.number(with, "modes", "frequency_low", surge);
        double high = Steps.number(with, "modes", "frequency_high", surge);
        // 0.62 Hz with 2 % damping; 1 % noise over 16 minutes tells it to far less than 1 %
        assertTrue(low < high && low > 0.61 && high < 0.63, low + " to " + high);
        assertEquals(1 / high, Steps.number(with, "modes", "period_low", surge), 1e-12);
        assertEquals(Steps.texts(with, "modes"), Steps.texts(Steps.run("spectrum-extractor", input, Map.of()), "modes"));
    }
}
