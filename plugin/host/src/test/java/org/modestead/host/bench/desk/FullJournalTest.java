package org.modestead.host.bench.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.SmallDisk;
import org.modestead.host.workflow.Workflow;

/** A disk that is full in the middle of a line of the journal: the edit is refused, and edits made once there is room are not hidden by it. */
class FullJournalTest {

    @TempDir
    Path folder;

    @Test
    void editsAfterAFullDiskAreFoundAgain() throws Exception {
        Path own = folder.resolve("desk");
        try (SmallDisk disk = SmallDisk.over(folder); Desk desk = Desk.begin(own, named("start"), false)) {
            desk.edit(named("before"), "named");
            disk.fill("full");
            assertThrows(DeskFault.class, () -> desk.edit(named("x".repeat(20_000)), "too much"));
            assertEquals("before", desk.timeline().current().name());
            Files.delete(folder.resolve("full"));
            desk.edit(named("after"), "named again");
            // the process is gone without closing anything
            Files.deleteIfExists(own.resolve(".lock"));
            assertEquals("after", Journal.read(own).orElseThrow().timeline().current().name());
        }
    }

    /** Its lock was held until the process ended. */
    @Test
    void aDeskWhoseJournalCouldNotBeBegunIsOpenedOnceItCan() throws Exception {
        Path own = folder.resolve("desk");
        Path inTheWay = Files.createDirectories(own.resolve(Journal.NAME));
        assertThrows(DeskFault.class, () -> Desk.begin(own, named("start"), false));
        Files.delete(inTheWay);
        try (Desk desk = Desk.begin(own, named("start"), false)) {
            assertEquals("start", desk.timeline().current().name());
        }
    }

    private static Workflow named(String name) {
        return new Workflow(name, Path.of("/desk/workflow.json"), List.of(), List.of());
    }
}
