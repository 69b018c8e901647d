package org.modestead.host.bench;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.InputStream;
import java.net.Socket;
import java.net.URI;
import java.net.URLEncoder;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;
import org.modestead.host.bench.desk.DeskFolder;
import org.modestead.nodes.contract.NodeCatalog;

/** A bench on a free port, asked over HTTP as the page asks it. */
public final class TestBench implements AutoCloseable {

    /** Long enough for a busy machine. */
    public static final Duration PATIENCE = Duration.ofSeconds(120);

    private static final ObjectMapper MAPPER = new ObjectMapper();

    private final Optional<Bench> bench;
    private final String base;
    private final String cookie;
    private final String setCookie;
    private final HttpClient client = HttpClient.newBuilder().version(HttpClient.Version.HTTP_1_1).build();

    private TestBench(Optional<Bench> bench, String startUrl) throws IOException, InterruptedException {
        this.bench = bench;
        this.base = startUrl.substring(0, startUrl.indexOf("/?"));
        HttpResponse<String> start = client.send(HttpRequest.newBuilder(URI.create(startUrl)).build(), HttpResponse.BodyHandlers.ofString());
        String set = start.headers().firstValue("Set-Cookie").orElseThrow(() -> new IllegalStateException("no cookie: " + start.body()));
        this.setCookie = set;
        this.cookie = set.substring(0, set.indexOf(';'));
    }

    /** Starts one whose desk lies in a folder. */
    public static TestBench start(NodeCatalog catalog, Path desk, Optional<Path> workflow, Path... folders) throws IOException, InterruptedException {
        Bench bench = Bench.start(catalog, new Bench.Options(workflow, 0, new DeskFolder(desk), List.of(folders), 1L << 30, 1 << 20));
        return new TestBench(Optional.of(bench), bench.startUrl());
    }

    /** Asks a bench in another process. */
    public static TestBench at(String startUrl) throws IOException, InterruptedException {
        return new TestBench(Optional.empty(), startUrl);
    }

    /** An answer. */
    public record Reply(int status, String body, HttpResponse<String> whole) {

        /** Returns its JSON. */
        public JsonNode json() {
            try {
                return MAPPER.readTree(body);
            } catch (IOException broken) {
                throw new IllegalStateException(body, broken);
            }
        }

        /** Returns the sentence of a refusal. */
        public String sentence() {
            return json().path("error").path("sentence").asText();
        }
    }

    /** Returns {@code http://127.0.0.1:PORT}. */
    public String base() {
        return base;
    }

    /** Returns the port. */
    public int port() {
        return URI.create(base).getPort();
    }

    /** Returns the session's cookie, {@code name=value}. */
    public String cookie() {
        return cookie;
    }

    /** Returns the header with which the cookie was given. */
    public String setCookie() {
        return setCookie;
    }

    /** Gets as the page does. */
    public Reply get(String path) throws IOException, InterruptedException {
        return send(request(path).GET());
    }

    /** Posts JSON as the page does. */
    public Reply post(String path, String json) throws IOException, InterruptedException {
        return send(request(path).header("X-Modestead", "bench").header("Content-Type", "application/json").POST(HttpRequest.BodyPublishers.ofString(json)));
    }

    /** Posts a file as the page does. */
    public Reply upload(String name, byte[] bytes) throws IOException, InterruptedException {
        return send(request("/api/upload?name=" + URLEncoder.encode(name, StandardCharsets.UTF_8)).header("X-Modestead", "bench")
                .POST(HttpRequest.BodyPublishers.ofByteArray(bytes)));
    }

    /** Begins a request with the session's cookie. */
    public HttpRequest.Builder request(String path) {
        return HttpRequest.newBuilder(URI.create(base + path)).timeout(PATIENCE).header("Cookie", cookie);
    }

    /** Sends any request. */
    public Reply send(HttpRequest.Builder request) throws IOException, InterruptedException {
        HttpResponse<String> answer = client.send(request.build(), HttpResponse.BodyHandlers.ofString());
        return new Reply(answer.statusCode(), answer.body(), answer);
    }

    /** Opens the stream of events. */
    public InputStream events() throws IOException, InterruptedException {
        return client.send(request("/api/events").header("Accept", "text/event-stream").build(), HttpResponse.BodyHandlers.ofInputStream()).body();
    }

    /** Sends lines as they are, for what no client would send; returns the first line of the answer and its body. */
    public String raw(String... lines) throws IOException {
        try (Socket socket = new Socket("127.0.0.1", port())) {
            socket.setSoTimeout((int) PATIENCE.toMillis());
            socket.getOutputStream().write((String.join("\r\n", lines) + "\r\n\r\n").getBytes(StandardCharsets.ISO_8859_1));
            socket.getOutputStream().flush();
            return new String(socket.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        }
    }

    /** Asks for the desk until it is as wanted. */
    public JsonNode await(Predicate<JsonNode> wanted) throws IOException, InterruptedException {
        long end = System.nanoTime() + PATIENCE.toNanos();
        while (System.nanoTime() < end) {
            JsonNode desk = get("/api/desk").json();
            if (wanted.test(desk)) {
                return desk;
            }
            Thread.sleep(20);
        }
        throw new AssertionError("never came; the desk is " + get("/api/desk").body());
    }

    /** Waits until nothing runs. */
    public JsonNode awaitRest() throws IOException, InterruptedException {
        return await(desk -> !desk.path("run").path("running").asBoolean());
    }

    /** Returns a step of a desk. */
    public static JsonNode step(JsonNode desk, String id) {
        for (JsonNode step : desk.path("steps")) {
            if (step.path("id").asText().equals(id)) {
                return step;
            }
        }
        throw new AssertionError("no step " + id + " in " + desk);
    }

    /** Returns how a step stands, in one word. */
    public static String kind(JsonNode desk, String id) {
        return step(desk, id).path("state").path("kind").asText();
    }

    @Override
    public void close() {
        bench.ifPresent(Bench::close);
    }
}
