package org.modestead.nodes.prepare;

import java.util.OptionalInt;
import java.util.Set;
import org.modestead.engine.RecordingFault;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** Reads which run each row belongs to. A number names a run by its value: 3 and 3.0 are one run. */
public final class RunNames {

    /** Columns that may name runs. */
    public static final Set<CellType> TYPES = Set.of(CellType.TEXT, CellType.LONG, CellType.DOUBLE, CellType.DATE, CellType.FLAG);

    private static final String ONLY = "1";

    /** Above this, whole numbers share a double. */
    private static final double EXACT = 1L << 53;

    private final String origin;
    private final String title;
    private final OptionalInt column;
    private final boolean decimals;

    private RunNames(String origin, String title, OptionalInt column, boolean decimals) {
        this.origin = origin;
        this.title = title;
        this.column = column;
        this.decimals = decimals;
    }

    /**
     * @param table with the rows
     * @param title of the column; empty where all rows are one run
     * @throws RecordingFault if there is no such column
     */
    static RunNames of(Table table, String title) {
        if (title.isEmpty()) {
            return new RunNames(table.origin(), title, OptionalInt.empty(), false);
        }
        int column = table.schema().indexOf(title).orElseThrow(() -> new RecordingFault(table.origin(), "there is no column " + title,
                "choose one of " + String.join(", ", table.schema().names())));
        return new RunNames(table.origin(), title, OptionalInt.of(column), table.schema().columns().get(column).type() == CellType.DOUBLE);
    }

    /**
     * Returns the run of the current row.
     *
     * @throws RecordingFault if the cell is empty
     */
    String read(RowCursor cursor) {
        if (column.isEmpty()) {
            return ONLY;
        }
        String name = cursor.text(column.getAsInt()).strip();
        if (name.isEmpty()) {
            throw new RecordingFault(MeasuredCell.place(origin, cursor, title), "the name of the run is missing",
                    "give every row the name of its run, or clear the run column");
        }
        return decimals ? whole(cursor.number(column.getAsInt()), name) : name;
    }

    private static String whole(double value, String name) {
        return value == Math.rint(value) && Math.abs(value) <= EXACT ? Long.toString((long) value) : name;
    }
}
