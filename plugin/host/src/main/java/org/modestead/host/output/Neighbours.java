package org.modestead.host.output;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.modestead.nodes.contract.NearestName;

/** Finds the file that a person probably meant when the one named is not there. */
public final class Neighbours {

    private Neighbours() {}

    /** Returns {@code ", perhaps you meant x"} with a name of the same folder, or an empty text. */
    public static String hint(Path missing) {
        Path folder = missing.getParent();
        if (folder == null || !Files.isDirectory(folder)) {
            return "";
        }
        try (Stream<Path> inside = Files.list(folder)) {
            List<String> names = inside.map(found -> found.getFileName().toString()).sorted().toList();
            return NearestName.hint(missing.getFileName().toString(), names);
        } catch (IOException unlisted) {
            return "";
        }
    }
}
