package org.modestead.host.table;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;

/** The files of a folder that are read as one table, in the order of their names. */
final class FolderFiles {

    private FolderFiles() {}

    /**
     * Returns those of one kind. Other programs begin the names of files that are no part of a table with a point or a low line.
     *
     * @param folder absolute
     * @param shown its name as the person wrote it
     * @param endings of their names in lower case, without the point, as a regular expression
     * @throws TableFault if the folder cannot be read
     */
    static List<Path> of(Path folder, String shown, String endings) {
        try (Stream<Path> files = Files.list(folder)) {
            return files.filter(file -> file.getFileName().toString().matches("(?i)[^._].*\\.(" + endings + ")") && Files.isRegularFile(file)).sorted()
                    .toList();
        } catch (IOException unreadable) {
            throw new TableFault(shown, "the folder cannot be read (" + unreadable.getMessage() + ")", "allow reading it");
        }
    }
}
