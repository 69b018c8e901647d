package org.knime.core.data.container;

import java.util.ArrayList;
import java.util.List;
import org.knime.core.data.DataRow;
import org.knime.core.data.DataTableSpec;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public class DataContainer {

    protected final DataTableSpec spec;
    protected final List<DataRow> rows = new ArrayList<>();

    protected DataContainer(final DataTableSpec spec) {
        this.spec = spec;
    }

    public void addRowToTable(final DataRow row) {
        if (row.getNumCells() != spec.getNumColumns()) {
            throw new IllegalArgumentException(row.getNumCells() + " cells for " + spec.getNumColumns() + " columns");
        }
        for (int i = 0; i < row.getNumCells(); i++) {
            if (!row.getCell(i).isMissing() && !row.getCell(i).getType().equals(spec.getColumnSpec(i).getType())) {
                throw new IllegalArgumentException(row.getCell(i).getType() + " in column " + spec.getColumnSpec(i));
            }
        }
        rows.add(row);
    }

    public void close() {
        // nothing is held
    }
}
