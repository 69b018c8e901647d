package org.knime.core.data.def;

import java.util.Iterator;
import java.util.List;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataRow;
import org.knime.core.data.RowKey;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public class DefaultRow implements DataRow {

    private final RowKey key;
    private final List<DataCell> cells;

    public DefaultRow(final RowKey key, final DataCell... cells) {
        this.key = key;
        this.cells = List.of(cells);
    }

    @Override
    public int getNumCells() {
        return cells.size();
    }

    @Override
    public RowKey getKey() {
        return key;
    }

    @Override
    public DataCell getCell(final int index) {
        return cells.get(index);
    }

    @Override
    public Iterator<DataCell> iterator() {
        return cells.iterator();
    }
}
