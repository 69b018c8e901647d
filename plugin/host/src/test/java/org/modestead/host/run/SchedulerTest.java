package org.modestead.host.run;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.CyclicBarrier;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.engine.FitFault;
import org.modestead.host.FakeNode;
import org.modestead.host.TestWorkflows;
import org.modestead.host.output.Disk;
import org.modestead.host.workflow.RunPlan;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** How a run goes: in parallel, past failures, stopped, from the cache; with nodes that only count and wait. */
class SchedulerTest {

    private static final long PATIENCE_SECONDS = 120;

    @TempDir
    Path folder;

    private final List<String> ran = new ArrayList<>();
    private final CyclicBarrier meeting = new CyclicBarrier(2);
    private final CountDownLatch begun = new CountDownLatch(1);
    private NodeCatalog nodes;

    @BeforeEach
    void catalog() {
        nodes = NodeCatalog.of(List.of(
                new FakeNode("source", (inputs, settings, context) -> note("source", settings.whole("level"))),
                new FakeNode("double", (inputs, settings, context) ->
                note("double", 2 * value(inputs, "a") * settings.whole("level"))),
                new FakeNode("sum", (inputs, settings, context) -> note("sum", value(inputs, "a") + value(inputs, "b"))),
                new FakeNode("meet", (inputs, settings, context) -> meet()),
                new FakeNode("fail", (inputs, settings, context) -> {
                    throw new FitFault("rank", "the rank 9 is above the 4 that the data hold", "choose at most 4");
                }),
                new FakeNode("defect", (inputs, settings, context) -> {
                    throw new IllegalStateException("a slip");
                }),
                new FakeNode("memory", (inputs, settings, context) -> {
                    throw new OutOfMemoryError("Java heap space");
                }),
                new FakeNode("wait", (inputs, settings, context) -> {
                    begun.countDown();
                    while (true) {
                        context.progress().checkCancelled();
                        Thread.onSpinWait();
                    }
                })));
    }

    @Test
    void stepsRunAfterTheirInputsAndWriteTheirTables() throws IOException {
        Path file = TestWorkflows.write(folder, List.of("c:sum", "a:source:{\"level\": 3}", "b:double"),
                List.of("a.table>b.a", "a.table>c.a", "b.table>c.b"));
        RunResult result = run(file, new CancelSwitch());
        assertEquals(RunResult.State.DONE, result.state());
        assertEquals(List.of("c", "a", "b"), List.copyOf(result.outcomes().keySet()), "outcomes are in file order");
        assertEquals("value\n9.0\n", Files.readString(folder.resolve("out/c/table.csv")));
        assertTrue(Files.readString(folder.resolve("out/report.html")).contains("The value is 9.0."));
    }

    @Test
    void independentStepsRunAtTheSameTime() throws IOException {
        Path file = TestWorkflows.write(folder, List.of("a:meet", "b:meet"), List.of());
        assertEquals(RunResult.State.DONE, run(file, new CancelSwitch()).state(), "each waits for the other");
    }

    @Test
    void theNumberOfThreadsDoesNotChangeTheResult() throws IOException {
        List<String> steps = new ArrayList<>(List.of("a:source:{\"level\": 2}"));
        List<String> links = new ArrayList<>();
        for (int i = 0; i < 12; i++) {
            steps.add("d" + i + ":double:{\"level\": " + i + "}");
            links.add((i < 4 ? "a" : "d" + (i - 4)) + ".table>d" + i + ".a");
        }
        RunPlan plan = TestWorkflows.plan(TestWorkflows.write(folder, steps, links), nodes);
        new WorkflowRunner(1, new ResultCache(0), Disk.REAL).run(plan, folder.resolve("one"), RunListener.NONE,
                new CancelSwitch());
        new WorkflowRunner(4, new ResultCache(0), Disk.REAL).run(plan, folder.resolve("four"), RunListener.NONE,
                new CancelSwitch());
        for (String name : RunRecord.filesOf(folder.resolve("one"))) {
            assertArrayEquals(Files.readAllBytes(folder.resolve("one").resolve(name)),
                    Files.readAllBytes(folder.resolve("four").resolve(name)), name);
        }
        assertEquals(RunRecord.filesOf(folder.resolve("one")), RunRecord.filesOf(folder.resolve("four")));
    }

