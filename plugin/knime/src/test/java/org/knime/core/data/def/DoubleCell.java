package org.knime.core.data.def;

import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;
import org.knime.core.data.DoubleValue;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class DoubleCell extends DataCell implements DoubleValue {
    public static final DataType TYPE = DataType.getType(DoubleCell.class);
    private static final long serialVersionUID = 1L;
    private final double value;

    public DoubleCell(final double value) {
        super();
        this.value = value;
    }

    @Override
    public double getDoubleValue() {
        return value;
    }

    @Override
    public String toString() {
        return String.valueOf(value);
    }
}
