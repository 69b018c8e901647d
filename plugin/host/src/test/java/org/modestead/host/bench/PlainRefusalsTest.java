package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.host.TestWorkflows;

/** What the web server refuses before a route sees it gets a sentence, and an answer that says that its connection ends. */
class PlainRefusalsTest {

    private static TestBench bench;

    @BeforeAll
    static void start(@TempDir Path folder) throws IOException, InterruptedException {
        bench = TestBench.start(TestWorkflows.allNodes(), folder, Optional.empty());
    }

    @AfterAll
    static void end() {
        bench.close();
    }

    @ParameterizedTest
    @ValueSource(strings = {"/a%00b", "/api/steps/%00/look", "/a%2Fb", "/a/%2e%2e/b", "/a\\b", "/a%zz", "/a%ff", "/%u0041", "/..", "/a//b", "/a b"})
    void aPathThatCannotBeReadInOneWayIsRefusedInASentence(String path) throws IOException {
        String answer = refused(path);
        assertTrue(answer.startsWith("HTTP/1.1 400 "), answer);
        assertTrue(answer.contains("{\"error\":{\"sentence\":\"request: "), answer);
        assertTrue(answer.contains("; ask for an address of the page.\""), answer);
        assertTrue(answer.contains("Content-Type: application/json"), answer);
        assertTrue(answer.contains("X-Content-Type-Options: nosniff"), answer);
    }

    @ParameterizedTest
    @ValueSource(strings = {"/a%00b", "/a%zz", "/a%2Fb"})
    void theAnswerSaysThatTheConnectionEnds(String path) throws IOException {
        String answer = refused(path);
        assertTrue(answer.contains("Connection: close\r\n"), answer);
    }

    @Test
    void theNextRequestOfAClientIsAnswered() throws IOException, InterruptedException {
        for (int again = 0; again < 50; again++) {
            assertEquals(400, bench.get("/api/steps/%00/look").status());
            assertEquals(200, bench.get("/api/nodes").status());
        }
    }

    /** No line asks for the end of the connection: it is the server that ends it. */
    private static String refused(String path) throws IOException {
        return bench.raw("GET " + path + " HTTP/1.1", "Host: 127.0.0.1:" + bench.port(), "Cookie: " + bench.cookie());
    }
}
