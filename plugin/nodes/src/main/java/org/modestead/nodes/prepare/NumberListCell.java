package org.modestead.nodes.prepare;

import java.util.Optional;
import org.modestead.engine.RecordingFault;
import org.modestead.nodes.table.RowCursor;

/**
 * Reads one column of lists of measured numbers, all of one length.
 *
 * @param origin of the table
 * @param name of the column
 * @param column its position
 * @param width entries of each list
 */
record NumberListCell(String origin, String name, int column, int width) implements MeasuredCell {

    @Override
    public void read(RowCursor cursor, GrowingDoubles into) {
        Optional<double[]> cell = cursor.numbers(column);
        if (cell.isEmpty()) {
            for (int i = 0; i < width; i++) {
                into.add(Double.NaN);
            }
            return;
        }
        double[] numbers = cell.get();
        if (numbers.length != width) {
            throw fault(cursor, "the list has " + entries(numbers.length) + ", not " + width + " as told or seen before",
                    "give every row a list of as many numbers, or leave the cell empty when all are missing");
        }
        for (int i = 0; i < width; i++) {
            if (Double.isInfinite(numbers[i])) {
                throw fault(cursor, "entry " + (i + 1) + " of the list is infinite", "give a finite number or leave the entry empty");
            }
        }
        into.add(numbers);
    }

    private static String entries(int count) {
        return count == 0 ? "no entry" : count + (count == 1 ? " entry" : " entries");
    }

    private RecordingFault fault(RowCursor cursor, String seen, String wanted) {
        return new RecordingFault(MeasuredCell.place(origin, cursor, name), seen, wanted);
    }
}
