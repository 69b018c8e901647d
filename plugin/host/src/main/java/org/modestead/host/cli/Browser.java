package org.modestead.host.cli;

import java.io.IOException;
import java.util.List;
import java.util.Locale;

/** Asks the system to open a page in the person's browser. */
final class Browser {

    private Browser() {}

    /** Opens it; where the system has no way to, the person opens the address that is printed. */
    static void open(String url) {
        String system = System.getProperty("os.name").toLowerCase(Locale.ROOT);
        List<String> command = system.contains("win") ? List.of("rundll32", "url.dll,FileProtocolHandler", url) : system.contains("mac") ? List.of("open", url)
                : List.of("xdg-open", url);
        try {
            new ProcessBuilder(command).redirectErrorStream(true).redirectOutput(ProcessBuilder.Redirect.DISCARD).start();
        } catch (IOException none) {
            // no such command: the address stands on the terminal
        }
    }
}
