package org.modestead.nodes.table;

import org.modestead.engine.recording.TimeAxis;

/** Times in tables that nodes give: written as the recording wrote them, whatever the engine counts in. */
public final class TimeCells {

    private TimeCells() {}

    /** Returns a column for times of an axis. */
    public static Column column(String name, TimeAxis axis) {
        return new Column(name, switch (axis.kind()) {
            case NUMBER -> CellType.DOUBLE;
            case DATE -> CellType.DATE;
            case DATE_TIME -> CellType.DATE_TIME;
        });
    }

    /**
     * @param axis of the recording
     * @param time in its unit
     * @return the cell for such a column
     */
    public static Object cell(TimeAxis axis, double time) {
        return switch (axis.kind()) {
            case NUMBER -> time;
            case DATE -> axis.toDate(time);
            case DATE_TIME -> axis.toDateTime(time);
        };
    }
}
