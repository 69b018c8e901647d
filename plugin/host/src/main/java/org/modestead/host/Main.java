package org.modestead.host;

import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.modestead.host.cli.CommandLineHost;
import org.modestead.host.cli.Terminal;
import org.modestead.nodes.contract.NodeCatalog;

/** Starts the command line. */
public final class Main {

    private Main() {}

    /** Runs a command and ends the process with its exit code. */
    public static void main(String[] arguments) {
        PrintStream out = new PrintStream(System.out, true, StandardCharsets.UTF_8);
        PrintStream err = new PrintStream(System.err, true, StandardCharsets.UTF_8);
        Terminal terminal = new Terminal(out, err, System.console() != null && System.getenv("CI") == null);
        CommandLineHost host = new CommandLineHost(terminal,
                () -> NodeCatalog.load(List.of(Main.class.getClassLoader())));
        System.exit(host.run(arguments));
    }
}
