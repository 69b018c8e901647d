package org.knime.core.node.workflow;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class FlowVariable {
    private FlowVariable() {
        throw new UnsupportedOperationException();
    }

    public <T> FlowVariable(final String name, final VariableType<T> type, final T value) {
        throw new UnsupportedOperationException();
    }

    public String getValueAsString() {
        throw new UnsupportedOperationException();
    }
}
