package org.modestead.host.table;

import java.sql.SQLException;
import java.time.ZoneOffset;
import java.time.ZonedDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import org.duckdb.DuckDBAppender;
import org.duckdb.DuckDBConnection;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.ListCell;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** Copies a table that DuckDB does not hold into a database, row by row. */
final class TableLoader {

    private TableLoader() {}

    static void load(Database database, String name, Table table) throws SQLException {
        List<Column> columns = table.schema().columns();
        database.execute("CREATE TABLE " + Sql.name(name) + columns.stream()
                .map(column -> Sql.name(column.name()) + " " + SqlTypes.sqlType(column.type()))
                .collect(Collectors.joining(", ", " (", ")")));
        DuckDBConnection connection = database.connection().unwrap(DuckDBConnection.class);
        try (DuckDBAppender appender = connection.createAppender("main", name); RowCursor cursor = table.open()) {
            while (cursor.next()) {
                appender.beginRow();
                for (int j = 0; j < columns.size(); j++) {
                    append(appender, cursor, j, columns.get(j));
                }
                appender.endRow();
            }
        }
    }

    private static void append(DuckDBAppender appender, RowCursor cursor, int index, Column column) throws SQLException {
        if (cursor.isMissing(index)) {
            appender.appendNull();
            return;
        }
        switch (column.type()) {
            case DOUBLE -> appender.append(cursor.number(index));
            case LONG -> appender.append((long) cursor.cell(index).orElseThrow());
            case TEXT -> appender.append(cursor.text(index));
            case FLAG -> appender.append((boolean) cursor.cell(index).orElseThrow());
            case DATE -> appender.append(cursor.date(index));
            case DATE_TIME -> appender.append(cursor.dateTime(index));
            case ZONED_DATE_TIME -> appender.append(cursor.dateTime(index).atOffset(ZoneOffset.UTC));
            case DOUBLE_LIST, LONG_LIST, TEXT_LIST, FLAG_LIST, DATE_LIST, DATE_TIME_LIST, ZONED_DATE_TIME_LIST ->
                appender.append(entries((ListCell) cursor.cell(index).orElseThrow()));
        }
    }

    /** Missing entries are null there. */
    private static List<Object> entries(ListCell list) {
        List<Object> entries = new ArrayList<>();
        list.entries().forEach(entry -> entries.add(entry.map(found -> found instanceof ZonedDateTime zoned ? zoned.toOffsetDateTime() : found)
                .orElse(null)));
        return entries;
    }
}
