package org.modestead.host.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.ChildProcess;
import org.modestead.host.TestWorkflows;

/** Stopping and killing the process in the middle of a run: the folder holds the results of before, whole, or nothing. */
class StopTest {

    /** Exit code of a process ended by SIGTERM: 128 + 15, as shells count. */
    private static final int TERMINATED = 143;

    @TempDir
    Path folder;

    @BeforeEach
    void workflows() throws IOException {
        Files.writeString(folder.resolve("t.csv"), "time,flow\n0,1\n1,2\n");
        Files.createDirectory(folder.resolve("long"));
        TestWorkflows.write(folder, List.of("source:table-source:{\"path\": \"t.csv\"}"), List.of());
        TestWorkflows.write(folder.resolve("long"), List.of("source:table-source:{\"path\": "
                + "\"../t.csv\"}", "more:wait-for-stop"),
                List.of("source.table>more.a"));
    }

    @Test
    void aStoppedRunSaysSoAndLeavesTheResultsOfBefore() throws Exception {
        Map<String, String> before = finished();
        ChildProcess child = longRun();
        child.process().destroy();
        int exit = child.exit();
        assertEquals(TERMINATED, exit, child.said());
        assertTrue(child.said().contains("Stopped; the result folder is as it was before."), child.said());
        assertFalse(child.said().contains("Exception"), child.said());
        assertEquals(before, contents(folder.resolve("out")));
        assertEquals(List.of(), hidden(), "nothing is left beside the folder");
    }

    @Test
    void aKilledRunLeavesTheResultsOfBeforeAndTheNextRunClearsUp() throws Exception {
        Map<String, String> before = finished();
        ChildProcess child = longRun();
        child.process().destroyForcibly();
        child.exit();
        assertEquals(before, contents(folder.resolve("out")));
        assertEquals(before.keySet(), finished().keySet(), "the lock of the killed process is gone");
        assertEquals(List.of(), hidden());
    }

    @Test
    void aRunKilledBeforeItsFirstResultsLeavesNoFolder() throws Exception {
        ChildProcess child = longRun();
        child.process().destroyForcibly();
        child.exit();
        assertFalse(Files.exists(folder.resolve("out")));
    }

    @Test
    void twoProcessesCannotWriteOneFolder() throws Exception {
        ChildProcess first = longRun();
        ChildProcess second = ChildProcess.start(Files.createDirectory(folder.resolve("second")), List.of(), "run",
                folder.resolve("workflow.json").toString(), "--out", folder.resolve("out").toString());
        assertEquals(1, second.exit());
        assertTrue(second.said().contains("another run is writing this folder; wait until it ends, or choose another "
                + "folder."),
                second.said());
        first.process().destroyForcibly();
        first.exit();
    }

    private ChildProcess longRun() throws IOException, InterruptedException {
        ChildProcess child = ChildProcess.start(folder, List.of("-Xmx256m"), "run", folder.resolve("long")
                .toString(), "--out",
                folder.resolve("out").toString());
        child.await("more: started");
        return child;
    }

    private Map<String, String> finished() throws IOException, InterruptedException {
        ChildProcess child = ChildProcess.start(folder, List.of("-Xmx256m"), "run", folder.toString());
        assertEquals(0, child.exit(), child.said());
        return contents(folder.resolve("out"));
    }

    private static Map<String, String> contents(Path root) throws IOException {
        Map<String, String> contents = new TreeMap<>();
        try (Stream<Path> inside = Files.walk(root)) {
            for (Path file : inside.filter(Files::isRegularFile).toList()) {
                contents.put(root.relativize(file).toString(), Files.readString(file));
            }
        }
        return contents;
    }

    private List<String> hidden() throws IOException {
        try (Stream<Path> inside = Files.list(folder)) {
            return inside.map(path -> path.getFileName().toString()).filter(name -> name.startsWith(".")).sorted().toList();
        }
    }
}
