package org.modestead.host.workflow;

import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** Puts the steps into an order in which each comes after all that it takes input from, or tells the circle. */
final class StepOrder {

    private final Workflow workflow;
    private final Map<String, Map<String, Link.End>> inputs;

    StepOrder(Workflow workflow, Map<String, Map<String, Link.End>> inputs) {
        this.workflow = workflow;
        this.inputs = inputs;
    }

    /** Returns the ids of all steps that are in no circle and after none, and adds a problem for each circle. */
    List<String> order(List<Problem> problems) {
        List<String> waiting = new ArrayList<>(workflow.steps().stream().map(Step::id).distinct().toList());
        List<String> order = new ArrayList<>();
        boolean moved = true;
        while (moved) {
            moved = waiting.removeIf(step -> order.containsAll(sources(step)) && order.add(step));
        }
        Set<String> told = new HashSet<>();
        for (String step : waiting) {
            List<String> circle = circle(step);
            if (told.addAll(circle)) {
                problems.add(new Problem(workflow.fileName(), "", "links", "the steps " + String.join(" -> ", circle)
                        + " feed each other in a circle", "remove one of the links between them"));
            }
        }
        return order;
    }

    private List<String> sources(String step) {
        return inputs.getOrDefault(step, Map.of()).values().stream().map(Link.End::step).distinct().sorted().toList();
    }

    /** Follows the inputs backwards from a step that waits for ever,
            until a step comes back; told in the flow's direction. */
    private List<String> circle(String start) {
        Set<String> path = new LinkedHashSet<>();
        String at = start;
        while (path.add(at)) {
            at = waitsFor(at, path);
        }
        List<String> found = new ArrayList<>(path);
        List<String> circle = new ArrayList<>(found.subList(found.indexOf(at), found.size()));
        Collections.reverse(circle);
        List<String> written = workflow.steps().stream().map(Step::id).toList();
        String first = Collections.min(circle, Comparator.comparingInt(written::indexOf));
        Collections.rotate(circle, -circle.indexOf(first));
        circle.add(circle.get(0));
        return circle;
    }

    private String waitsFor(String step, Set<String> path) {
        return sources(step).stream().filter(path::contains).findFirst()
                .orElseGet(() -> sources(step).stream().filter(this::waits).findFirst().orElseThrow());
    }

    private boolean waits(String step) {
        return waits(step, new HashSet<>());
    }

    private boolean waits(String step, Set<String> seen) {
        return !seen.add(step) || sources(step).stream().anyMatch(source -> waits(source, seen));
    }
}