    @Test
    void aFailureStopsWhatDependsOnItAndNothingElse() throws IOException {
        Path file = TestWorkflows.write(folder, List.of("bad:fail", "after:double", "later:double", "a:source", "b:double"),
                List.of("bad.table>after.a", "after.table>later.a", "a.table>b.a"));
        RunResult result = run(file, new CancelSwitch());
        assertEquals(RunResult.State.FAILED, result.state());
        assertEquals(List.of("step bad, rank: the rank 9 is above the 4 that the data hold; choose at most 4."),
                result.failures());
        assertEquals(new StepOutcome.Skipped("bad"), result.outcomes().get("later"));
        assertInstanceOf(StepOutcome.Done.class, result.outcomes().get("b"));
        assertTrue(Files.exists(folder.resolve("out/b/table.csv")));
        assertFalse(Files.exists(folder.resolve("out/after")));
        assertEquals("failed", record().path("state").asText());
    }

    @Test
    void aDefectAndExhaustedMemoryAreOneSentenceEach() throws IOException {
        RunResult result = run(TestWorkflows.write(folder, List.of("x:defect", "y:memory"), List.of()), new CancelSwitch());
        assertEquals("step x: an error in the program (IllegalStateException: a slip); please report it with the log.",
                result.failures().get(0));
        assertTrue(((StepOutcome.Failed) result.outcomes().get("x")).defect().isPresent());
        assertTrue(result.failures().get(1).matches("step y: the memory of \\d+ MB ran out; start Java with more, .*"),
                result.failures().get(1));
    }

    @Test
    void stoppingLeavesTheFolderAsItWas() throws Exception {
        Files.createDirectories(folder.resolve("out"));
        Files.writeString(folder.resolve("out/note.txt"), "old");
        Path file = TestWorkflows.write(folder, List.of("a:source", "w:wait", "z:double"), List.of("w.table>z.a"));
        CancelSwitch cancel = new CancelSwitch();
        Thread person = new Thread(() -> {
            await(begun);
            cancel.cancel("enough");
        });
        person.start();
        RunResult result = run(file, cancel);
        person.join();
        assertEquals(RunResult.State.STOPPED, result.state());
        assertEquals(List.of("note.txt"), list(folder.resolve("out")));
        assertEquals(List.of("out", "workflow.json"), list(folder), "nothing is left beside the folder");
    }

    @Test
    void aQueryThatComputesForLongStopsAtOnce() throws IOException {
        Files.writeString(folder.resolve("t.csv"), "time,flow\n0,1\n");
        Path file = TestWorkflows.write(folder, List.of("s:table-source:{\"path\": \"t.csv\"}",
                "q:table-query:{\"sql\": \"SELECT sum(a.i * b.i) AS n FROM range(9000000) a(i), range(9000000) b(i)\"}"),
                List.of("s.table>q.input"));
        CancelSwitch cancel = new CancelSwitch();
        RunListener person = new RunListener() {
            @Override
            public void started(String step) {
                // waits for the writing of the table, which is when the query computes
            }

            @Override
            public void progress(String step, double fraction, String message) {
                if (step.equals("q") && message.startsWith("writing")) {
                    new Thread(() -> cancel.cancel("enough")).start();
                }
            }

            @Override
            public void ended(String step, StepOutcome outcome) {
                // told by the result
            }
        };
        RunResult result = assertTimeoutPreemptively(Duration.ofSeconds(PATIENCE_SECONDS), () -> new WorkflowRunner(2,
                new ResultCache(0), Disk.REAL).run(TestWorkflows.plan(file, TestWorkflows.allNodes()), folder.resolve("out"),
                        person, cancel));
        assertEquals(RunResult.State.STOPPED, result.state());
        assertEquals(new StepOutcome.Stopped(), result.outcomes().get("q"));
        assertFalse(Files.exists(folder.resolve("out")));
    }

    @Test
    void changingOneSettingRunsOnlyWhatDependsOnIt() throws IOException {
        Path file = TestWorkflows.write(folder, List.of("a:source", "b:double:{\"level\": 2}", "c:double", "d:sum"),
                List.of("a.table>b.a", "a.table>c.a", "b.table>d.a", "c.table>d.b"));
        WorkflowRunner runner = new WorkflowRunner(2, new ResultCache(100), Disk.REAL);
        runner.run(TestWorkflows.plan(file, nodes), folder.resolve("out"), RunListener.NONE, new CancelSwitch());
        assertEquals(4, ran.size());
        ran.clear();
        RunResult again = runner.run(TestWorkflows.plan(file, nodes, "c.level=5"), folder.resolve("out"), RunListener.NONE,
                new CancelSwitch());
        assertEquals(List.of("double", "sum"), ran);
        assertTrue(((StepOutcome.Done) again.outcomes().get("b")).cached());
        assertEquals("value\n14.0\n", Files.readString(folder.resolve("out/d/table.csv")));
        ran.clear();
        runner.run(TestWorkflows.plan(file, nodes, "c.level=5"), folder.resolve("out"), RunListener.NONE,
                new CancelSwitch());
        assertEquals(List.of(), ran, "nothing changed, nothing runs, and the tables are written all the same");
        assertEquals("value\n14.0\n", Files.readString(folder.resolve("out/d/table.csv")));
    }

