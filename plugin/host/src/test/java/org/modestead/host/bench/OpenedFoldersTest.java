package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.net.URLEncoder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/** No file outside the opened folders is read, written, listed or told of, whatever a workflow or a request names. */
class OpenedFoldersTest {

    private static final String TABLE = "secret_column,x\n1,2\n3,4\n";

    @TempDir
    private Path folder;
    private Path work;
    private Path outside;
    private TestBench bench;

    @BeforeEach
    void start() throws IOException, InterruptedException {
        work = Files.createDirectories(folder.resolve("work"));
        outside = Files.writeString(Files.createDirectories(folder.resolve("outside")).resolve("secret.csv"), TABLE);
        Files.writeString(work.resolve("inside.csv"), TABLE);
        Files.createSymbolicLink(work.resolve("link.csv"), outside);
        Files.createSymbolicLink(work.resolve("door"), outside.getParent());
        TestWorkflows.write(work, List.of("a:table-source:{\"path\": \"inside.csv\"}"), List.of());
        bench = TestBench.start(TestWorkflows.allNodes(), folder.resolve("desk"), Optional.of(work));
    }

    @AfterEach
    void end() {
        bench.close();
    }

    @Test
    void aFileThatBecameALinkAfterTheRunIsNotReadWhenTheResultIsLookedAt() throws IOException, InterruptedException {
        bench.post("/api/run", "{}");
        bench.awaitRest();
        assertEquals(200, bench.get("/api/steps/a/tables/table").status());
        Files.delete(work.resolve("inside.csv"));
        Files.createSymbolicLink(work.resolve("inside.csv"), outside);
        for (String path : List.of("/api/steps/a/look", "/api/steps/a/tables/table", "/api/steps/a/tables/table.csv")) {
            TestBench.Reply refused = bench.get(path);
            assertEquals(409, refused.status(), path);
            assertTrue(refused.sentence().startsWith("step a, setting path: inside.csv: it lies outside the opened folders; "), refused.body());
        }
    }

    @Test
    void aStepThatReadsOutsideIsNotSetUpAndNothingIsToldOfTheFile() throws IOException, InterruptedException {
        for (String name : List.of(outside.toString(), "../outside/secret.csv", "link.csv", "door/secret.csv", "../outside/nothing.csv", "door/../door/secret.csv")) {
            JsonNode desk = bench.post("/api/edit", "{\"edits\": [{\"do\": \"set\", \"step\": \"a\", \"typed\": {\"path\": \"" + name + "\"}}]}").json();
            assertEquals("unset", TestBench.kind(desk, "a"), name);
            String sentence = TestBench.step(desk, "a").path("problems").path(0).path("sentence").asText();
            assertTrue(sentence.startsWith("step a, setting path: " + name + ": it lies outside the opened folders; put it into one of "), sentence);
            assertEquals(1, TestBench.step(desk, "a").path("problems").size(), desk.toString());
            assertFalse(desk.toString().contains("secret_column"));
            assertEquals(409, bench.post("/api/run", "{\"steps\": [\"a\"]}").status());
            assertFalse(bench.get("/api/steps/a/dialog").body().contains("secret_column"));
        }
        JsonNode desk = bench.post("/api/edit", "{\"edits\": [{\"do\": \"set\", \"step\": \"a\", \"typed\": {\"path\": \"inside.csv\"}}]}").json();
        assertEquals("ready", TestBench.kind(desk, "a"));
    }

    @Test
    void aStepThatWritesOutsideIsNotSetUp() throws IOException, InterruptedException {
        JsonNode desk = bench.post("/api/edit", "{\"edits\": [{\"do\": \"add\", \"node\": \"table-sink\", \"id\": \"out\", \"from\": \"a.table\", "
                + "\"settings\": {\"path\": \"../outside/new.csv\"}}]}").json();
        assertEquals("unset", TestBench.kind(desk, "out"));
        bench.post("/api/run", "{}");
        bench.awaitRest();
        assertFalse(Files.exists(folder.resolve("outside/new.csv")));
    }

    @Test
    void savingAndOpeningOutsideAreRefused() throws IOException, InterruptedException {
        assertEquals(403, bench.post("/api/save", "{\"path\": \"../outside/workflow.json\"}").status());
        assertEquals(403, bench.post("/api/save", "{\"path\": \"door/workflow.json\"}").status());
        assertEquals(409, bench.post("/api/save", "{\"path\": \"notes.txt\"}").status());
        Files.copy(work.resolve("workflow.json"), folder.resolve("outside/workflow.json"));
        TestBench.Reply reply = bench.post("/api/desk", "{\"open\": \"" + folder.resolve("outside/workflow.json") + "\"}");
        assertEquals(403, reply.status());
        assertTrue(reply.sentence().contains("it lies outside the opened folders"), reply.sentence());
        assertEquals(200, bench.post("/api/save", "{\"path\": \"other.json\"}").status());
        assertTrue(Files.exists(work.resolve("other.json")));
    }

