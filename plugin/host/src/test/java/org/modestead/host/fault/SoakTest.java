package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
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
    private static final int ROWS = 20_000;

    @TempDir
    Path folder;

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
        assertTrue(after.isNoMoreThan(before), told);
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
