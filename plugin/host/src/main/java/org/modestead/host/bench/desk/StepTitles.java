package org.modestead.host.bench.desk;

import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NodeCatalog;

/** Names of steps for people, as cards bear them. */
public final class StepTitles {

    private StepTitles() {}

    /** Returns the title of a step, its own or the node's; with the id in brackets where another step has the same title. */
    public static String of(Workflow workflow, NodeCatalog catalog, String id) {
        return workflow.step(id).map(step -> {
            String title = title(step, catalog);
            long same = workflow.steps().stream().filter(other -> title(other, catalog).equals(title)).count();
            return same > 1 ? title + " (" + id + ")" : title;
        }).orElse(id);
    }

    private static String title(Step step, NodeCatalog catalog) {
        return step.label().title().isEmpty() ? catalog.find(step.node()).map(node -> node.declaration().title()).orElse(step.id()) : step.label().title();
    }
}
