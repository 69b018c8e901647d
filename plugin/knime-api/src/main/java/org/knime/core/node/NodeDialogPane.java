package org.knime.core.node;

import java.awt.Component;
import javax.swing.JPanel;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.workflow.VariableType;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class NodeDialogPane {
    protected NodeDialogPane() {
        throw new UnsupportedOperationException();
    }

    public final JPanel getPanel() {
        throw new UnsupportedOperationException();
    }

    protected final void addTab(final String title, final Component component) {
        throw new UnsupportedOperationException();
    }

    protected final void addTab(final String title, final Component component, final boolean wrapInScrollPane) {
        throw new UnsupportedOperationException();
    }

    protected void loadSettingsFrom(final NodeSettingsRO settings, final PortObjectSpec[] specs) throws NotConfigurableException {
        throw new UnsupportedOperationException();
    }

    protected abstract void saveSettingsTo(NodeSettingsWO settings) throws InvalidSettingsException;

    public FlowVariableModel createFlowVariableModel(final String[] keys, final VariableType<?> type) {
        throw new UnsupportedOperationException();
    }

    public final void finishEditingAndSaveSettingsTo(final NodeSettingsWO settings) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    public void onOpen() {
        throw new UnsupportedOperationException();
    }

    public void onClose() {
        throw new UnsupportedOperationException();
    }

    public void onCancel() {
        throw new UnsupportedOperationException();
    }

    public boolean closeOnESC() {
        throw new UnsupportedOperationException();
    }
}
