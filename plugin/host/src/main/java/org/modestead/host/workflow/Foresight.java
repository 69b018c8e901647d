package org.modestead.host.workflow;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.Fault;
import org.modestead.nodes.contract.ColumnChecks;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.table.TableSchema;

/** How a check learns what a step would say and give, without running it. */
@FunctionalInterface
public interface Foresight {

    /** Asks the node at every check. */
    Foresight DIRECT = (step, arriving, context) -> {
        Map<String, TableSchema> tables = arriving.tables();
        List<SettingProblem> problems = new ArrayList<>(ColumnChecks.check(step.declaration(), step.settings(), tables));
        try {
            problems.addAll(step.node().check(tables, step.settings()));
            return problems.isEmpty() ? new Seen(problems, Optional.of(step.node().expect(arriving, step.settings(), context)), Optional.empty())
                    : new Seen(problems, Optional.empty(), Optional.empty());
        } catch (Fault fault) {
            return new Seen(problems, Optional.empty(), Optional.of(fault));
        }
    };

    /**
     * What a step says beforehand.
     *
     * @param problems with its settings
     * @param expected of its outputs; empty when something is wrong
     * @param fault that running would certainly end with
     */
    record Seen(List<SettingProblem> problems, Optional<Expected> expected, Optional<Fault> fault) {

        /** Takes an immutable copy. */
        public Seen {
            problems = List.copyOf(problems);
        }
    }

    /**
     * @param step whose settings fit the declaration
     * @param arriving what is known of its inputs
     * @param context base folder of the workflow
     */
    Seen look(PlannedStep step, Expected arriving, RunContext context);
}
