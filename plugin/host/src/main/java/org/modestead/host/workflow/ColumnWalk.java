package org.modestead.host.workflow;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.nodes.contract.ColumnChecks;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
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
    private final Map<Link.End, TableSchema> schemas = new HashMap<>();
    private final Map<Link.End, Outlook> outlooks = new HashMap<>();

    ColumnWalk(Workflow workflow, Map<String, PlannedStep> planned, List<Problem> problems) {
        this.workflow = workflow;
        this.planned = planned;
        this.problems = problems;
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
        Map<String, TableSchema> arriving = arriving(step, schemas);
        int before = problems.size();
        ColumnChecks.check(step.declaration(), step.settings(), arriving).forEach(found -> problem(step, found));
        try {
            step.node().check(arriving, step.settings()).forEach(found -> problem(step, found));
            if (problems.size() == before) {
                RunContext context = new RunContext(Progress.NONE, workflow.baseFolder(), workflow.baseFolder());
                Expected expected = step.node().expect(new Expected(arriving, arriving(step, outlooks)), step.settings(), context);
                expected.tables().forEach((port, schema) -> schemas.put(new Link.End(step.id(), port), schema));
                expected.values().forEach((port, outlook) -> outlooks.put(new Link.End(step.id(), port), outlook));
            }
        } catch (Fault fault) {
            problems.add(new Problem(workflow.fileName(), step.id(), fault.where(), fault.seen(), fault.wanted()));
        }
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
