package org.modestead.host.cli;

import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.concurrent.CountDownLatch;
import java.util.function.Supplier;
import org.modestead.host.bench.Bench;
import org.modestead.nodes.contract.NodeCatalog;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Opens the bench: a page on this machine on which workflows are built, run and looked at. */
@Command(name = "bench", mixinStandardHelpOptions = true, versionProvider = ReleaseVersion.class,
        description = {"Opens the bench: a page, for this machine only, on which workflows are built, run and looked at. Ends with Ctrl-C.", ""})
final class BenchCommand implements Callable<Integer> {

    private final Terminal terminal;
    private final Supplier<NodeCatalog> catalog;

    @Parameters(paramLabel = "WORKFLOW", arity = "0..1", description = "Workflow file, or a folder that holds a workflow.json.")
    private Path workflow;

    @Option(names = "--port", paramLabel = "N", description = "Port of the page; default: a free one.")
    private int port;

    @Option(names = "--no-open", description = "Print the page's address only, open no browser.")
    private boolean closed;

    BenchCommand(Terminal terminal, Supplier<NodeCatalog> catalog) {
        this.terminal = terminal;
        this.catalog = catalog;
    }

    @Override
    public Integer call() throws InterruptedException {
        try (Bench bench = Bench.start(catalog.get(), Optional.ofNullable(workflow), port)) {
            terminal.out().println("Bench: " + bench.startUrl());
            new CountDownLatch(1).await();
        }
        return ExitCode.DONE;
    }
}
