package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import org.modestead.host.ChildProcess;
import org.modestead.host.TestWorkflows;
import org.modestead.host.bench.TestBench;
import org.modestead.host.workflow.WorkflowFile;

/** A bench in a process of its own that edits one number, upwards, and saves now and then until it is killed; and what is on disk afterwards. */
final class KilledBench {

    private static final int EDITS_BETWEEN_SAVES = 3;

    private final Path folder;
    private final List<String> java;
    private int sent = 4;
    private int answered = 4;
    private int saved = 4;
    private int kills;

    /**
     * @param folder of the workflow, whose step {@code b} has the depth 4
     * @param java options
     */
    KilledBench(Path folder, List<String> java) {
        this.folder = folder;
        this.java = java;
    }

    /** Starts it, edits, and kills it after so many milliseconds of editing. */
    void killedAfter(int millis) throws IOException, InterruptedException {
        Path own = Files.createDirectories(folder.resolve("bench-" + kills++));
        ChildProcess child = ChildProcess.start(own, java, "bench", folder.toString(), "--desk", folder.resolve("desk").toString(), "--no-open");
        try {
            TestBench bench = TestBench.at(url(own.resolve("child-out.txt"), child));
            assertEquals(200, bench.post("/api/run", "{}").status());
            Thread editing = new Thread(() -> edit(bench));
            editing.start();
            Thread.sleep(millis);
            child.process().destroyForcibly().waitFor();
            editing.join(TimeUnit.MINUTES.toMillis(1));
            assertTrue(!editing.isAlive(), "a request to a killed process ends");
        } finally {
            child.process().destroyForcibly().waitFor(1, TimeUnit.MINUTES);
        }
    }

    /** Ends with the first request that is not answered. */
    private void edit(TestBench bench) {
        try {
            while (true) {
                sent++;
                if (bench.post("/api/edit", "{\"edits\": [{\"do\": \"set\", \"step\": \"b\", \"typed\": {\"delay-depth\": \"" + sent + "\"}}]}").status() != 200) {
                    throw new IllegalStateException("edit " + sent + " was refused");
                }
                answered = sent;
                if (sent % EDITS_BETWEEN_SAVES == 0 && bench.post("/api/save", "{}").status() == 200) {
                    saved = sent;
                }
            }
        } catch (IOException killed) {
            return;
        } catch (InterruptedException stopped) {
            Thread.currentThread().interrupt();
        }
    }

    /** Reads the file, and opens the desk in this process. */
    void check(String kill) throws IOException, InterruptedException {
        WorkflowFile.Reading file = WorkflowFile.read(folder);
        assertEquals(Optional.empty(), file.broken(), kill);
        int inFile = ((Number) file.workflow().orElseThrow().steps().stream().filter(step -> step.id().equals("b")).findFirst().orElseThrow()
                .settings().get("delay-depth")).intValue();
        assertTrue(inFile >= saved && inFile <= sent, kill + ": the file holds " + inFile + ", saved was " + saved);
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder.resolve("desk"), Optional.of(folder))) {
            JsonNode desk = bench.get("/api/desk").json();
            int onDesk = TestBench.step(desk, "b").path("settings").path("delay-depth").asInt();
            assertTrue(onDesk == answered || onDesk == sent, kill + ": the desk holds " + onDesk + ", answered was " + answered + " of " + sent);
            if (TestBench.kind(desk, "source").equals("done")) {
                assertEquals(200, bench.get("/api/steps/source/tables/table").status(), kill);
            }
            saved = inFile;
            answered = onDesk;
        }
    }

    String words() {
        return "of " + (sent - 4) + " edits all that were answered were on the desk, and every answered save in the file";
    }

    private static String url(Path out, ChildProcess child) throws IOException, InterruptedException {
        long end = System.nanoTime() + TestBench.PATIENCE.toNanos();
        while (System.nanoTime() < end && child.process().isAlive()) {
            String said = Files.exists(out) ? Files.readString(out) : "";
            if (said.contains("http://") && said.endsWith("\n")) {
                return said.substring(said.indexOf("http://")).strip().lines().findFirst().orElseThrow();
            }
            Thread.sleep(20);
        }
        throw new AssertionError("it did not start, " + (child.process().isAlive() ? "and still tries" : "exit code " + child.process().exitValue()) + ": "
                + child.said() + (Files.exists(out) ? Files.readString(out) : ""));
    }
}
