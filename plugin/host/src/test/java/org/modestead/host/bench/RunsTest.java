package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.FakeNode;
import org.modestead.host.TestWorkflows;
import org.modestead.host.bench.desk.DeskFolder;
import org.modestead.host.bench.folders.OpenedFolders;
import org.modestead.host.bench.run.KeptResults;
import org.modestead.host.bench.run.ResultFolder;
import org.modestead.host.bench.work.DeskView;
import org.modestead.host.bench.work.Workbench;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** What runs, what need not, what stops, and that nothing a step does breaks the desk. */
class RunsTest {

    private static final List<String> LINKS = List.of("a.table>b.a", "b.table>c.a");

    @TempDir
    private Path folder;
    private final AtomicInteger works = new AtomicInteger();
    private final CountDownLatch release = new CountDownLatch(1);

    private NodeCatalog nodes() {
        return NodeCatalog.of(List.of(
                new FakeNode("add", (inputs, settings, context) -> {
                    works.incrementAndGet();
                    return value(inputs) + settings.whole("level");
                }),
                new FakeNode("crash", (inputs, settings, context) -> {
                    throw new IllegalStateException("broken inside");
                }),
                new FakeNode("memory", (inputs, settings, context) -> {
                    throw new OutOfMemoryError("no more");
                }),
                new FakeNode("overflow", (inputs, settings, context) -> overflow(1)),
                new FakeNode("deaf", (inputs, settings, context) -> deaf()),
                new FakeNode("half", (inputs, settings, context) -> {
                    context.progress().report(0.5, "half of it");
                    deaf();
                    return 1;
                })));
    }

    private static double overflow(double value) {
        return value < 0 ? 0 : overflow(value + 1) + 1;
    }

    /** Hears no request to stop, not even an interrupt. */
    private double deaf() {
        boolean done = false;
        while (!done) {
            try {
                done = release.await(1, TimeUnit.MINUTES);
            } catch (InterruptedException ignored) {
                done = release.getCount() == 0;
            }
        }
        return 1;
    }

    private static double value(NodeInputs inputs) {
        return inputs.find("a", Table.class).map(table -> {
            try (RowCursor cursor = table.open()) {
                cursor.next();
                return cursor.number(0);
            }
        }).orElse(0.0);
    }

    private TestBench bench(List<String> steps, List<String> links) throws IOException, InterruptedException {
        return bench("work", steps, links);
    }

    private TestBench bench(String name, List<String> steps, List<String> links) throws IOException, InterruptedException {
        Path work = Files.createDirectories(folder.resolve(name));
        TestWorkflows.write(work, steps, links);
        return TestBench.start(nodes(), folder.resolve("desk"), Optional.of(work));
    }

    private static void set(TestBench bench, String step, int level) throws IOException, InterruptedException {
        bench.post("/api/edit", "{\"edits\": [{\"do\": \"set\", \"step\": \"" + step + "\", \"typed\": {\"level\": \"" + level + "\"}}]}");
    }

    private static double shown(TestBench bench, String step) throws IOException, InterruptedException {
        return bench.get("/api/steps/" + step + "/tables/table").json().path("rows").path(0).path(0).asDouble();
    }

    @Test
    void onlyWhatChangedRunsAgainAndUndoFindsTheOldResults() throws IOException, InterruptedException {
        try (TestBench bench = bench(List.of("a:add", "b:add", "c:add"), LINKS)) {
            JsonNode desk = bench.get("/api/desk").json();
            assertEquals(List.of("ready", "waiting", "waiting"), List.of(TestBench.kind(desk, "a"), TestBench.kind(desk, "b"), TestBench.kind(desk, "c")));
            assertEquals("It waits for add (a).", TestBench.step(desk, "b").path("state").path("sentence").asText());
            bench.post("/api/run", "{\"steps\": [\"b\"]}");
            desk = bench.awaitRest();
            assertEquals(List.of("done", "done", "ready"), List.of(TestBench.kind(desk, "a"), TestBench.kind(desk, "b"), TestBench.kind(desk, "c")));
            assertEquals(2, works.get(), "up to b");
            bench.post("/api/run", "{}");
            desk = bench.awaitRest();
            assertEquals("3 steps done.", desk.path("run").path("last").asText());
            assertEquals(3, works.get(), "a and b were kept");
            assertEquals(3, shown(bench, "c"));
            set(bench, "b", 10);
            desk = bench.get("/api/desk").json();
            assertEquals(List.of("done", "stale", "stale"), List.of(TestBench.kind(desk, "a"), TestBench.kind(desk, "b"), TestBench.kind(desk, "c")));
            assertEquals(2, shown(bench, "b"), "what is out of date can still be looked at");
            assertTrue(bench.get("/api/steps/b/look").json().path("stale").asBoolean());
            bench.post("/api/run", "{}");
            bench.awaitRest();
            assertEquals(5, works.get());
            assertEquals(12, shown(bench, "c"));
            desk = bench.post("/api/undo", "").json();
            assertEquals("done", TestBench.kind(desk, "c"));
            assertEquals(3, shown(bench, "c"));
            desk = bench.post("/api/run", "{}").json();
            assertEquals("Everything is up to date.", desk.path("run").path("last").asText());
            bench.post("/api/run", "{\"steps\": [\"c\"], \"again\": true}");
            bench.awaitRest();
            assertEquals(6, works.get());
        }
    }

