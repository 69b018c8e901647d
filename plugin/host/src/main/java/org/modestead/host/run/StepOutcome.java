package org.modestead.host.run;

import java.time.Duration;
import java.util.Optional;
import org.modestead.engine.Fault;
import org.modestead.nodes.contract.NodeResult;

/** How a step ended. */
public sealed interface StepOutcome {

    /** Returns one word for tables and files. */
    String word();

    /**
     * It gave a result.
     *
     * @param result of the node
     * @param time it took
     * @param cached whether the result is that of an earlier run
     */
    record Done(NodeResult result, Duration time, boolean cached) implements StepOutcome {
        @Override
        public String word() {
            return "done";
        }
    }

    /**
     * It could not do its work.
     *
     * @param sentence what a person is told
     * @param defect the error behind it when it is not the person's, for the log
     * @param time it took
     */
    record Failed(String sentence, Optional<Throwable> defect, Duration time) implements StepOutcome {
        static Failed of(String step, Fault fault, Duration time) {
            return new Failed("step " + step + ", " + fault.getMessage(), Optional.empty(), time);
        }

        @Override
        public String word() {
            return "failed";
        }
    }

    /** Its result could not be written, so that none of the run's results can be kept. */
    record Unwritten(String sentence) implements StepOutcome {
        @Override
        public String word() {
            return "unwritten";
        }
    }

    /** It never began, because a step that it takes input from gave no result. */
    record Skipped(String because) implements StepOutcome {
        @Override
        public String word() {
            return "skipped";
        }
    }

    /** The person asked to stop before it gave a result. */
    record Stopped() implements StepOutcome {
        @Override
        public String word() {
            return "stopped";
        }
    }
}
