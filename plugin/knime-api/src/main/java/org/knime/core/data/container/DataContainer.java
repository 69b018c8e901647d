package org.knime.core.data.container;

import org.knime.core.data.DataRow;

/** Signatures of the platform's public class of this name; no behaviour. */
public class DataContainer {
    protected DataContainer() {
        throw new UnsupportedOperationException();
    }

    public void addRowToTable(final DataRow row) {
        throw new UnsupportedOperationException();
    }

    public void close() {
        throw new UnsupportedOperationException();
    }
}
