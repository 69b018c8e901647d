package org.modestead.host.table;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.concurrent.locks.ReadWriteLock;
import java.util.concurrent.locks.ReentrantReadWriteLock;
import java.util.stream.Collectors;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.Table;

/**
 * A table at rest, to be looked at page by page, sorted and searched. Its beginning is copied at once into a database of its own, all of
 * it only when somebody sorts, searches, looks further or asks for the number of rows; then no page costs a new reading. What does not fit
 * into memory goes to a temporary folder. Thread-safe: the beginning can be looked at while the rest is being read.
 */
public final class TablePages implements AutoCloseable {

    /** Most rows of a page. */
    public static final int MOST_ROWS = 500;

    /** Rows of the beginning; a table that has no more is read once. */
    static final int BEGINNING = 10_000;

    private static final String ROWS = "\"rows\"";

    private final Table table;
    private final ReadWriteLock use = new ReentrantReadWriteLock();
    private final Object copying = new Object();
    private Optional<Rows> beginning = Optional.empty();
    private volatile Optional<Rows> all = Optional.empty();
    private boolean closed;

    /** Nothing is read yet. */
    public TablePages(Table table) {
        this.table = table;
    }

    /**
     * What is asked for.
     *
     * @param offset rows before the page
     * @param limit rows of the page, at most {@value #MOST_ROWS}
     * @param sort position of the column by which rows are sorted; empty for the table's own order
     * @param falling whether the largest comes first; missing cells come last either way
     * @param find text that a cell of a row must hold, in capitals or not; empty for all rows
     * @param whole whether the number of all rows must be told, however long that takes
     */
    public record Wish(long offset, int limit, OptionalInt sort, boolean falling, String find, boolean whole) {

        /** Keeps to the limits. */
        public Wish {
            offset = Math.max(0, offset);
            limit = Math.max(0, Math.min(limit, MOST_ROWS));
        }

        private boolean isWithin(long rows) {
            return !whole && sort.isEmpty() && find.isBlank() && offset + limit <= rows;
        }
    }

    /**
     * A page.
     *
     * @param whole whether the table was read to its end; if not, it has more rows than are told of
     * @param total rows of the table, or those at its beginning
     * @param found rows that hold the text
     * @param numbers of the rows in the table, from 1
     * @param rows cells as {@link org.modestead.nodes.table.RowCursor#cell} gives them
     */
    public record Page(boolean whole, long total, long found, List<Long> numbers, List<List<Optional<Object>>> rows) {}

    /** Returns a page; empty when this was closed. */
    public Optional<Page> page(Wish wish) {
        use.readLock().lock();
        try {
            return closed ? Optional.empty() : Optional.of(rows(wish).page(wish));
        } finally {
            use.readLock().unlock();
        }
    }

    private Rows rows(Wish wish) {
        Optional<Rows> known = all;
        if (known.isPresent()) {
            return known.get();
        }
        Rows begun = beginning();
        return begun.whole || wish.isWithin(BEGINNING) ? begun : all();
    }

    private synchronized Rows beginning() {
        Rows begun = beginning.orElseGet(() -> Rows.copy(table, BEGINNING));
        beginning = Optional.of(begun);
        return begun;
    }

    private Rows all() {
        synchronized (copying) {
            Rows copied = all.orElseGet(() -> Rows.copy(table, Long.MAX_VALUE));
            all = Optional.of(copied);
            return copied;
        }
    }

    @Override
    public void close() {
        use.writeLock().lock();
        try {
            closed = true;
            beginning.ifPresent(Rows::close);
            all.ifPresent(Rows::close);
        } finally {
            use.writeLock().unlock();
        }
    }

    /** Rows that were copied, all of the table or the first of them. */
    private static final class Rows {
        private final Table table;
        private final Database database;
        private final String number;
        private final long total;
        private final boolean whole;

        private Rows(Table table, Database database, String number, long total, boolean whole) {
            this.table = table;
            this.database = database;
            this.number = number;
            this.total = total;
            this.whole = whole;
        }

        static Rows copy(Table table, long most) {
            Recipe recipe = Recipe.of(table);
            Database database = null;
            boolean kept = false;
            try {
                database = Database.open(Database.USUAL_MEGABYTES);
                recipe.prepare(database, List.of());
                String number = Sql.name(free(table));
                // one row more tells whether there are more
                String some = most == Long.MAX_VALUE ? "" : " LIMIT " + (most + 1);
                database.execute("CREATE TABLE " + ROWS + " AS SELECT row_number() OVER () AS " + number + ", * FROM (SELECT * FROM (" + recipe.select() + ")"
                        + some + ")");
                long total = database.one("SELECT count(*) FROM " + ROWS, row -> row.getLong(1));
                kept = true;
                return new Rows(table, database, number, Math.min(total, most), total <= most);
            } catch (SQLException failure) {
                throw explain(table, failure);
            } finally {
                if (!kept && database != null) {
                    database.close();
                }
            }
        }

        synchronized Page page(Wish wish) {
            List<Column> columns = table.schema().columns();
            String where = wish.find().isBlank() || columns.isEmpty() ? "" : " WHERE contains(lower(concat_ws(chr(10), " + columns.stream()
                    .map(column -> "CAST(" + Sql.name(column.name()) + " AS VARCHAR)").collect(Collectors.joining(", ")) + ")), lower("
                    + Sql.text(wish.find()) + "))";
            String order = wish.sort().isPresent() ? Sql.name(columns.get(wish.sort().getAsInt()).name()) + (wish.falling() ? " DESC" : " ASC") + " NULLS LAST, "
                    : "";
            try (Statement statement = database.connection().createStatement()) {
                long found = where.isEmpty() ? total : database.one("SELECT count(*) FROM " + ROWS + where, row -> row.getLong(1));
                List<Long> numbers = new ArrayList<>();
                List<List<Optional<Object>>> rows = new ArrayList<>();
                try (ResultSet cells = statement.executeQuery("SELECT * FROM " + ROWS + where + " ORDER BY " + order + number + " LIMIT " + wish.limit()
                        + " OFFSET " + wish.offset())) {
                    while (cells.next()) {
                        numbers.add(cells.getLong(1));
                        rows.add(row(cells, columns));
                    }
                }
                return new Page(whole, total, found, numbers, rows);
            } catch (SQLException failure) {
                throw explain(table, failure);
            }
        }

        synchronized void close() {
            database.close();
        }
    }

    private static List<Optional<Object>> row(ResultSet cells, List<Column> columns) throws SQLException {
        List<Optional<Object>> row = new ArrayList<>();
        for (int j = 0; j < columns.size(); j++) {
            row.add(DuckDbCursor.cell(cells, j + 2, columns.get(j).type()));
        }
        return row;
    }

    /** The rows are numbered in a column whose name no column of the table has. */
    private static String free(Table table) {
        List<String> names = table.schema().names().stream().map(name -> name.toLowerCase(java.util.Locale.ROOT)).toList();
        String name = "number of the row";
        while (names.contains(name)) {
            name += "'";
        }
        return name;
    }

    private static TableFault explain(Table table, SQLException failure) {
        return table instanceof DuckDbTable stored ? stored.explainer().explain(failure)
                : new TableFault(table.origin(), DuckDbMessage.of(failure).brief(), "look at another table");
    }
}
