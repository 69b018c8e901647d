package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.net.Socket;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/** A request whose body nobody needs does not take the answer from the one behind it on the same connection. */
class UnreadBodyTest {

    private static final String BODY = "{\"edits\": []}";
    /** Time for a server that does not wait for the body to answer and close; one that waits passes whatever it is. */
    private static final long HEAD_START_MILLIS = 300;

    @TempDir
    Path folder;

    @Test
    void theNextRequestOnTheConnectionIsAnswered() throws IOException, InterruptedException {
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder, Optional.empty())) {
            for (String first : List.of("/api/cancel", "/api/undo", "/api/desk/close", "/api/nothing")) {
                assertEquals(2, answers(bench, "POST " + first, "X-Modestead: bench"), first);
            }
            assertEquals(2, answers(bench, "POST /api/edit", "X-Other: none"), "a refused one");
        }
    }

    @Test
    void aBodyThatBreaksOffIsRefusedInASentence() throws IOException, InterruptedException {
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder, Optional.empty());
                Socket socket = new Socket("127.0.0.1", bench.port())) {
            socket.setSoTimeout((int) TestBench.PATIENCE.toMillis());
            send(socket, "POST /api/edit HTTP/1.1\r\nHost: 127.0.0.1:" + bench.port() + "\r\nCookie: " + bench.cookie()
                    + "\r\nX-Modestead: bench\r\nContent-Length: 1000\r\n\r\n" + BODY);
            socket.shutdownOutput();
            String answer = read(socket.getInputStream());
            assertTrue(answer.startsWith("HTTP/1.1 400 ") && answer.contains("request: its body broke off"), answer);
        }
    }

    /** Sends the head of a request, its body a while later, and another request behind it; counts the answers. */
    private static long answers(TestBench bench, String request, String header) throws IOException, InterruptedException {
        String who = "Host: 127.0.0.1:" + bench.port() + "\r\nCookie: " + bench.cookie() + "\r\n";
        try (Socket socket = new Socket("127.0.0.1", bench.port())) {
            socket.setSoTimeout((int) TestBench.PATIENCE.toMillis());
            send(socket, request + " HTTP/1.1\r\n" + who + header + "\r\nContent-Length: " + BODY.length() + "\r\n\r\n");
            Thread.sleep(HEAD_START_MILLIS);
            send(socket, BODY + "GET /api/nothing HTTP/1.1\r\n" + who + "Connection: close\r\n\r\n");
            return Pattern.compile("HTTP/1\\.1 \\d{3} ").matcher(read(socket.getInputStream())).results().count();
        }
    }

    private static void send(Socket socket, String text) throws IOException {
        socket.getOutputStream().write(text.getBytes(StandardCharsets.ISO_8859_1));
        socket.getOutputStream().flush();
    }

    private static String read(InputStream in) throws IOException {
        return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    }
}
