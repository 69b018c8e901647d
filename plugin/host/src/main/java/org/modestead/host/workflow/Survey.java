package org.modestead.host.workflow;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.table.TableSchema;

/**
 * All that can be told of a workflow before it runs, also where parts of it are wrong.
 *
 * @param problems everything wrong, as {@link WorkflowChecker} tells it
 * @param planned steps whose node is known and whose settings fit, by id in file order
 * @param order ids of steps that are in no circle and after none, each after all that it takes input from
 * @param inputs where each connected input takes its value from, by step and input port; links that fit only
 * @param schemas columns of output tables, where known
 * @param outlooks what is known of other outputs
 */
public record Survey(List<Problem> problems, Map<String, PlannedStep> planned, List<String> order,
        Map<String, Map<String, Link.End>> inputs, Map<Link.End, TableSchema> schemas, Map<Link.End, Outlook> outlooks) {

    /** Takes immutable, ordered copies. */
    public Survey {
        problems = List.copyOf(problems);
        planned = Collections.unmodifiableMap(new LinkedHashMap<>(planned));
        order = List.copyOf(order);
        inputs = Map.copyOf(inputs);
        schemas = Map.copyOf(schemas);
        outlooks = Map.copyOf(outlooks);
    }
}
