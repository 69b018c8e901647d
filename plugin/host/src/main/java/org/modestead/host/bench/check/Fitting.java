package org.modestead.host.bench.check;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.modestead.host.bench.desk.EditFault;
import org.modestead.host.bench.desk.LinkRules;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;

/**
 * What fits one end of a link.
 *
 * @param end the end
 * @param output whether it is an output
 * @param type what travels
 * @param ports all ports of the other kind, with what speaks against each
 * @param nodes that could be added
 */
public record Fitting(Link.End end, boolean output, PortType type, List<Candidate> ports, List<Offer> nodes) {

    /** Takes immutable copies. */
    public Fitting {
        ports = List.copyOf(ports);
        nodes = List.copyOf(nodes);
    }

    /**
     * A port of a step.
     *
     * @param end the port
     * @param fed what feeds it now, when it is an input
     * @param refusal why it does not fit; empty when it does
     */
    public record Candidate(Link.End end, Optional<Link.End> fed, Optional<EditFault> refusal) {}

    /** A node, and the first of its ports that fits. */
    public record Offer(String node, String port) {}

    /**
     * Finds what fits.
     *
     * @param output which end is meant, where a step has an input and an output of one name
     * @throws EditFault if the end is not there
     */
    public static Fitting of(Workflow workflow, NodeCatalog catalog, Link.End end, boolean output) {
        Step step = workflow.step(end.step()).orElseThrow(() -> new EditFault("step " + end.step(), "there is no such step", "choose another end"));
        NodeDeclaration declaration = catalog.find(step.node()).map(Node::declaration)
                .orElseThrow(() -> new EditFault("step " + end.step(), "its node is not known", "choose another end"));
        PortType type = ports(declaration, output).stream().filter(port -> port.id().equals(end.port())).map(Port::type).findFirst()
                .orElseThrow(() -> new EditFault("step " + end.step(), "it has no " + (output ? "output" : "input") + " " + end.port(), "choose another end"));
        List<Candidate> candidates = new ArrayList<>();
        for (Step other : workflow.steps()) {
            for (Port port : catalog.find(other.node()).map(node -> ports(node.declaration(), !output)).orElse(List.of())) {
                Link.End candidate = new Link.End(other.id(), port.id());
                Link link = output ? new Link(end, candidate) : new Link(candidate, end);
                candidates.add(new Candidate(candidate, output ? LinkRules.feeding(workflow, candidate).map(Link::from) : Optional.empty(),
                        LinkRules.refusal(workflow, catalog, link)));
            }
        }
        List<Offer> offers = new ArrayList<>();
        for (Node node : catalog.nodes()) {
            ports(node.declaration(), !output).stream().filter(port -> port.type() == type).findFirst()
                    .ifPresent(port -> offers.add(new Offer(node.declaration().id(), port.id())));
        }
        return new Fitting(end, output, type, candidates, offers);
    }

    private static List<Port> ports(NodeDeclaration declaration, boolean outputs) {
        return outputs ? declaration.outputs() : declaration.inputs();
    }
}
