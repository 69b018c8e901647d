package org.modestead.host.bench;

import java.nio.file.Path;
import java.util.Optional;
import org.modestead.host.bench.server.BenchServer;
import org.modestead.host.bench.work.Workbench;
import org.modestead.host.workflow.WorkflowFile;
import org.modestead.nodes.contract.NodeCatalog;

/** A bench at work: its server and what lies on it. */
public final class Bench implements AutoCloseable {

    private final BenchServer server;

    private Bench(BenchServer server) {
        this.server = server;
    }

    /** Starts it. */
    public static Bench start(NodeCatalog catalog, Optional<Path> workflow, int port) {
        Workbench workbench = new Workbench(catalog);
        workflow.flatMap(file -> WorkflowFile.read(file).workflow()).ifPresent(workbench::open);
        return new Bench(BenchServer.start(workbench, catalog, port));
    }

    /** Returns the URL that opens the page. */
    public String startUrl() {
        return server.startUrl();
    }

    @Override
    public void close() {
        server.close();
    }
}
