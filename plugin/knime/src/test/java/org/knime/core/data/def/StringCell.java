package org.knime.core.data.def;

import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;
import org.knime.core.data.StringValue;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class StringCell extends DataCell implements StringValue {
    public static final DataType TYPE = DataType.getType(StringCell.class);
    private static final long serialVersionUID = 1L;
    private final String value;

    public StringCell(final String value) {
        super();
        this.value = value;
    }

    @Override
    public String getStringValue() {
        return value;
    }

    @Override
    public String toString() {
        return String.valueOf(value);
    }
}
