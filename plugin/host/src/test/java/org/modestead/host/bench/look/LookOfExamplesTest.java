package org.modestead.host.bench.look;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.StreamSupport;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingsReader;

/** What the page is told of the values that travel between the nodes, on the invented pump house. */
class LookOfExamplesTest {
    private static FittedOperator operator;
    private static Spectrum spectrum;
    private static Verdict verdict;

    @BeforeAll
    static void fit() {
        NodeResult made = run("signal-generator", Map.of(), Map.of("runs", 6, "duration", 20, "unstable-runs", 0, "gaps", 0, "dropouts", 0));
        NodeResult prepared = run("snapshot-builder", Map.of("table", made.outputs().get("table")), Map.of("time-column", "time",
                "run-column", "run", "time-unit", "s", "resampling", "uniform", "step", 0.05, "delay-depth", 8, "holdout", "run-share",
                "holdout-run-share", 0.2));
        Object snapshots = prepared.outputs().get("snapshots");
        operator = (FittedOperator) run("operator-fitter", Map.of("snapshots", snapshots), Map.of("rank-rule", "fixed", "rank", 7)).outputs()
                .get("operator");
        spectrum = (Spectrum) run("spectrum-extractor", Map.of("operator", operator), Map.of()).outputs().get("spectrum");
        verdict = (Verdict) run("wellposedness-checker", Map.of("snapshots", snapshots, "operator", operator, "spectrum", spectrum), Map.of())
                .outputs().get("verdict");
    }

    private static NodeResult run(String id, Map<String, Object> inputs, Map<String, Object> settings) {
        Node node = NodeCatalog.load(List.of(LookOfExamplesTest.class.getClassLoader())).find(id).orElseThrow();
        return node.run(new NodeInputs(inputs), SettingsReader.read(node, settings).settings().orElseThrow(),
                new RunContext(Progress.NONE, Path.of("."), Path.of(".")));
    }

    @Test
    void theCompressedOperatorIsShownAtTheChosenRank() {
        HeatMap map = Matrices.of(operator).get(0).map().get();
        assertEquals(operator.rank(), map.values().numRows);
        assertTrue(map.diverging());
    }

    @Test
    void eigenfunctionsOverlapThemselvesFullyAndOthersSymmetrically() {
        HeatMap map = Matrices.of(spectrum).stream().filter(one -> one.id().equals("overlap")).findFirst().orElseThrow().map().get();
        DMatrixRMaj overlap = map.values();
        for (int i = 0; i < overlap.numRows; i++) {
            // vectors are of unit length to rounding
            assertEquals(1, overlap.get(i, i), 1e-9);
            for (int j = 0; j < i; j++) {
                assertEquals(overlap.get(i, j), overlap.get(j, i), 1e-12);
            }
        }
        assertEquals(spectrum.rank(), map.rows().selections().size());
        assertEquals("mode:1", map.rows().selections().get(0));
    }

    @Test
    void everyModeIsToldWithWhatDecidedIt() {
        JsonNode json = VerdictJson.of(verdict);
        assertEquals(verdict.modes().size(), json.get("modes").size());
        for (JsonNode mode : json.get("modes")) {
            assertEquals("mode:" + mode.get("mode").asInt(), mode.get("selection").asText());
            assertFalse(mode.get("meaning").asText().isEmpty() || mode.get("sentence").asText().isEmpty());
            List<String> decided = StreamSupport.stream(mode.get("deciding").spliterator(), false).map(one -> one.get("check").asText()).toList();
            List<String> named = StreamSupport.stream(mode.get("decidedBy").spliterator(), false).map(JsonNode::asText).toList();
            assertTrue(named.containsAll(decided), named + " / " + decided);
        }
        assertTrue(json.get("safety").toString().contains("licensed engineer"));
    }

    /** What data that the fit never saw do not keep may still be a mode that something unrecorded drives: who reads "absent" is told, nobody else. */
    @Test
    void absentByDataNeverSeenIsToldWithWhatElseMayBeTried() {
        assertEquals("", VerdictJson.of(graded(Grade.ABSENT, "space-norm-growth")).get("driven").asText());
        assertEquals("", VerdictJson.of(graded(Grade.UNDECIDED, "holdout-residual")).get("driven").asText());
        String told = VerdictJson.of(graded(Grade.ABSENT, "holdout-residual")).get("driven").asText();
        assertTrue(told.contains("delay depth") && told.contains("input") && told.contains("Stabilisation Diagram"), told);
    }

    private static Verdict graded(Grade grade, String check) {
        ModeVerdict mode = new ModeVerdict(1, grade, List.of(check), true, "Mode 1.");
        return new Verdict(mode, List.of(mode), List.of(), List.of(), List.of());
    }

    @Test
    void aModeIsToldWithItsFiguresWhereTheSpectrumIsAtHand() {
        JsonNode modes = VerdictJson.of(verdict, Optional.of(spectrum)).get("modes");
        assertTrue(StreamSupport.stream(modes.spliterator(), false).anyMatch(mode -> mode.get("figures").asText().startsWith("0.6200 Hz (0.61")), modes.toString());
        assertEquals("", VerdictJson.of(verdict).at("/modes/0/figures").asText());
    }

    @Test
    void aKernelIsShownByItsSections() {
        // the Gaussian is 1 at its own centre
        var figure = PortFigures.of(KernelFamilies.create(new KernelSpec("gaussian", Map.of("scale", 2.0)))).get(0);
        var line = (org.modestead.nodes.figure.Figure.Line) figure.layers().get(0);
        assertEquals(0, line.x()[120], 1e-12);
        assertEquals(1, line.y()[120], 1e-12);
        assertEquals(-6, line.x()[0], 1e-12);
    }

    @Test
    void picturesOfAPortBearTheIdsOfTheNodesPictures() {
        assertEquals("eigenvalues", PortFigures.of(spectrum).get(0).id());
        assertEquals("singular-values", PortFigures.of(operator).get(0).id());
    }
}
