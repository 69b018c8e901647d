package org.modestead.host.bench.desk;

import java.util.HashSet;
import java.util.Optional;
import java.util.Set;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;

/** Which links may be drawn, and why others may not. */
public final class LinkRules {

    private LinkRules() {}

    /**
     * Returns why an output cannot feed an input, empty when it can. That something else feeds the input already is no reason.
     *
     * @throws EditFault if one of the ends is not there
     */
    public static Optional<EditFault> refusal(Workflow workflow, NodeCatalog catalog, Link link) {
        Port from = Lookup.port(workflow, catalog, link.from(), false);
        Port to = Lookup.port(workflow, catalog, link.to(), true);
        String where = "link " + link.from() + " to " + link.to();
        if (link.from().step().equals(link.to().step())) {
            return Optional.of(new EditFault(where, "both ends are the same step", "link two different steps"));
        }
        if (from.type() != to.type()) {
            return Optional.of(new EditFault(where, link.from() + " gives " + with(from.type()) + ", and " + link.to() + " takes " + with(to.type()),
                    "link an output that gives " + with(to.type())));
        }
        if (leads(workflow, link.to().step(), link.from().step(), new HashSet<>())) {
            return Optional.of(new EditFault(where, link.from().step() + " already takes input from " + link.to().step()
                    + ", directly or through others", "link so that no step feeds itself in a circle"));
        }
        return Optional.empty();
    }

    /** Returns the link that feeds an input. */
    public static Optional<Link> feeding(Workflow workflow, Link.End input) {
        return workflow.links().stream().filter(link -> link.to().equals(input)).findFirst();
    }

    private static boolean leads(Workflow workflow, String from, String to, Set<String> seen) {
        return from.equals(to) || seen.add(from) && workflow.links().stream().filter(link -> link.from().step().equals(from))
                .anyMatch(link -> leads(workflow, link.to().step(), to, seen));
    }

    private static String with(PortType type) {
        String title = type.title();
        boolean plural = title.endsWith("s");
        return (plural ? "" : "AEIOU".indexOf(title.charAt(0)) >= 0 ? "an " : "a ") + title;
    }
}
