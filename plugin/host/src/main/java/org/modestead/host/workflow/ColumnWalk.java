package org.modestead.host.workflow;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import org.modestead.engine.Progress;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.table.TableSchema;

/**
 * The part of the check that goes through the steps in running order, knows on the way the columns of each table and of which
 * recording each value is made, and holds column and file settings against what is there.
 */
final class ColumnWalk {

    private final Workflow workflow;
    private final Map<String, PlannedStep> planned;
    private final List<Problem> problems;
    private final Foresight foresight;
    private final Map<Link.End, TableSchema> schemas = new HashMap<>();
    private final Map<Link.End, Outlook> outlooks = new HashMap<>();

    ColumnWalk(Workflow workflow, Map<String, PlannedStep> planned, List<Problem> problems, Foresight foresight) {
        this.workflow = workflow;
        this.planned = planned;
        this.problems = problems;
        this.foresight = foresight;
    }

    /** Returns the columns found, of all outputs that are tables. */
    Map<Link.End, TableSchema> schemas() {
        return schemas;
    }

    /** Returns what is known of the other outputs. */
    Map<Link.End, Outlook> outlooks() {
        return outlooks;
    }

    void walk(List<String> order) {
        for (String id : order) {
            PlannedStep step = planned.get(id);
            if (step != null) {
                visit(step);
            }
        }
    }

    private void visit(PlannedStep step) {
        for (Port port : step.declaration().outputs()) {
            port.schema().filter(schema -> port.type() == PortType.TABLE)
                    .ifPresent(schema -> schemas.put(new Link.End(step.id(), port.id()), schema));
        }
        RunContext context = new RunContext(Progress.NONE, workflow.baseFolder(), workflow.baseFolder());
        Foresight.Seen seen = foresight.look(step, new Expected(arriving(step, schemas), arriving(step, outlooks)), context);
        seen.problems().forEach(found -> problem(step, found));
        seen.fault().filter(fault -> !fileTold(step)).ifPresent(fault -> problems.add(new Problem(workflow.fileName(), step.id(), fault.where(), fault.seen(), fault.wanted())));
        seen.expected().ifPresent(expected -> {
            expected.tables().forEach((port, schema) -> schemas.put(new Link.End(step.id(), port), schema));
            expected.values().forEach((port, outlook) -> outlooks.put(new Link.End(step.id(), port), outlook));
        });
    }

    /** Returns whether it was told already, under its setting, that a file of the step is not there: the node would say so once more. */
    private boolean fileTold(PlannedStep step) {
        Set<String> files = step.declaration().settings().stream().filter(Setting.File.class::isInstance).map(file -> "setting " + file.key())
                .collect(Collectors.toSet());
        return problems.stream().anyMatch(problem -> problem.step().equals(step.id()) && files.contains(problem.key()));
    }

    private static <T> Map<String, T> arriving(PlannedStep step, Map<Link.End, T> known) {
        Map<String, T> arriving = new HashMap<>();
        step.inputs().forEach((port, source) -> {
            if (known.containsKey(source)) {
                arriving.put(port, known.get(source));
            }
        });
        return arriving;
    }

    private void problem(PlannedStep step, SettingProblem found) {
        problems.add(new Problem(workflow.fileName(), step.id(), "setting " + found.key(), found.seen(), found.wanted()));
    }
}
