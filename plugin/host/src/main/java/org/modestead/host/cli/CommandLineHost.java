package org.modestead.host.cli;

import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.util.function.Supplier;
import org.modestead.engine.Fault;
import org.modestead.host.run.DefectLog;
import org.modestead.nodes.contract.NodeCatalog;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** The command line with its commands. Whatever goes wrong becomes a sentence on the error stream and an exit code. */
public final class CommandLineHost {

    private final Terminal terminal;
    private final Supplier<NodeCatalog> catalog;

    /**
     * @param terminal where it speaks
     * @param catalog finds the nodes, asked when a command needs them
     */
    public CommandLineHost(Terminal terminal, Supplier<NodeCatalog> catalog) {
        this.terminal = terminal;
        this.catalog = catalog;
    }

    /** Runs a command and returns the exit code. */
    public int run(String... arguments) {
        CommandLine line = new CommandLine(new Top());
        line.addSubcommand(new RunCommand(terminal, catalog));
        line.addSubcommand(new CheckCommand(terminal, catalog));
        line.addSubcommand(new NodesCommand(terminal, catalog));
        line.addSubcommand(new ReferenceCommand(terminal, catalog));
        line.addSubcommand(new BenchCommand(terminal, catalog));
        line.setOut(new PrintWriter(terminal.out(), true, StandardCharsets.UTF_8));
        line.setErr(new PrintWriter(terminal.err(), true, StandardCharsets.UTF_8));
        line.setUsageHelpLongOptionsMaxWidth(24);
        line.setParameterExceptionHandler((wrong, given) -> refuse(wrong));
        line.setExecutionExceptionHandler((failure, command, parsed) -> fail(failure));
        return line.execute(arguments);
    }

    private int refuse(ParameterException wrong) {
        terminal.err().println(wrong.getMessage());
        String name = wrong.getCommandLine().getCommandSpec().qualifiedName();
        terminal.err().println("Try: " + name + " --help");
        return ExitCode.WRONG;
    }

    private int fail(Exception failure) {
        if (failure instanceof Fault fault) {
            terminal.err().println(fault.getMessage());
            return ExitCode.FAILED;
        }
        terminal.err().println("An error in the program (" + failure.getClass().getSimpleName() + ": " + failure.getMessage()
                + "); please report it with " + DefectLog.write(failure) + ".");
        return ExitCode.FAILED;
    }

    /** The command without a subcommand: tells how to go on. */
    @Command(name = "modestead", mixinStandardHelpOptions = true, versionProvider = ReleaseVersion.class,
            synopsisSubcommandLabel = "COMMAND",
            description = {"Decides whether the dynamic modes of a recording exist, extracts them, and forecasts.", ""},
            footerHeading = "%nExit codes: 0 done, 1 a step failed, 2 the command or the workflow is wrong, 130 stopped.%n")
    private static final class Top implements Runnable {
        @Spec
        private CommandSpec spec;

        @Override
        public void run() {
            throw new ParameterException(spec.commandLine(), "A command is missing: run, check, nodes, reference or bench.");
        }
    }
}
