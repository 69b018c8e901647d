package org.modestead.host.run;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import org.modestead.host.output.Disk;
import org.modestead.host.output.OutputFault;
import org.modestead.host.output.OutputFolder;
import org.modestead.host.output.UnfinishedRun;
import org.modestead.host.table.SpillFolder;
import org.modestead.host.workflow.RunPlan;
import org.modestead.nodes.report.HtmlReport;

/** Runs checked workflows and leaves their results behind: tables, report and record, whole or not at all. */
public final class WorkflowRunner {

    /** Name of the report in the result folder. */
    public static final String REPORT = "report.html";

    private final int threads;
    private final ResultCache cache;
    private final Disk disk;

    /**
     * @param threads most steps at a time
     * @param cache results of earlier runs; shared by the runs of this runner
     * @param disk where results go
     */
    public WorkflowRunner(int threads, ResultCache cache, Disk disk) {
        this.threads = threads;
        this.cache = cache;
        this.disk = disk;
    }

    /** A runner for one run: as many threads as cores, nothing cached, the machine's disk. */
    public static WorkflowRunner once() {
        return new WorkflowRunner(Runtime.getRuntime().availableProcessors(), new ResultCache(0), Disk.REAL);
    }

    /**
     * Runs a workflow.
     *
     * <p>When a step fails, the results of the others are kept and the record says so. When the run is stopped or a
     * result cannot be written, the folder stays as it was.
     *
     * @param plan with nothing wrong
     * @param target result folder
     * @param listener hears how it goes
     * @param cancel stops it
     * @throws OutputFault if the folder cannot be used
     */
    public RunResult run(RunPlan plan, Path target, RunListener listener, CancelSwitch cancel) {
        return run(plan, target, Wanted.ALL, listener, cancel);
    }

    /**
     * Runs a workflow and writes what is wanted of it.
     *
     * @param wanted tables of steps of the plan
     * @throws OutputFault if the folder cannot be used
     */
    public RunResult run(RunPlan plan, Path target, Wanted wanted, RunListener listener, CancelSwitch cancel) {
        Instant started = Instant.now();
        SpillFolder.clearAbandoned();
        try (OutputFolder folder = OutputFolder.open(target, disk)) {
            UnfinishedRun.in(folder.folder()).ifPresent(killed -> listener.told(killed.sentence(target.toString())));
            StepRunner steps = new StepRunner(plan.workflow().baseFolder(), cache, new FolderStore(folder, wanted), listener,
                    cancel);
            Map<String, StepOutcome> outcomes = new Scheduler(plan, steps, listener, cancel).run(threads);
            RunResult result = new RunResult(plan, outcomes, folder.folder(), Duration.between(started, Instant.now()),
                    cancel.reason().isPresent());
            if (result.state() == RunResult.State.DONE || result.state() == RunResult.State.FAILED) {
                publish(result, started, folder, wanted);
            }
            return result;
        }
    }

    private static void publish(RunResult result, Instant started, OutputFolder folder, Wanted wanted) {
        try {
            if (wanted.report()) {
                byte[] report = HtmlReport.write(RunDocument.of(result)).getBytes(StandardCharsets.UTF_8);
                folder.write(REPORT, out -> out.write(report));
            }
            List<String> earlier = RunRecord.filesOf(folder.folder());
            byte[] record = RunRecord.write(result, started, folder.files());
            folder.write(RunRecord.NAME, out -> out.write(record));
            folder.publish(RunRecord.time(started), earlier, RunRecord.NAME);
        } catch (IOException unwritable) {
            throw OutputFault.of(folder.folder().toString(), unwritable);
        }
    }
}
