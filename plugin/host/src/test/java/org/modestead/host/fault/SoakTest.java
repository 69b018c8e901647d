package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.sun.management.UnixOperatingSystemMXBean;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;
import org.modestead.host.run.CancelSwitch;
import org.modestead.host.run.RunListener;
import org.modestead.host.run.RunResult;
import org.modestead.host.run.WorkflowRunner;
import org.modestead.host.workflow.RunPlan;

/** Many runs in one process leave nothing behind: no memory, open file, thread or temporary folder. {@code -Dsoak=500} runs more than the build does. */
class SoakTest {

    private static final int WARM = 5;
    /** Compiled code and caches of the libraries settle slowly; a run that kept its table of 20 000 rows would show after few. */
    private static final long SLACK_BYTES = 8_000_000;
    /** The runtime's own: class files and helpers that come and go. */
    private static final int SLACK = 4;
    private static final int ROWS = 20_000;

    @TempDir
    Path folder;

    private record Held(long bytes, long files, int threads, long spills) {

        static Held now() throws IOException {
            for (int i = 0; i < 3; i++) {
                System.gc();
            }
            long files = ManagementFactory.getOperatingSystemMXBean() instanceof UnixOperatingSystemMXBean unix ? unix.getOpenFileDescriptorCount() : 0;
            try (Stream<Path> temporary = Files.list(Path.of(System.getProperty("java.io.tmpdir")))) {
                return new Held(ManagementFactory.getMemoryMXBean().getHeapMemoryUsage().getUsed(), files, ManagementFactory.getThreadMXBean().getThreadCount(),
                        temporary.filter(path -> path.getFileName().toString().startsWith("modestead-spill-" + ProcessHandle.current().pid() + "-")).count());
            }
        }

        String words() {
            return String.format(Locale.ROOT, "%.1f MB, %d files, %d threads, %d temporary folders", bytes / 1e6, files, threads, spills);
        }
    }

    @Test
    void runsLeaveNothingBehind() throws IOException {
        StringBuilder text = new StringBuilder("time,flow\n");
        for (int i = 0; i < ROWS; i++) {
            text.append(i).append(',').append(Math.sin(0.01 * i)).append('\n');
        }
        Files.writeString(folder.resolve("t.csv"), text);
        RunPlan plan = TestWorkflows.plan(TestWorkflows.write(folder, List.of("source:table-source:{\"path\": \"t.csv\"}", "q:table-query"),
                List.of("source.table>q.input")), TestWorkflows.allNodes());
        int runs = Integer.getInteger("soak", 10);
        run(plan, WARM);
        Held before = Held.now();
        run(plan, runs);
        Held after = Held.now();
        String told = runs + " runs: " + before.words() + " before, " + after.words() + " after";
        System.out.println(told);
        assertTrue(after.bytes() - before.bytes() < SLACK_BYTES, told);
        assertTrue(after.files() - before.files() <= SLACK, told);
        assertTrue(after.threads() - before.threads() <= SLACK, told);
        assertEquals(before.spills(), after.spills(), told);
    }

    private void run(RunPlan plan, int runs) throws IOException {
        for (int i = 0; i < runs; i++) {
            RunResult result = WorkflowRunner.once().run(plan, folder.resolve("out"), RunListener.NONE, new CancelSwitch());
            assertEquals(RunResult.State.DONE, result.state(), result.failures().toString());
        }
        try (Stream<Path> inside = Files.walk(folder)) {
            assertEquals(List.of(), inside.filter(path -> path.toString().endsWith(".part")).toList());
        }
    }
}
