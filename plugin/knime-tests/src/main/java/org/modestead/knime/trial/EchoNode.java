package org.modestead.knime.trial;

import java.util.List;
import java.util.Map;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** A node of ours, as another extension could bring it, that gives on the table it gets: what the bridge reads, it has to write. */
public final class EchoNode implements Node {

    /** Its id; the trial's own nodes are not among those that are offered. */
    static final String ID = "trial-echo";

    private static final String TABLE = "table";

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration(ID, "Echo", NodeDeclaration.Stage.DATA, "Gives on the table it gets.", "Gives on the table it gets.", List.of(), List.of(),
                List.of(Port.of(TABLE, PortType.TABLE, "Table", "Any table.")), List.of(Port.of(TABLE, PortType.TABLE, "Table", "The same table.")),
                List.of(), 1);
    }

    @Override
    public Map<String, TableSchema> schemas(Map<String, TableSchema> inputs, Settings settings, RunContext context) {
        return inputs;
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        return new NodeResult(Map.of(TABLE, inputs.get(TABLE, Table.class)), List.of(), List.of(), List.of());
    }
}
