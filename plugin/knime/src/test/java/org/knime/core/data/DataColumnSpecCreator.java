package org.knime.core.data;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class DataColumnSpecCreator {

    private final String name;
    private final DataType type;

    public DataColumnSpecCreator(final String name, final DataType type) {
        this.name = name;
        this.type = type;
    }

    public DataColumnSpec createSpec() {
        return new DataColumnSpec(name, type);
    }
}
