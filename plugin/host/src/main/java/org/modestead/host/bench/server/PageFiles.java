package org.modestead.host.bench.server;

import com.fasterxml.jackson.databind.JsonNode;
import io.javalin.http.Context;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Pattern;

/** Serves the page's own files and the front-end libraries, from the class path. */
final class PageFiles {

    /** A folder that takes the place of the page in the jar, for work on the page. */
    private static final String OTHER_FOLDER = "modestead.bench.page";

    private static final String PAGE = "/org/modestead/host/bench/page/";
    private static final String LIBRARIES = "/META-INF/resources/webjars/";
    private static final String DOCUMENT = "index.html";
    /** Where the document takes what the page shows first. */
    private static final String FIRST = "<script id=\"first\" type=\"application/json\">";
    /** A file under another name: a browser asks for the icon by itself where a document, such as a report, names none. */
    private static final Map<String, String> NAMES = Map.of("/favicon.ico", "mark.svg");
    private static final Pattern NAME = Pattern.compile("[A-Za-z0-9_-][A-Za-z0-9._-]*(/[A-Za-z0-9_-][A-Za-z0-9._-]*)*");
    private static final Map<String, String> TYPES = Map.of("html", "text/html; charset=utf-8", "js", "text/javascript; charset=utf-8",
            "css", "text/css; charset=utf-8", "svg", "image/svg+xml", "json", "application/json", "txt", "text/plain; charset=utf-8",
            "png", "image/png", "ico", "image/x-icon", "woff2", "font/woff2");

    private final Libraries libraries = new Libraries();

    /**
     * Answers with the document.
     *
     * @param first what the page shows first: it stands in the document, so that the page need not ask for it
     */
    void serve(Context context, JsonNode first) {
        String document = new String(page(DOCUMENT).orElseThrow(), StandardCharsets.UTF_8);
        // no text of the data may end the element that they stand in
        String whole = document.replace(FIRST, FIRST + Answer.text(first).replace("<", "\\u003c"));
        context.contentType(TYPES.get("html")).result(whole.getBytes(StandardCharsets.UTF_8));
    }

    /** Answers with a file. */
    void serve(Context context) {
        String name = NAMES.getOrDefault(context.path(), context.path().substring(1));
        String type = TYPES.get(name.substring(name.lastIndexOf('.') + 1));
        Optional<byte[]> bytes = type == null || !NAME.matcher(name).matches() ? Optional.empty()
                : name.startsWith("lib/") ? libraries.find(name.substring("lib/".length())) : page(name);
        if (bytes.isEmpty()) {
            throw new RequestFault(404, "page", "there is no file " + name, "open the page anew");
        }
        context.contentType(type).result(bytes.get());
    }

    private static Optional<byte[]> page(String name) {
        String folder = System.getProperty(OTHER_FOLDER);
        return folder == null ? resource(PAGE + name) : inFolder(Path.of(folder), name);
    }

    private static Optional<byte[]> inFolder(Path folder, String name) {
        try {
            Path file = folder.resolve(name);
            return Files.isRegularFile(file) && file.toRealPath().startsWith(folder.toRealPath()) ? Optional.of(Files.readAllBytes(file))
                    : Optional.empty();
        } catch (IOException unreadable) {
            return Optional.empty();
        }
    }

    private static Optional<byte[]> resource(String name) {
        try (InputStream in = PageFiles.class.getResourceAsStream(name)) {
            return in == null ? Optional.empty() : Optional.of(in.readAllBytes());
        } catch (IOException unreadable) {
            return Optional.empty();
        }
    }

    /** The few files of the libraries that the page loads, under names without versions. */
    private static final class Libraries {
        private static final Map<String, String> FILES = Map.of(
                "preact.js", "preact/10.24.3/dist/preact.module.js",
                "hooks.js", "preact/10.24.3/hooks/dist/hooks.module.js",
                "preact.umd.js", "preact/10.24.3/dist/preact.umd.js",
                "hooks.umd.js", "preact/10.24.3/hooks/dist/hooks.umd.js",
                "echarts.js", "echarts/5.3.1/dist/echarts.esm.min.js",
                "echarts.esm.min.js", "echarts/5.3.1/dist/echarts.esm.min.js");

        Optional<byte[]> find(String name) {
            Optional<byte[]> bytes = Optional.ofNullable(FILES.get(name)).flatMap(file -> resource(LIBRARIES + file));
            return name.equals("hooks.js") ? bytes.map(Libraries::atHome) : bytes;
        }

        /** The hooks name Preact as packages do; a page without a build step needs its address. */
        private static byte[] atHome(byte[] module) {
            String text = new String(module, StandardCharsets.UTF_8);
            return text.replace("from\"preact\"", "from\"/lib/preact.js\"").getBytes(StandardCharsets.UTF_8);
        }
    }
}
