package org.modestead.nodes.table;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalLong;

/**
 * A table held in memory, one typed store a column; immutable once built, so many threads may read it.
 *
 * <p>Not-a-number in a column of numbers is a missing cell: the engine writes NaN where a figure could not be computed.
 */
public final class MemoryTable implements Table {

    private final TableSchema schema;
    private final String origin;
    private final List<ColumnStore> stores;
    private final int rows;

    private MemoryTable(TableSchema schema, String origin, List<ColumnStore> stores, int rows) {
        this.schema = schema;
        this.origin = origin;
        this.stores = stores;
        this.rows = rows;
    }

    /** Starts a table without rows. */
    public static Builder builder(TableSchema schema, String origin) {
        return new Builder(schema, origin);
    }

    /** Reads all rows of a table; it must fit into memory. */
    public static MemoryTable copyOf(Table table) {
        Builder builder = builder(table.schema(), table.origin());
        int columns = table.schema().columns().size();
        Object[] cells = new Object[columns];
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                for (int j = 0; j < columns; j++) {
                    cells[j] = cursor.cell(j).orElse(null);
                }
                builder.row(cells);
            }
        }
        return builder.build();
    }

    @Override
    public TableSchema schema() {
        return schema;
    }

    @Override
    public String origin() {
        return origin;
    }

    /** Returns the number of rows. */
    public int rows() {
        return rows;
    }

    @Override
    public OptionalLong rowCount() {
        return OptionalLong.of(rows);
    }

    @Override
    public RowCursor open() {
        return new Cursor();
    }

    /** Collects rows. Not for use by several threads. */
    public static final class Builder {
        private final TableSchema schema;
        private final String origin;
        private final List<ColumnStore> stores;
        private int rows;

        private Builder(TableSchema schema, String origin) {
            this.schema = schema;
            this.origin = Objects.requireNonNull(origin);
            this.stores = schema.columns().stream().map(column -> ColumnStore.of(column.type())).toList();
        }

        /**
         * Appends a row.
         *
         * @param cells one a column, each of the Java type that {@link CellType} names (any {@link Number} in a column of
         *     numbers) or null when missing
         * @throws IllegalArgumentException if the number of cells or the type of one is wrong
         */
        public Builder row(Object... cells) {
            if (cells.length != stores.size()) {
                throw new IllegalArgumentException(cells.length + " cells for " + stores.size() + " columns");
            }
            for (int j = 0; j < cells.length; j++) {
                Column column = schema.columns().get(j);
                if (cells[j] != null && !ColumnStore.fits(column.type(), cells[j])) {
                    throw new IllegalArgumentException("column " + column.name() + " holds " + column.type().title()
                            + ", not "
                            + cells[j].getClass().getSimpleName() + " " + cells[j]);
                }
            }
            for (int j = 0; j < cells.length; j++) {
                stores.get(j).add(cells[j]);
            }
            rows++;
            return this;
        }

        /** Returns the table; the builder is empty of use afterwards. */
        public MemoryTable build() {
            stores.forEach(ColumnStore::seal);
            return new MemoryTable(schema, origin, List.copyOf(new ArrayList<>(stores)), rows);
        }
    }

    private final class Cursor implements RowCursor {
        private int at = -1;

        @Override
        public boolean next() {
            at = Math.min(at + 1, rows);
            return at < rows;
        }

        @Override
        public long row() {
            return at + 1L;
        }

        @Override
        public double number(int column) {
            return stores.get(column).number(at);
        }

        @Override
        public Optional<Object> cell(int column) {
            return stores.get(column).cell(at);
        }

        @Override
        public void close() {
            // holds nothing but arrays
        }
    }
}
