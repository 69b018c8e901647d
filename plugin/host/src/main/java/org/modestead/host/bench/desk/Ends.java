package org.modestead.host.bench.desk;

import org.modestead.host.workflow.Link;

/** Reads ends of links written {@code step.port}. */
public final class Ends {

    private Ends() {}

    /** @throws EditFault if it is not of that form */
    public static Link.End read(String text) {
        String[] parts = text.split("\\.", -1);
        if (parts.length != 2 || parts[0].isBlank() || parts[1].isBlank()) {
            throw new EditFault("end of a link", "\"" + text + "\"", "write step.port");
        }
        return new Link.End(parts[0], parts[1]);
    }
}
