package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.ChildProcess;
import org.modestead.host.TestWorkflows;

/** A process that is killed in the middle loses nothing of the desk, and finds its results again. */
class KillTest {

    @TempDir
    private Path folder;

    @Test
    void aKilledProcessLosesNothing() throws IOException, InterruptedException {
        Path work = Files.createDirectories(folder.resolve("work"));
        Files.writeString(work.resolve("x.csv"), "time,x\n" + rows());
        TestWorkflows.write(work, List.of("a:table-source:{\"path\": \"x.csv\"}", "b:snapshot-builder:{\"time-column\": \"time\"}"), List.of("a.table>b.table"));
        JsonNode before;
        ChildProcess first = start("first");
        try {
            TestBench bench = TestBench.at(url("first", first));
            bench.post("/api/edit", "{\"edits\": [{\"do\": \"add\", \"node\": \"operator-fitter\", \"id\": \"fit\", \"from\": \"b.snapshots\"}]}");
            bench.post("/api/edit", "{\"edits\": [{\"do\": \"note\", \"step\": \"fit\", \"note\": \"look here\"}, {\"do\": \"title\", \"step\": \"b\", \"title\": \"My runs\"}]}");
            bench.post("/api/edit", "{\"edits\": [{\"do\": \"set\", \"step\": \"b\", \"typed\": {\"delay-depth\": \"4\"}}]}");
            bench.post("/api/edit", "{\"edits\": [{\"do\": \"set\", \"step\": \"b\", \"typed\": {\"delay-depth\": \"5\"}}]}");
            bench.post("/api/undo", "");
            bench.post("/api/run", "{}");
            before = bench.awaitRest();
            assertEquals("done", TestBench.kind(before, "fit"), before.toString());
            bench.post("/api/run", "{\"steps\": [\"fit\"], \"again\": true}");
        } finally {
            first.process().destroyForcibly().waitFor(1, TimeUnit.MINUTES);
        }
        ChildProcess second = start("second");
        try {
            TestBench bench = TestBench.at(url("second", second));
            JsonNode after = bench.get("/api/desk").json();
            assertTrue(after.path("recovered").asText().matches("Unsaved work of \\d\\d:\\d\\d was taken up again\\."), after.toString());
            for (String same : List.of("steps", "links", "name", "notes", "undo", "redo", "file", "folder", "desk", "saved")) {
                assertEquals(before.path(same), after.path(same), same);
            }
            assertEquals("done", TestBench.kind(after, "fit"));
            assertEquals(200, bench.get("/api/steps/fit/look").status());
            assertEquals(200, bench.get("/api/steps/a/tables/table").status(), "a table that is made anew can be looked at too");
            JsonNode undone = bench.post("/api/redo", "").json();
            assertEquals(5, TestBench.step(undone, "b").path("settings").path("delay-depth").asInt());
            bench.post("/api/undo", "");
            assertEquals(true, ((ObjectNode) bench.post("/api/save", "{}").json()).path("saved").asBoolean());
            assertTrue(Files.readString(work.resolve("workflow.json")).contains("\"note\": \"look here\""));
        } finally {
            second.process().destroyForcibly().waitFor(1, TimeUnit.MINUTES);
        }
    }

    /** The run is told to be over when its results lie on disk, though writing the last of them takes its time. */
    @Test
    void whatWasToldToBeDoneIsThereAfterAKillAtThatMoment() throws IOException, InterruptedException {
        Path work = Files.createDirectories(folder.resolve("work"));
        TestWorkflows.write(work, List.of("a:signal-generator:{\"runs\": 40, \"rate\": 100}", "b:signal-generator:{\"runs\": 1}"), List.of());
        JsonNode before;
        ChildProcess first = start("first");
        try {
            TestBench bench = TestBench.at(url("first", first));
            bench.post("/api/run", "{}");
            before = bench.awaitRest();
        } finally {
            first.process().destroyForcibly().waitFor(1, TimeUnit.MINUTES);
        }
        assertEquals(List.of("done", "done"), List.of(TestBench.kind(before, "a"), TestBench.kind(before, "b")), before.toString());
        ChildProcess second = start("second");
        try {
            TestBench bench = TestBench.at(url("second", second));
            JsonNode after = bench.get("/api/desk").json();
            assertEquals(List.of("done", "done"), List.of(TestBench.kind(after, "a"), TestBench.kind(after, "b")), after.toString());
            int rows = bench.get("/api/steps/a/tables/table?limit=0&whole=1").json().path("total").asInt();
            assertTrue(rows > 200_000, "the whole table, not " + rows);
        } finally {
            second.process().destroyForcibly().waitFor(1, TimeUnit.MINUTES);
        }
    }

    private static String rows() {
        StringBuilder rows = new StringBuilder();
        for (int i = 0; i < 60; i++) {
            rows.append(i).append(',').append(StrictMath.cos(0.3 * i)).append('\n');
        }
        return rows.toString();
    }

    private ChildProcess start(String name) throws IOException {
        Path own = Files.createDirectories(folder.resolve(name));
        return ChildProcess.start(own, List.of("-Xmx512m", "--enable-native-access=ALL-UNNAMED"), "bench", folder.resolve("work").toString(), "--desk",
                folder.resolve("desk").toString(), "--no-open");
    }

    private String url(String name, ChildProcess process) throws IOException, InterruptedException {
        Path out = folder.resolve(name).resolve("child-out.txt");
        long end = System.nanoTime() + TestBench.PATIENCE.toNanos();
        while (System.nanoTime() < end && process.process().isAlive()) {
            String said = Files.exists(out) ? Files.readString(out) : "";
            if (said.contains("http://") && said.endsWith("\n")) {
                return said.substring(said.indexOf("http://")).strip().lines().findFirst().orElseThrow();
            }
            Thread.sleep(20);
        }
        throw new AssertionError("it did not start: " + process.said());
    }
}
