package org.modestead.host.workflows;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.DynamicContainer.dynamicContainer;
import static org.junit.jupiter.api.DynamicTest.dynamicTest;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicContainer;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.run.RunResult;
import org.modestead.host.run.StepOutcome;
import org.modestead.nodes.table.Table;

/** Runs every folder of test-workflows and compares its tables with its expected.json. */
class TestWorkflowsTest {

    /** Surefire names the module's folder; an IDE starts in it. */
    private static final Path FOLDERS = Path.of(System.getProperty("basedir", ""), "../../test-workflows")
            .toAbsolutePath().normalize();
    private static final String EXPECTED = "expected.json";

    @TempDir
    static Path results;

    @TestFactory
    Stream<DynamicContainer> everyWorkflowGivesWhatIsExpected() throws IOException {
        return folders().stream().map(folder -> dynamicContainer(folder.getFileName().toString(), tests(folder).stream()));
    }

    @Test
    void everyFolderSaysWhatItExpects() throws IOException {
        List<Path> folders = folders();
        // a folder that is not found would be a green test of nothing
        assertTrue(folders.size() >= 5, folders.toString());
        for (Path folder : folders) {
            assertTrue(Files.isRegularFile(folder.resolve(EXPECTED)), folder + " has no " + EXPECTED);
            assertTrue(!Expectation.read(folder.resolve(EXPECTED)).expectations().isEmpty(), folder + " expects nothing");
        }
    }

    @Test
    void theGeneratorMakesTheCommittedRecordingsByteByByte() {
        Path folder = FOLDERS.resolve("pump-house");
        RunResult made = Workflows.run(folder.resolve("generate.json"), results.resolve("generated"));
        assertEquals(RunResult.State.DONE, made.state());
        assertSameBytes(folder.resolve("data/recordings.csv"), made.folder().resolve("station/table.csv"));
        assertSameBytes(folder.resolve("data/truth.csv"), made.folder().resolve("station/truth.csv"));
    }

    @Test
    void theSameWorkflowGivesTheSameTablesByteByByte() throws IOException {
        Path workflow = FOLDERS.resolve("three-flows");
        Path first = Workflows.run(workflow, results.resolve("first")).folder();
        Path second = Workflows.run(workflow, results.resolve("second")).folder();
        try (Stream<Path> files = Files.walk(first)) {
            List<Path> tables = files.filter(file -> file.toString().endsWith(".csv")).toList();
            assertTrue(tables.size() > 10, tables.toString());
            tables.forEach(table -> assertSameBytes(table, second.resolve(first.relativize(table))));
        }
    }

    /** One test that the workflow runs, then one an expectation on the tables it gave. */
    private static List<DynamicTest> tests(Path folder) {
        List<RunResult> run = new ArrayList<>();
        List<DynamicTest> tests = new ArrayList<>();
        tests.add(dynamicTest("runs", () -> {
            run.add(Workflows.run(folder, results.resolve(folder.getFileName())));
            assertEquals(List.of(), run.get(0).failures());
        }));
        for (Expectation expected : Workflows.expectations(folder.resolve(EXPECTED))) {
            tests.add(dynamicTest(expected.name(), () -> {
                assertTrue(!run.isEmpty(), "the workflow gave no result");
                assertEquals(Optional.empty(), expected.differs(table(run.get(0), expected)));
            }));
        }
        return tests;
    }

    private static Table table(RunResult run, Expectation expected) {
        StepOutcome outcome = run.outcomes().get(expected.step());
        if (outcome instanceof StepOutcome.Done done
                && done.result().outputs().get(expected.table()) instanceof Table table) {
            return table;
        }
        throw new AssertionError("there is no table " + expected.step() + "." + expected.table() + " among the results of "
                + run.outcomes().keySet());
    }

    /** All but the one with workflows of another host. */
    private static List<Path> folders() throws IOException {
        try (Stream<Path> entries = Files.list(FOLDERS)) {
            return entries.filter(Files::isDirectory).filter(folder -> !folder.endsWith("knime")).sorted().toList();
        }
    }

    private static void assertSameBytes(Path wanted, Path found) {
        try {
            assertEquals(-1, Files.mismatch(wanted, found), found + " differs from " + wanted + " at that byte");
        } catch (IOException unreadable) {
            throw new AssertionError(unreadable);
        }
    }
}
