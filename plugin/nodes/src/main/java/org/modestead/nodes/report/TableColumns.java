package org.modestead.nodes.report;

import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/**
 * Finds columns by name and reads the times of result tables.
 *
 * @param table whose columns are meant
 */
record TableColumns(Table table) {
    private static final String TIME = "time";

    /**
     * Returns the position of a column.
     *
     * @throws SettingFault if there is none of that name
     */
    int of(String name) {
        return table.schema().indexOf(name).orElseThrow(() -> new SettingFault(table.origin(), "there is no column " + name,
                "connect a table with the columns of the Reconstruction and Forecast node"));
    }

    /** Returns the current row's time as the engine counts it. */
    double time(RowCursor cursor, Snapshots snapshots) {
        int column = of(TIME);
        double unit = snapshots.time().calendarUnitsPerUnit();
        return switch (table.schema().columns().get(column).type()) {
            case DATE -> TimeAxis.ofDate(cursor.date(column)) / unit;
            case DATE_TIME, ZONED_DATE_TIME -> TimeAxis.ofDateTime(cursor.dateTime(column)) / unit;
            case DOUBLE, LONG -> cursor.number(column);
            default -> throw new SettingFault(table.origin(), "column time holds " + cursor.text(column),
                    "connect a table whose times are numbers, dates or date-times");
        };
    }
}
