package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.locks.LockSupport;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;
import org.modestead.host.bench.TestBench;
import org.modestead.host.run.CancelSwitch;
import org.modestead.host.run.RunListener;
import org.modestead.host.run.RunResult;
import org.modestead.host.run.WorkflowRunner;
import org.modestead.host.workflow.RunPlan;

/**
 * Runs that are cancelled at a moment drawn from a seed, over and over in one process: results are those of before or the new ones, and
 * memory, open files, threads and temporary folders are as they were. {@code -Dcancels=100} cancels more often than the ordinary build,
 * half of them runs, half of them runs of a bench.
 */
class RandomCancelsTest {

    private static final long SEED = 20261204;
    private static final int CANCELS = Integer.getInteger("cancels", 12);
    /** Of the time a run takes: some come while its files move into place, or too late. */
    private static final double LATEST = 1.05;
    private static final int ROWS = 40_000;
    /** Sorting is over before the first row comes: some cancels meet the database at work, which Java cannot interrupt. */
    private static final String SORT = "SELECT a.time AS time, a.x AS x FROM input a ORDER BY sin(a.time * 7919.0), a.time";

    @TempDir
    Path folder;

    @BeforeEach
    void workflow() throws IOException {
        for (String name : List.of("old", "new")) {
            StringBuilder rows = new StringBuilder("time,x\n");
            for (int i = 0; i < ROWS; i++) {
                rows.append(i).append(',').append(StrictMath.cos((name.equals("old") ? 0.3 : 0.4) * i)).append('\n');
            }
            Files.writeString(folder.resolve(name + ".csv"), rows);
        }
        TestWorkflows.write(folder, List.of("source:table-source:{\"path\": \"old.csv\"}",
                "sorted:table-query:{\"memory\": 128, \"sql\": \"" + SORT + "\"}",
                "b:snapshot-builder:{\"time-column\": \"time\", \"delay-depth\": 8}", "fit:operator-fitter",
                "spectrum:spectrum-extractor:{\"intervals\": \"none\"}"),
                List.of("source.table>sorted.input", "source.table>b.table", "b.snapshots>fit.snapshots", "fit.operator>spectrum.operator"));
    }

    @Test
    void aCancelledRunLeavesTheResultsOfBeforeAndNothingElse() throws IOException {
        Map<String, RunPlan> plans = Map.of("old", plan("old"), "new", plan("new"));
        Map<String, Map<String, String>> whole = new TreeMap<>();
        long lasts = Long.MAX_VALUE;
        for (String data : List.of("new", "old", "new", "old")) {
            long began = System.nanoTime();
            assertEquals(RunResult.State.DONE, run(plans.get(data), new CancelSwitch()).state());
            lasts = Math.min(lasts, System.nanoTime() - began);
            whole.put(data, tables(folder.resolve("out")));
        }
        Held before = Held.now();
        Random random = new Random(SEED);
        String lies = "old";
        int stopped = 0;
        for (int k = 0; k < CANCELS / 2; k++) {
            String data = lies.equals("old") ? "new" : "old";
            CancelSwitch cancel = new CancelSwitch();
            Thread canceller = cancelAfter((long) (LATEST * random.nextDouble() * lasts), cancel);
            RunResult.State state = run(plans.get(data), cancel).state();
            canceller.interrupt();
            assertTrue(state == RunResult.State.STOPPED || state == RunResult.State.DONE, "cancel " + k + ": " + state);
            stopped += state == RunResult.State.STOPPED ? 1 : 0;
            lies = state == RunResult.State.DONE ? data : lies;
            assertEquals(whole.get(lies), tables(folder.resolve("out")), "cancel " + k);
            assertEquals(before.spills(), Held.spillFolders(), "cancel " + k);
        }
        assertTrue(stopped > 0, "cancels come in time");
        assertNothingLeft(before, stopped + " of " + CANCELS / 2 + " runs of " + lasts / 1_000_000 + " ms stopped");
    }

