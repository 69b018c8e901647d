package org.modestead.host.output;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.stream.Stream;

/** Removes a folder with all that is in it. */
public final class WholeFolder {

    private WholeFolder() {}

    /**
     * Removes a folder, what is deepest first; links of the file system are removed, not followed.
     *
     * @param folder that is there
     * @throws IOException if something of it stays
     */
    public static void remove(Path folder) throws IOException {
        try (Stream<Path> inside = Files.walk(folder)) {
            for (Path path : inside.sorted(Comparator.reverseOrder()).toList()) {
                Files.deleteIfExists(path);
            }
        }
    }
}
