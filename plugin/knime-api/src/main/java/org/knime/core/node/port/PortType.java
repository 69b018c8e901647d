package org.knime.core.node.port;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class PortType {
    private PortType() {
        throw new UnsupportedOperationException();
    }

    public Class<? extends PortObject> getPortObjectClass() {
        throw new UnsupportedOperationException();
    }

    public boolean isOptional() {
        throw new UnsupportedOperationException();
    }

    public String getName() {
        throw new UnsupportedOperationException();
    }
}
