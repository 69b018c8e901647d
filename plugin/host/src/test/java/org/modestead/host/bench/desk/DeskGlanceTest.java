package org.modestead.host.bench.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;

/** The list of desks tells of each what a whole reading of its journal tells, from the last line alone. */
class DeskGlanceTest {

    @TempDir
    private Path folder;

    private Workflow workflow(String name, int steps) {
        List<Step> made = java.util.stream.IntStream.range(0, steps)
                .mapToObj(i -> new Step("step-" + i, "table-query", Map.of("sql", "SELECT * FROM input -- " + "x".repeat(200)))).toList();
        return new Workflow(name, folder.resolve("workflow.json"), made, List.of());
    }

    private Path journal() {
        return folder.resolve(Journal.NAME);
    }

    /** A glance and a whole reading agree; times are kept to the millisecond. */
    private void assertGlance(String name, int steps, boolean unsaved) {
        DeskFolder.Kept kept = Desk.glance(folder).orElseThrow();
        assertEquals(List.of(name, steps, unsaved, folder.resolve("workflow.json")), List.of(kept.name(), kept.steps(), kept.unsaved(), kept.file()));
        Journal.Told told = Journal.read(folder).orElseThrow();
        assertEquals(told.changed(), kept.changed());
        assertEquals(told.timeline().current().name(), kept.name());
        assertEquals(told.timeline().current().steps().size(), kept.steps());
    }

    @Test
    void whateverHappenedLastIsTold() {
        try (Desk desk = Desk.begin(folder, workflow("first", 1), true)) {
            assertGlance("first", 1, false);
            desk.edit(workflow("second", 2), "more");
            assertGlance("second", 2, true);
            desk.edit(workflow("large", 200), "many");
            assertGlance("large", 200, true);
            desk.undo();
            assertGlance("second", 2, true);
            desk.redo();
            assertGlance("large", 200, true);
            desk.undo();
            desk.undo();
            assertGlance("first", 1, false);
            desk.redo();
            desk.save(workflow -> workflow.in(folder.resolve("workflow.json")));
            assertGlance("second", 2, false);
        }
        try (Desk again = Desk.resume(folder)) {
            assertEquals("", again.recovered());
            assertGlance("second", 2, false);
        }
    }

    @Test
    void nothingButTheLastLineIsRead() throws IOException {
        try (Desk desk = Desk.begin(folder, workflow("first", 1), true)) {
            desk.edit(workflow("large", 200), "many");
        }
        List<String> lines = Files.readAllLines(journal());
        Files.writeString(journal(), lines.stream().limit(lines.size() - 1).map(line -> "no journal").collect(Collectors.joining("\n", "", "\n"))
                + lines.get(lines.size() - 1) + "\n");
        assertEquals(200, Desk.glance(folder).orElseThrow().steps());
    }

    @Test
    void halfALineAndJournalsOfEarlierBuildsAreReadWhole() throws IOException {
        try (Desk desk = Desk.begin(folder, workflow("first", 1), true)) {
            desk.edit(workflow("second", 2), "more");
        }
        String whole = Files.readString(journal());
        Files.writeString(journal(), whole + "{\"do\":\"edit\",\"la", StandardCharsets.UTF_8);
        assertGlance("second", 2, true);
        String former = whole.replaceAll(",\"now\":\\{[^{}]*\\}", "");
        assertTrue(former.length() < whole.length());
        Files.writeString(journal(), former);
        assertGlance("second", 2, true);
        Files.writeString(journal(), "");
        assertEquals(Optional.empty(), Desk.glance(folder));
    }
}
