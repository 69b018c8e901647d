package org.modestead.nodes.prepare;

import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** Reads one column of measured numbers, or of lists of them. */
sealed interface MeasuredCell permits NumberCell, NumberListCell {

    /**
     * Hands over the numbers in the current row, NaN for what is missing.
     *
     * @throws org.modestead.engine.RecordingFault when the cell cannot be used
     */
    void read(RowCursor cursor, GrowingDoubles into);

    /** Returns where a cell of the current row is, for messages. */
    static String place(String origin, RowCursor cursor, String column) {
        return origin + ", row " + cursor.row() + " below the header, column " + column;
    }

    /**
     * Returns the reader of a column.
     *
     * @param table it is in
     * @param measured name and channels
     */
    static MeasuredCell of(Table table, MeasuredColumn measured) {
        int position = table.schema().indexOf(measured.column()).orElseThrow();
        var type = table.schema().columns().get(position).type();
        return type.entries().isPresent() ? new NumberListCell(table.origin(), measured.column(), position, measured.names().size())
                : new NumberCell(table.origin(), measured.column(), position, type);
    }
}
