package org.knime.core.data;

import java.io.Serializable;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public abstract class DataCell implements DataValue, Serializable {
    private static final long serialVersionUID = 1L;

    public DataType getType() {
        return DataType.getType(getClass());
    }

    public boolean isMissing() {
        return false;
    }

    @Override
    public abstract String toString();
}
