package org.knime.core.data.def;

import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;
import org.knime.core.data.DoubleValue;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class DoubleCell extends DataCell implements DoubleValue {
    private static final long serialVersionUID = 1L;

    public static final DataType TYPE = null;

    public DoubleCell(final double value) {
        throw new UnsupportedOperationException();
    }

    @Override
    public double getDoubleValue() {
        throw new UnsupportedOperationException();
    }

    @Override
    public String toString() {
        throw new UnsupportedOperationException();
    }
}
