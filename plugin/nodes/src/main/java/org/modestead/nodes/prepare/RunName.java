package org.modestead.nodes.prepare;

import java.util.Set;
import org.modestead.engine.RecordingFault;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/**
 * Reads the name of the run that each row belongs to. Whole numbers name a run however they are written: spreadsheets and arrays hold
 * 1.0 where a person wrote 1, and both are run 1.
 *
 * @param origin of the table, for messages
 * @param column name; empty for a table that is one run
 * @param position of the column
 * @param type of its cells
 */
public record RunName(String origin, String column, int position, CellType type) {

    /** What a column of runs may hold. */
    public static final Set<CellType> TYPES = Set.of(CellType.TEXT, CellType.LONG, CellType.DOUBLE, CellType.DATE, CellType.FLAG);

    private static final String ONLY = "1";
    private static final double LARGEST_WHOLE = 0x1p53;

    /**
     * Returns the reader of a column.
     *
     * @param table it is in
     * @param column name; empty for a table that is one run
     * @throws RecordingFault if there is no such column
     */
    public static RunName of(Table table, String column) {
        if (column.isEmpty()) {
            return new RunName(table.origin(), column, -1, CellType.TEXT);
        }
        int position = table.schema().indexOf(column).orElseThrow(() -> new RecordingFault(table.origin(), "there is no column " + column,
                "choose one of " + String.join(", ", table.schema().names())));
        return new RunName(table.origin(), column, position, table.schema().columns().get(position).type());
    }

    /**
     * Returns the name of the run of the current row.
     *
     * @throws RecordingFault if it is missing, or a number that is not whole
     */
    public String read(RowCursor cursor) {
        if (column.isEmpty()) {
            return ONLY;
        }
        String name = written(cursor);
        if (name.isEmpty()) {
            throw new RecordingFault(MeasuredCell.place(origin, cursor, column), "the name of the run is missing",
                    "give every row the name of its run, or clear the run column");
        } else if (type == CellType.DOUBLE && name.indexOf('.') >= 0) {
            throw new RecordingFault(MeasuredCell.place(origin, cursor, column), "the run is " + name + ", which is no whole number",
                    "number runs by whole numbers, or choose the column that names them");
        }
        return name;
    }

    /** Returns the cell of the current row as a name, whether it will do or not; empty where it is missing. */
    public String written(RowCursor cursor) {
        if (cursor.isMissing(position)) {
            return "";
        } else if (type != CellType.DOUBLE) {
            return cursor.text(position).strip();
        }
        double number = cursor.number(position);
        return number == Math.rint(number) && Math.abs(number) <= LARGEST_WHOLE ? Long.toString((long) number) : Double.toString(number);
    }
}
