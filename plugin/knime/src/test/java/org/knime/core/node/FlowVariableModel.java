package org.knime.core.node;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javax.swing.event.ChangeEvent;
import javax.swing.event.ChangeListener;
import org.knime.core.node.workflow.FlowVariable;

/** Stand-in for tests: a variable of the given name, whose value is not known. */
public class FlowVariableModel {
    private final List<ChangeListener> listeners = new ArrayList<>();
    private Optional<String> name = Optional.empty();

    /** Puts a variable there, or takes it away. */
    public void use(final Optional<String> variable) {
        name = variable;
        listeners.forEach(listener -> listener.stateChanged(new ChangeEvent(this)));
    }

    public String getInputVariableName() {
        return name.orElse(null);
    }

    public Optional<FlowVariable> getVariableValue() {
        return Optional.empty();
    }

    public boolean isVariableReplacementEnabled() {
        return name.isPresent();
    }

    public void addChangeListener(final ChangeListener l) {
        listeners.add(l);
    }
}