    @Test
    void aNoteOrATitleMakesNothingOutOfDate() throws IOException, InterruptedException {
        try (TestBench bench = bench(List.of("a:add"), List.of())) {
            bench.post("/api/run", "{}");
            bench.awaitRest();
            JsonNode desk = bench.post("/api/edit", "{\"edits\": [{\"do\": \"note\", \"step\": \"a\", \"note\": \"x\"}, {\"do\": \"rename\", \"step\": \"a\", \"id\": \"z\"}]}").json();
            assertEquals("done", TestBench.kind(desk, "z"));
        }
    }

    @Test
    void aStepThatCrashesFailsWithASentenceAndTheOthersAreDone() throws IOException, InterruptedException {
        for (String node : List.of("crash", "memory", "overflow")) {
            try (TestBench bench = bench(node, List.of("a:add", "b:" + node, "c:add:{\"level\": 2}"), List.of("b.table>c.a"))) {
                bench.post("/api/run", "{}");
                JsonNode desk = bench.awaitRest();
                assertEquals("done", TestBench.kind(desk, "a"), node);
                assertEquals("failed", TestBench.kind(desk, "b"), node);
                assertEquals("waiting", TestBench.kind(desk, "c"), node);
                String sentence = TestBench.step(desk, "b").path("state").path("sentence").asText();
                assertTrue(sentence.startsWith("step b: ") && sentence.endsWith("."), sentence);
                assertTrue(!sentence.contains("\tat "), sentence);
                desk = bench.post("/api/edit", "{\"edits\": [{\"do\": \"remove\", \"steps\": [\"b\"]}]}").json();
                assertEquals("ready", TestBench.kind(desk, "c"), "the desk goes on");
            }
        }
    }

    @Test
    void whatDoesNotReactIsLeftToItselfWithinASecond() throws IOException, InterruptedException {
        try (TestBench bench = bench(List.of("a:half", "b:add"), List.of("a.table>b.a"))) {
            bench.post("/api/run", "{}");
            JsonNode desk = bench.await(now -> TestBench.step(now, "a").path("state").path("words").asText().startsWith("running, 50 %")
                    || TestBench.kind(now, "a").equals("running"));
            assertEquals("waiting", TestBench.kind(desk, "b"));
            assertEquals("It has its turn later in this run.", TestBench.step(desk, "b").path("state").path("sentence").asText());
            long begun = System.nanoTime();
            desk = bench.post("/api/cancel", "").json();
            double seconds = (System.nanoTime() - begun) / 1e9;
            assertEquals(false, desk.path("run").path("running").asBoolean());
            assertEquals("Stopped.", desk.path("run").path("last").asText());
            assertEquals("stopped", TestBench.kind(desk, "a"));
            assertTrue(seconds < 30, "it waited for the work: " + seconds + " s");
            assertEquals(409, bench.post("/api/undo", "").status() == 422 ? 409 : 0, "nothing was edited");
            release.countDown();
            Thread.sleep(200);
            assertEquals("stopped", TestBench.kind(bench.get("/api/desk").json(), "a"), "what comes too late is thrown away");
            bench.post("/api/run", "{}");
            assertEquals("done", TestBench.kind(bench.awaitRest(), "b"), "and the next run is a new one");
        }
    }

    /** As the page hears it: where a step stays at its half for more than a second, about as much is left as was spent. */
    @Test
    void aRunTellsHowFarItIsAndHowMuchTimeIsLeft() throws IOException, InterruptedException {
        try (TestBench bench = bench(List.of("a:half"), List.of());
                BufferedReader events = new BufferedReader(new InputStreamReader(bench.events(), StandardCharsets.UTF_8))) {
            bench.post("/api/run", "{}");
            String line = events.readLine();
            while (!line.contains(" left\"")) {
                line = events.readLine();
            }
            JsonNode told = new ObjectMapper().readTree(line.substring(line.indexOf('{')));
            assertTrue(told.path("run").path("words").asText().matches("running, 45 %, about \\d+ (s|min) left"), line);
            assertEquals(0.45, told.path("run").path("fraction").asDouble(), 0.01, "its half, and a tenth is for keeping the result");
            assertTrue(told.path("states").path("a").path("words").asText().matches("running, 45 %, \\d+ (s|min) left"), line);
            assertEquals("half of it", told.path("states").path("a").path("message").asText());
            release.countDown();
            assertEquals("done", TestBench.kind(bench.awaitRest(), "a"));
        }
    }

