package org.knime.core.node;

import java.awt.Component;
import java.util.HashMap;
import java.util.Map;
import javax.swing.JPanel;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.workflow.VariableType;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public abstract class NodeDialogPane {

    /** Flow variable models by key. */
    public final Map<String, FlowVariableModel> made = new HashMap<>();

    private final JPanel panel = new JPanel();

    protected NodeDialogPane() {
        // empty at first
    }

    public final JPanel getPanel() {
        return panel;
    }

    protected final void addTab(final String title, final Component component) {
        addTab(title, component, true);
    }

    protected final void addTab(final String title, final Component component, final boolean wrapInScrollPane) {
        component.setName(title);
        panel.add(component);
    }

    protected void loadSettingsFrom(final NodeSettingsRO settings, final PortObjectSpec[] specs) throws NotConfigurableException {
        throw new UnsupportedOperationException();
    }

    protected abstract void saveSettingsTo(NodeSettingsWO settings) throws InvalidSettingsException;

    public FlowVariableModel createFlowVariableModel(final String[] keys, final VariableType<?> type) {
        FlowVariableModel model = new FlowVariableModel();
        made.put(keys[0], model);
        return model;
    }
}
