package org.modestead.host.run;

import java.util.List;
import java.util.Optional;
import org.modestead.host.workflow.RunPlan;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;

/**
 * What of a run's results is written besides its record: everything, or some tables only and no report.
 *
 * @param tables as {@code step.table}; empty for everything
 */
public record Wanted(List<String> tables) {

    /** Every table and the report. */
    public static final Wanted ALL = new Wanted(List.of());

    /** Takes an immutable copy. */
    public Wanted {
        tables = List.copyOf(tables);
    }

    boolean table(String step, String port) {
        return tables.isEmpty() || tables.contains(step + "." + port);
    }

    boolean report() {
        return tables.isEmpty();
    }

    /** Returns a sentence when a table is named that no step of the plan gives. */
    public Optional<String> problem(RunPlan plan) {
        List<String> there = plan.order().stream().flatMap(step -> step.declaration().outputs().stream()
                .filter(port -> port.type() == PortType.TABLE).map(Port::id).map(port -> step.id() + "." + port)).toList();
        return tables.stream().filter(name -> !there.contains(name)).findFirst()
                .map(name -> "--only " + name + ": no step gives such a table; there are " + String.join(", ", there) + ".");
    }
}
