package org.modestead.host.bench.check;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Survey;
import org.modestead.host.workflow.Workflow;

/**
 * What a check tells, sorted by step.
 *
 * @param survey of the workflow
 * @param byStep problems of each step, also those of a link that leads to it
 * @param general problems of no step
 */
public record Inspection(Survey survey, Map<String, List<Problem>> byStep, List<Problem> general) {

    /** Sorts the problems of a survey. */
    public static Inspection of(Workflow workflow, Survey survey) {
        Map<String, List<Problem>> byStep = new LinkedHashMap<>();
        workflow.steps().stream().map(Step::id).forEach(id -> byStep.put(id, new ArrayList<>()));
        List<Problem> general = new ArrayList<>();
        for (Problem problem : survey.problems()) {
            String step = problem.step().isEmpty() ? target(workflow, problem) : problem.step();
            if (byStep.containsKey(step)) {
                byStep.get(step).add(problem);
            } else {
                general.add(problem);
            }
        }
        return new Inspection(survey, byStep, general);
    }

    private static String target(Workflow workflow, Problem problem) {
        return workflow.links().stream().filter(link -> problem.key().equals("link " + link)).map(Link::to).map(Link.End::step)
                .findFirst().orElse("");
    }

    /** Returns whether a step could run if its inputs were there. */
    public boolean setUp(String step) {
        return byStep.getOrDefault(step, List.of()).isEmpty() && survey.planned().containsKey(step) && survey.order().contains(step);
    }
}