    @Test
    void whileOneRunGoesOnAnotherIsRefusedAndEditsAreNot() throws IOException, InterruptedException {
        try (TestBench bench = bench(List.of("a:deaf", "b:add"), List.of())) {
            bench.post("/api/run", "{\"steps\": [\"a\"]}");
            bench.await(now -> TestBench.kind(now, "a").equals("running"));
            TestBench.Reply refused = bench.post("/api/run", "{}");
            assertEquals(409, refused.status());
            assertEquals("run: one is going on; wait for its end, or stop it.", refused.sentence());
            set(bench, "b", 7);
            assertEquals(7, TestBench.step(bench.get("/api/desk").json(), "b").path("settings").path("level").asInt());
            release.countDown();
            assertEquals("done", TestBench.kind(bench.awaitRest(), "a"));
        }
    }

    @Test
    void aStepThatIsNotSetUpIsNamed() throws IOException, InterruptedException {
        try (TestBench bench = bench(List.of("a:add:{\"level\": 1000}", "b:add", "c:add"), List.of("a.table>b.a"))) {
            TestBench.Reply refused = bench.post("/api/run", "{\"steps\": [\"b\"]}");
            assertEquals(409, refused.status());
            assertEquals("step a, setting level: the number 1000; use a whole number at least 0 and at most 100.", refused.sentence());
            bench.post("/api/run", "{}");
            JsonNode desk = bench.awaitRest();
            assertEquals(List.of("unset", "waiting", "done"), List.of(TestBench.kind(desk, "a"), TestBench.kind(desk, "b"), TestBench.kind(desk, "c")));
            assertEquals("It waits for add (a), which is not set up.", TestBench.step(desk, "b").path("state").path("sentence").asText());
        }
    }

    @Test
    void resultsAreFoundAgainByANewProcessOfTheSameBuildUnlessTheyWereCutShort() throws IOException, InterruptedException {
        try (TestBench bench = bench(List.of("a:add", "b:add"), List.of("a.table>b.a"))) {
            bench.post("/api/run", "{}");
            bench.awaitRest();
        }
        try (TestBench bench = bench(List.of("a:add", "b:add"), List.of("a.table>b.a"))) {
            JsonNode desk = bench.get("/api/desk").json();
            assertEquals("done", TestBench.kind(desk, "b"));
            assertEquals(2, shown(bench, "b"));
            assertEquals(2, works.get());
        }
        try (var files = Files.walk(folder.resolve("desk/results"))) {
            for (Path file : files.filter(path -> path.toString().endsWith(".parquet")).toList()) {
                Files.writeString(file, "cut short");
            }
        }
        try (TestBench bench = bench(List.of("a:add", "b:add"), List.of("a.table>b.a"))) {
            TestBench.Reply gone = bench.get("/api/steps/b/look");
            assertEquals(409, gone.status());
            assertEquals("step b: its result is no longer kept; run it again.", gone.sentence());
            assertEquals("ready", TestBench.kind(bench.get("/api/desk").json(), "b"), "the damage was found out");
            bench.post("/api/run", "{\"steps\": [\"b\"]}");
            JsonNode desk = bench.awaitRest();
            assertEquals(List.of("done", "done"), List.of(TestBench.kind(desk, "a"), TestBench.kind(desk, "b")), desk.toString());
            assertEquals(4, works.get(), "a was damaged too, and was made anew for b");
            assertEquals(2, shown(bench, "b"));
            assertEquals(1, shown(bench, "a"));
        }
        try (TestBench bench = bench(List.of("a:add", "b:add"), List.of("a.table>b.a"))) {
            assertEquals(2, shown(bench, "b"), "what was made anew is kept in the place of what was damaged");
            assertEquals(4, works.get());
        }
    }

    @Test
    void whatFellOutOfMemoryAndDiskIsReadyAgainAndRunningToItRunsIt() throws IOException, InterruptedException {
        Path work = Files.createDirectories(folder.resolve("work"));
        TestWorkflows.write(work, List.of("a:add", "b:add", "c:add"), LINKS);
        DeskFolder desk = new DeskFolder(folder.resolve("desk"));
        KeptResults results = new KeptResults(new ResultFolder(desk.results(), "build", 1), 1);
        try (Workbench workbench = new Workbench(nodes(), results, new OpenedFolders(List.of(folder)))) {
            workbench.open(() -> desk.open(work));
            workbench.run(List.of(), false);
            assertEquals(List.of("READY", "WAITING", "DONE"), states(workbench), "only the last result had room");
            workbench.run(List.of("b"), false);
            assertEquals(List.of("READY", "DONE", "READY"), states(workbench));
            assertEquals(5, works.get(), "a and b ran again");
        }
    }

    private static List<String> states(Workbench workbench) throws InterruptedException {
        DeskView view = workbench.view();
        while (view.desk().orElseThrow().run().running()) {
            view = workbench.await(view.revision(), TestBench.PATIENCE.toMillis()).orElse(view);
        }
        DeskView.Open open = view.desk().orElseThrow();
        return List.of("a", "b", "c").stream().map(step -> open.standing().get(step).state().kind().name()).toList();
    }
}
