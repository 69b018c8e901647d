package org.modestead.nodes.table;

import java.util.List;
import java.util.OptionalInt;

/**
 * The columns of a table, known before its rows.
 *
 * @param columns in order, names unique
 */
public record TableSchema(List<Column> columns) {

    /** Takes an immutable copy. */
    public TableSchema {
        columns = List.copyOf(columns);
    }

    /** A schema of the given columns. */
    public static TableSchema of(Column... columns) {
        return new TableSchema(List.of(columns));
    }

    /** Returns the position of a column, empty when there is none of that name. */
    public OptionalInt indexOf(String name) {
        for (int i = 0; i < columns.size(); i++) {
            if (columns.get(i).name().equals(name)) {
                return OptionalInt.of(i);
            }
        }
        return OptionalInt.empty();
    }

    /** Returns the column names in order. */
    public List<String> names() {
        return columns.stream().map(Column::name).toList();
    }
}
