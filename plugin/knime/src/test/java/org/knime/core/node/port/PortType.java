package org.knime.core.node.port;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class PortType {

    private final Class<? extends PortObject> objectClass;
    private final boolean optional;

    PortType(final Class<? extends PortObject> objectClass, final boolean optional) {
        this.objectClass = objectClass;
        this.optional = optional;
    }

    public Class<? extends PortObject> getPortObjectClass() {
        return objectClass;
    }

    public boolean isOptional() {
        return optional;
    }

    public String getName() {
        return objectClass.getSimpleName();
    }
}
