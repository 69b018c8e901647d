package org.modestead.nodes.contract;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.modestead.nodes.table.TableSchema;

/**
 * A workflow node, written once for every host. Found by {@link java.util.ServiceLoader}; has a public constructor
 * without arguments and no state.
 */
public interface Node {

    /** Returns the declaration; the same content at every call. */
    NodeDeclaration declaration();

    /**
     * Does the work.
     *
     * @param inputs values of the connected input ports
     * @param settings checked against the declaration
     * @param context progress, cancel, base folder
     * @return a value for every output port, with figures and findings
     * @throws org.modestead.engine.Fault in one sentence when the work cannot be done
     * @throws org.modestead.engine.Cancelled when the person asked to stop
     */
    NodeResult run(NodeInputs inputs, Settings settings, RunContext context);

    /**
     * Tells what can be told before running: columns of output tables that depend on input or settings.
     *
     * @param inputs schemas of connected input tables, by port id, where already known
     * @param settings checked against the declaration
     * @param context base folder of the workflow
     * @return schemas by output port id, only those known now; fixed ones ({@link Port#schema()}) need not be repeated
     * @throws org.modestead.engine.Fault when it is already certain that {@link #run} must fail
     */
    default Map<String, TableSchema> schemas(Map<String, TableSchema> inputs, Settings settings, RunContext context) {
        return Map.of();
    }

    /**
     * Tells all that can be told of the outputs before running. A host that knows only tables calls {@link #schemas}; one whose typed
     * ports carry an outlook calls this. Unless a node says otherwise, its values are made of the recording that its first input with
     * an outlook is made of, and its tables have the columns that {@link #schemas} tells.
     *
     * @param inputs what is known of the connected inputs
     * @param settings checked against the declaration
     * @param context base folder of the workflow
     * @return what is known of the outputs; tables with fixed columns ({@link Port#schema()}) need not be repeated
     * @throws org.modestead.engine.Fault when it is already certain that {@link #run} must fail
     */
    default Expected expect(Expected inputs, Settings settings, RunContext context) {
        Map<String, Outlook> values = new HashMap<>();
        Optional<Outlook> first = declaration().inputs().stream().map(port -> inputs.values().get(port.id()))
                .filter(Objects::nonNull).findFirst();
        first.ifPresent(outlook -> declaration().outputs().stream().filter(port -> port.type() != PortType.TABLE)
                .forEach(port -> values.put(port.id(), outlook)));
        return new Expected(schemas(inputs.tables(), settings, context), values);
    }

    /**
     * Checks settings against each other and against the input columns, beyond what the declaration says. All
     * problems at once. Column existence and types are checked by the caller from the declaration.
     *
     * @param inputs schemas of connected input tables, by port id, where already known
     * @param settings checked one by one against the declaration
     * @return empty when all is well
     */
    default List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
        return List.of();
    }

    /**
     * Turns settings stored by an older version into today's.
     *
     * @param stored as read, by key
     * @param version {@link NodeDeclaration#settingsVersion()} under which they were stored, below today's
     * @return settings for today's version
     */
    default Map<String, Object> upgrade(Map<String, Object> stored, int version) {
        return stored;
    }
}
