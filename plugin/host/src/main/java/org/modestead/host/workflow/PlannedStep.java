package org.modestead.host.workflow;

import java.util.Map;
import java.util.Objects;
import java.util.TreeMap;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Settings;

/**
 * A step that may run: its node is known, its settings fit and its required inputs are connected.
 *
 * @param id of the step
 * @param node that does the work
 * @param settings complete
 * @param inputs where each connected input port takes its value from, by input port id in alphabetical order
 */
public record PlannedStep(String id, Node node, Settings settings, Map<String, Link.End> inputs) {

    /** Takes an immutable, ordered copy. */
    public PlannedStep {
        Objects.requireNonNull(id);
        Objects.requireNonNull(node);
        inputs = java.util.Collections.unmodifiableMap(new TreeMap<>(inputs));
    }

    /** Returns the node's declaration. */
    public NodeDeclaration declaration() {
        return node.declaration();
    }
}
