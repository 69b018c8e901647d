package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/** Every way in leads to a desk that is ready, and what was left is offered again. */
class StartPageTest {

    @TempDir
    private Path folder;
    private TestBench bench;

    @BeforeEach
    void start() throws IOException, InterruptedException {
        bench = TestBench.start(TestWorkflows.allNodes(), folder, Optional.empty());
    }

    @AfterEach
    void end() {
        bench.close();
    }

    @Test
    void everyTestWorkflowIsAnExampleWithNothingWrong() throws IOException, InterruptedException {
        JsonNode offered = bench.get("/api/start").json().path("examples");
        List<String> examples = offered.findValuesAsText("id");
        try (var folders = Files.list(Path.of("..", "..", "test-workflows"))) {
            assertEquals(folders.filter(path -> Files.exists(path.resolve("workflow.json"))).map(path -> path.getFileName().toString()).sorted().toList(),
                    examples.stream().sorted().toList());
        }
        for (String example : examples) {
            JsonNode desk = bench.post("/api/desk", "{\"example\": \"" + example + "\"}").json();
            assertTrue(desk.path("open").asBoolean(), desk.toString());
            assertEquals(offered.path(examples.indexOf(example)).path("title").asText(), desk.path("name").asText(), "the title is the workflow's name");
            assertEquals(0, desk.path("problems").size(), desk.path("problems").toString());
            assertFalse(desk.path("saved").asBoolean());
            assertTrue(desk.path("folder").asText().startsWith(folder.toString()));
        }
        assertEquals(examples.size(), bench.get("/api/start").json().path("recent").size());
    }

    @Test
    void theDocumentHoldsWhatTheStartPageShowsAndNothingOfAnOpenDesk() throws IOException, InterruptedException {
        bench.post("/api/desk", "{\"empty\": true, \"name\": \"</script><b>\"}");
        bench.post("/api/edit", "{\"edits\": [{\"do\": \"add\", \"node\": \"signal-generator\"}]}");
        assertEquals("", first(), "how the steps stand is asked for");
        bench.post("/api/desk/close", "");
        String first = first();
        assertFalse(first.contains("<"), "a name ends no element: " + first);
        JsonNode told = new ObjectMapper().readTree(first);
        assertFalse(told.path("desk").path("open").asBoolean(true));
        assertEquals("</script><b>", told.path("start").path("recent").path(0).path("name").asText());
        assertEquals(bench.get("/api/start").json().path("examples"), told.path("start").path("examples"));
    }

    private String first() throws IOException, InterruptedException {
        return bench.get("/").body().replaceAll("(?s).*<script id=\"first\" type=\"application/json\">(.*?)</script>.*", "$1").replace("{}", "");
    }

    @Test
    void anOwnRecordingBecomesStepsThatRunToAVerdict() throws IOException, InterruptedException {
        byte[] file = Files.readAllBytes(Path.of("..", "..", "test-workflows", "driven-shaft", "data", "recordings.csv"));
        JsonNode guess = bench.upload("shaft.csv", file).json();
        assertEquals(0, guess.path("problems").size());
        assertEquals("input", guess.path("all").path(3).path("role").asText());
        assertTrue(guess.path("path").isNull(), "no desk is open that could name it");
        JsonNode desk = bench.post("/api/desk", "{\"recording\": {\"upload\": " + guess.path("upload") + ", \"name\": \"shaft.csv\"}}").json();
        assertEquals("shaft", desk.path("name").asText());
        assertEquals(0, desk.path("problems").size(), desk.path("problems").toString());
        bench.post("/api/run", "{\"steps\": [\"check\"]}");
        desk = bench.awaitRest();
        assertEquals("done", TestBench.kind(desk, "check"), desk.toString());
        JsonNode look = bench.get("/api/steps/check/look").json();
        assertFalse(look.path("verdict").path("sentence").asText().isEmpty());
        assertFalse(look.path("caution").asText().isEmpty());
        assertTrue(bench.get("/api/report.html").body().contains("Step: Well-posedness Checker (check)"), "the report of all results is a page of its own");
        JsonNode again = bench.upload("shaft.csv", file).json();
        assertEquals("data/shaft.csv", again.path("path").asText(), "a step of the open desk reads it under this name");
    }