    private RunResult run(RunPlan plan, CancelSwitch cancel) {
        return WorkflowRunner.once().run(plan, folder.resolve("out"), RunListener.NONE, cancel);
    }

    private RunPlan plan(String data) {
        return TestWorkflows.plan(folder.resolve("workflow.json"), TestWorkflows.allNodes(), "source.path=" + data + ".csv");
    }

    private static Thread cancelAfter(long nanos, CancelSwitch cancel) {
        Thread thread = new Thread(() -> {
            park(nanos);
            cancel.cancel("cancelled by the test");
        }, "canceller");
        thread.start();
        return thread;
    }

    private static void park(long nanos) {
        long end = System.nanoTime() + nanos;
        while (System.nanoTime() < end && !Thread.currentThread().isInterrupted()) {
            LockSupport.parkNanos(end - System.nanoTime());
        }
    }

    @Test
    void aCancelledRunOfABenchKeepsWhatIsDoneAndLeavesNothingElse() throws IOException, InterruptedException {
        String all = "{\"steps\": [\"sorted\", \"spectrum\"], \"again\": true}";
        Held before;
        String told;
        Held first = Held.now();
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder.resolve("desk"), Optional.of(folder))) {
            long lasts = Long.MAX_VALUE;
            for (int k = 0; k < 3; k++) {
                long began = System.nanoTime();
                assertEquals(200, bench.post("/api/run", all).status());
                bench.awaitRest();
                lasts = Math.min(lasts, System.nanoTime() - began);
            }
            String modes = modes(bench);
            before = Held.now();
            Random random = new Random(SEED);
            int stopped = 0;
            for (int k = 0; k < CANCELS / 2; k++) {
                assertEquals(200, bench.post("/api/run", all).status(), "cancel " + k);
                park((long) (LATEST * random.nextDouble() * lasts));
                JsonNode desk = bench.post("/api/cancel", "").json();
                assertTrue(!desk.path("run").path("running").asBoolean(), "cancel " + k);
                stopped += desk.path("run").path("last").asText().startsWith("Stopped") ? 1 : 0;
                if (TestBench.kind(desk, "spectrum").equals("done")) {
                    assertEquals(modes, modes(bench), "cancel " + k);
                }
            }
            assertEquals(200, bench.post("/api/run", all).status());
            assertEquals("done", TestBench.kind(bench.awaitRest(), "spectrum"));
            assertEquals(modes, modes(bench), "the run after takes no harm");
            assertTrue(stopped > 0, "cancels come in time");
            told = stopped + " of " + CANCELS / 2 + " runs of a bench of " + lasts / 1_000_000 + " ms stopped";
            assertNothingLeft(before, told);
        }
        assertEquals(first.spills(), Held.spillFolders(), "the bench leaves none");
    }

    private static String modes(TestBench bench) throws IOException, InterruptedException {
        return bench.get("/api/steps/spectrum/tables/modes").json().path("rows").toString();
    }

    /** What was left to end by itself may take a moment. */
    private void assertNothingLeft(Held before, String told) throws IOException {
        long end = System.nanoTime() + TimeUnit.MINUTES.toNanos(1);
        Held after = Held.now();
        while (!after.isNoMoreThan(before) && System.nanoTime() < end) {
            park(TimeUnit.MILLISECONDS.toNanos(200));
            after = Held.now();
        }
        String words = told + ": " + before.words() + " before, " + after.words() + " after";
        System.out.println(words);
        assertTrue(after.isNoMoreThan(before), words);
        try (Stream<Path> inside = Files.walk(folder)) {
            assertEquals(List.of(), inside.filter(path -> path.toString().contains(".part")).toList());
        }
    }

    private static Map<String, String> tables(Path out) throws IOException {
        Map<String, String> tables = new TreeMap<>();
        try (Stream<Path> inside = Files.walk(out)) {
            for (Path file : inside.filter(path -> path.toString().endsWith(".csv")).toList()) {
                tables.put(out.relativize(file).toString(), Files.readString(file));
            }
        }
        return tables;
    }
}
