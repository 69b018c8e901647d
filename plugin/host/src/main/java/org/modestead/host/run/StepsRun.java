package org.modestead.host.run;

import java.util.Map;
import org.modestead.host.workflow.RunPlan;

/** Runs the steps of a plan and hands each outcome to a listener, without a result folder: for hosts that keep results themselves. */
public final class StepsRun {

    private StepsRun() {}

    /**
     * Runs all steps of a plan.
     *
     * @param plan with nothing wrong
     * @param results of earlier runs
     * @param store keeps what comes
     * @param listener hears how it goes
     * @param cancel stops it
     * @param threads most steps at a time, at least 1
     * @return outcomes by step id in the order of the workflow file
     */
    public static Map<String, StepOutcome> run(RunPlan plan, Results results, StepStore store, RunListener listener, CancelSwitch cancel,
            int threads) {
        StepRunner steps = new StepRunner(plan.workflow().baseFolder(), results, store, listener, cancel);
        return new Scheduler(plan, steps, listener, cancel).run(threads);
    }
}