    /** One row a reading, decimal commas, and words where a sensor was silent: upload, open and run, and there is a verdict. */
    @Test
    void aTableWithOneRowAReadingAndWordsAmongNumbersRunsToAVerdict() throws IOException, InterruptedException {
        StringBuilder text = new StringBuilder("trial;time_ms;sensor;value\n");
        for (int run = 1; run <= 5; run++) {
            for (int k = 0; k < 200; k++) {
                double swing = StrictMath.exp(-0.004 * k) * StrictMath.cos(0.4 * k + run);
                String first = run == 2 && k == 9 ? "sensor off" : String.format(Locale.ROOT, "%.5f", swing).replace('.', ',');
                text.append(String.format(Locale.ROOT, "%d;%d;acc x;%s%n%d;%d;acc y;%s%n", run, 5 * k, first, run, 5 * k,
                        String.format(Locale.ROOT, "%.5f", 0.5 * StrictMath.exp(-0.004 * k) * StrictMath.cos(0.4 * k + run + 0.3)).replace('.', ',')));
            }
        }
        JsonNode guess = bench.upload("rig.csv", text.toString().getBytes(StandardCharsets.UTF_8)).json();
        assertEquals(0, guess.path("problems").size(), guess.path("problems").toString());
        JsonNode desk = bench.post("/api/desk", "{\"recording\": {\"upload\": " + guess.path("upload") + ", \"reading\": " + guess.path("reading")
                + ", \"columns\": " + guess.path("columns") + ", \"name\": \"rig.csv\"}}").json();
        assertEquals(0, desk.path("problems").size(), desk.path("problems").toString());
        bench.post("/api/run", "{\"steps\": [\"check\"]}");
        assertEquals("done", TestBench.kind(bench.awaitRest(), "check"), desk.toString());
        JsonNode verdict = bench.get("/api/steps/check/look").json().path("verdict");
        assertTrue(List.of("stands", "settles").contains(verdict.path("overall").asText()), verdict.toString());
    }

    @Test
    void workIsOfferedAgainAndCanBeForgotten() throws IOException, InterruptedException {
        String desk = bench.post("/api/desk", "{\"empty\": true, \"name\": \"Night shift\"}").json().path("desk").asText();
        bench.post("/api/edit", "{\"edits\": [{\"do\": \"add\", \"node\": \"signal-generator\"}]}");
        assertEquals(409, bench.post("/api/desk/forget", "{\"desk\": \"" + desk + "\"}").status(), "it is open");
        assertFalse(bench.post("/api/desk/close", "").json().path("open").asBoolean());
        JsonNode recent = bench.get("/api/start").json().path("recent").path(0);
        assertEquals("Night shift", recent.path("name").asText());
        assertTrue(recent.path("unsaved").asBoolean());
        assertEquals(1, recent.path("steps").asInt());
        JsonNode resumed = bench.post("/api/desk", "{\"resume\": \"" + desk + "\"}").json();
        assertEquals("Add Signal Generator", resumed.path("undo").asText());
        assertTrue(resumed.path("recovered").asText().startsWith("Unsaved work of "), resumed.toString());
        bench.post("/api/desk/close", "");
        assertEquals(0, bench.post("/api/desk/forget", "{\"desk\": \"" + desk + "\"}").json().path("recent").size());
    }

    @Test
    void anEmptyBenchThatWasLeftEmptyIsNoWorkToGoOnWith() throws IOException, InterruptedException {
        bench.post("/api/desk", "{\"empty\": true, \"name\": \"Nothing yet\"}");
        bench.post("/api/desk/close", "");
        assertEquals(0, bench.get("/api/start").json().path("recent").size());
        bench.post("/api/desk", "{\"empty\": true, \"name\": \"Thoughts\"}");
        bench.post("/api/edit", "{\"edits\": [{\"do\": \"notes\", \"notes\": \"Ask for the night runs.\"}]}");
        bench.post("/api/desk/close", "");
        JsonNode recent = bench.get("/api/start").json().path("recent");
        assertEquals(List.of("Thoughts"), recent.findValuesAsText("name"), "what was only written is work");
    }

    @Test
    void aDroppedWorkflowIsOpenedOrRefusedWithASentence() throws IOException, InterruptedException {
        String text = TestWorkflows.text(List.of("g:signal-generator", "s:snapshot-builder:{\"time-column\": \"time\"}"), List.of("g.table>s.table"));
        JsonNode desk = bench.post("/api/desk", "{\"workflow\": " + JsonNodeFactory.instance.textNode(text) + ", \"name\": \"workflow.json\"}").json();
        assertEquals(2, desk.path("steps").size(), desk.toString());
        TestBench.Reply refused = bench.post("/api/desk", "{\"workflow\": \"{\\\"format\\\": \\\"other\\\"}\", \"name\": \"workflow.json\"}");
        assertEquals(409, refused.status());
        assertTrue(refused.sentence().startsWith("workflow.json: field format"), refused.sentence());
        assertTrue(bench.get("/api/desk").json().path("open").asBoolean(), "the desk that was open stays");
    }
}
