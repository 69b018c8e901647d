package org.knime.core.data.def;

import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;
import org.knime.core.data.StringValue;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class StringCell extends DataCell implements StringValue {
    private static final long serialVersionUID = 1L;

    public static final DataType TYPE = null;

    public StringCell(final String value) {
        throw new UnsupportedOperationException();
    }

    @Override
    public String getStringValue() {
        throw new UnsupportedOperationException();
    }

    @Override
    public String toString() {
        throw new UnsupportedOperationException();
    }
}
