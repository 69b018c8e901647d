package org.modestead.host.bench.work;

import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.modestead.host.bench.desk.DeskFault;
import org.modestead.host.run.Fingerprint;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.RunPlan;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;

/**
 * Chooses what runs.
 *
 * @param found how all steps stand
 * @param workflow the document
 */
record Plans(Overview.Found found, Workflow workflow) {

    /**
     * Returns the steps that must run and all they take input from; those whose result is there are not run again.
     *
     * @param wanted ids; empty for everything that is set up
     * @param again whether wanted steps count as not done
     * @throws DeskFault if a wanted step cannot run
     */
    RunPlan plan(List<String> wanted, boolean again) {
        Set<String> targets = new LinkedHashSet<>();
        if (wanted.isEmpty()) {
            workflow.steps().stream().map(Step::id).filter(step -> hindrance(step, new HashSet<>()).isEmpty() && !found.fresh(step)).forEach(targets::add);
            if (targets.isEmpty() && workflow.steps().stream().noneMatch(step -> found.fresh(step.id()))) {
                throw new DeskFault("run", workflow.steps().isEmpty() ? "there is no step" : "no step is set up", "set up a step first");
            }
        } else {
            for (String step : wanted) {
                hindrance(step, new HashSet<>()).ifPresent(fault -> {
                    throw fault;
                });
                if (again || !found.fresh(step) || Fingerprint.hasEffects(planned().get(step))) {
                    targets.add(step);
                }
            }
        }
        Set<String> all = new HashSet<>();
        targets.forEach(step -> gather(step, all));
        List<PlannedStep> order = found.inspection().survey().order().stream().filter(all::contains).map(planned()::get).toList();
        Workflow part = workflow.with(workflow.steps().stream().filter(step -> all.contains(step.id())).toList(),
                workflow.links().stream().filter(link -> all.contains(link.from().step()) && all.contains(link.to().step())).toList());
        return new RunPlan(part, part.steps().stream().map(step -> planned().get(step.id())).toList(), order);
    }

    private Map<String, PlannedStep> planned() {
        return found.inspection().survey().planned();
    }

    private void gather(String step, Set<String> all) {
        if (all.add(step)) {
            planned().get(step).inputs().values().stream().map(Link.End::step).forEach(source -> gather(source, all));
        }
    }

    /** Returns why a step cannot run: itself or a step before it is not set up. */
    private Optional<DeskFault> hindrance(String step, Set<String> seen) {
        if (!seen.add(step)) {
            return Optional.empty();
        }
        if (!found.inspection().setUp(step)) {
            List<Problem> problems = found.inspection().byStep().getOrDefault(step, List.of());
            return Optional.of(problems.isEmpty() ? new DeskFault("step " + step, "it is not there or feeds itself in a circle", "choose another step")
                    : new DeskFault("step " + step + ", " + problems.get(0).key(), problems.get(0).seen(), problems.get(0).wanted()));
        }
        return planned().get(step).inputs().values().stream().map(Link.End::step).flatMap(source -> hindrance(source, seen).stream()).findFirst();
    }
}
