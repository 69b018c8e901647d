package org.knime.core.node;

import javax.swing.JButton;

/** Signatures of the platform's public class of this name; no behaviour. */
public class FlowVariableModelButton extends JButton {
    private static final long serialVersionUID = 1L;

    public FlowVariableModelButton(final FlowVariableModel fvm) {
        throw new UnsupportedOperationException();
    }
}
