package org.modestead.host.bench;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.modestead.host.bench.desk.DeskFolder;
import org.modestead.host.bench.folders.OpenedFolders;
import org.modestead.host.bench.run.Build;
import org.modestead.host.bench.run.KeptResults;
import org.modestead.host.bench.run.ResultFolder;
import org.modestead.host.bench.server.BenchServer;
import org.modestead.host.bench.start.Doors;
import org.modestead.host.bench.start.Uploads;
import org.modestead.host.bench.work.Workbench;
import org.modestead.host.table.SpillFolder;
import org.modestead.nodes.contract.NodeCatalog;

/** A bench at work: its server and what lies on it. */
public final class Bench implements AutoCloseable {

    private final Workbench workbench;
    private final BenchServer server;

    private Bench(Workbench workbench, BenchServer server) {
        this.workbench = workbench;
        this.server = server;
    }

    /**
     * How a bench is started.
     *
     * @param workflow to be opened; empty for the start page
     * @param port of the page, 0 for a free one
     * @param desk where work, uploads and results are kept
     * @param folders opened beside those of the workflow and the desk
     * @param keptBytes most bytes of results on disk
     * @param uploadBytes most bytes of an uploaded file
     */
    public record Options(Optional<Path> workflow, int port, DeskFolder desk, List<Path> folders, long keptBytes, long uploadBytes) {

        /** Takes an immutable copy. */
        public Options {
            folders = List.copyOf(folders);
        }
    }

    /** Starts it. */
    public static Bench start(NodeCatalog catalog, Options options) {
        SpillFolder.clearAbandoned();
        List<Path> open = new ArrayList<>(List.of(options.desk().root()));
        open.addAll(options.folders());
        KeptResults results = new KeptResults(new ResultFolder(options.desk().results(), Build.mark(), options.keptBytes()));
        OpenedFolders folders = new OpenedFolders(open);
        Workbench workbench = new Workbench(catalog, results, folders);
        Doors doors = new Doors(options.desk(), new Uploads(options.desk().uploads(), options.uploadBytes()), folders, catalog);
        options.workflow().ifPresent(file -> workbench.open(() -> options.desk().open(file)));
        return new Bench(workbench, BenchServer.start(workbench, catalog, doors, options.port()));
    }

    /** Returns the URL that opens the page. */
    public String startUrl() {
        return server.startUrl();
    }

    /** Stops what runs and ends; all work is kept. */
    @Override
    public void close() {
        server.close();
        workbench.close();
    }
}
