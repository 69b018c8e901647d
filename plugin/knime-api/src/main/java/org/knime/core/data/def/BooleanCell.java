package org.knime.core.data.def;

import org.knime.core.data.BooleanValue;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class BooleanCell extends DataCell implements BooleanValue {
    private static final long serialVersionUID = 1L;

    public static final BooleanCell TRUE = null;

    public static final BooleanCell FALSE = null;

    public static final DataType TYPE = null;

    private BooleanCell() {
        throw new UnsupportedOperationException();
    }

    @Override
    public boolean getBooleanValue() {
        throw new UnsupportedOperationException();
    }

    @Override
    public String toString() {
        throw new UnsupportedOperationException();
    }
}
