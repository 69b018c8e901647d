package org.modestead.host.table;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.modestead.host.output.WholeFolder;
import org.modestead.nodes.files.GoneProcess;

/**
 * Temporary folders in which databases keep what does not fit into memory, {@code modestead-spill-PID-...}. Each is removed when its
 * database closes; those of processes that were killed go when the next one begins to work.
 */
public final class SpillFolder {

    private static final String PREFIX = "modestead-spill-";
    private static final Pattern NAME = Pattern.compile(PREFIX + "(\\d{1,18})-.*");
    /** A process of another container that shares the folder has numbers of its own; a database at work changes its folder now and then. */
    private static final Duration QUIET = Duration.ofHours(1);

    private SpillFolder() {}

    static Path make() throws IOException {
        return Files.createTempDirectory(PREFIX + ProcessHandle.current().pid() + "-");
    }

    /** Removes, as far as it may, what processes that are gone left behind an hour ago or earlier. */
    public static void clearAbandoned() {
        Path temporary = Path.of(System.getProperty("java.io.tmpdir"));
        Instant late = Instant.now().minus(QUIET);
        try (Stream<Path> inside = Files.list(temporary)) {
            List<Path> abandoned = inside.filter(path -> isAbandoned(path, late)).toList();
            for (Path folder : abandoned) {
                WholeFolder.remove(folder);
            }
        } catch (IOException notOurs) {
            // what another person left is left; it harms nobody's result
        }
    }

    private static boolean isAbandoned(Path path, Instant late) {
        String file = path.getFileName().toString();
        // other programs leave hundreds of thousands of files there
        if (!file.startsWith(PREFIX)) {
            return false;
        }
        Matcher name = NAME.matcher(file);
        return name.matches() && GoneProcess.left(path, Long.parseLong(name.group(1)), late);
    }
}
