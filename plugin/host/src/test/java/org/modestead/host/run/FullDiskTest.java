package org.modestead.host.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.FilterOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.atomic.AtomicLong;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.SmallDisk;
import org.modestead.host.TestWorkflows;
import org.modestead.host.output.Disk;
import org.modestead.host.workflow.RunPlan;

/** A disk that fills up while results are written: one sentence, and the results of before stay whole. */
class FullDiskTest {

    private static final int ROWS = 200_000;

    @TempDir
    Path folder;

    private RunPlan plan;

    @BeforeEach
    void workflow() throws IOException {
        StringBuilder text = new StringBuilder("time,flow\n");
        for (int i = 0; i < ROWS; i++) {
            text.append(i).append(",0.123456789").append(i % 10).append('\n');
        }
        Files.writeString(folder.resolve("t.csv"), text);
        plan = TestWorkflows.plan(TestWorkflows.write(folder, List.of("source:table-source:{\"path\": \"t.csv\"}",
                "q:table-query"), List.of("source.table>q.input")), TestWorkflows.allNodes());
    }

    @Test
    void aDiskThatFillsUpLeavesTheResultsOfBefore() throws IOException {
        Path out = folder.resolve("out");
        Files.createDirectories(out);
        Files.writeString(out.resolve("run.json"), "old");
        AtomicLong room = new AtomicLong(1_000_000);
        RunResult result = new WorkflowRunner(2, new ResultCache(0), file -> limited(Disk.REAL.create(file), room))
                .run(plan, out, RunListener.NONE, new CancelSwitch());
        assertTold(result);
        assertEquals(List.of("out/run.json"), files(folder).stream().filter(name -> name.contains("out")).toList());
        assertEquals("old", Files.readString(out.resolve("run.json")));
    }

    @Test
    void aReallyFullFileSystemDoesTheSame() throws Exception {
        try (SmallDisk small = SmallDisk.over(Files.createDirectory(folder.resolve("small")))) {
            RunResult result = new WorkflowRunner(2, new ResultCache(0), Disk.REAL)
                    .run(plan, small.folder().resolve("out"), RunListener.NONE, new CancelSwitch());
            assertTold(result);
            assertEquals(List.of(), files(small.folder()));
        }
    }

    private static void assertTold(RunResult result) {
        assertEquals(RunResult.State.UNWRITTEN, result.state());
        assertTrue(result.failures().get(0).matches("results of step source: the disk is full \\(.*\\); make room or "
                + "choose a folder on "
                + "another disk; nothing half-written was left\\."), result.failures().toString());
    }

    private static OutputStream limited(OutputStream out, AtomicLong room) {
        return new FilterOutputStream(out) {
            @Override
            public void write(byte[] bytes, int from, int count) throws IOException {
                if (room.addAndGet(-count) < 0) {
                    throw new IOException("No space left on device");
                }
                out.write(bytes, from, count);
            }
        };
    }

    private static List<String> files(Path root) throws IOException {
        try (Stream<Path> inside = Files.walk(root)) {
            return inside.filter(Files::isRegularFile).map(file -> root.relativize(file).toString()).sorted().toList();
        }
    }
}
