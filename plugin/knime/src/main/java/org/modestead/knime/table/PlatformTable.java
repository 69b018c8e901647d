package org.modestead.knime.table;

import java.util.Objects;
import java.util.Optional;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataRow;
import org.knime.core.data.DataTableSpec;
import org.knime.core.data.container.CloseableRowIterator;
import org.knime.core.node.BufferedDataTable;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** A table of the platform as the nodes see it: rows are streamed, none is kept. */
public final class PlatformTable implements Table {

    private final BufferedDataTable table;
    private final String origin;
    private final TableSchema schema;
    private final int[] positions;

    /**
     * @param table arriving at a port
     * @param origin what messages call it
     */
    public PlatformTable(BufferedDataTable table, String origin) {
        this.table = Objects.requireNonNull(table);
        this.origin = Objects.requireNonNull(origin);
        DataTableSpec spec = table.getDataTableSpec();
        this.schema = TableSpecs.schema(spec);
        this.positions = schema.names().stream().mapToInt(spec::findColumnIndex).toArray();
    }

    @Override
    public TableSchema schema() {
        return schema;
    }

    @Override
    public String origin() {
        return origin;
    }

    @Override
    public RowCursor open() {
        return new Cursor(table.iterator());
    }

    private final class Cursor implements RowCursor {
        private final CloseableRowIterator rows;
        private Optional<DataRow> current = Optional.empty();
        private long row;

        Cursor(CloseableRowIterator rows) {
            this.rows = rows;
        }

        @Override
        public boolean next() {
            boolean more = rows.hasNext();
            current = more ? Optional.of(rows.next()) : Optional.empty();
            row++;
            return more;
        }

        @Override
        public long row() {
            return row;
        }

        @Override
        public double number(int column) {
            return CellTypes.number(platformCell(column));
        }

        @Override
        public Optional<Object> cell(int column) {
            CellType kind = schema.columns().get(column).type();
            return CellTypes.read(platformCell(column), kind);
        }

        private DataCell platformCell(int column) {
            return current.orElseThrow(() -> new IllegalStateException("no current row")).getCell(positions[column]);
        }

        @Override
        public void close() {
            rows.close();
        }
    }
}
