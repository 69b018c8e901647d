package org.modestead.host.workflow;

import java.util.Objects;
import java.util.OptionalInt;

/**
 * What people wrote on a step and where they put it: kept in the file, of no effect on a run.
 *
 * @param title name in place of the node's; empty for none
 * @param note remark; empty for none
 * @param place order among the steps of its stage, not negative; empty where nobody ordered them
 */
public record StepLabel(String title, String note, OptionalInt place) {

    /** Nothing was written. */
    public static final StepLabel NONE = new StepLabel("", "", OptionalInt.empty());

    /** Checks that all parts are there. */
    public StepLabel {
        Objects.requireNonNull(title);
        Objects.requireNonNull(note);
        Objects.requireNonNull(place);
    }

    /** The same label with another title. */
    public StepLabel titled(String other) {
        return new StepLabel(other, note, place);
    }

    /** The same label with another note. */
    public StepLabel noted(String other) {
        return new StepLabel(title, other, place);
    }

    /** The same label at another place. */
    public StepLabel at(int other) {
        return new StepLabel(title, note, OptionalInt.of(other));
    }
}
