package org.knime.core.node.port;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class PortTypeRegistry {

    private static final PortTypeRegistry ONLY = new PortTypeRegistry();

    private PortTypeRegistry() {}

    public static PortTypeRegistry getInstance() {
        return ONLY;
    }

    public synchronized PortType getPortType(final Class<? extends PortObject> portClass) {
        return new PortType(portClass, false);
    }

    public synchronized PortType getPortType(final Class<? extends PortObject> portClass, final boolean optional) {
        return new PortType(portClass, optional);
    }
}
