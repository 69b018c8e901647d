package org.knime.core.data;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class DataColumnSpec {

    private final String name;
    private final DataType type;

    DataColumnSpec(final String name, final DataType type) {
        this.name = name;
        this.type = type;
    }

    public String getName() {
        return name;
    }

    public DataType getType() {
        return type;
    }

    @Override
    public boolean equals(final Object other) {
        return other instanceof DataColumnSpec column && column.name.equals(name) && column.type.equals(type);
    }

    @Override
    public int hashCode() {
        return name.hashCode();
    }

    @Override
    public String toString() {
        return name + " (" + type + ")";
    }
}
