package org.knime.core.node.port;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class PortTypeRegistry {
    private PortTypeRegistry() {
        throw new UnsupportedOperationException();
    }

    public static PortTypeRegistry getInstance() {
        throw new UnsupportedOperationException();
    }

    public synchronized PortType getPortType(final Class<? extends PortObject> portClass) {
        throw new UnsupportedOperationException();
    }

    public synchronized PortType getPortType(final Class<? extends PortObject> portClass, final boolean optional) {
        throw new UnsupportedOperationException();
    }
}
