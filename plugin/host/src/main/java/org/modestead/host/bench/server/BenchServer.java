package org.modestead.host.bench.server;

import io.javalin.Javalin;
import io.javalin.compression.CompressionStrategy;
import io.javalin.http.HttpResponseException;
import io.javalin.router.JavalinDefaultRoutingApi;
import java.io.IOException;
import java.net.InetAddress;
import java.net.ServerSocket;
import org.modestead.engine.Fault;
import org.modestead.host.bench.desk.EditFault;
import org.modestead.host.bench.folders.FolderFault;
import org.modestead.host.bench.start.Doors;
import org.modestead.host.bench.start.Uploads;
import org.modestead.host.bench.work.Workbench;
import org.modestead.host.run.DefectLog;
import org.modestead.nodes.contract.NodeCatalog;

/** The bench's web server. */
public final class BenchServer implements AutoCloseable {

    private final Workbench workbench;
    private final Doors doors;
    private final byte[] nodes;
    private final DeskJson deskJson;
    private final PageFiles files = new PageFiles();
    private final LookRoutes looks;
    private final EventStream events;
    private final Gate gate;
    private final Javalin server;

    private BenchServer(Workbench workbench, NodeCatalog catalog, Doors doors, int port) {
        this.workbench = workbench;
        this.doors = doors;
        this.nodes = Answer.bytes(NodesJson.of(catalog));
        this.deskJson = new DeskJson(catalog);
        this.looks = new LookRoutes(workbench.looks());
        this.events = new EventStream(workbench, deskJson);
        this.gate = Gate.fresh(port);
        this.server = Javalin.create(config -> {
            config.startup.showJavalinBanner = false;
            config.startup.startupWatcherEnabled = false;
            config.http.maxRequestSize = 8L << 20;
            // nothing leaves this machine: packing would only cost time
            config.http.compressionStrategy = CompressionStrategy.NONE;
            PlainRefusals.on(config.jetty);
            routes(config.routes);
        });
        server.start("127.0.0.1", port);
    }

    /** Starts the server; port 0 takes a free one. */
    public static BenchServer start(Workbench workbench, NodeCatalog catalog, Doors doors, int port) {
        try {
            return new BenchServer(workbench, catalog, doors, port == 0 ? freePort() : port);
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

    private void routes(JavalinDefaultRoutingApi routes) {
        routes.before(Gate::harden);
        routes.before(context -> {
            if (gate.opens(context)) {
                context.html("<!doctype html><html lang=\"en\"><head><title>Modestead</title><meta http-equiv=\"refresh\" content=\"0;url=/\">"
                        + "</head><body><p><a href=\"/\">Go on</a></p></body></html>");
                context.skipRemainingHandlers();
            } else {
                gate.check(context);
            }
        });
        routes.get("/api/nodes", context -> context.contentType("application/json").result(nodes));
        new DeskRoutes(workbench, deskJson).on(routes);
        new StepRoutes(workbench).on(routes);
        new StartRoutes(workbench, doors, deskJson, files).on(routes);
        new FileRoutes(workbench, doors.desks()).on(routes);
        looks.on(routes);
        events.on(routes);
        routes.get("/api/<path>", context -> {
            throw new RequestFault(404, "request", "there is no " + context.path(), "open the page anew");
        });
        routes.get("/<path>", files::serve);
        routes.after(Answer::readToTheEnd);
        routes.exception(RequestFault.class, (fault, context) -> Answer.refuse(context, fault.status(), fault));
        routes.exception(EditFault.class, (fault, context) -> Answer.refuse(context, 422, fault));
        routes.exception(FolderFault.class, (fault, context) -> Answer.refuse(context, 403, fault));
        routes.exception(Uploads.TooLarge.class, (fault, context) -> Answer.refuse(context, 413, fault));
        routes.exception(Fault.class, (fault, context) -> Answer.refuse(context, 409, fault));
        routes.exception(HttpResponseException.class, (failure, context) -> Answer.refuse(context, failure.getStatus(),
                new RequestFault(failure.getStatus(), "request", failure.getMessage(), failure.getStatus() == 413 ? "send less" : "open the page anew")));
        routes.exception(Exception.class, (defect, context) -> Answer.refuse(context, 500, new RequestFault(500, "bench", "an error in the program ("
                + defect.getClass().getSimpleName() + ": " + defect.getMessage() + ")", "please report it with " + DefectLog.write(defect))));
    }

    @Override
    public void close() {
        events.close();
        server.stop();
        looks.close();
    }
}
