package org.modestead.host.bench.server;

import io.javalin.http.Context;
import io.javalin.http.HandlerType;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.SecureRandom;
import java.util.Base64;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Lets nobody in but the page that was opened by the start URL on this machine. Each request is held against: the host it names
 * (a foreign name that leads here is refused), the page it comes from, the session's cookie and, where it changes something, a
 * header that no foreign page can send.
 */
final class Gate {

    /** Header that every request that changes something carries, with the value {@value #HEADER_VALUE}. */
    static final String HEADER = "X-Modestead";
    static final String HEADER_VALUE = "bench";

    private static final int SECRET_BYTES = 32;
    private static final Set<String> NEAR = Set.of("same-origin", "none");
    private static final Set<HandlerType> READING = Set.of(HandlerType.GET, HandlerType.HEAD);
    private static final String POLICY = "default-src 'none'; script-src 'self'; style-src 'self'; img-src 'self' data: blob:; "
            + "connect-src 'self'; font-src 'self'; form-action 'none'; frame-ancestors 'none'; base-uri 'none'";

    /** What every answer has, refusals too. */
    static final Map<String, String> HEADERS = Map.of("Content-Security-Policy", POLICY, "X-Content-Type-Options", "nosniff", "Referrer-Policy", "no-referrer",
            "Cross-Origin-Opener-Policy", "same-origin", "Cross-Origin-Resource-Policy", "same-origin", "X-Frame-Options", "DENY", "Cache-Control", "no-store");

    private final String token;
    private final String session;
    private final int port;

    private Gate(String token, String session, int port) {
        this.token = token;
        this.session = session;
        this.port = port;
    }

    /** Makes a gate with fresh secrets of 256 bits. */
    static Gate fresh(int port) {
        SecureRandom random = new SecureRandom();
        return new Gate(secret(random), secret(random), port);
    }

    private static String secret(SecureRandom random) {
        byte[] bytes = new byte[SECRET_BYTES];
        random.nextBytes(bytes);
        return Base64.getUrlEncoder().withoutPadding().encodeToString(bytes);
    }

    /** Returns the URL that opens the page. */
    String startUrl() {
        return "http://127.0.0.1:" + port + "/?token=" + token;
    }

    /** Sets the headers that every answer has, refusals too. */
    static void harden(Context context) {
        HEADERS.forEach(context::header);
    }

    /** Returns whether this is the start URL with the right token; then the answer carries the cookie. */
    boolean opens(Context context) {
        place(context);
        String given = context.queryParam("token");
        if (!context.path().equals("/") || given == null || context.method() != HandlerType.GET) {
            return false;
        }
        if (!same(given, token)) {
            throw new RequestFault(401, "start URL", "its token is not that of this process", "open the URL that the command printed last");
        }
        context.header("Set-Cookie", cookie() + "=" + session + "; Path=/; HttpOnly; SameSite=Strict");
        return true;
    }

    /** @throws RequestFault if the request may not pass */
    void check(Context context) {
        place(context);
        String given = context.cookie(cookie());
        if (given == null || !same(given, session)) {
            throw new RequestFault(401, "session", "this page was not opened by the start URL of this process", "open the URL that the command printed last");
        }
        if (!READING.contains(context.method()) && !HEADER_VALUE.equals(context.header(HEADER))) {
            throw new RequestFault(403, "request", "the header " + HEADER + " is missing", "send it with the value " + HEADER_VALUE);
        }
    }

    /** Refuses requests that name another host or come from another page. */
    private void place(Context context) {
        List<String> names = List.of("127.0.0.1:" + port, "localhost:" + port);
        String host = Optional.ofNullable(context.header("Host")).orElse("");
        if (!names.contains(host)) {
            throw new RequestFault(403, "host", "the request names the host \"" + host + "\"", "open http://127.0.0.1:" + port);
        }
        String origin = context.header("Origin");
        if (origin != null && !origin.equals("http://" + host)) {
            throw new RequestFault(403, "origin", "the request comes from \"" + origin + "\"", "send it from the bench's own page");
        }
        String site = context.header("Sec-Fetch-Site");
        if (site != null && !NEAR.contains(site) && context.queryParam("token") == null) {
            throw new RequestFault(403, "origin", "the request comes from another site", "send it from the bench's own page");
        }
    }

    private String cookie() {
        return "modestead-bench-" + port;
    }

    /** Takes as long whether the texts differ early or late. */
    private static boolean same(String given, String wanted) {
        return MessageDigest.isEqual(given.getBytes(StandardCharsets.UTF_8), wanted.getBytes(StandardCharsets.UTF_8));
    }
}
