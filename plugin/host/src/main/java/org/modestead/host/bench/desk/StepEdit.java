package org.modestead.host.bench.desk;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.StepLabel;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.Port;

/** Edits that make, remove or rename steps. */
public sealed interface StepEdit extends Edit {

    /**
     * Adds a step.
     *
     * @param node id of the node
     * @param id wanted; empty for one made of the node's
     * @param title of its own; empty for none
     * @param settings as stored
     * @param place in its band; empty for the end
     * @param from an output that is to feed it
     * @param to an input that it is to feed
     */
    record Add(String node, String id, String title, Map<String, Object> settings, OptionalInt place, Optional<Link.End> from,
            Optional<Link.End> to) implements StepEdit {

        /** Takes an immutable copy. */
        public Add {
            settings = Map.copyOf(settings);
        }

        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            Node added = Lookup.node(catalog, node);
            String name = id.isEmpty() ? StepIds.free(before, node) : StepIds.checked(before, id);
            List<Step> steps = new ArrayList<>(before.steps());
            steps.add(new Step(name, node, settings, new StepLabel(title, "", OptionalInt.empty())));
            Workflow after = before.with(steps, before.links());
            if (place.isPresent()) {
                after = Bands.moved(after, catalog, name, place.getAsInt());
            }
            if (from.isPresent()) {
                after = linked(after, catalog, from.get(), Lookup.port(before, catalog, from.get(), false), added.declaration().inputs(), name, true);
            }
            if (to.isPresent()) {
                after = linked(after, catalog, to.get(), Lookup.port(before, catalog, to.get(), true), added.declaration().outputs(), name, false);
            }
            return new Change(after, List.of(name));
        }

        private static Workflow linked(Workflow workflow, NodeCatalog catalog, Link.End end, Port port, List<Port> offered, String step,
                boolean feeds) {
            Port fitting = offered.stream().filter(other -> other.type() == port.type()).findFirst()
                    .orElseThrow(() -> new EditFault("step " + step, "it has no " + (feeds ? "input" : "output") + " of type "
                            + port.type().title(), "choose a node that fits " + end));
            Link.End own = new Link.End(step, fitting.id());
            return new LinkEdit.Connect(feeds ? new Link(end, own) : new Link(own, end), true).apply(workflow, catalog).workflow();
        }

        @Override
        public String words(Workflow before, NodeCatalog catalog) {
            return "Add " + Lookup.node(catalog, node).declaration().title();
        }
    }

    /** Removes steps with their links. */
    record Remove(List<String> steps) implements StepEdit {

        /** Takes an immutable copy. */
        public Remove {
            steps = List.copyOf(steps);
        }

        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            steps.forEach(step -> Lookup.step(before, step));
            return Change.of(before.with(before.steps().stream().filter(step -> !steps.contains(step.id())).toList(),
                    before.links().stream().filter(link -> !steps.contains(link.from().step()) && !steps.contains(link.to().step())).toList()));
        }

        @Override
        public String words(Workflow before, NodeCatalog catalog) {
            return steps.size() == 1 ? "Remove " + StepTitles.of(before, catalog, steps.get(0)) : "Remove " + steps.size() + " steps";
        }
    }

    /** Copies steps with their settings, the links among them, and those that feed them from outside. */
    record Copy(List<String> steps) implements StepEdit {

        /** Takes an immutable copy. */
        public Copy {
            steps = List.copyOf(steps);
        }

        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            Map<String, String> copies = new LinkedHashMap<>();
            Workflow after = before;
            for (String id : steps) {
                Step original = Lookup.step(before, id);
                String name = StepIds.free(after, id);
                copies.put(id, name);
                List<Step> all = new ArrayList<>(after.steps());
                StepLabel label = original.label();
                all.add(original.named(name).with(new StepLabel(label.title(), label.note(), OptionalInt.empty())));
                after = after.with(all, after.links());
            }
            List<Link> links = new ArrayList<>(after.links());
            for (Link link : before.links()) {
                if (copies.containsKey(link.to().step())) {
                    links.add(new Link(end(link.from(), copies), end(link.to(), copies)));
                }
            }
            return new Change(after.with(after.steps(), links), List.copyOf(copies.values()));
        }

        private static Link.End end(Link.End end, Map<String, String> copies) {
            return new Link.End(copies.getOrDefault(end.step(), end.step()), end.port());
        }

        @Override
        public String words(Workflow before, NodeCatalog catalog) {
            return steps.size() == 1 ? "Copy " + StepTitles.of(before, catalog, steps.get(0)) : "Copy " + steps.size() + " steps";
        }
    }

    /** Gives a step another id; links follow. */
    record Rename(String step, String id) implements StepEdit {
        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            Lookup.step(before, step);
            if (step.equals(id)) {
                return Change.of(before);
            }
            Workflow others = before.with(before.steps().stream().filter(other -> !other.id().equals(step)).toList(), before.links());
            String name = StepIds.checked(others, id);
            return Change.of(before.with(before.steps().stream().map(other -> other.id().equals(step) ? other.named(name) : other).toList(),
                    before.links().stream().map(link -> new Link(end(link.from(), name), end(link.to(), name))).toList()));
        }

        private Link.End end(Link.End end, String name) {
            return end.step().equals(step) ? new Link.End(name, end.port()) : end;
        }

        @Override
        public String words(Workflow before, NodeCatalog catalog) {
            return "Rename " + step + " to " + id;
        }
    }

    /** Ids of steps. */
    final class StepIds {
        private StepIds() {}

        /** Returns the wished id, or with a number behind it, so that no other step has it. */
        static String free(Workflow workflow, String wished) {
            String name = wished.replaceAll("-\\d+$", "");
            for (int number = 1;; number++) {
                String candidate = number == 1 ? name : name + "-" + number;
                if (!taken(workflow, candidate)) {
                    return candidate;
                }
            }
        }

        static String checked(Workflow workflow, String id) {
            if (!Step.isId(id)) {
                throw new EditFault("id of a step", "\"" + id + "\"", "use letters, digits, - and _, beginning with a letter or digit");
            }
            if (taken(workflow, id)) {
                throw new EditFault("id of a step", "there is a step \"" + id + "\" already (capital letters make no difference)", "choose another id");
            }
            return id;
        }

        private static boolean taken(Workflow workflow, String id) {
            return workflow.steps().stream().anyMatch(step -> step.id().equalsIgnoreCase(id));
        }
    }
}
