package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.net.ConnectException;
import java.net.InetAddress;
import java.net.InetSocketAddress;
import java.net.NetworkInterface;
import java.net.Socket;
import java.net.URI;
import java.net.http.HttpRequest;
import java.nio.file.Path;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/** Nobody gets in but the page that was opened by the start URL on this machine. */
class GateTest {

    private static TestBench bench;

    @BeforeAll
    static void start(@TempDir Path folder) throws IOException, InterruptedException {
        bench = TestBench.start(TestWorkflows.allNodes(), folder, Optional.empty());
    }

    @AfterAll
    static void end() {
        bench.close();
    }

    @Test
    void withoutTheCookieNothingIsAnswered() throws IOException, InterruptedException {
        for (String path : List.of("/", "/js/app.js", "/lib/preact.js", "/api/desk", "/api/nodes", "/api/events", "/api/files", "/api/nothing")) {
            TestBench.Reply reply = bench.send(HttpRequest.newBuilder(URI.create(bench.base() + path)));
            assertEquals(401, reply.status(), path);
            assertEquals("session: this page was not opened by the start URL of this process; open the URL that the command printed last.", reply.sentence());
        }
    }

    @Test
    void aWrongTokenOrCookieIsRefused() throws IOException, InterruptedException {
        assertEquals(401, bench.send(HttpRequest.newBuilder(URI.create(bench.base() + "/?token=guess"))).status());
        String name = bench.cookie().substring(0, bench.cookie().indexOf('='));
        assertEquals(401, bench.send(HttpRequest.newBuilder(URI.create(bench.base() + "/api/desk")).header("Cookie", name + "=guess")).status());
        assertEquals(200, bench.get("/api/desk").status());
    }

    @Test
    void secretsAreLongAndDifferEachTime(@TempDir Path folder) throws IOException, InterruptedException {
        try (TestBench other = TestBench.start(TestWorkflows.allNodes(), folder, Optional.empty())) {
            String own = bench.cookie().substring(bench.cookie().indexOf('=') + 1);
            assertEquals(43, own.length(), "256 bits in base 64");
            assertNotEquals(own, other.cookie().substring(other.cookie().indexOf('=') + 1));
        }
    }

    @Test
    void theCookieIsForThisSiteAndNoScript() throws IOException, InterruptedException {
        assertEquals(bench.cookie() + "; Path=/; HttpOnly; SameSite=Strict", bench.setCookie());
        assertTrue(bench.cookie().startsWith("modestead-bench-" + bench.port() + "="), "benches on two ports have a cookie each");
        String answer = bench.raw("GET /?token=wrong HTTP/1.1", "Host: 127.0.0.1:" + bench.port(), "Connection: close");
        assertFalse(answer.contains("Set-Cookie"), answer);
    }

    @Test
    void aForeignNameThatLeadsHereIsRefused() throws IOException {
        for (String host : List.of("evil.example", "evil.example:" + bench.port(), "127.0.0.1", "127.0.0.1:1", "127.0.0.1.evil.example:" + bench.port())) {
            String answer = bench.raw("GET /api/desk HTTP/1.1", "Host: " + host, "Cookie: " + bench.cookie(), "Connection: close");
            assertTrue(answer.startsWith("HTTP/1.1 403"), host + ": " + answer);
            assertTrue(answer.contains("host: the request names the host"), answer);
        }
        assertTrue(bench.raw("GET /api/desk HTTP/1.1", "Host: localhost:" + bench.port(), "Cookie: " + bench.cookie(), "Connection: close").startsWith("HTTP/1.1 200"));
    }

    @Test
    void aRequestOfAnotherPageIsRefused() throws IOException, InterruptedException {
        for (String origin : List.of("http://evil.example", "null", "http://127.0.0.1:1", "https://127.0.0.1:" + bench.port(), "http://localhost:" + bench.port())) {
            TestBench.Reply reply = bench.send(bench.request("/api/undo").header("Origin", origin).header("X-Modestead", "bench")
                    .POST(HttpRequest.BodyPublishers.noBody()));
            assertEquals(403, reply.status(), origin);
            assertEquals("origin: the request comes from \"" + origin + "\"; send it from the bench's own page.", reply.sentence());
        }
        assertEquals(403, bench.send(bench.request("/api/desk").header("Sec-Fetch-Site", "cross-site")).status());
        assertEquals(403, bench.send(bench.request("/api/desk").header("Sec-Fetch-Site", "same-site")).status());
        assertEquals(200, bench.send(bench.request("/api/desk").header("Sec-Fetch-Site", "same-origin").header("Origin", bench.base())).status());
    }

    @Test
    void whatChangesSomethingNeedsTheHeaderThatNoForeignPageCanSend() throws IOException, InterruptedException {
        for (String path : List.of("/api/edit", "/api/undo", "/api/run", "/api/cancel", "/api/save", "/api/desk", "/api/upload?name=a.csv")) {
            TestBench.Reply reply = bench.send(bench.request(path).POST(HttpRequest.BodyPublishers.ofString("{}")));
            assertEquals(403, reply.status(), path);
            assertEquals("request: the header X-Modestead is missing; send it with the value bench.", reply.sentence());
        }
    }

    @Test
    void everyAnswerForbidsWhatThePageDoesNotNeed() throws IOException, InterruptedException {
        for (TestBench.Reply reply : List.of(bench.get("/"), bench.get("/api/desk"), bench.get("/api/nothing"),
                bench.send(HttpRequest.newBuilder(URI.create(bench.base() + "/"))))) {
            var headers = reply.whole().headers();
            String policy = headers.firstValue("Content-Security-Policy").orElse("");
            assertTrue(policy.startsWith("default-src 'none'; script-src 'self'; style-src 'self';"), policy);
            assertFalse(policy.contains("unsafe"), policy);
            assertEquals("nosniff", headers.firstValue("X-Content-Type-Options").orElse(""));
            assertEquals("no-referrer", headers.firstValue("Referrer-Policy").orElse(""));
            assertEquals("no-store", headers.firstValue("Cache-Control").orElse(""));
            assertTrue(headers.firstValue("Access-Control-Allow-Origin").isEmpty());
        }
    }

    @Test
    void theIconThatABrowserAsksForByItselfIsTheMarkOfThePage() throws IOException, InterruptedException {
        TestBench.Reply icon = bench.get("/favicon.ico");
        assertEquals(200, icon.status());
        assertEquals("image/svg+xml", icon.whole().headers().firstValue("Content-Type").orElse(""));
        assertEquals(bench.get("/mark.svg").body(), icon.body());
    }

    @Test
    void itListensOnTheLoopbackAddressOnly() throws IOException {
        for (NetworkInterface each : Collections.list(NetworkInterface.getNetworkInterfaces())) {
            for (InetAddress address : Collections.list(each.getInetAddresses())) {
                if (!address.isLoopbackAddress()) {
                    assertThrows(IOException.class, () -> {
                        try (Socket socket = new Socket()) {
                            socket.connect(new InetSocketAddress(address, bench.port()), 2000);
                        }
                    }, address.toString());
                }
            }
        }
        assertThrows(ConnectException.class, () -> new Socket("127.0.0.2", bench.port()).close());
    }

    @Test
    void aDefectIsToldInASentenceWithoutItsTrace() throws IOException, InterruptedException {
        TestBench.Reply reply = bench.post("/api/edit", "{\"edits\": 3}");
        assertEquals(422, reply.status());
        assertFalse(reply.body().contains("at org."), reply.body());
        assertEquals(400, bench.post("/api/edit", "{broken").status());
        assertEquals(404, bench.get("/api/nothing").status());
    }
}
