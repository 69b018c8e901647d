package org.knime.core.data.def;

import java.util.Iterator;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataRow;
import org.knime.core.data.RowKey;

/** Signatures of the platform's public class of this name; no behaviour. */
public class DefaultRow implements DataRow {
    public DefaultRow(final RowKey key, final DataCell... cells) {
        throw new UnsupportedOperationException();
    }

    @Override
    public int getNumCells() {
        throw new UnsupportedOperationException();
    }

    @Override
    public RowKey getKey() {
        throw new UnsupportedOperationException();
    }

    @Override
    public DataCell getCell(final int index) {
        throw new UnsupportedOperationException();
    }

    @Override
    public Iterator<DataCell> iterator() {
        throw new UnsupportedOperationException();
    }
}
