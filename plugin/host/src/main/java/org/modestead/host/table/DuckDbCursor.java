package org.modestead.host.table;

import java.sql.Array;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.sql.Timestamp;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.ZonedDateTime;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.ListCell;
import org.modestead.nodes.table.RowCursor;

/** Steps through a streamed DuckDB result. Not for use by several threads. */
final class DuckDbCursor implements RowCursor {

    private final Database database;
    private final DuckDbTable table;
    private final List<Column> columns;
    private final Statement statement;
    private final InterruptWatch watch;
    private final ResultSet rows;
    private final String select;
    private boolean over;
    private long row;

    DuckDbCursor(Database database, String select, DuckDbTable table) throws SQLException {
        this.database = database;
        this.table = table;
        this.columns = table.schema().columns();
        this.statement = database.connection().createStatement();
        this.watch = InterruptWatch.over(statement);
        this.select = select;
        this.rows = rows(CompleteRows.marked(select, columns.size()));
    }

    private ResultSet rows(String select) throws SQLException {
        boolean open = false;
        try {
            ResultSet found = statement.executeQuery(select);
            open = true;
            return found;
        } finally {
            if (!open) {
                watch.close();
            }
        }
    }

    @Override
    public boolean next() {
        return read(() -> {
            if (over) {
                return false;
            } else if (!rows.next()) {
                throw CompleteRows.reason(database, select, table, row);
            }
            over = rows.getBoolean(columns.size() + 1);
            row += over ? 0 : 1;
            return !over;
        });
    }

    @Override
    public long row() {
        return row;
    }

    @Override
    public boolean isMissing(int column) {
        return columns.get(column).type() == CellType.DOUBLE ? Double.isNaN(number(column)) : cell(column).isEmpty();
    }

    @Override
    public double number(int column) {
        return read(() -> {
            double value = rows.getDouble(column + 1);
            return rows.wasNull() ? Double.NaN : value;
        });
    }

    @Override
    public Optional<Object> cell(int column) {
        return read(() -> value(column, columns.get(column).type()));
    }

    @Override
    public void close() {
        watch.close();
        try {
            rows.close();
            statement.close();
        } catch (SQLException closing) {
            throw table.explainer().explain(closing);
        } finally {
            database.close();
        }
    }

    private Optional<Object> value(int column, CellType type) throws SQLException {
        return cell(rows, column + 1, type);
    }

    /**
     * Returns a cell of the current row.
     *
     * @param position of the column, from 1
     */
    static Optional<Object> cell(ResultSet rows, int position, CellType type) throws SQLException {
        Object found = switch (type) {
            case DOUBLE -> rows.getDouble(position);
            case LONG -> rows.getLong(position);
            case TEXT -> rows.getString(position);
            case FLAG -> rows.getBoolean(position);
            case DATE -> rows.getObject(position, LocalDate.class);
            case DATE_TIME -> rows.getObject(position, LocalDateTime.class);
            case ZONED_DATE_TIME -> rows.getObject(position, OffsetDateTime.class);
            case DOUBLE_LIST, LONG_LIST, TEXT_LIST, FLAG_LIST, DATE_LIST, DATE_TIME_LIST, ZONED_DATE_TIME_LIST -> list(rows, position);
        };
        boolean missing = found == null || rows.wasNull() || found instanceof Double number && number.isNaN();
        if (missing) {
            return Optional.empty();
        }
        return Optional.of(found instanceof OffsetDateTime moment ? utc(moment) : found);
    }

    /** Returns the list, null when there is none, as {@code getString} does. */
    private static ListCell list(ResultSet rows, int position) throws SQLException {
        Array found = rows.getArray(position);
        return found == null ? null : new ListCell(Stream.of((Object[]) found.getArray()).map(DuckDbCursor::entry).toList());
    }

    private static Optional<Object> entry(Object found) {
        if (found instanceof Timestamp moment) {
            return Optional.of(moment.toLocalDateTime());
        } else if (found instanceof Double number && number.isNaN()) {
            return Optional.empty();
        }
        return Optional.ofNullable(found instanceof OffsetDateTime moment ? utc(moment) : found);
    }

    private static ZonedDateTime utc(OffsetDateTime moment) {
        return moment.atZoneSameInstant(ZoneOffset.UTC);
    }

    private <T> T read(Reading<T> reading) {
        try {
            return reading.read();
        } catch (SQLException failure) {
            throw table.explainer().explain(failure);
        }
    }

    private interface Reading<T> {
        T read() throws SQLException;
    }
}
