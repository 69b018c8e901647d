package org.modestead.knime;

import java.io.File;
import java.io.IOException;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.knime.core.node.CanceledExecutionException;
import org.knime.core.node.ExecutionContext;
import org.knime.core.node.ExecutionMonitor;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.KNIMEException;
import org.knime.core.node.NodeModel;
import org.knime.core.node.NodeSettingsRO;
import org.knime.core.node.NodeSettingsWO;
import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortType;
import org.knime.core.node.property.hilite.HiLiteHandler;
import org.modestead.engine.Cancelled;
import org.modestead.engine.Fault;
import org.modestead.knime.describe.DeclaredDescription;
import org.modestead.knime.port.StagePorts;
import org.modestead.knime.settings.NativeSettings;
import org.modestead.knime.settings.StoredSettings;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.modelfile.ResultFile;

/**
 * The native node of one declared node. Knows settings and, for the view, the last result; everything that running needs comes from
 * the inputs and the settings, so that it can be reset, saved, loaded and run elsewhere.
 *
 * <p>It says nothing of streaming, by which the platform takes it for a node that needs its whole input and runs once: a fit goes over its rows
 * more than once. In a streaming component it is handed whole tables.
 */
public final class DeclaredNodeModel extends NodeModel {

    private final Node node;
    private final NodeRun run;
    private final HiLiteHandler hilite = new HiLiteHandler();
    private Map<String, Object> raw = Map.of();
    private Optional<ResultFile> shown = Optional.empty();

    DeclaredNodeModel(Node node) {
        super(types(node.declaration().inputs()), types(node.declaration().outputs()));
        this.node = node;
        this.run = new NodeRun(node);
    }

    /** Returns what the view shows: figures, sentences and doubts of the last run; empty before one and after a reset. */
    public Optional<ResultFile> shown() {
        return shown;
    }

    @Override
    protected void saveSettingsTo(NodeSettingsWO settings) {
        NativeSettings.write(node.declaration(), raw, settings);
    }

    @Override
    protected void validateSettings(NodeSettingsRO settings) throws InvalidSettingsException {
        StoredSettings.validate(node, settings);
    }

    @Override
    protected void loadValidatedSettingsFrom(NodeSettingsRO settings) throws InvalidSettingsException {
        raw = StoredSettings.load(node, settings);
    }

    @Override
    protected PortObjectSpec[] configure(PortObjectSpec[] inSpecs) throws InvalidSettingsException {
        return run.prepare(raw, inSpecs).outSpecs();
    }

    @Override
    protected PortObject[] execute(PortObject[] inObjects, ExecutionContext exec)
            throws InvalidSettingsException, CanceledExecutionException, KNIMEException {
        try {
            NodeRun.Done done = run.run(raw, inObjects, exec);
            shown = Optional.of(done.shown());
            done.verdict().ifPresent(word -> pushFlowVariableString(DeclaredDescription.VERDICT_VARIABLE, word));
            done.warning().ifPresent(this::setWarningMessage);
            return done.outputs();
        } catch (Cancelled stopped) {
            throw new CanceledExecutionException(stopped.getMessage());
        } catch (Fault fault) {
            exec.checkCanceled(); // what goes wrong after the person asked to stop, goes wrong because of it
            throw new KNIMEException(fault.getMessage(), fault);
        } catch (RuntimeException defect) {
            exec.checkCanceled();
            throw new KNIMEException("An error in the program (" + defect.getClass().getSimpleName() + ": " + defect.getMessage()
                    + "); please report it with the log.", defect);
        }
    }

    /** Rows of the outputs are not those of the inputs: what is marked there says nothing here. */
    @Override
    protected HiLiteHandler getOutHiLiteHandler(int outIndex) {
        return hilite;
    }

    @Override
    protected void reset() {
        shown = Optional.empty();
    }

    @Override
    protected void loadInternals(File folder, ExecutionMonitor exec) throws IOException {
        shown = Internals.load(folder.toPath());
    }

    @Override
    protected void saveInternals(File folder, ExecutionMonitor exec) throws IOException {
        Internals.save(shown, folder.toPath());
    }

    private static PortType[] types(List<Port> ports) {
        return ports.stream().map(StagePorts::type).toArray(PortType[]::new);
    }
}
