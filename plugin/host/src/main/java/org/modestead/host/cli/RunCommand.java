package org.modestead.host.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.function.Supplier;
import org.modestead.host.run.CancelSwitch;
import org.modestead.host.run.DefectLog;
import org.modestead.host.run.RunResult;
import org.modestead.host.run.StepOutcome;
import org.modestead.host.run.Wanted;
import org.modestead.host.run.WorkflowRunner;
import org.modestead.host.workflow.RunPlan;
import org.modestead.host.workflow.WorkflowChecker;
import org.modestead.nodes.contract.NodeCatalog;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Checks and runs a workflow and writes its results. */
@Command(name = "run", mixinStandardHelpOptions = true, versionProvider = ReleaseVersion.class,
        description = {"Checks a workflow, runs it and writes its results: DIR/STEP/PORT.csv for every table, "
                + "DIR/report.html, DIR/run.json. Nothing half-written is left when it fails or is stopped.", ""})
final class RunCommand implements Callable<Integer> {

    private final Terminal terminal;
    private final Supplier<NodeCatalog> catalog;

    @Parameters(paramLabel = "WORKFLOW", description = "Workflow file, or a folder that holds a workflow.json.")
    private Path workflow;

    @Option(names = "--out", paramLabel = "DIR", description = "Result folder; default: out in the workflow's folder.")
    private Path out;

    @Option(names = "--set", paramLabel = "STEP.KEY=VALUE", description = CheckCommand.SET_HELP)
    private List<String> set = new ArrayList<>();

    @Option(names = "--only", paramLabel = "STEP.TABLE", description = "Write this table only, and no report; may be given several times.")
    private List<String> only = new ArrayList<>();

    RunCommand(Terminal terminal, Supplier<NodeCatalog> catalog) {
        this.terminal = terminal;
        this.catalog = catalog;
    }

    @Override
    public Integer call() {
        WorkflowChecker.Outcome outcome = CheckedFile.check(catalog.get(), workflow, set);
        Optional<RunPlan> plan = outcome.plan();
        if (plan.isEmpty()) {
            CheckedFile.tell(terminal, outcome.problems());
            return ExitCode.WRONG;
        }
        Wanted wanted = new Wanted(only);
        Optional<String> unknown = wanted.problem(plan.get());
        if (unknown.isPresent()) {
            terminal.err().println(unknown.get());
            return ExitCode.WRONG;
        }
        Path target = Optional.ofNullable(out).orElse(plan.get().workflow().baseFolder().resolve("out"));
        CancelSwitch cancel = new CancelSwitch();
        ProgressLine progress = new ProgressLine(terminal, plan.get().steps().size());
        RunResult result;
        try (Interrupt interrupt = Interrupt.on(cancel, terminal)) {
            result = WorkflowRunner.once().run(plan.get(), target, wanted, progress, cancel);
            interrupt.ended(result.state() == RunResult.State.DONE || result.state() == RunResult.State.FAILED);
        } finally {
            progress.close();
        }
        return tell(result);
    }

    private int tell(RunResult result) {
        result.failures().forEach(terminal.err()::println);
        result.outcomes().forEach((step, outcome) -> {
            if (outcome instanceof StepOutcome.Skipped skipped) {
                terminal.err().println("step " + step + ": left out, because step " + skipped.because()
                        + " gave no result.");
            } else if (outcome instanceof StepOutcome.Failed failed) {
                failed.defect().ifPresent(defect -> terminal.err().println("Details: " + DefectLog.write(defect) + "."));
            }
        });
        return switch (result.state()) {
            case DONE -> {
                new RunSummary(terminal.out()).print(result);
                yield ExitCode.DONE;
            }
            case FAILED -> {
                terminal.err().println("The results of the other steps are in " + result.folder() + ".");
                yield ExitCode.FAILED;
            }
            case UNWRITTEN -> ExitCode.FAILED;
            // what stopped it has told the person
            case STOPPED -> ExitCode.STOPPED;
        };
    }
}
