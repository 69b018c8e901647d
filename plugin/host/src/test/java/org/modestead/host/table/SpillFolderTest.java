package org.modestead.host.table;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;

/** What databases of killed processes left in the folder for temporary files goes, and nothing else. */
class SpillFolderTest {

    @Test
    void onlyOldFoldersOfProcessesThatAreGoneAreRemoved() throws Exception {
        Process process = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(), "-version")
                .redirectErrorStream(true).redirectOutput(ProcessBuilder.Redirect.DISCARD).start();
        process.waitFor(1, TimeUnit.MINUTES);
        Path old = left("modestead-spill-" + process.pid() + "-", Duration.ofHours(2));
        Path late = left("modestead-spill-" + process.pid() + "-", Duration.ofMinutes(2));
        Path own = left("modestead-spill-" + ProcessHandle.current().pid() + "-", Duration.ofHours(2));
        Path foreign = left("modestead-other-" + process.pid() + "-", Duration.ofHours(2));
        try {
            SpillFolder.clearAbandoned();
            assertEquals(List.of(late, own, foreign), List.of(old, late, own, foreign).stream().filter(Files::exists).toList());
        } finally {
            for (Path folder : List.of(late, own, foreign)) {
                Files.deleteIfExists(folder.resolve("spilled"));
                Files.deleteIfExists(folder);
            }
        }
    }

    private static Path left(String name, Duration age) throws Exception {
        Path folder = Files.createTempDirectory(name);
        Files.writeString(folder.resolve("spilled"), "half");
        Files.setLastModifiedTime(folder, FileTime.from(Instant.now().minus(age)));
        return folder;
    }
}
