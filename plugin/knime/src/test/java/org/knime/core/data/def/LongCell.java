package org.knime.core.data.def;

import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;
import org.knime.core.data.DoubleValue;
import org.knime.core.data.LongValue;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public class LongCell extends DataCell implements LongValue, DoubleValue {
    public static final DataType TYPE = DataType.getType(LongCell.class);
    private static final long serialVersionUID = 1L;
    private final long value;

    public LongCell(final long value) {
        super();
        this.value = value;
    }

    @Override
    public long getLongValue() {
        return value;
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
