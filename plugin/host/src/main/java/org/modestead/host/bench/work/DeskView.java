package org.modestead.host.bench.work;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.modestead.host.bench.check.Inspection;
import org.modestead.host.bench.run.StepState;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;

/**
 * All that the page shows of the desk, as it stood at one moment.
 *
 * @param revision rises with everything that changes
 * @param desk what is open; empty at the start page
 */
public record DeskView(long revision, Optional<Open> desk) {

    /**
     * A desk that is open.
     *
     * @param id in the desk folder
     * @param workflow the document
     * @param ordered its steps band by band
     * @param saved whether the file on disk holds this document
     * @param savedWords for people
     * @param recovered a sentence when unsaved work of an earlier process was taken up; else empty
     * @param undo what undo would take back
     * @param redo what redo would do again
     * @param inspection everything wrong, and what is known of columns
     * @param standing of each step, by id
     * @param run what runs
     */
    public record Open(String id, Workflow workflow, List<Step> ordered, boolean saved, String savedWords, String recovered, Optional<String> undo,
            Optional<String> redo, Inspection inspection, Map<String, Standing> standing, RunView run) {

        /** Takes immutable copies. */
        public Open {
            ordered = List.copyOf(ordered);
            standing = Map.copyOf(standing);
        }

        /** Returns where Save goes. */
        public Path file() {
            return workflow.file();
        }
    }

    /**
     * How one step stands.
     *
     * @param state of the step
     * @param result names the result that can be looked at; empty without one
     */
    public record Standing(StepState state, Optional<String> result) {}

    /**
     * What runs.
     *
     * @param running whether something does
     * @param words for people, empty when nothing runs
     * @param fraction done so far, in [0, 1]
     * @param secondsLeft where that can be told
     * @param stopping whether the person asked to stop
     * @param last how the last run ended, empty when there was none
     */
    public record RunView(boolean running, String words, double fraction, OptionalDouble secondsLeft, boolean stopping, String last) {

        /** Nothing runs. */
        public static RunView idle(String last) {
            return new RunView(false, "", 0, OptionalDouble.empty(), false, last);
        }
    }
}