    @Test
    void stepsMeanTheSameFilesWhenTheWorkflowIsSavedInAnotherFolder() throws IOException, InterruptedException {
        bench.post("/api/edit", "{\"edits\": [{\"do\": \"add\", \"node\": \"table-source\", \"id\": \"full\", \"settings\": {\"path\": \""
                + work.resolve("inside.csv") + "\"}}]}");
        assertEquals("", bench.post("/api/save", "{\"path\": \"other.json\"}").json().path("told").asText("?"), "the folder is the same");
        Path there = Files.createDirectories(work.toRealPath().resolve("later/deep")).resolve("workflow.json");
        JsonNode desk = bench.post("/api/save", "{\"path\": \"" + there + "\"}").json();
        assertEquals("The folder is another one: file names in 1 step were written anew, so that they mean the same files as before.", desk.path("told").asText());
        assertEquals("../../inside.csv", TestBench.step(desk, "a").path("settings").path("path").asText(), desk.toString());
        assertEquals(work.resolve("inside.csv").toString(), TestBench.step(desk, "full").path("settings").path("path").asText());
        assertTrue(Files.readString(there).contains("\"../../inside.csv\""));
        assertEquals(List.of("ready", "ready", true), List.of(TestBench.kind(desk, "a"), TestBench.kind(desk, "full"), desk.path("saved").asBoolean()),
                desk.toString());
        String id = desk.path("desk").asText();
        bench.post("/api/desk/close", "{}");
        JsonNode resumed = bench.post("/api/desk", "{\"resume\": \"" + id + "\"}").json();
        assertEquals("../../inside.csv", TestBench.step(resumed, "a").path("settings").path("path").asText(),
                "the journal tells it as the file does");
        // what the document was before is where the document is, and means the same file too
        assertEquals("ready", TestBench.kind(bench.post("/api/undo", "{}").json(), "a"));
        bench.post("/api/run", "{}");
        bench.awaitRest();
        assertEquals(200, bench.get("/api/steps/a/tables/table").status());
        JsonNode back = bench.post("/api/save", "{\"path\": \"" + work.resolve("back.json") + "\"}").json();
        assertEquals("inside.csv", TestBench.step(back, "a").path("settings").path("path").asText(), back.toString());
    }

    @Test
    void whatWasFoundIsUpToDateAfterTheWorkflowIsSavedInAnotherFolder() throws IOException, InterruptedException {
        bench.post("/api/edit", "{\"edits\": [{\"do\": \"add\", \"node\": \"table-sink\", \"id\": \"out\", \"settings\": {\"path\": \"out.csv\"}},"
                + "{\"do\": \"link\", \"from\": \"a.table\", \"to\": \"out.table\"}]}");
        bench.post("/api/run", "{}");
        JsonNode ran = bench.awaitRest();
        assertEquals(List.of("done", "done"), List.of(TestBench.kind(ran, "a"), TestBench.kind(ran, "out")), ran.toString());
        Path there = Files.createDirectories(work.toRealPath().resolve("later")).resolve("workflow.json");
        JsonNode desk = bench.post("/api/save", "{\"path\": \"" + there + "\"}").json();
        assertEquals("../out.csv", TestBench.step(desk, "out").path("settings").path("path").asText(), desk.toString());
        assertEquals(List.of("done", "done"), List.of(TestBench.kind(desk, "a"), TestBench.kind(desk, "out")), "the files are the same: " + desk);
        JsonNode other = bench.post("/api/edit", "{\"edits\": [{\"do\": \"set\", \"step\": \"out\", \"typed\": {\"path\": \"out.csv\"}}]}").json();
        assertEquals("stale", TestBench.kind(other, "out"), "the same name from another folder is another file: " + other);
    }

