package org.modestead.host.workflow;

import java.util.List;

/**
 * A workflow with nothing wrong, ready to run.
 *
 * @param workflow as written
 * @param steps in file order
 * @param order the same steps, each after all that it takes input from; ties in file order
 */
public record RunPlan(Workflow workflow, List<PlannedStep> steps, List<PlannedStep> order) {

    /** Takes immutable copies. */
    public RunPlan {
        steps = List.copyOf(steps);
        order = List.copyOf(order);
    }
}
