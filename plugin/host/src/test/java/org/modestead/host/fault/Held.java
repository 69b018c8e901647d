package org.modestead.host.fault;

import com.sun.management.UnixOperatingSystemMXBean;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.stream.Stream;

/**
 * What this process holds.
 *
 * @param bytes of the heap after collecting
 * @param files open ones; 0 where the system does not tell
 * @param threads alive
 * @param spills temporary folders of databases
 */
record Held(long bytes, long files, int threads, long spills) {

    /** Compiled code and caches of the libraries settle slowly; a run that kept its table of 20 000 rows would show after few. */
    private static final long SLACK_BYTES = 8_000_000;
    /** The runtime's own: class files and helpers that come and go. */
    private static final int SLACK = 4;

    static Held now() throws IOException {
        for (int i = 0; i < 3; i++) {
            System.gc();
        }
        long files = ManagementFactory.getOperatingSystemMXBean() instanceof UnixOperatingSystemMXBean unix ? unix.getOpenFileDescriptorCount() : 0;
        return new Held(ManagementFactory.getMemoryMXBean().getHeapMemoryUsage().getUsed(), files, ManagementFactory.getThreadMXBean().getThreadCount(),
                spillFolders());
    }

    static long spillFolders() throws IOException {
        try (Stream<Path> temporary = Files.list(Path.of(System.getProperty("java.io.tmpdir")))) {
            return temporary.filter(path -> path.getFileName().toString().startsWith("modestead-spill-" + ProcessHandle.current().pid() + "-")).count();
        }
    }

    boolean isNoMoreThan(Held before) {
        return bytes - before.bytes() < SLACK_BYTES && files - before.files() <= SLACK && threads - before.threads() <= SLACK && spills == before.spills();
    }

    String words() {
        return String.format(Locale.ROOT, "%.1f MB, %d files, %d threads, %d temporary folders", bytes / 1e6, files, threads, spills);
    }
}
