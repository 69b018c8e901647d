package org.modestead.host.workflow;

import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.modestead.nodes.contract.NearestName;
import org.modestead.nodes.contract.Port;

/** The part of the check that looks at the links: ends that exist, types that fit, inputs that are fed once. */
final class LinkCheck {

    private final Workflow workflow;
    private final Map<String, StepSettings.Known> known;
    private final List<Problem> problems;

    LinkCheck(Workflow workflow, Map<String, StepSettings.Known> known, List<Problem> problems) {
        this.workflow = workflow;
        this.known = known;
        this.problems = problems;
    }

    /** Returns where each connected input takes its value from, by step and input port, and adds what is wrong. */
    Map<String, Map<String, Link.End>> inputs() {
        Map<String, Map<String, Link.End>> inputs = new HashMap<>();
        Map<Link.End, Link> feeding = new HashMap<>();
        Set<Link.End> meant = new LinkedHashSet<>();
        for (Link link : workflow.links()) {
            meant.add(link.to());
            Optional<Port> from = port(link, link.from(), false);
            Optional<Port> to = port(link, link.to(), true);
            if (from.isEmpty() || to.isEmpty() || !fits(link, from.get(), to.get())) {
                continue;
            }
            Link earlier = feeding.putIfAbsent(link.to(), link);
            if (earlier != null) {
                problem(link, "input " + link.to() + " is already fed by " + earlier.from(), "keep one of the two links");
            } else {
                inputs.computeIfAbsent(link.to().step(), step -> new LinkedHashMap<>()).put(link.to().port(), link.from());
            }
        }
        unconnected(meant);
        return inputs;
    }

    private Optional<Port> port(Link link, Link.End end, boolean input) {
        List<String> ids = workflow.steps().stream().map(Step::id).distinct().toList();
        if (!ids.contains(end.step())) {
            problem(link, "there is no step \"" + end.step() + "\"" + NearestName.hint(end.step(), ids),
                    "use one of " + String.join(", ", ids));
        }
        if (!known.containsKey(end.step())) {
            return Optional.empty();
        }
        List<Port> ports = ports(end.step(), input);
        Optional<Port> found = ports.stream().filter(port -> port.id().equals(end.port())).findFirst();
        if (found.isEmpty()) {
            List<String> names = ports.stream().map(Port::id).toList();
            String kind = input ? "input" : "output";
            problem(link, "step " + end.step() + " has no " + kind + " \"" + end.port() + "\""
                    + NearestName.hint(end.port(), names), names.isEmpty() ? "remove the link: the step has no " + kind
                            : "use one of " + String.join(", ", names));
        }
        return found;
    }

    private boolean fits(Link link, Port from, Port to) {
        if (from.type() == to.type()) {
            return true;
        }
        problem(link, article(from.type().title()) + " cannot feed an input that takes " + to.type().title(),
                "link an output of type " + to.type().title() + " to " + link.to() + candidates(to, link.to().step()));
        return false;
    }

    private void unconnected(Set<Link.End> meant) {
        known.forEach((id, step) -> {
            for (Port port : step.node().declaration().inputs()) {
                if (!port.optional() && !meant.contains(new Link.End(id, port.id()))) {
                    problems.add(new Problem(workflow.fileName(), id, "input " + port.id(), "nothing is linked to it",
                            "link an output of type " + port.type().title() + " to " + id + "." + port.id()
                                    + candidates(port, id)));
                }
            }
        });
    }

    private String candidates(Port wanted, String butOf) {
        String found = known.keySet().stream().filter(id -> !id.equals(butOf))
                .flatMap(id -> ports(id, false).stream().filter(port -> port.type() == wanted.type())
                        .map(port -> id + "." + port.id()))
                .limit(3)
                .collect(Collectors.joining(" or "));
        return found.isEmpty() ? "" : ", for example " + found;
    }

    private List<Port> ports(String step, boolean input) {
        return input ? known.get(step).node().declaration().inputs() : known.get(step).node().declaration().outputs();
    }

    private void problem(Link link, String seen, String wanted) {
        problems.add(new Problem(workflow.fileName(), "", "link " + link, seen, wanted));
    }

    private static String article(String title) {
        boolean plural = title.endsWith("s");
        boolean vowel = "AEIOU".indexOf(title.charAt(0)) >= 0;
        return (plural ? "" : vowel ? "an " : "a ") + title;
    }
}
