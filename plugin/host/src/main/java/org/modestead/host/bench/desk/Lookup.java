package org.modestead.host.bench.desk;

import java.util.List;
import java.util.function.UnaryOperator;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NearestName;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;

/** Finds what an edit names, or tells that it is not there. */
final class Lookup {

    private Lookup() {}

    static Step step(Workflow workflow, String id) {
        List<String> ids = workflow.steps().stream().map(Step::id).toList();
        return workflow.step(id).orElseThrow(() -> new EditFault("step " + id, "there is no such step" + NearestName.hint(id, ids),
                ids.isEmpty() ? "add a step first" : "use one of " + String.join(", ", ids)));
    }

    static Node node(NodeCatalog catalog, String id) {
        return catalog.find(id).orElseThrow(() -> new EditFault("node " + id, "there is no such node" + NearestName.hint(id, catalog.ids()),
                "use one of " + String.join(", ", catalog.ids())));
    }

    static Port port(Workflow workflow, NodeCatalog catalog, Link.End end, boolean input) {
        NodeDeclaration declaration = node(catalog, step(workflow, end.step()).node()).declaration();
        List<Port> ports = input ? declaration.inputs() : declaration.outputs();
        List<String> names = ports.stream().map(Port::id).toList();
        String kind = input ? "input" : "output";
        return ports.stream().filter(port -> port.id().equals(end.port())).findFirst()
                .orElseThrow(() -> new EditFault("step " + end.step(), "it has no " + kind + " \"" + end.port() + "\"",
                        names.isEmpty() ? "choose another step: this one has no " + kind : "use one of " + String.join(", ", names)));
    }

    /** Returns the document with one step replaced. */
    static Workflow changed(Workflow workflow, String id, UnaryOperator<Step> change) {
        step(workflow, id);
        return workflow.with(workflow.steps().stream().map(step -> step.id().equals(id) ? change.apply(step) : step).toList(), workflow.links());
    }
}
