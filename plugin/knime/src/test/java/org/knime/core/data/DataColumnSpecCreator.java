package org.knime.core.data;

import java.util.List;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class DataColumnSpecCreator {

    private final String name;
    private final DataType type;
    private List<String> elements = List.of();

    public DataColumnSpecCreator(final String name, final DataType type) {
        this.name = name;
        this.type = type;
    }

    public void setElementNames(final String[] elNames) {
        elements = List.of(elNames);
    }

    public DataColumnSpec createSpec() {
        return new DataColumnSpec(name, type, elements);
    }
}
