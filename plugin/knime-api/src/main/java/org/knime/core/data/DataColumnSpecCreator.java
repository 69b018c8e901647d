package org.knime.core.data;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class DataColumnSpecCreator {
    public DataColumnSpecCreator(final String name, final DataType type) {
        throw new UnsupportedOperationException();
    }

    public void setElementNames(final String[] elNames) {
        throw new UnsupportedOperationException();
    }

    public DataColumnSpec createSpec() {
        throw new UnsupportedOperationException();
    }
}
