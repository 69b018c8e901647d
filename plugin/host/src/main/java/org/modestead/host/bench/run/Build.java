package org.modestead.host.bench.run;

import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.UUID;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.modestead.engine.Fault;
import org.modestead.host.run.Versions;
import org.modestead.nodes.contract.Node;

/** Tells one build of the program from another, since another one may compute otherwise. */
public final class Build {

    private Build() {}

    /** Returns the release with a mark of the very files that it was started from. */
    public static String mark() {
        String files = Stream.of(Fault.class, Node.class, Build.class).map(Build::origin).distinct().collect(Collectors.joining("\n"));
        return Versions.modestead() + "-" + UUID.nameUUIDFromBytes(files.getBytes(StandardCharsets.UTF_8)).toString().substring(0, 8);
    }

    private static String origin(Class<?> member) {
        try {
            Path place = Path.of(member.getProtectionDomain().getCodeSource().getLocation().toURI());
            return place + " " + (Files.isDirectory(place) ? newest(place) : Files.size(place) + " " + Files.getLastModifiedTime(place));
        } catch (IOException | URISyntaxException unknown) {
            // nothing can be said of its age: no result of another process is taken for its own
            return UUID.randomUUID().toString();
        }
    }

    private static String newest(Path folder) throws IOException {
        try (Stream<Path> files = Files.walk(folder)) {
            List<Long> times = files.filter(file -> file.toString().endsWith(".class")).map(file -> file.toFile().lastModified()).sorted().toList();
            return times.size() + " " + (times.isEmpty() ? 0 : times.get(times.size() - 1));
        }
    }
}
