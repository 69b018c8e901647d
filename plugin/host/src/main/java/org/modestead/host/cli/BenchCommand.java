package org.modestead.host.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.concurrent.CountDownLatch;
import java.util.function.Supplier;
import org.modestead.host.bench.Bench;
import org.modestead.host.bench.desk.DeskFolder;
import org.modestead.nodes.contract.NodeCatalog;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Opens the bench: a page on this machine on which workflows are built, run and looked at. */
@Command(name = "bench", mixinStandardHelpOptions = true, versionProvider = ReleaseVersion.class,
        description = {"Opens the bench: a page, for this machine only, on which workflows are built, run and looked at. Ends with Ctrl-C; "
                + "whatever was done is kept.", ""})
final class BenchCommand implements Callable<Integer> {

    private static final long MEGABYTE = 1L << 20;

    private final Terminal terminal;
    private final Supplier<NodeCatalog> catalog;

    @Parameters(paramLabel = "WORKFLOW", arity = "0..1", description = "Workflow file, or a folder that holds a workflow.json; without, the start page.")
    private Path workflow;

    @Option(names = "--port", paramLabel = "N", description = "Port of the page; default: a free one.")
    private int port;

    @Option(names = "--desk", paramLabel = "DIR", description = "Where work, uploads and results are kept; default: .modestead/bench in your home.")
    private Path desk;

    @Option(names = "--folder", paramLabel = "DIR", description = "A folder whose files the bench may read and write, besides that of the workflow; may be "
            + "given several times.")
    private List<Path> folders = new ArrayList<>();

    @Option(names = "--keep", paramLabel = "MB", defaultValue = "4096", description = "Most megabytes of results kept on disk; default: ${DEFAULT-VALUE}.")
    private long keep;

    @Option(names = "--upload", paramLabel = "MB", defaultValue = "2048", description = "Most megabytes of a file dropped on the page; default: ${DEFAULT-VALUE}.")
    private long upload;

    @Option(names = "--no-open", description = "Print the page's address only, open no browser.")
    private boolean closed;

    BenchCommand(Terminal terminal, Supplier<NodeCatalog> catalog) {
        this.terminal = terminal;
        this.catalog = catalog;
    }

    @Override
    public Integer call() throws InterruptedException {
        Bench.Options options = new Bench.Options(Optional.ofNullable(workflow), port, Optional.ofNullable(desk).map(DeskFolder::new)
                .orElseGet(DeskFolder::usual), folders, keep * MEGABYTE, upload * MEGABYTE);
        CountDownLatch end = new CountDownLatch(1);
        try (Bench bench = Bench.start(catalog.get(), options)) {
            Runtime.getRuntime().addShutdownHook(new Thread(bench::close, "bench-end"));
            terminal.out().println("Bench: " + bench.startUrl());
            if (!closed && terminal.live()) {
                Browser.open(bench.startUrl());
            }
            end.await();
        }
        return ExitCode.DONE;
    }
}
