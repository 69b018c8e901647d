package org.modestead.host.table;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.modestead.host.output.Neighbours;

/** Refuses files that no reader could read, each with a sentence of its own. */
final class FileChecks {

    private FileChecks() {}

    /**
     * @param path absolute
     * @param shown the name as the person wrote it
     * @throws TableFault if there is nothing to read
     */
    static void readable(Path path, String shown) {
        if (Files.isDirectory(path)) {
            throw new TableFault(shown, "this is a folder, not a file", "name a file in it");
        }
        if (!Files.exists(path)) {
            throw new TableFault(shown, "there is no such file" + Neighbours.hint(path),
                    "name a file relative to the workflow's folder or with its full path");
        }
        if (!Files.isReadable(path)) {
            throw new TableFault(shown, "the file may not be read", "allow reading it");
        }
        if (size(path, shown) == 0) {
            throw new TableFault(shown, "the file is empty (0 bytes)", "give a table with a header and at least one row");
        }
        if (shown.indexOf('*') >= 0 || shown.indexOf('?') >= 0) {
            throw new TableFault(shown, "the name holds * or ?", "rename the file: these stand for any letters");
        }
    }

    private static long size(Path path, String shown) {
        try {
            return Files.size(path);
        } catch (IOException unreadable) {
            throw new TableFault(shown, "the file cannot be read (" + unreadable.getMessage() + ")", "allow reading it");
        }
    }
}
