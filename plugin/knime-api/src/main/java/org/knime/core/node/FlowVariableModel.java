package org.knime.core.node;

import java.util.Optional;
import javax.swing.event.ChangeListener;
import org.knime.core.node.workflow.FlowVariable;

/** Signatures of the platform's public class of this name; no behaviour. */
public class FlowVariableModel {
    FlowVariableModel() {
        throw new UnsupportedOperationException();
    }

    public String getInputVariableName() {
        throw new UnsupportedOperationException();
    }

    public Optional<FlowVariable> getVariableValue() {
        throw new UnsupportedOperationException();
    }

    public boolean isVariableReplacementEnabled() {
        throw new UnsupportedOperationException();
    }

    public void addChangeListener(final ChangeListener l) {
        throw new UnsupportedOperationException();
    }
}
