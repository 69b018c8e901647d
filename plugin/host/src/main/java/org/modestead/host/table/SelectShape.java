package org.modestead.host.table;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/**
 * The columns of a SELECT, found without running it, and the same SELECT with its columns cast to the types that
 * nodes know.
 *
 * @param schema columns
 * @param select SQL with the same rows
 */
record SelectShape(TableSchema schema, String select) {

    /**
     * @param database that holds what the SELECT reads
     * @param rows the SELECT
     * @param origin for messages
     * @throws TableFault if two columns have the same name
     */
    static SelectShape of(Database database, String rows, String origin) throws SQLException {
        List<Column> columns = new ArrayList<>();
        Set<String> names = new HashSet<>();
        try (Statement statement = database.connection().createStatement();
                ResultSet found = statement.executeQuery("DESCRIBE " + rows)) {
            while (found.next()) {
                String name = found.getString("column_name");
                if (!names.add(name.toLowerCase(java.util.Locale.ROOT))) {
                    throw new TableFault(origin + ", column " + name, "two columns have this name",
                            "give each a name of its own, for example with AS");
                }
                columns.add(new Column(name, SqlTypes.cellType(found.getString("column_type"))));
            }
        }
        String select = columns.stream()
                .map(column -> "CAST(" + Sql.name(column.name()) + " AS " + SqlTypes.sqlType(column.type()) + ") AS "
                        + Sql.name(column.name()))
                .collect(Collectors.joining(", ", "SELECT ", " FROM (" + rows + "\n)"));
        return new SelectShape(new TableSchema(columns), select);
    }
}
