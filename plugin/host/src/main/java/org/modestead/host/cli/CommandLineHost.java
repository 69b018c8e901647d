package org.modestead.host.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.function.Supplier;
import org.modestead.engine.Fault;
import org.modestead.host.run.Versions;
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
                + "); please report it with " + log(failure) + ".");
        return ExitCode.FAILED;
    }

    /** Writes what a programmer needs to a file, so that the person need not see it; returns how to find it. */
    static String log(Throwable defect) {
        try {
            Path file = Files.createTempFile("modestead-error", ".log");
            try (PrintWriter writer = new PrintWriter(Files.newBufferedWriter(file))) {
                writer.println("Modestead " + Versions.modestead() + ", Java " + System.getProperty("java.version"));
                defect.printStackTrace(writer);
            }
            return "the log " + file;
        } catch (IOException unwritable) {
            return "this sentence (no log could be written: " + unwritable.getMessage() + ")";
        }
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
            throw new ParameterException(spec.commandLine(), "A command is missing: run, check or nodes.");
        }
    }
}
