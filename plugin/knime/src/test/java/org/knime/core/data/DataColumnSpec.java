package org.knime.core.data;

import java.util.List;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class DataColumnSpec {

    private final String name;
    private final DataType type;
    private final List<String> elements;

    DataColumnSpec(final String name, final DataType type, final List<String> elements) {
        this.name = name;
        this.type = type;
        this.elements = elements;
    }

    public List<String> getElementNames() {
        return elements;
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
