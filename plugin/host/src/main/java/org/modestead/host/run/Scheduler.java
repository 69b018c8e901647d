package org.modestead.host.run;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.CompletionService;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorCompletionService;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.host.workflow.RunPlan;

/**
 * Runs the steps of a plan: each as soon as its inputs are there, independent ones in parallel. A step that fails
 * stops what depends on it and nothing else. The outcome does not depend on the number of threads.
 */
final class Scheduler {

    private final RunPlan plan;
    private final StepRunner runner;
    private final RunListener listener;
    private final CancelSwitch cancel;
    private final Map<String, StepRunner.Ended> ended = new HashMap<>();
    private final List<PlannedStep> waiting;
    private int running;

    /**
     * @param plan to be run once
     * @param runner does one step
     * @param listener hears how it goes
     * @param cancel stops it
     */
    Scheduler(RunPlan plan, StepRunner runner, RunListener listener, CancelSwitch cancel) {
        this.plan = plan;
        this.runner = runner;
        this.listener = listener;
        this.cancel = cancel;
        this.waiting = new ArrayList<>(plan.order());
    }

    /**
     * Runs all steps.
     *
     * @param threads at least 1
     * @return outcomes by step id in the order of the workflow file
     */
    Map<String, StepOutcome> run(int threads) {
        ExecutorService pool = Executors.newFixedThreadPool(threads, task -> {
            Thread thread = new Thread(task, "step");
            thread.setDaemon(true);
            cancel.works(thread);
            return thread;
        });
        try {
            CompletionService<StepRunner.Ended> done = new ExecutorCompletionService<>(pool);
            while (!waiting.isEmpty() || running > 0) {
                start(done);
                if (running > 0) {
                    finish(done.take().get());
                }
            }
        } catch (InterruptedException interrupted) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException("the run was interrupted", interrupted);
        } catch (ExecutionException defect) {
            throw new IllegalStateException("a step ended without outcome", defect.getCause());
        } finally {
            pool.shutdown();
        }
        Map<String, StepOutcome> outcomes = new LinkedHashMap<>();
        plan.steps().forEach(step -> outcomes.put(step.id(), ended.get(step.id()).outcome()));
        return outcomes;
    }

    /** Hands out every step whose inputs are there; settles those whose inputs will never be. */
    private void start(CompletionService<StepRunner.Ended> done) {
        for (PlannedStep step : List.copyOf(waiting)) {
            Optional<StepOutcome> never = never(step);
            if (never.isPresent()) {
                waiting.remove(step);
                finish(step, new StepRunner.Ended(step, never.get(), Optional.empty()));
            } else if (step.inputs().values().stream().allMatch(source -> ended.containsKey(source.step()))) {
                waiting.remove(step);
                running++;
                StepRunner.Inputs inputs = inputs(step);
                done.submit(() -> runner.run(step, inputs));
            }
        }
    }

    private Optional<StepOutcome> never(PlannedStep step) {
        for (Link.End source : step.inputs().values()) {
            StepRunner.Ended before = ended.get(source.step());
            if (before != null && before.outcome() instanceof StepOutcome.Skipped skipped) {
                return Optional.of(skipped);
            } else if (before != null && before.outcome() instanceof StepOutcome.Failed) {
                return Optional.of(new StepOutcome.Skipped(source.step()));
            } else if (before != null && !(before.outcome() instanceof StepOutcome.Done)) {
                return Optional.of(new StepOutcome.Stopped());
            }
        }
        return Optional.empty();
    }

    private StepRunner.Inputs inputs(PlannedStep step) {
        Map<String, Object> values = new HashMap<>();
        Map<String, String> fingerprints = new HashMap<>();
        step.inputs().forEach((port, source) -> {
            StepRunner.Ended before = ended.get(source.step());
            values.put(port, ((StepOutcome.Done) before.outcome()).result().outputs().get(source.port()));
            before.fingerprint().ifPresent(found -> fingerprints.put(source.step(), found));
        });
        return new StepRunner.Inputs(values, fingerprints);
    }

    private void finish(StepRunner.Ended end) {
        running--;
        finish(end.step(), end);
    }

    private void finish(PlannedStep step, StepRunner.Ended end) {
        ended.put(step.id(), end);
        listener.ended(step.id(), end.outcome());
    }
}
