package org.modestead.host.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.function.Supplier;
import org.modestead.host.workflow.WorkflowChecker;
import org.modestead.nodes.contract.NodeCatalog;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Tells everything wrong with a workflow without running it. */
@Command(name = "check", mixinStandardHelpOptions = true, versionProvider = ReleaseVersion.class,
        description = {"Tells everything wrong with a workflow at once, without running it.", ""})
final class CheckCommand implements Callable<Integer> {

    /** Explains {@code --set} wherever it is offered. */
    static final String SET_HELP = "A setting to use in place of the one in the file; may be given several times. List "
            + "entries "
            + "are separated by commas.";

    private final Terminal terminal;
    private final Supplier<NodeCatalog> catalog;

    @Parameters(paramLabel = "WORKFLOW", description = "Workflow file, or a folder that holds a workflow.json.")
    private Path workflow;

    @Option(names = "--set", paramLabel = "STEP.KEY=VALUE", description = SET_HELP)
    private List<String> set = new ArrayList<>();

    CheckCommand(Terminal terminal, Supplier<NodeCatalog> catalog) {
        this.terminal = terminal;
        this.catalog = catalog;
    }

    @Override
    public Integer call() {
        WorkflowChecker.Outcome outcome = CheckedFile.check(catalog.get(), workflow, set);
        if (outcome.plan().isEmpty()) {
            CheckedFile.tell(terminal, outcome.problems());
            return ExitCode.WRONG;
        }
        int steps = outcome.plan().get().steps().size();
        terminal.out().println(outcome.plan().get().workflow().fileName() + ": nothing wrong; " + steps
                + (steps == 1 ? " step" : " steps") + " would run.");
        return ExitCode.DONE;
    }
}
