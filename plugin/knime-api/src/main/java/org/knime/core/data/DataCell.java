package org.knime.core.data;

import java.io.Serializable;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class DataCell implements DataValue, Serializable {
    private static final long serialVersionUID = 1L;

    public final DataType getType() {
        throw new UnsupportedOperationException();
    }

    public boolean isMissing() {
        throw new UnsupportedOperationException();
    }

    @Override
    public abstract String toString();
}
