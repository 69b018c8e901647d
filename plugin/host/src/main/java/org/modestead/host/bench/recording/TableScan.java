package org.modestead.host.bench.recording;

import java.time.ZoneOffset;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/**
 * What was seen when a table was read once.
 *
 * @param rows read
 * @param whole whether these are all
 * @param columns what was seen in each
 */
record TableScan(long rows, boolean whole, List<ColumnFacts> columns) {

    /** Rows beyond are not looked at. */
    static final long MOST_ROWS = 500_000;

    static TableScan of(Table table) {
        List<Counter> counters = table.schema().columns().stream().map(Counter::new).toList();
        long rows = 0;
        boolean more = false;
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                if (rows == MOST_ROWS) {
                    more = true;
                    break;
                }
                rows++;
                for (int j = 0; j < counters.size(); j++) {
                    counters.get(j).see(cursor, j);
                }
            }
        }
        return new TableScan(rows, !more, counters.stream().map(Counter::facts).toList());
    }

    /** Returns a cell as a number: numbers as they are, dates in days, date-times in seconds since 1970; NaN for all others. */
    static double number(RowCursor cursor, int column, CellType type) {
        if (type.isNumber()) {
            return cursor.number(column);
        } else if (!type.isTime() || cursor.isMissing(column)) {
            return Double.NaN;
        }
        return type == CellType.DATE ? cursor.date(column).toEpochDay()
                : cursor.dateTime(column).toEpochSecond(ZoneOffset.UTC) + cursor.dateTime(column).getNano() * 1e-9;
    }

    /** Counts one column. */
    private static final class Counter {
        private final Column column;
        private final Set<String> distinct = new HashSet<>();
        private long cells;
        private long missing;
        private double low = Double.NaN;
        private double high = Double.NaN;
        private double before = Double.NaN;
        private String textBefore = "";
        private long rises;
        private long falls;
        private long changes;
        private boolean whole = true;

        Counter(Column column) {
            this.column = column;
        }

        void see(RowCursor cursor, int index) {
            if (cursor.isMissing(index)) {
                missing++;
                return;
            }
            String text = cursor.text(index);
            changes += cells > 0 && !text.equals(textBefore) ? 1 : 0;
            textBefore = text;
            cells++;
            if (distinct.size() < ColumnFacts.MOST_DISTINCT) {
                distinct.add(text);
            }
            double value = number(cursor, index, column.type());
            whole &= value == Math.rint(value);
            rises += value > before ? 1 : 0;
            falls += value < before ? 1 : 0;
            low = Double.isNaN(low) || value < low ? value : low;
            high = Double.isNaN(high) || value > high ? value : high;
            before = value;
        }

        ColumnFacts facts() {
            return new ColumnFacts(column, cells, missing, low, high, rises, falls, changes, distinct.size(),
                    whole && cells > 0 && column.type().isNumber());
        }
    }
}
