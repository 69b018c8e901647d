package org.modestead.host.bench.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.FakeNode;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** What is said to be there can be read, however little memory and disk there is. */
class KeptResultsTest {

    private static final NodeDeclaration NODE = new FakeNode("one", (inputs, settings, context) -> 1).declaration();
    private static final long ROOMY = 1L << 30;

    @TempDir
    private Path root;

    private ResultFolder folder(long limit) {
        return new ResultFolder(root, "build", limit);
    }

    private static NodeResult result(double value) {
        return new NodeResult(Map.of("table", MemoryTable.builder(FakeNode.SCHEMA, "one").row(value).build()), List.of(), List.of("It is " + value + "."), List.of());
    }

    private static double value(NodeResult result) {
        try (RowCursor cursor = ((Table) result.outputs().get("table")).open()) {
            assertTrue(cursor.next());
            return cursor.number(0);
        }
    }

    private static void keep(KeptResults results, String id, double value) throws InterruptedException {
        results.keep(NODE, id, result(value), 2.5);
        results.settle();
    }

    private long bytes(String id) throws IOException {
        try (Stream<Path> files = Files.list(root.resolve("build").resolve(id))) {
            return files.mapToLong(file -> file.toFile().length()).sum();
        }
    }

    /** Makes a result the one that was unused for longest. */
    private void age(String id, int hours) throws IOException {
        Files.setLastModifiedTime(root.resolve("build").resolve(id).resolve("facts.json"), FileTime.from(Instant.now().minusSeconds(3600L * hours)));
    }

    private List<String> onDisk() throws IOException {
        try (Stream<Path> files = Files.list(root.resolve("build"))) {
            return files.map(file -> file.getFileName().toString()).sorted().toList();
        }
    }

    @Test
    void theDiskBeginsToForgetWhatWasUnusedForLongestAtItsLimit() throws IOException, InterruptedException {
        try (KeptResults roomy = new KeptResults(folder(ROOMY))) {
            keep(roomy, "a", 1);
            keep(roomy, "b", 2);
            keep(roomy, "c", 3);
        }
        assertEquals(List.of("a", "b", "c"), onDisk());
        age("a", 1);
        age("b", 3);
        age("c", 2);
        // room for three: the fourth is of the same size, give or take some digits of a time
        long limit = bytes("a") + bytes("b") + bytes("c") + bytes("a") / 2;
        try (KeptResults tight = new KeptResults(folder(limit), 0)) {
            keep(tight, "d", 4);
            assertEquals(List.of("a", "c", "d"), onDisk(), "b was unused for longest");
            assertEquals(1, value(tight.find(NODE, "a").orElseThrow()), "which counts as use");
            keep(tight, "e", 5);
            assertEquals(List.of("a", "d", "e"), onDisk());
        }
    }

    @Test
    void whatTheDiskForgotIsThereAsLongAsMemoryHasItAndNotLonger() throws IOException, InterruptedException {
        try (KeptResults results = new KeptResults(folder(ROOMY), 1)) {
            keep(results, "a", 1);
            assertEquals(2.5, results.facts("a").orElseThrow().seconds());
            new ResultFolder(root, "another build", ROOMY).write(NODE, "z", result(9), results.facts("a").orElseThrow());
            new ResultFolder(root, "another build", ROOMY).shrink();
            assertFalse(Files.exists(root.resolve("build/a")), "another build of the program cleared it away");
            assertEquals(1, value(results.find(NODE, "a").orElseThrow()), "memory still has it");
            assertTrue(results.facts("a").isPresent());
            keep(results, "b", 2);
            assertEquals(Optional.empty(), results.facts("a"), "now nobody has it");
            assertEquals(Optional.empty(), results.find(NODE, "a"));
            keep(results, "a", 1);
            assertTrue(results.facts("a").isPresent());
        }
    }

    @Test
    void aResultLargerThanAllMayBeTogetherDrivesNoOtherOut() throws IOException, InterruptedException {
        try (KeptResults roomy = new KeptResults(folder(ROOMY))) {
            keep(roomy, "a", 1);
        }
        MemoryTable.Builder rows = MemoryTable.builder(FakeNode.SCHEMA, "one");
        for (int i = 0; i < 20000; i++) {
            rows.row(StrictMath.sin(i));
        }
        NodeResult large = new NodeResult(Map.of("table", rows.build()), List.of(), List.of(), List.of());
        try (KeptResults tight = new KeptResults(folder(2 * bytes("a")), 1)) {
            tight.keep(NODE, "large", large, 1);
            tight.settle();
            assertEquals(List.of("a"), onDisk());
            assertTrue(tight.facts("large").isPresent(), "it is in memory");
        }
    }

    @Test
    void aDamagedResultIsGoneWhenItIsFoundOutAndAnewOneTakesItsPlace() throws IOException, InterruptedException {
        List<String> files;
        try (KeptResults results = new KeptResults(folder(ROOMY))) {
            keep(results, "a", 1);
            try (Stream<Path> found = Files.list(root.resolve("build/a"))) {
                files = found.map(file -> file.getFileName().toString()).sorted().toList();
            }
        }
        assertEquals(List.of("facts.json", "result.zip", "table.parquet"), files);
        for (String file : files) {
            for (String how : List.of("cut", "gone")) {
                try (KeptResults results = new KeptResults(folder(ROOMY), 0)) {
                    keep(results, "a", 1);
                    assertEquals(1, value(results.find(NODE, "a").orElseThrow()));
                    damage(root.resolve("build/a").resolve(file), how);
                    assertEquals(Optional.empty(), results.find(NODE, "a"), file + " " + how);
                    assertEquals(Optional.empty(), results.facts("a"), file + " " + how);
                }
            }
        }
        try (KeptResults results = new KeptResults(folder(ROOMY), 0)) {
            keep(results, "a", 1);
            damage(root.resolve("build/a/result.zip"), "cut");
            keep(results, "a", 1);
            assertEquals(1, value(results.find(NODE, "a").orElseThrow()), "run again, it is whole again");
        }
    }

    private static void damage(Path file, String how) throws IOException {
        if (how.equals("gone")) {
            Files.delete(file);
        } else {
            byte[] bytes = Files.readAllBytes(file);
            Files.write(file, java.util.Arrays.copyOf(bytes, bytes.length / 2));
        }
    }

    @Test
    void manyQuestionsAfterResultsThatNeverWereAreNotRemembered() {
        try (KeptResults results = new KeptResults(folder(ROOMY))) {
            for (int i = 0; i < 1000; i++) {
                assertEquals(Optional.empty(), results.facts("edit-" + i));
            }
            assertEquals(0, results.known());
        }
    }
}
