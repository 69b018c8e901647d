package org.modestead.host.bench.desk;

import org.modestead.host.workflow.Link;

/** Reads ends of links written {@code step.port}. */
public final class Ends {

    private Ends() {}

    /** @throws EditFault if it is not of that form */
    public static Link.End read(String text) {
        return Link.End.read(text).orElseThrow(() -> new EditFault("end of a link", "\"" + text + "\"", "write step.port"));
    }
}
