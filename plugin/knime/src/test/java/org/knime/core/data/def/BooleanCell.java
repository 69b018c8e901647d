package org.knime.core.data.def;

import org.knime.core.data.BooleanValue;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;
import org.knime.core.data.DoubleValue;
import org.knime.core.data.LongValue;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class BooleanCell extends DataCell implements BooleanValue, LongValue, DoubleValue {
    public static final BooleanCell TRUE = new BooleanCell(true);
    public static final BooleanCell FALSE = new BooleanCell(false);
    public static final DataType TYPE = DataType.getType(BooleanCell.class);
    private static final long serialVersionUID = 1L;
    private final boolean value;

    private BooleanCell(final boolean value) {
        super();
        this.value = value;
    }

    @Override
    public boolean getBooleanValue() {
        return value;
    }

    @Override
    public long getLongValue() {
        return value ? 1 : 0;
    }

    @Override
    public double getDoubleValue() {
        return getLongValue();
    }

    @Override
    public String toString() {
        return String.valueOf(value);
    }
}
