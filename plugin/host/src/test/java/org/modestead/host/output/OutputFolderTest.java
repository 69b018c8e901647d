package org.modestead.host.output;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The result folder: complete files or the old ones, one writer, no trace of what was not published. */
class OutputFolderTest {

    @TempDir
    Path parent;

    @Test
    void nothingIsSeenBeforePublishing() throws IOException {
        try (OutputFolder folder = OutputFolder.open(out(), Disk.REAL)) {
            write(folder, "a/table.csv", "new");
            assertTrue(Files.notExists(out()));
            folder.publish(List.of(), "run.json");
        }
        assertEquals(List.of("out", "out/a", "out/a/table.csv"), all());
    }

    @Test
    void whatIsNotPublishedLeavesNoTrace() throws IOException {
        try (OutputFolder folder = OutputFolder.open(out(), Disk.REAL)) {
            write(folder, "a/table.csv", "new");
        }
        assertEquals(List.of(), all());
    }

    @Test
    void publishingReplacesAndRemovesFilesOfTheEarlierRunButKeepsOthers() throws IOException {
        Files.createDirectories(out().resolve("a"));
        Files.createDirectories(out().resolve("gone"));
        Files.writeString(out().resolve("a/table.csv"), "old");
        Files.writeString(out().resolve("gone/table.csv"), "old");
        Files.writeString(out().resolve("mine.txt"), "kept");
        Files.writeString(parent.resolve("outside.txt"), "kept");
        try (OutputFolder folder = OutputFolder.open(out(), Disk.REAL)) {
            write(folder, "a/table.csv", "new");
            write(folder, "run.json", "{}");
            folder.publish(List.of("a/table.csv", "gone/table.csv", "../outside.txt"), "run.json");
        }
        assertEquals(List.of("out", "out/a", "out/a/table.csv", "out/mine.txt", "out/run.json", "outside.txt"), all());
        assertEquals("new", Files.readString(out().resolve("a/table.csv")));
    }

    @Test
    void aSecondWriterIsRefusedUntilTheFirstEnds() {
        try (OutputFolder first = OutputFolder.open(out(), Disk.REAL)) {
            OutputFault fault = assertThrows(OutputFault.class, () -> OutputFolder.open(first.folder(), Disk.REAL));
            assertEquals(out() + ": another run is writing this folder; wait until it ends, or choose another folder.",
                    fault.getMessage());
        }
        OutputFolder.open(out(), Disk.REAL).close();
    }

    @Test
    void whatAKilledRunLeftIsRemoved() throws IOException {
        Files.createDirectories(parent.resolve(".out.part/a"));
        Files.writeString(parent.resolve(".out.part/a/table.csv"), "half");
        Files.writeString(parent.resolve(".out.lock"), "123");
        try (OutputFolder folder = OutputFolder.open(out(), Disk.REAL)) {
            assertEquals(List.of(), folder.files());
        }
        assertEquals(List.of(), all());
    }

    @Test
    void aFileInPlaceOfTheFolderIsRefused() throws IOException {
        Files.writeString(out(), "text");
        assertTrue(assertThrows(OutputFault.class, () -> OutputFolder.open(out(), Disk.REAL)).getMessage()
                .contains("not a folder that could be replaced"));
        OutputFault inside = assertThrows(OutputFault.class, () -> OutputFolder.open(out().resolve("deeper"), Disk.REAL));
        assertTrue(inside.getMessage().contains(out() + " is not a folder"), inside::getMessage);
    }

    @Test
    void aWholeFileReplacesTheOldOneOnlyWhenComplete() throws IOException {
        Path target = parent.resolve("deep/result.csv");
        WholeFile.write(Disk.REAL, target, out -> out.write("old".getBytes(StandardCharsets.UTF_8)));
        assertThrows(IOException.class, () -> WholeFile.write(Disk.REAL, target, out -> {
            out.write("half".getBytes(StandardCharsets.UTF_8));
            throw new IOException("No space left on device");
        }));
        assertEquals("old", Files.readString(target));
        assertEquals(List.of("deep", "deep/result.csv"), all(), "no part is left");
    }

    @Test
    void aFullDiskIsToldAsSuch() {
        assertEquals("results of step fit: the disk is full (No space left on device); make room or choose a folder on "
                + "another disk; "
                + "nothing half-written was left.",
                OutputFault.of("results of step fit", new IOException("No space left on device")).getMessage());
    }

    private static void write(OutputFolder folder, String name, String text) throws IOException {
        folder.write(name, out -> out.write(text.getBytes(StandardCharsets.UTF_8)));
    }

    private Path out() {
        return parent.resolve("out");
    }

    private List<String> all() throws IOException {
        try (Stream<Path> inside = Files.walk(parent)) {
            return inside.filter(path -> !path.equals(parent)).map(path -> parent.relativize(path).toString()).sorted()
                    .toList();
        }
    }
}
