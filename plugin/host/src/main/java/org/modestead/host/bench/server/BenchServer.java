package org.modestead.host.bench.server;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import io.javalin.Javalin;
import io.javalin.http.Context;
import io.javalin.http.HttpResponseException;
import java.io.IOException;
import java.net.InetAddress;
import java.net.ServerSocket;
import java.nio.charset.StandardCharsets;
import org.modestead.engine.Fault;
import org.modestead.host.bench.desk.EditFault;
import org.modestead.host.bench.desk.EditReader;
import org.modestead.host.bench.work.Workbench;
import org.modestead.host.run.DefectLog;
import org.modestead.nodes.contract.NodeCatalog;

/** The bench's web server. */
public final class BenchServer implements AutoCloseable {

    private static final ObjectMapper MAPPER = new ObjectMapper();

    private final Workbench workbench;
    private final byte[] nodes;
    private final DeskJson deskJson;
    private final PageFiles files = new PageFiles();
    private final Gate gate;
    private final Javalin server;

    private BenchServer(Workbench workbench, NodeCatalog catalog, int port) {
        this.workbench = workbench;
        this.nodes = bytes(NodesJson.of(catalog));
        this.deskJson = new DeskJson(catalog);
        this.gate = Gate.fresh(port);
        this.server = Javalin.create(config -> {
            config.showJavalinBanner = false;
            config.startupWatcherEnabled = false;
            config.http.maxRequestSize = 8L << 20;
            config.http.gzipOnlyCompression();
        });
        routes();
        server.start("127.0.0.1", port);
    }

    /** Starts the server; port 0 takes a free one. */
    public static BenchServer start(Workbench workbench, NodeCatalog catalog, int port) {
        try {
            return new BenchServer(workbench, catalog, port == 0 ? freePort() : port);
        } catch (IOException none) {
            throw new IllegalStateException("no port is free", none);
        }
    }

    private static int freePort() throws IOException {
        try (ServerSocket socket = new ServerSocket(0, 1, InetAddress.getLoopbackAddress())) {
            return socket.getLocalPort();
        }
    }

    /** Returns the URL that opens the page. */
    public String startUrl() {
        return gate.startUrl();
    }

    private void routes() {
        server.before(Gate::harden);
        server.before(context -> {
            if (gate.opens(context)) {
                context.html("<!doctype html><html lang=\"en\"><head><title>Modestead</title><meta http-equiv=\"refresh\" content=\"0;url=/\">"
                        + "</head><body><p><a href=\"/\">Go on</a></p></body></html>");
                context.skipRemainingHandlers();
            } else {
                gate.check(context);
            }
        });
        server.get("/api/nodes", context -> context.contentType("application/json").result(nodes));
        server.get("/api/desk", context -> json(context, deskJson.of(workbench.view())));
        server.post("/api/edit", context -> {
            JsonNode body = body(context);
            Workbench.Edited edited = workbench.edit(EditReader.read(body.path("edits")), body.path("label").asText(""));
            ObjectNode answer = deskJson.of(edited.view());
            answer.set("made", NodesJson.texts(edited.made()));
            json(context, answer);
        });
        server.post("/api/undo", context -> json(context, deskJson.of(workbench.undo())));
        server.post("/api/redo", context -> json(context, deskJson.of(workbench.redo())));
        server.get("/<path>", files::serve);
        server.get("/", files::serve);
        server.exception(RequestFault.class, (fault, context) -> refuse(context, fault.status(), fault));
        server.exception(EditFault.class, (fault, context) -> refuse(context, 422, fault));
        server.exception(Fault.class, (fault, context) -> refuse(context, 409, fault));
        server.exception(HttpResponseException.class, (failure, context) -> refuse(context, failure.getStatus(),
                new RequestFault(failure.getStatus(), "request", failure.getMessage(), "open the page anew")));
        server.exception(Exception.class, (defect, context) -> refuse(context, 500, new RequestFault(500, "bench", "an error in the program ("
                + defect.getClass().getSimpleName() + ": " + defect.getMessage() + ")", "please report it with " + DefectLog.write(defect))));
        server.error(404, context -> {
            if (context.path().startsWith("/api/") && context.result() == null) {
                refuse(context, 404, new RequestFault(404, "request", "there is no " + context.path(), "open the page anew"));
            }
        });
    }

    private static JsonNode body(Context context) {
        try {
            return MAPPER.readTree(context.bodyAsBytes());
        } catch (IOException broken) {
            throw new RequestFault(400, "request", "its body is no JSON", "send JSON");
        }
    }

    private static void refuse(Context context, int status, Fault fault) {
        ObjectNode json = JsonNodeFactory.instance.objectNode();
        json.putObject("error").put("sentence", fault.getMessage()).put("where", fault.where()).put("seen", fault.seen()).put("wanted", fault.wanted());
        json(context.status(status), json);
    }

    private static void json(Context context, JsonNode json) {
        context.contentType("application/json").result(bytes(json));
    }

    private static byte[] bytes(JsonNode json) {
        try {
            return MAPPER.writeValueAsString(json).getBytes(StandardCharsets.UTF_8);
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException("a tree could not be written", impossible);
        }
    }

    @Override
    public void close() {
        server.stop();
    }
}
