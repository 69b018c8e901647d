package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/** A page that listens knows the desk, whenever it came and however often it was away; edits of many pages come one after the other. */
class EventsTest {

    @TempDir
    private Path folder;

    private record Listener(BufferedReader lines) implements AutoCloseable {

        static Listener on(TestBench bench) throws IOException, InterruptedException {
            return new Listener(new BufferedReader(new InputStreamReader(bench.events(), StandardCharsets.UTF_8)));
        }

        /** Reads on until an event of a kind and returns its data. */
        JsonNode next(String kind) throws IOException {
            boolean wanted = false;
            for (String line = lines.readLine(); line != null; line = lines.readLine()) {
                wanted = line.startsWith("event: ") ? line.equals("event: " + kind) : wanted;
                if (wanted && line.startsWith("data: ")) {
                    return new ObjectMapper().readTree(line.substring("data: ".length()));
                }
            }
            throw new IOException("the stream ended");
        }

        @Override
        public void close() throws IOException {
            lines.close();
        }
    }

    @Test
    void everyListenerGetsTheWholeDeskFirstAndAfterEveryChange() throws IOException, InterruptedException {
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder, Optional.empty())) {
            bench.post("/api/desk", "{\"empty\": true, \"name\": \"mine\"}");
            try (Listener first = Listener.on(bench)) {
                JsonNode desk = first.next("desk");
                assertEquals("mine", desk.path("name").asText());
                long known = desk.path("revision").asLong();
                bench.post("/api/edit", "{\"edits\": [{\"do\": \"add\", \"node\": \"signal-generator\"}]}");
                desk = first.next("desk");
                assertTrue(desk.path("revision").asLong() > known);
                assertEquals(1, desk.path("steps").size());
            }
            bench.post("/api/edit", "{\"edits\": [{\"do\": \"add\", \"node\": \"snapshot-builder\", \"from\": \"signal-generator.table\"}]}");
            try (Listener again = Listener.on(bench)) {
                assertEquals(2, again.next("desk").path("steps").size(), "nothing was missed while it was away");
            }
        }
    }

    @Test
    void editsOfManyPagesAreDoneOneAfterTheOther() throws Exception {
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder, Optional.empty())) {
            bench.post("/api/desk", "{\"empty\": true}");
            ExecutorService pages = Executors.newFixedThreadPool(4);
            List<Future<TestBench.Reply>> replies = new ArrayList<>();
            for (int i = 0; i < 24; i++) {
                replies.add(pages.submit(() -> bench.post("/api/edit", "{\"edits\": [{\"do\": \"add\", \"node\": \"signal-generator\"}]}")));
            }
            List<String> made = new ArrayList<>();
            for (Future<TestBench.Reply> reply : replies) {
                made.add(reply.get().json().path("made").path(0).asText());
            }
            pages.shutdown();
            assertEquals(24, made.stream().distinct().count(), made.toString());
            for (int i = 0; i < 24; i++) {
                assertEquals(200, bench.post("/api/undo", "").status());
            }
            assertEquals(0, bench.get("/api/desk").json().path("steps").size());
            assertEquals(422, bench.post("/api/undo", "").status());
        }
    }

    @Test
    void editsAreDoneAllOrNone() throws IOException, InterruptedException {
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder, Optional.empty())) {
            bench.post("/api/desk", "{\"empty\": true}");
            TestBench.Reply refused = bench.post("/api/edit", "{\"edits\": [{\"do\": \"add\", \"node\": \"signal-generator\"}, {\"do\": \"note\", \"step\": \"nobody\", "
                    + "\"note\": \"\"}]}");
            assertEquals(422, refused.status());
            assertTrue(refused.sentence().startsWith("step nobody: there is no such step"), refused.sentence());
            assertEquals(0, bench.get("/api/desk").json().path("steps").size());
        }
    }
}
