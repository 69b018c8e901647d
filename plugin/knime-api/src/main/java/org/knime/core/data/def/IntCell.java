package org.knime.core.data.def;

import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;
import org.knime.core.data.DoubleValue;
import org.knime.core.data.IntValue;
import org.knime.core.data.LongValue;

/** Signatures of the platform's public class of this name; no behaviour. */
public class IntCell extends DataCell implements IntValue, LongValue, DoubleValue {
    private static final long serialVersionUID = 1L;

    public static final DataType TYPE = null;

    public IntCell(final int value) {
        throw new UnsupportedOperationException();
    }

    @Override
    public int getIntValue() {
        throw new UnsupportedOperationException();
    }

    @Override
    public double getDoubleValue() {
        throw new UnsupportedOperationException();
    }

    @Override
    public long getLongValue() {
        throw new UnsupportedOperationException();
    }

    @Override
    public String toString() {
        throw new UnsupportedOperationException();
    }
}
