package org.modestead.nodes.prepare;

import java.math.BigDecimal;
import java.util.OptionalDouble;
import org.modestead.engine.RecordingFault;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.RowCursor;

/**
 * Reads one column of measured numbers.
 *
 * @param origin of the table
 * @param name of the column
 * @param column its position
 * @param type of the column; text is accepted where every cell is a number
 */
record NumberCell(String origin, String name, int column, CellType type) implements MeasuredCell {

    @Override
    public void read(RowCursor cursor, GrowingDoubles into) {
        into.add(read(cursor));
    }

    /** Returns the number in the current row, NaN when it is missing. */
    double read(RowCursor cursor) {
        if (type.isNumber()) {
            double value = cursor.number(column);
            if (Double.isInfinite(value)) {
                throw fault(cursor, "the value is infinite", "give a finite number or leave the cell empty");
            }
            return value;
        }
        String text = cursor.text(column).strip();
        if (text.isEmpty()) {
            return Double.NaN;
        }
        return parse(text).orElseThrow(() -> fault(cursor, "the value is the text \"" + text + "\"",
                "write a number with a decimal point, or leave the cell empty when the value is missing"));
    }

    /** Returns the finite number that a text holds. */
    static OptionalDouble parse(String text) {
        try {
            double value = new BigDecimal(text).doubleValue();
            return Double.isInfinite(value) ? OptionalDouble.empty() : OptionalDouble.of(value);
        } catch (NumberFormatException notANumber) {
            return OptionalDouble.empty();
        }
    }

    private RecordingFault fault(RowCursor cursor, String seen, String wanted) {
        return new RecordingFault(MeasuredCell.place(origin, cursor, name), seen, wanted);
    }
}
