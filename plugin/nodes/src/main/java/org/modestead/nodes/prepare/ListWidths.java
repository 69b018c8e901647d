package org.modestead.nodes.prepare;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.ListCell;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** How many entries the lists of a column have: told by the table with their names, or by the first list that is there. */
final class ListWidths {

    private ListWidths() {}

    /**
     * Returns what is known before the rows are read.
     *
     * @param schema of the table
     * @param names of columns, all of them there
     * @return one a column, empty where the entries of one are not told
     */
    static Optional<List<MeasuredColumn>> told(TableSchema schema, List<String> names) {
        List<Column> columns = columns(schema, names);
        return columns.stream().anyMatch(ListWidths::untold) ? Optional.empty()
                : Optional.of(columns.stream().map(column -> MeasuredColumn.of(column, column.entries().size(), schema)).toList());
    }

    /**
     * Returns the channels of some columns; reads rows until every list that the table does not tell of has been seen once.
     *
     * @param table to be read
     * @param names of columns, all of them there
     * @param progress asked whether to stop
     * @throws RecordingFault when no row holds a list of some column, or an empty one comes first
     */
    static List<MeasuredColumn> found(Table table, List<String> names, Progress progress) {
        TableSchema schema = table.schema();
        Map<String, Integer> widths = new LinkedHashMap<>();
        List<Column> columns = columns(schema, names);
        columns.forEach(column -> widths.put(column.name(), column.entries().size()));
        TreeSet<Integer> unseen = new TreeSet<>();
        columns.stream().filter(ListWidths::untold).forEach(column -> unseen.add(schema.indexOf(column.name()).orElseThrow()));
        try (RowCursor cursor = table.open()) {
            while (!unseen.isEmpty() && cursor.next()) {
                progress.checkCancelled();
                unseen.removeIf(column -> seen(table, cursor, column, widths));
            }
        }
        if (!unseen.isEmpty()) {
            throw new RecordingFault(table.origin() + ", column " + schema.columns().get(unseen.first()).name(), "no row holds a list",
                    "choose other channels or give it lists of numbers");
        }
        return columns.stream().map(column -> MeasuredColumn.of(column, widths.get(column.name()), schema)).toList();
    }

    private static boolean seen(Table table, RowCursor cursor, int column, Map<String, Integer> widths) {
        Optional<ListCell> list = cursor.cell(column).map(ListCell.class::cast);
        String name = table.schema().columns().get(column).name();
        if (list.isPresent() && list.get().entries().isEmpty()) {
            throw new RecordingFault(MeasuredCell.place(table.origin(), cursor, name), "the list is empty",
                    "give every row a list of as many numbers, or leave the cell empty when all are missing");
        }
        list.ifPresent(found -> widths.put(name, found.entries().size()));
        return list.isPresent();
    }

    private static boolean untold(Column column) {
        return column.type().entries().isPresent() && column.entries().isEmpty();
    }

    private static List<Column> columns(TableSchema schema, List<String> names) {
        return names.stream().map(name -> schema.columns().get(schema.indexOf(name).orElseThrow())).toList();
    }
}
