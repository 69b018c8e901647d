package org.modestead.host.bench.desk;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;

/** The order of steps within the bands of the bench, one band a stage. */
public final class Bands {

    private Bands() {}

    /** Returns the stage in whose band a step lies: its node's, the first where the node is not known. */
    public static NodeDeclaration.Stage stage(Step step, NodeCatalog catalog) {
        return catalog.find(step.node()).map(node -> node.declaration().stage()).orElse(NodeDeclaration.Stage.DATA);
    }

    /** Returns all steps, band by band, in a band by place; steps without one come after those with one, in file order. */
    public static List<Step> ordered(Workflow workflow, NodeCatalog catalog) {
        List<Step> ordered = new ArrayList<>();
        for (NodeDeclaration.Stage stage : NodeDeclaration.Stage.values()) {
            ordered.addAll(band(workflow, catalog, stage));
        }
        return ordered;
    }

    static List<Step> band(Workflow workflow, NodeCatalog catalog, NodeDeclaration.Stage stage) {
        return workflow.steps().stream().filter(step -> stage(step, catalog) == stage)
                .sorted(Comparator.comparingInt(step -> step.label().place().orElse(Integer.MAX_VALUE))).toList();
    }

    /** Returns the document with a step at another place of its band; the others of the band make room. */
    static Workflow moved(Workflow workflow, NodeCatalog catalog, String id, int place) {
        Step moved = Lookup.step(workflow, id);
        List<String> band = new ArrayList<>(band(workflow, catalog, stage(moved, catalog)).stream().map(Step::id).toList());
        band.remove(id);
        band.add(Math.max(0, Math.min(place, band.size())), id);
        List<Step> steps = workflow.steps().stream().map(step -> {
            int at = IntStream.range(0, band.size()).filter(i -> band.get(i).equals(step.id())).findFirst().orElse(-1);
            return at < 0 ? step : step.with(step.label().at(at));
        }).toList();
        return workflow.with(steps, workflow.links());
    }
}
