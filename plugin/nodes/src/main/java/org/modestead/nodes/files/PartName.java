package org.modestead.nodes.files;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/**
 * The hidden name beside a file or a folder, {@code .NAME.PID.part}, under which it is made until it is complete and is moved to its
 * place; the number of the process tells whether what stands there will ever be complete.
 */
public final class PartName {

    /** A process of another machine or container has numbers of its own: what was written lately may be its. */
    private static final Duration QUIET = Duration.ofMinutes(1);
    private static final Pattern PART = Pattern.compile("\\..+\\.(\\d{1,18})\\.part", Pattern.DOTALL);

    private PartName() {}

    /** Returns the name for this process. */
    public static Path of(Path target) {
        return target.resolveSibling("." + target.getFileName() + "." + ProcessHandle.current().pid() + ".part");
    }

    /** Returns what processes that are gone left of a file or folder, a minute ago or earlier. */
    public static List<Path> abandonedBeside(Path target) throws IOException {
        return abandoned(target.getParent(), "." + target.getFileName() + ".");
    }

    /** Returns what processes that are gone left in a folder of our own, a minute ago or earlier. */
    public static List<Path> abandonedIn(Path folder) throws IOException {
        return abandoned(folder, ".");
    }

    private static List<Path> abandoned(Path folder, String beginning) throws IOException {
        Instant late = Instant.now().minus(QUIET);
        try (Stream<Path> inside = Files.list(folder)) {
            return inside.filter(path -> {
                String name = path.getFileName().toString();
                Matcher part = PART.matcher(name);
                return name.startsWith(beginning) && part.matches() && (beginning.length() == 1 || part.start(1) == beginning.length())
                        && GoneProcess.left(path, Long.parseLong(part.group(1)), late);
            }).sorted().toList();
        }
    }
}
