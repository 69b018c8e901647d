package org.modestead.host.output;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A file is written whole, replaces files only, and what writers left that were killed goes. */
class WholeFileTest {

    @TempDir
    Path folder;

    @Test
    void aPipeStaysWhatItIs() throws Exception {
        Path pipe = folder.resolve("pipe");
        assumeTrue(command("mkfifo", pipe.toString()) == 0, "pipes can be made (POSIX)");
        OutputFault fault = assertThrows(OutputFault.class, () -> WholeFile.checkTarget(pipe, "pipe"));
        assertEquals("pipe: this is a device or a pipe, not an ordinary file; choose another name.", fault.getMessage());
        assertThrows(FileSystemException.class, () -> WholeFile.write(Disk.REAL, pipe, out -> out.write(1)));
        assertEquals(List.of("pipe"), names());
        assertTrue(Files.exists(pipe) && !Files.isRegularFile(pipe));
    }

    @Test
    void aFolderStaysEvenWhenItIsEmpty() throws IOException {
        Path inner = Files.createDirectory(folder.resolve("inner"));
        assertThrows(FileSystemException.class, () -> WholeFile.write(Disk.REAL, inner, out -> out.write(1)));
        assertTrue(Files.isDirectory(inner));
        assertEquals(List.of("inner"), names());
    }

    @Test
    void whatAKilledWriterLeftGoesWithTheNextWriting() throws Exception {
        long gone = gone();
        left(".t.csv." + gone + ".part", Duration.ofHours(1));
        left(".t.csv." + ProcessHandle.current().parent().orElseThrow().pid() + ".part", Duration.ofHours(1));
        left(".other.csv." + gone + ".part", Duration.ofHours(1));
        left(".t.csv.mine.part", Duration.ofHours(1));
        WholeFile.write(Disk.REAL, folder.resolve("t.csv"), out -> out.write('x'));
        assertFalse(Files.exists(folder.resolve(".t.csv." + gone + ".part")));
        assertEquals(4, names().size(), "those of a living process, of other files and of other makers stay: " + names());
    }

    /** A process of another machine, or of another container, cannot be asked whether it lives. */
    @Test
    void whatWasWrittenAMomentAgoStays() throws Exception {
        String name = ".t.csv." + gone() + ".part";
        left(name, Duration.ofSeconds(10));
        WholeFile.write(Disk.REAL, folder.resolve("t.csv"), out -> out.write('x'));
        assertEquals(List.of(name, "t.csv"), names());
    }

    private void left(String name, Duration age) throws IOException {
        Path file = Files.writeString(folder.resolve(name), "half");
        Files.setLastModifiedTime(file, FileTime.from(Instant.now().minus(age)));
    }

    /** Returns the number of a process that has ended. */
    private static long gone() throws Exception {
        Process process = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(), "-version")
                .redirectErrorStream(true).redirectOutput(ProcessBuilder.Redirect.DISCARD).start();
        process.waitFor(1, TimeUnit.MINUTES);
        return process.pid();
    }

    private List<String> names() throws IOException {
        try (Stream<Path> inside = Files.list(folder)) {
            return inside.map(path -> path.getFileName().toString()).sorted().toList();
        }
    }

    private static int command(String... words) throws InterruptedException {
        try {
            Process process = new ProcessBuilder(words).redirectErrorStream(true).start();
            return process.waitFor(10, TimeUnit.SECONDS) ? process.exitValue() : -1;
        } catch (IOException unknown) {
            return -1;
        }
    }
}
