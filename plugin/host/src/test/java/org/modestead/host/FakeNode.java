package org.modestead.host;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/**
 * A node for tests of the host: optional table inputs {@code a} and {@code b}, an output table of one column, a setting
 * {@code level}, and work given by the test.
 */
public record FakeNode(String id, Work work) implements Node {

    /** Columns of every output. */
    public static final TableSchema SCHEMA = TableSchema.of(new Column("value", CellType.DOUBLE));

    /** What the node does; returns the value of its one row. */
    @FunctionalInterface
    public interface Work {
        /** Does it. */
        double run(NodeInputs inputs, Settings settings, RunContext context);
    }

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration(id, id, NodeDeclaration.Stage.DATA, "Serves a test.", "Serves a test.", List.of(),
                List.of(),
                List.of(Port.optional("a", PortType.TABLE, "A", "A table."),
                Port.optional("b", PortType.TABLE, "B", "A table.")),
                List.of(Port.table("table", "Table", "One number.", SCHEMA)),
                List.of(new Setting.Whole(new Setting.Common("level", "Level", "All", "A number.", Optional.empty()), "", 0,
                100,
                        OptionalLong.of(1))),
                1);
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        double value = work.run(inputs, settings, context);
        return new NodeResult(Map.of("table", MemoryTable.builder(SCHEMA, id).row(value).build()), List.of(),
                List.of("The value is " + value + "."), List.of());
    }
}
