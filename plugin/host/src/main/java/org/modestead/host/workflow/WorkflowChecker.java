package org.modestead.host.workflow;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.nodes.contract.NodeCatalog;

/**
 * Tells everything wrong with a workflow at once, without running it: names, settings, links, circles, files and the
 * columns that each step will meet.
 */
public final class WorkflowChecker {

    private final NodeCatalog catalog;
    private final Foresight foresight;

    /** @param catalog the nodes that a step may name */
    public WorkflowChecker(NodeCatalog catalog) {
        this(catalog, Foresight.DIRECT);
    }

    /**
     * @param catalog the nodes that a step may name
     * @param foresight how it is told what a step will give
     */
    public WorkflowChecker(NodeCatalog catalog, Foresight foresight) {
        this.catalog = catalog;
        this.foresight = foresight;
    }

    /**
     * What checking gives.
     *
     * @param plan what may run; empty when something is wrong
     * @param problems everything wrong, steps in file order
     */
    public record Outcome(Optional<RunPlan> plan, List<Problem> problems) {

        /** Takes an immutable copy. */
        public Outcome {
            problems = List.copyOf(problems);
        }
    }

    /**
     * Checks what was read.
     *
     * @param reading of the workflow file, with what is wrong with the file itself
     * @param overrides settings of the command line, which replace those of the file
     */
    public Outcome check(WorkflowFile.Reading reading, List<SettingOverride> overrides) {
        List<Problem> problems = new ArrayList<>(reading.problems());
        if (reading.workflow().isEmpty()) {
            return new Outcome(Optional.empty(), problems);
        }
        Workflow workflow = reading.workflow().get();
        Survey survey = survey(workflow, overrides);
        problems.addAll(survey.problems());
        if (!problems.isEmpty()) {
            return new Outcome(Optional.empty(), problems);
        }
        List<PlannedStep> ordered = survey.order().stream().map(survey.planned()::get).toList();
        return new Outcome(Optional.of(new RunPlan(workflow, List.copyOf(survey.planned().values()), ordered)), problems);
    }

    /** Tells everything that can be told of a workflow of which parts may be wrong. */
    public Survey survey(Workflow workflow) {
        return survey(workflow, List.of());
    }

    private Survey survey(Workflow workflow, List<SettingOverride> overrides) {
        List<Problem> problems = new ArrayList<>();
        StepSettings settings = new StepSettings(workflow, catalog, overrides);
        Map<String, StepSettings.Known> known = settings.read(problems);
        LinkCheck links = new LinkCheck(workflow, known, problems);
        Map<String, Map<String, Link.End>> inputs = links.inputs();
        List<String> order = new StepOrder(workflow, inputs).order(problems);
        Map<String, PlannedStep> planned = plan(known, inputs);
        ColumnWalk walk = new ColumnWalk(workflow, planned, problems, foresight);
        walk.walk(order);
        return new Survey(problems, planned, order, inputs, walk.schemas(), walk.outlooks());
    }

    private static Map<String, PlannedStep> plan(Map<String, StepSettings.Known> known, Map<String, Map<String,
            Link.End>> inputs) {
        Map<String, PlannedStep> planned = new LinkedHashMap<>();
        known.forEach((id, step) -> step.settings().ifPresent(settings ->
                planned.put(id, new PlannedStep(id, step.node(), settings, inputs.getOrDefault(id, Map.of())))));
        return planned;
    }
}
