package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.sun.management.ThreadMXBean;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;
import org.modestead.host.bench.TestBench;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.WorkflowFile;

/** JSON nested 100 000 deep, and fields that are there twice, in workflow files and in what the bench is sent: refused with a sentence. */
class HostileJsonTest {

    private static final int DEEP = 100_000;
    /** The text of the nest is copied once or twice; the nest itself is given up after a thousand levels. */
    private static final long MOST_BYTES = 20_000_000;
    private static final List<String> NESTS = List.of("[".repeat(DEEP) + "]".repeat(DEEP), "{\"a\":".repeat(DEEP) + "0" + "}".repeat(DEEP), "[".repeat(DEEP));

    @TempDir
    Path folder;

    @Test
    void workflowsNestedTooDeep() {
        for (String nest : NESTS) {
            for (String text : List.of(nest, "{\"format\": \"modestead-workflow/1\", \"steps\": " + nest + "}", settings(nest))) {
                long before = allocated();
                String told = only(text);
                assertTrue(told.equals("w.json: Document nesting depth (1001) exceeds the maximum allowed (1000); correct the JSON there."), told);
                assertTrue(allocated() - before < MOST_BYTES, (allocated() - before) + " bytes");
            }
        }
    }

    @Test
    void fieldsThatAreThereTwiceAtAnyDepth() {
        String told = only(settings("{\"path\": \"a.csv\", \"path\": \"b.csv\"}"));
        assertTrue(told.startsWith("w.json, line 1, column ") && told.contains("path"), told);
    }

    @Test
    void requestsNestedTooDeepOrWithAFieldTwice() throws IOException, InterruptedException {
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder.resolve("desks"), Optional.empty(), folder)) {
            assertEquals(200, bench.post("/api/desk", "{\"empty\": true, \"name\": \"Night shift\"}").status());
            String before = bench.get("/api/desk").json().path("steps").toString();
            for (String nest : NESTS) {
                for (String body : List.of(nest, "{\"edits\":" + nest + "}", edit("\"settings\":{\"path\":" + nest + "}"))) {
                    assertRefused(bench.post("/api/edit", body));
                }
            }
            assertRefused(bench.post("/api/edit", edit("\"id\":\"a\",\"id\":\"b\"")));
            assertRefused(bench.post("/api/edit", "{\"edits\":[],\"edits\":[{\"do\":\"name\",\"name\":\"n\"}]}"));
            assertEquals(before, bench.get("/api/desk").json().path("steps").toString());
            assertEquals(200, bench.post("/api/edit", edit("\"id\":\"a\"")).status());
        }
    }

    private static void assertRefused(TestBench.Reply reply) {
        assertEquals(400, reply.status(), reply.body());
        String told = reply.sentence();
        assertTrue(told.startsWith("request: its body is no JSON (") && told.endsWith("; send JSON.") && told.lines().count() == 1, told);
    }

    private static String settings(String value) {
        return "{\"format\": \"modestead-workflow/1\", \"steps\": [{\"id\": \"a\", \"node\": \"table-source\", \"settings\": " + value + "}]}";
    }

    private static String edit(String rest) {
        return "{\"edits\":[{\"do\":\"add\",\"node\":\"table-source\"," + rest + "}],\"label\":\"l\"}";
    }

    private String only(String text) {
        List<String> told = WorkflowFile.parse(folder.resolve("w.json"), text.getBytes(StandardCharsets.UTF_8)).problems().stream().map(Problem::sentence).toList();
        assertEquals(1, told.size(), told::toString);
        assertEquals(1, told.get(0).lines().count(), told::toString);
        return told.get(0);
    }

    private static long allocated() {
        return ((ThreadMXBean) ManagementFactory.getThreadMXBean()).getThreadAllocatedBytes(Thread.currentThread().getId());
    }
}
