package org.modestead.host.bench.desk;

import java.util.List;
import org.modestead.host.workflow.Workflow;

/**
 * What an edit gives.
 *
 * @param workflow the document after it
 * @param made ids of steps that it made
 */
public record Change(Workflow workflow, List<String> made) {

    /** Takes an immutable copy. */
    public Change {
        made = List.copyOf(made);
    }

    /** A change that makes no step. */
    static Change of(Workflow workflow) {
        return new Change(workflow, List.of());
    }
}
