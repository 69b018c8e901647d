package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;
import org.modestead.nodes.contract.Node;

/** Dialogs know the columns upstream, show what takes part, and say what a workflow's check would say. */
class DialogTest {

    private static TestBench bench;

    @BeforeAll
    static void start(@TempDir Path folder) throws IOException, InterruptedException {
        bench = TestBench.start(TestWorkflows.allNodes(), folder, Optional.empty());
        bench.post("/api/desk", "{\"example\": \"driven-shaft\"}");
    }

    @AfterAll
    static void end() {
        bench.close();
    }

    private static List<String> texts(JsonNode list) {
        return StreamSupport.stream(list.spliterator(), false).map(JsonNode::asText).toList();
    }

    private static JsonNode check(String step, String typed) throws IOException, InterruptedException {
        return bench.post("/api/steps/" + step + "/check", "{\"typed\": " + typed + "}").json();
    }

    @Test
    void theColumnsOfTheTableUpstreamAreThereBeforeAnythingRan() throws IOException, InterruptedException {
        JsonNode dialog = bench.get("/api/steps/snapshots/dialog").json();
        assertEquals(List.of("run", "time [s]", "level [m]", "gate [%]", "pump [m3/s]"), dialog.path("columns").path("table").findValuesAsText("name"));
        assertEquals("s", dialog.path("columns").path("table").path(1).path("unit").asText());
        assertEquals("5 columns of source.table", dialog.path("columnsWords").path("table").asText());
        assertEquals(0, dialog.path("problems").size());
    }

    @Test
    void dependentSettingsComeAndGoWithWhatIsTyped() throws IOException, InterruptedException {
        assertTrue(texts(check("snapshots", "{}").path("visible")).contains("holdout-run-share"));
        JsonNode dialog = check("snapshots", "{\"holdout\": \"tail-time\"}");
        assertFalse(texts(dialog.path("visible")).contains("holdout-run-share"));
        assertTrue(texts(dialog.path("visible")).contains("holdout-tail-time"));
        assertEquals("tail-time", dialog.path("settings").path("holdout").asText());
        assertEquals("run-share", TestBench.step(bench.get("/api/desk").json(), "snapshots").path("settings").path("holdout").asText(), "nothing was stored");
    }

    @Test
    void whatIsWrongIsToldInTheWordsOfTheCheck() throws IOException, InterruptedException {
        JsonNode dialog = check("snapshots", "{\"time-column\": \"tme [s]\", \"delay-depth\": \"many\", \"gap-factor\": \"0.5\"}");
        List<String> sentences = dialog.path("problems").findValuesAsText("sentence");
        assertTrue(sentences.contains("step snapshots, setting time-column: the input has no column tme [s], perhaps you meant time [s]; "
                + "choose a column of type number, whole number, text, date, date-time or date-time with zone: run, time [s], level [m], gate [%], pump [m3/s]."),
                sentences.toString());
        assertTrue(sentences.stream().anyMatch(sentence -> sentence.startsWith("step snapshots, setting delay-depth: the text \"many\"; use a whole number")), sentences.toString());
        assertTrue(sentences.stream().anyMatch(sentence -> sentence.startsWith("step snapshots, setting gap-factor: the number 0.5; use a number above 1")), sentences.toString());
    }

    @Test
    void whatIsTypedIsStoredAsAWorkflowFileHoldsIt() throws IOException, InterruptedException {
        JsonNode settings = check("snapshots", "{\"delay-depth\": \"7\", \"gap-factor\": \"2.5\", \"inputs\": [\"gate [%]\"], \"detrend\": null, \"time-column\": \"\", \"units\": []}")
                .path("settings");
        assertEquals("7", settings.path("delay-depth").toString());
        assertEquals("2.5", settings.path("gap-factor").toString());
        assertEquals("[\"gate [%]\"]", settings.path("inputs").toString());
        assertTrue(settings.path("detrend").isMissingNode() && settings.path("time-column").isMissingNode() && settings.path("units").isMissingNode());
    }

    @Test
    void everyNodeHasADialogOnAnEmptyBench(@TempDir Path folder) throws IOException, InterruptedException {
        try (TestBench empty = TestBench.start(TestWorkflows.allNodes(), folder, Optional.empty())) {
            empty.post("/api/desk", "{\"empty\": true}");
            for (Node node : TestWorkflows.allNodes().nodes()) {
                String id = node.declaration().id();
                String made = empty.post("/api/edit", "{\"edits\": [{\"do\": \"add\", \"node\": \"" + id + "\"}]}").json().path("made").path(0).asText();
                JsonNode dialog = empty.get("/api/steps/" + made + "/dialog").json();
                assertEquals(id, dialog.path("node").asText(), dialog.toString());
                List<String> keys = node.declaration().settings().stream().map(setting -> setting.key()).toList();
                assertTrue(keys.containsAll(texts(dialog.path("visible"))));
            }
        }
    }

    @Test
    void fittingTellsWhatCanBeLinkedAndAdded() throws IOException, InterruptedException {
        JsonNode fitting = bench.get("/api/links/fitting?end=snapshots.snapshots&side=output").json();
        JsonNode fit = Stream.of(fitting.path("ports")).flatMap(list -> StreamSupport.stream(list.spliterator(), false))
                .filter(port -> port.path("end").asText().equals("fit.snapshots")).findFirst().orElseThrow();
        assertTrue(fit.path("fits").asBoolean());
        assertEquals("snapshots.snapshots", fit.path("fed").asText());
        assertTrue(fitting.path("nodes").findValuesAsText("node").containsAll(List.of("kernel-chooser", "operator-fitter", "wellposedness-checker", "forecast")));
        assertFalse(fitting.path("nodes").findValuesAsText("node").contains("table-query"));
        for (JsonNode port : fitting.path("ports")) {
            assertEquals(port.path("fits").asBoolean(), port.path("refusal").asText().isEmpty(), port.toString());
        }
        assertEquals("link source.table to fit.snapshots: source.table gives a Table, and fit.snapshots takes Snapshots; link an output that gives Snapshots.",
                bench.get("/api/links/refusal?from=source.table&to=fit.snapshots").json().path("refusal").asText());
    }
}
