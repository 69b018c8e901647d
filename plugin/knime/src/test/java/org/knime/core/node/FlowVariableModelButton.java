package org.knime.core.node;

import javax.swing.JButton;

/** Stand-in for tests. */
public class FlowVariableModelButton extends JButton {
    private static final long serialVersionUID = 1L;

    public FlowVariableModelButton(final FlowVariableModel fvm) {
        super("v");
    }
}
