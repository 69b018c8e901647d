package org.modestead.host.output;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The result folder: complete files or the old ones, one writer, no trace of what was not published. */
class OutputFolderTest {

    private static final String BEGUN = "2026-12-04T03:00:00Z";

    @TempDir
    Path parent;

    @Test
    void nothingIsSeenBeforePublishing() throws IOException {
        try (OutputFolder folder = OutputFolder.open(out(), Disk.REAL)) {
            write(folder, "a/table.csv", "new");
            assertTrue(Files.notExists(out()));
            folder.publish(BEGUN, List.of(), "run.json");
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
            folder.publish(BEGUN, List.of("a/table.csv", "gone/table.csv", "../outside.txt"), "run.json");
        }
        assertEquals(List.of("out", "out/a", "out/a/table.csv", "out/mine.txt", "out/run.json", "outside.txt"), all());
        assertEquals("new", Files.readString(out().resolve("a/table.csv")));
    }

    /** A folder in the way of the second file stops the run as a kill would, after the first one moved. */
    @Test
    void aRunThatStopsWhileItsFilesMoveLeavesAMarkAndTheNextOneClearsUp() throws IOException {
        Files.createDirectories(out().resolve("b.csv/in the way"));
        Files.writeString(out().resolve("mine.txt"), "kept");
        try (OutputFolder folder = OutputFolder.open(out(), Disk.REAL)) {
            write(folder, "a.csv", "half published");
            write(folder, "b.csv", "never published");
            write(folder, "run.json", "{}");
            assertThrows(IOException.class, () -> folder.publish(BEGUN, List.of(), "run.json"));
        }
        UnfinishedRun killed = UnfinishedRun.in(out()).orElseThrow();
        assertEquals(new UnfinishedRun(BEGUN, List.of("a.csv", "b.csv")), killed);
        assertEquals("out: a run begun at " + BEGUN + " did not come to the end of moving its files here, so that files of two runs may lie beside each other; "
                + "run the workflow again.", killed.sentence("out"));
        assertEquals(Optional.of(killed.sentence(out().toString())), UnfinishedRun.doubtOf(out().resolve("a/table.csv")));
        assertEquals(Optional.empty(), UnfinishedRun.doubtOf(parent.resolve("table.csv")));
        WholeFolder.remove(out().resolve("b.csv"));
        try (OutputFolder folder = OutputFolder.open(out(), Disk.REAL)) {
            write(folder, "c.csv", "new");
            write(folder, "run.json", "{}");
            folder.publish(BEGUN, List.of(), "run.json");
        }
        assertEquals(List.of("out", "out/c.csv", "out/mine.txt", "out/run.json"), all(), "no file of the run that stopped, and no mark");
    }

    @Test
    void aMarkThatIsNotOursIsNone() throws IOException {
        Files.createDirectories(out());
        for (String foreign : List.of("", "{", "{\"files\": [\"a\"]}", "[".repeat(100_000))) {
            Files.writeString(out().resolve(UnfinishedRun.NAME), foreign);
            assertEquals(Optional.empty(), UnfinishedRun.in(out()), foreign);
        }
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