    @Test
    void onlyOpenedFoldersAreListedAndLinksOutAreNotShown() throws IOException, InterruptedException {
        JsonNode listed = bench.get("/api/files?folder=" + URLEncoder.encode(work.toString(), StandardCharsets.UTF_8)).json();
        assertEquals(List.of("inside.csv", "workflow.json"), listed.path("entries").findValuesAsText("name"));
        assertEquals("inside.csv", listed.path("entries").path(0).path("relative").asText());
        assertTrue(listed.path("parent").isNull());
        for (String name : List.of("/", "/etc", outside.getParent().toString(), work + "/..", work + "/door", "~")) {
            int status = bench.get("/api/files?folder=" + URLEncoder.encode(name, StandardCharsets.UTF_8)).status();
            assertTrue(status == 403 || status == 404, name + " gave " + status);
        }
    }

    @Test
    void pageFilesAreServedAndNothingAround() throws IOException, InterruptedException {
        assertEquals(200, bench.get("/").status());
        assertEquals(200, bench.get("/lib/preact.umd.js").status());
        for (String path : List.of("/../Main.class", "/%2e%2e/%2e%2e/Main.class", "/..%2fMain.class", "/js/../../server/Gate.class", "//etc/passwd", "/lib/../page/index.html",
                "/lib/unknown.js", "/js/", "/.hidden.js", "/js//app.js", "/js/app.class", "/js\\app.js", "/%00.js")) {
            String answer = bench.raw("GET " + path + " HTTP/1.1", "Host: 127.0.0.1:" + bench.port(), "Cookie: " + bench.cookie(), "Connection: close");
            assertTrue(answer.startsWith("HTTP/1.1 404") || answer.startsWith("HTTP/1.1 400"), path + ": " + answer.lines().findFirst());
        }
    }

    @Test
    void everyModuleOfTheLibrariesStandsAlone() throws IOException, InterruptedException {
        for (String module : List.of("/lib/preact.js", "/lib/hooks.js", "/lib/echarts.js", "/lib/echarts.esm.min.js", "/lib/hooks.umd.js")) {
            TestBench.Reply reply = bench.get(module);
            assertEquals(200, reply.status(), module);
            assertTrue(reply.whole().headers().firstValue("Content-Type").orElse("").startsWith("text/javascript"), module);
            assertFalse(reply.body().matches("(?s).*(from|import)\\s*[\"'](?![./])[^\"']+[\"'].*"), module + " names a package");
        }
    }

    @Test
    void anUploadKeepsToItsLimitAndItsFolder() throws IOException, InterruptedException {
        TestBench.Reply reply = bench.upload("../../evil/../a b.csv", TABLE.getBytes(StandardCharsets.UTF_8));
        assertEquals(200, reply.status(), reply.body());
        assertEquals("a b.csv", reply.json().path("name").asText());
        byte[] large = new byte[(1 << 20) + 1];
        TestBench.Reply refused = bench.upload("large.csv", large);
        assertEquals(413, refused.status());
        assertEquals("file: it is larger than 1 MB; put it into a folder that is open to the bench, or start it with a larger --upload.", refused.sentence());
        try (var left = Files.walk(folder.resolve("desk/uploads"))) {
            assertEquals(0, left.filter(path -> path.getFileName().toString().equals("large.csv")).count());
        }
    }

    @Test
    void anUploadOfUnknownLengthIsCutOffAtTheLimit() throws IOException {
        String chunk = "8000\r\n" + "x".repeat(0x8000) + "\r\n";
        String answer = bench.raw("POST /api/upload?name=endless.csv HTTP/1.1", "Host: 127.0.0.1:" + bench.port(), "Cookie: " + bench.cookie(),
                "X-Modestead: bench", "Transfer-Encoding: chunked", "Connection: close", "", chunk.repeat(40) + "0\r\n");
        assertTrue(answer.startsWith("HTTP/1.1 413"), answer.lines().findFirst().orElse(""));
    }

    @Test
    void aBodyBeyondTheLimitIsRefused() throws IOException, InterruptedException {
        TestBench.Reply reply = bench.post("/api/edit", "{\"edits\": [], \"label\": \"" + "x".repeat(9 << 20) + "\"}");
        assertEquals(413, reply.status());
    }

    @Test
    void namesThatAreNoFilesAreRefused() throws IOException, InterruptedException {
        assertEquals(409, bench.post("/api/recording", "{\"upload\": \"../../work\"}").status());
        assertEquals(409, bench.post("/api/desk", "{\"resume\": \"../../work\"}").status());
        assertEquals(409, bench.post("/api/desk/forget", "{\"desk\": \"..\"}").status());
        assertTrue(Files.exists(work.resolve("inside.csv")));
        assertEquals(409, bench.post("/api/desk", "{\"example\": \"../server\"}").status());
    }
}
