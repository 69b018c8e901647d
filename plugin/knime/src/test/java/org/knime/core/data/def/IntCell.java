package org.knime.core.data.def;

import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;
import org.knime.core.data.DoubleValue;
import org.knime.core.data.IntValue;
import org.knime.core.data.LongValue;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public class IntCell extends DataCell implements IntValue, LongValue, DoubleValue {
    public static final DataType TYPE = DataType.getType(IntCell.class);
    private static final long serialVersionUID = 1L;
    private final int value;

    public IntCell(final int value) {
        super();
        this.value = value;
    }

    @Override
    public int getIntValue() {
        return value;
    }

    @Override
    public double getDoubleValue() {
        return value;
    }

    @Override
    public long getLongValue() {
        return value;
    }

    @Override
    public String toString() {
        return String.valueOf(value);
    }
}
