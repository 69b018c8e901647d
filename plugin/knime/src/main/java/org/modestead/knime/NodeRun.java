package org.modestead.knime;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.knime.core.data.DataTableSpec;
import org.knime.core.node.BufferedDataTable;
import org.knime.core.node.ExecutionContext;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortObjectSpec;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.knime.port.StagePort;
import org.modestead.knime.port.StagePorts;
import org.modestead.knime.port.StageSpec;
import org.modestead.knime.settings.CheckedSettings;
import org.modestead.knime.table.PlatformTable;
import org.modestead.knime.table.TableSpecs;
import org.modestead.knime.table.TableWriter;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.modelfile.ResultFile;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** Checks and runs a node on what the platform hands it. Has no state. */
final class NodeRun {

    private static final double WORK = 0.9;

    private final Node node;
    private final NodeDeclaration declaration;

    NodeRun(Node node) {
        this.node = node;
        this.declaration = node.declaration();
    }

    /**
     * What a run gives the platform.
     *
     * @param outputs in port order
     * @param shown by the view, also after the workflow was loaded again
     * @param warning what a person must know, empty when all is well
     * @param verdict word of the overall verdict, where one was passed
     */
    record Done(PortObject[] outputs, ResultFile shown, Optional<String> warning, Optional<String> verdict) {}

    /**
     * Checks settings and inputs; the same before and while running, so that specs told in advance are those that come out.
     *
     * @param specs in port order; null for what is not connected
     * @throws InvalidSettingsException in one sentence a problem
     */
    Prepared prepare(Map<String, Object> raw, PortObjectSpec[] specs) throws InvalidSettingsException {
        Map<String, TableSchema> tables = new HashMap<>();
        Map<String, Outlook> values = new HashMap<>();
        for (int i = 0; i < specs.length; i++) {
            String port = declaration.inputs().get(i).id();
            if (specs[i] instanceof DataTableSpec table) {
                tables.put(port, TableSpecs.schema(table));
            } else if (specs[i] instanceof StageSpec stage) {
                values.put(port, stage.outlook());
            }
        }
        Settings settings = CheckedSettings.read(node, raw, tables);
        CheckedSettings.check(node, settings, tables);
        try {
            return new Prepared(declaration.outputs(), settings,
                    node.expect(new Expected(tables, values), settings, context(Progress.NONE)));
        } catch (Fault certain) {
            throw new InvalidSettingsException(certain.getMessage(), certain);
        }
    }

    /** Runs the node. */
    Done run(Map<String, Object> raw, PortObject[] inputs, ExecutionContext exec) throws InvalidSettingsException {
        PortObjectSpec[] specs = new PortObjectSpec[inputs.length];
        for (int i = 0; i < inputs.length; i++) {
            specs[i] = inputs[i] == null ? null : inputs[i].getSpec();
        }
        Prepared prepared = prepare(raw, specs);
        Progress progress = new ExecutionProgress(exec);
        NodeInputs values = new NodeInputs(values(inputs));
        RunContext context = context(progress.part(0, WORK));
        NodeResult result = AttendedWork.result(() -> node.run(values, prepared.settings(), context), progress, "Modestead " + declaration.id());
        progress.checkCancelled();
        TableWriter writer = new TableWriter(exec, progress.part(WORK, 1));
        List<PortObject> outputs = new ArrayList<>();
        for (Port port : declaration.outputs()) {
            outputs.add(object(port, result.outputs().get(port.id()), prepared, writer));
        }
        Notices notices = new Notices(result);
        return new Done(outputs.toArray(PortObject[]::new), ResultFile.of(declaration, result), notices.warning(),
                notices.verdict());
    }

    private PortObject object(Port port, Object value, Prepared prepared, TableWriter writer) {
        if (!port.type().valueClass().isInstance(value)) {
            throw new IllegalStateException("node " + declaration.id() + " gave no " + port.type().title() + " at output " + port.id());
        }
        return value instanceof Table table ? writer.write(table) : StagePorts.object(prepared.spec(port, value), value);
    }

    private Map<String, Object> values(PortObject[] inputs) {
        Map<String, Object> values = new HashMap<>();
        for (int i = 0; i < inputs.length; i++) {
            Port port = declaration.inputs().get(i);
            if (inputs[i] instanceof BufferedDataTable table) {
                values.put(port.id(), new PlatformTable(table, origin(port)));
            } else if (inputs[i] instanceof StagePort stage) {
                values.put(port.id(), stage.content().value());
            }
        }
        return values;
    }

    private String origin(Port port) {
        long tables = declaration.inputs().stream().filter(other -> other.type() == PortType.TABLE).count();
        return tables == 1 ? "the input table" : "the table at input " + port.title();
    }

    private static RunContext context(Progress progress) {
        Path folder = WorkflowFolder.find();
        return new RunContext(progress, folder, folder);
    }
}
