package org.modestead.knime;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.knime.core.node.port.PortObjectSpec;
import org.modestead.knime.port.StageSpec;
import org.modestead.knime.table.TableSpecs;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.table.TableSchema;

/**
 * A node that could run: settings that fit, and what its outputs will be.
 *
 * @param outputs declared
 * @param settings checked
 * @param expected what is known of the outputs
 */
record Prepared(List<Port> outputs, Settings settings, Expected expected) {

    /** Returns a spec for every output; null, as the platform wants it, where only the data tell the columns. */
    PortObjectSpec[] outSpecs() {
        return outputs.stream().map(this::spec).toArray(PortObjectSpec[]::new);
    }

    /** Returns the spec of a value that is there: what was expected, completed by what the value tells. */
    StageSpec spec(Port port, Object value) {
        return new StageSpec(port.type(), outlook(port).completedBy(value));
    }

    private PortObjectSpec spec(Port port) {
        if (port.type() != PortType.TABLE) {
            return new StageSpec(port.type(), outlook(port));
        }
        Map<String, TableSchema> told = expected.tables();
        return port.schema().or(() -> Optional.ofNullable(told.get(port.id()))).map(TableSpecs::spec).orElse(null);
    }

    private Outlook outlook(Port port) {
        return expected.values().getOrDefault(port.id(), Outlook.NONE);
    }
}
