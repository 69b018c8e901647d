package org.knime.core.node;

import java.io.File;
import java.io.IOException;
import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortType;
import org.knime.core.node.property.hilite.HiLiteHandler;
import org.knime.core.node.streamable.InputPortRole;
import org.knime.core.node.streamable.OutputPortRole;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class NodeModel implements AbstractNodeView.ViewableModel {
    protected NodeModel(final PortType[] inPortTypes, final PortType[] outPortTypes) {
        throw new UnsupportedOperationException();
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

    public InputPortRole[] getInputPortRoles() {
        throw new UnsupportedOperationException();
    }

    public OutputPortRole[] getOutputPortRoles() {
        throw new UnsupportedOperationException();
    }

    protected HiLiteHandler getOutHiLiteHandler(final int outIndex) {
        throw new UnsupportedOperationException();
    }

    protected void onDispose() {
        throw new UnsupportedOperationException();
    }

    protected final void setWarningMessage(final String message) {
        throw new UnsupportedOperationException();
    }

    protected final void pushFlowVariableString(final String name, final String value) {
        throw new UnsupportedOperationException();
    }
}