    @Test
    void theCacheKeepsNoMoreThanItsCapacity() throws IOException {
        Path file = TestWorkflows.write(folder, List.of("a:source", "b:double"), List.of("a.table>b.a"));
        WorkflowRunner runner = new WorkflowRunner(1, new ResultCache(1), Disk.REAL);
        for (int i = 0; i < 2; i++) {
            runner.run(TestWorkflows.plan(file, nodes), folder.resolve("out"), RunListener.NONE, new CancelSwitch());
        }
        assertEquals(List.of("source", "double", "source", "double"),
                ran, "the second result pushes the first out each time");
    }

    @Test
    void aChangedFileRunsAgainAndAnEqualOneDoesNot() throws IOException {
        Files.writeString(folder.resolve("t.csv"), "time,flow\n0,1\n");
        Path file = TestWorkflows.write(folder, List.of("s:table-source:{\"path\": \"t.csv\"}"), List.of());
        WorkflowRunner runner = new WorkflowRunner(1, new ResultCache(10), Disk.REAL);
        assertFalse(cached(runner, file));
        assertTrue(cached(runner, file));
        Files.writeString(folder.resolve("t.csv"), "time,flow\n0,2\n");
        assertFalse(cached(runner, file));
        assertEquals("time,flow\n0,2\n", Files.readString(folder.resolve("out/s/table.csv")));
    }

    @Test
    void theRecordTellsSettingsVersionsAndFiles() throws IOException {
        run(TestWorkflows.write(folder, List.of("a:source:{\"level\": 7}"), List.of()), new CancelSwitch());
        JsonNode record = record();
        assertEquals("done", record.path("state").asText());
        assertEquals(7, record.path("steps").path(0).path("settings").path("level").asInt());
        assertTrue(record.path("linear_algebra").asText().contains("EJML "), record::toString);
        assertTrue(record.path("versions").path("duckdb").asText().startsWith("v1."), record::toString);
        assertEquals("[\"a/table.csv\",\"report.html\"]", record.path("files").toString());
    }

    private boolean cached(WorkflowRunner runner, Path file) {
        RunResult result = runner.run(TestWorkflows.plan(file, TestWorkflows.allNodes()), folder.resolve("out"),
                RunListener.NONE,
                new CancelSwitch());
        return ((StepOutcome.Done) result.outcomes().get("s")).cached();
    }

    private RunResult run(Path file, CancelSwitch cancel) {
        return new WorkflowRunner(2, new ResultCache(0), Disk.REAL).run(TestWorkflows.plan(file, nodes),
                folder.resolve("out"),
                RunListener.NONE, cancel);
    }

    private JsonNode record() throws IOException {
        return new ObjectMapper().readTree(folder.resolve("out/run.json").toFile());
    }

    private double note(String name, double value) {
        synchronized (ran) {
            ran.add(name);
        }
        return value;
    }

    private double meet() {
        try {
            meeting.await(PATIENCE_SECONDS, TimeUnit.SECONDS);
            return 1;
        } catch (Exception alone) {
            throw new IllegalStateException("the other step did not come", alone);
        }
    }

    private static double value(NodeInputs inputs, String port) {
        try (RowCursor cursor = inputs.get(port, Table.class).open()) {
            cursor.next();
            return cursor.number(0);
        }
    }

    private static void await(CountDownLatch latch) {
        try {
            assertTrue(latch.await(PATIENCE_SECONDS, TimeUnit.SECONDS));
        } catch (InterruptedException interrupted) {
            throw new IllegalStateException(interrupted);
        }
    }

    private static List<String> list(Path path) throws IOException {
        try (var inside = Files.list(path)) {
            return inside.map(found -> found.getFileName().toString()).sorted().toList();
        }
    }
}
