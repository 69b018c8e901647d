package org.modestead.host.run;

import java.nio.file.Path;
import java.time.Duration;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.host.workflow.RunPlan;

/**
 * How a run ended.
 *
 * @param plan what was run
 * @param outcomes by step id in the order of the workflow file
 * @param folder where the results are
 * @param time it took
 * @param stopped whether the person stopped it before its results were kept
 */
public record RunResult(RunPlan plan, Map<String, StepOutcome> outcomes, Path folder, Duration time,
        boolean stopped) {

    /** How a run ended, in one word. */
    public enum State {
        /** Every step gave its result. */
        DONE("done"),
        /** A step failed; the results of the others were kept. */
        FAILED("failed"),
        /** Results could not be written; nothing was kept. */
        UNWRITTEN("unwritten"),
        /** The person stopped it; nothing was kept. */
        STOPPED("stopped");

        private final String word;

        State(String word) {
            this.word = word;
        }

        /** Returns the word used in files. */
        public String word() {
            return word;
        }
    }

    /** Takes an immutable, ordered copy. */
    public RunResult {
        outcomes = Collections.unmodifiableMap(new LinkedHashMap<>(outcomes));
    }

    /** Returns how the run ended. */
    public State state() {
        if (outcomes.values().stream().anyMatch(StepOutcome.Unwritten.class::isInstance)) {
            return State.UNWRITTEN;
        } else if (stopped) {
            return State.STOPPED;
        }
        return outcomes.values().stream().allMatch(StepOutcome.Done.class::isInstance) ? State.DONE : State.FAILED;
    }

    /** Returns what went wrong, one sentence a step. */
    public List<String> failures() {
        return outcomes.values().stream().flatMap(outcome -> outcome instanceof StepOutcome.Failed failed
                ? java.util.stream.Stream.of(failed.sentence())
                : outcome instanceof StepOutcome.Unwritten unwritten ? java.util.stream.Stream.of(unwritten.sentence())
                        : java.util.stream.Stream.empty()).distinct().toList();
    }
}
