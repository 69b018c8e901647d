package org.knime.core.node;

import java.io.File;
import java.io.IOException;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortType;
import org.knime.core.node.property.hilite.HiLiteHandler;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public abstract class NodeModel implements AbstractNodeView.ViewableModel {

    private final PortType[] inputs;
    private final PortType[] outputs;
    private final Map<String, Object> variables = new LinkedHashMap<>();
    private Optional<String> warning = Optional.empty();

    protected NodeModel(final PortType[] inPortTypes, final PortType[] outPortTypes) {
        this.inputs = inPortTypes.clone();
        this.outputs = outPortTypes.clone();
    }

    protected abstract void loadInternals(File folder, ExecutionMonitor exec) throws IOException, CanceledExecutionException;

    protected abstract void saveInternals(File folder, ExecutionMonitor exec) throws IOException, CanceledExecutionException;

    protected abstract void saveSettingsTo(NodeSettingsWO settings);

    protected abstract void validateSettings(NodeSettingsRO settings) throws InvalidSettingsException;

    protected abstract void loadValidatedSettingsFrom(NodeSettingsRO settings) throws InvalidSettingsException;

    protected abstract void reset();

    protected PortObject[] execute(final PortObject[] inObjects, final ExecutionContext exec) throws Exception {
        throw new UnsupportedOperationException();
    }

    protected PortObjectSpec[] configure(final PortObjectSpec[] inSpecs) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    protected HiLiteHandler getOutHiLiteHandler(final int outIndex) {
        throw new UnsupportedOperationException();
    }

    protected void onDispose() {
        // nothing is held
    }

    protected final void setWarningMessage(final String message) {
        warning = Optional.ofNullable(message);
    }

    protected final void pushFlowVariableString(final String name, final String value) {
        variables.put(name, value);
    }

    /** What the engine does with a model, for tests. */
    public static final class Engine {

        private final NodeModel model;

        /** @param model driven */
        public Engine(final NodeModel model) {
            this.model = model;
        }

        /** Loads settings as the engine does: validated first. */
        public void settings(final NodeSettingsRO settings) throws InvalidSettingsException {
            model.validateSettings(settings);
            model.loadValidatedSettingsFrom(settings);
        }

        /** Returns what the model saves. */
        public NodeSettings saved() {
            NodeSettings settings = new NodeSettings("model");
            model.saveSettingsTo(settings);
            return settings;
        }

        /** Configures. */
        public PortObjectSpec[] configure(final PortObjectSpec... specs) throws InvalidSettingsException {
            return model.configure(specs);
        }

        /** Executes. */
        public PortObject[] execute(final ExecutionContext exec, final PortObject... objects) throws Exception {
            model.warning = Optional.empty();
            return model.execute(objects, exec);
        }

        /** Resets. */
        public void reset() {
            model.reset();
        }

        /** Saves internals. */
        public void save(final File folder) throws IOException, CanceledExecutionException {
            model.saveInternals(folder, new ExecutionMonitor());
        }

        /** Loads internals. */
        public void load(final File folder) throws IOException, CanceledExecutionException {
            model.loadInternals(folder, new ExecutionMonitor());
        }

        /** Returns the warning on the node. */
        public Optional<String> warning() {
            return model.warning;
        }

        /** Returns flow variables pushed. */
        public Map<String, Object> variables() {
            return Map.copyOf(model.variables);
        }

        /** Returns the types of the input ports. */
        public PortType[] inputs() {
            return model.inputs.clone();
        }

        /** Returns the types of the output ports. */
        public PortType[] outputs() {
            return model.outputs.clone();
        }
    }
}
