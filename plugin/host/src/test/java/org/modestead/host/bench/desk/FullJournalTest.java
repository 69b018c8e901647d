package org.modestead.host.bench.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.workflow.Workflow;

/** A disk that is full in the middle of a line of the journal: the edit is refused, and edits made once there is room are not hidden by it. */
class FullJournalTest {

    private static final int ROOM = 1 << 20;

    @TempDir
    Path folder;

    @Test
    void editsAfterAFullDiskAreFoundAgain() throws Exception {
        assumeTrue(command("mount", "-t", "tmpfs", "-o", "size=1m", "tmpfs", folder.toString()) == 0, "a small file system can be mounted (needs root on Linux)");
        try {
            Path own = folder.resolve("desk");
            Desk desk = Desk.begin(own, named("start"), false);
            desk.edit(named("before"), "named");
            fill();
            assertThrows(DeskFault.class, () -> desk.edit(named("x".repeat(20_000)), "too much"));
            assertEquals("before", desk.timeline().current().name());
            Files.delete(folder.resolve("full"));
            desk.edit(named("after"), "named again");
            // the process is gone without closing anything
            Files.deleteIfExists(own.resolve(".lock"));
            assertEquals("after", Journal.read(own).orElseThrow().timeline().current().name());
            desk.close();
        } finally {
            assertEquals(0, command("umount", folder.toString()));
        }
    }

    /** Leaves less room than the edit needs: the rest of the journal's last page. */
    private void fill() throws IOException {
        try (var channel = Files.newByteChannel(folder.resolve("full"), StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE)) {
            for (int i = 0; i < ROOM; i += 1 << 10) {
                channel.write(ByteBuffer.allocate(1 << 10));
            }
        } catch (IOException full) {
            assertEquals("No space left on device", full.getMessage());
        }
    }

    private static Workflow named(String name) {
        return new Workflow(name, Path.of("/desk/workflow.json"), List.of(), List.of());
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
