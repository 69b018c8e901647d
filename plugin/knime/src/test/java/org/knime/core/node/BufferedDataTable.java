package org.knime.core.node;

import java.util.Iterator;
import java.util.List;
import javax.swing.JComponent;
import org.knime.core.data.DataRow;
import org.knime.core.data.DataTable;
import org.knime.core.data.DataTableSpec;
import org.knime.core.data.container.CloseableRowIterator;
import org.knime.core.node.port.PortObject;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class BufferedDataTable implements DataTable, PortObject {

    private final DataTableSpec spec;
    private final List<DataRow> rows;

    BufferedDataTable(final DataTableSpec spec, final List<DataRow> rows) {
        this.spec = spec;
        this.rows = List.copyOf(rows);
    }

    @Override
    public DataTableSpec getDataTableSpec() {
        return spec;
    }

    @Override
    public DataTableSpec getSpec() {
        return spec;
    }

    @Override
    public String getSummary() {
        return rows.size() + " rows";
    }

    public CloseableRowIterator iterator() {
        Iterator<DataRow> all = rows.iterator();
        return new CloseableRowIterator() {
            @Override
            public boolean hasNext() {
                return all.hasNext();
            }

            @Override
            public DataRow next() {
                return all.next();
            }

            @Override
            public void close() {
                // nothing is held
            }
        };
    }

    public long size() {
        return rows.size();
    }

    @Override
    public JComponent[] getViews() {
        return new JComponent[0];
    }
}
