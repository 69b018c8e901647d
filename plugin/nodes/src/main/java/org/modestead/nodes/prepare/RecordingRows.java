package org.modestead.nodes.prepare;

import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** The rows of a recording in the order of its table, one after the other and none of them kept, as often as they are asked for. */
public final class RecordingRows {

    private static final int ROWS_BETWEEN_REPORTS = 1 << 14;

    private final Table table;
    private final RecordingColumns columns;
    private final List<MeasuredColumn> measured;
    private final int[] positions;

    private RecordingRows(Table table, RecordingColumns columns) {
        this.table = table;
        this.columns = columns;
        this.measured = measured(columns, table.schema());
        this.positions = measured.stream().mapToInt(column -> position(column.column())).toArray();
        if (measured.isEmpty()) {
            throw new RecordingFault(table.origin(), "no column of numbers is left for the channels among "
                    + String.join(", ", table.schema().names()), "choose the channels or convert their columns to numbers");
        }
    }

    /**
     * @param table read anew by each pass
     * @param time column of times
     * @param timeUnit see {@link RecordedTime}
     * @param run column that names the run, empty for one run
     * @param channels columns of numbers; empty = all that have no other part
     * @param units by channel
     * @throws RecordingFault if a column is not there
     */
    public static RecordingRows of(Table table, String time, String timeUnit, String run, List<String> channels, Map<String, String> units) {
        return new RecordingRows(table, new RecordingColumns(time, 1, timeUnit, run, channels, List.of(), units));
    }

    /** Returns the channels that such a table would give, as far as its columns tell. */
    public static List<Channel> channels(TableSchema schema, String time, String run, List<String> channels, Map<String, String> units) {
        RecordingColumns columns = new RecordingColumns(time, 1, "", run, channels, List.of(), units);
        return columns.describe(measured(columns, schema));
    }

    private static List<MeasuredColumn> measured(RecordingColumns columns, TableSchema schema) {
        return columns.channelColumns(schema).stream().filter(name -> columns.channels().contains(name)
                || schema.columns().stream().anyMatch(column -> column.name().equals(name) && column.type().isNumber()))
                .map(name -> new MeasuredColumn(name, List.of(name))).toList();
    }

    /** Takes the rows; returns whether it wants more. */
    public interface Taker {
        /**
         * @param run name
         * @param time in the time unit
         * @param values one a channel, NaN where missing; written again for the next row
         */
        boolean take(String run, double time, double[] values);
    }

    /** Returns the channels in order. */
    public List<Channel> channels() {
        return columns.describe(measured);
    }

    /** Returns how times are written; for a column of text its first cell tells. */
    public TimeAxis axis() {
        CellType type = type(columns.time());
        String first = "";
        if (type == CellType.TEXT) {
            try (RowCursor cursor = table.open()) {
                first = cursor.next() ? cursor.text(position(columns.time())) : "";
            }
        }
        return RecordedTime.axis(type, first, columns.timeUnit());
    }

    /**
     * Hands over all rows, or as many as are wanted.
     *
     * @param message what is being done, for the progress
     * @return number of rows handed over
     * @throws RecordingFault naming table, row and column when a cell cannot be used
     */
    public long read(Taker taker, String message, Progress progress) {
        long rows = 0;
        int timeColumn = position(columns.time());
        RunName run = RunName.of(table, columns.run());
        double[] values = new double[positions.length];
        try (RowCursor cursor = table.open()) {
            RecordedTime time = null;
            while (cursor.next()) {
                time = time == null ? RecordedTime.of(type(columns.time()), timeColumn, cursor.text(timeColumn), columns.timeUnit()) : time;
                for (int c = 0; c < positions.length; c++) {
                    values[c] = cursor.number(positions[c]);
                }
                if (++rows % ROWS_BETWEEN_REPORTS == 0) {
                    progress.checkCancelled();
                    progress.report(0, message + ", " + rows + " rows read");
                }
                if (!taker.take(run.read(cursor), timeOf(cursor, timeColumn, time), values)) {
                    break;
                }
            }
        }
        if (rows < 2) {
            throw new RecordingFault(table.origin(), "the table has " + rows + " rows", "give at least two");
        }
        return rows;
    }

    private double timeOf(RowCursor cursor, int column, RecordedTime time) {
        OptionalDouble found = cursor.isMissing(column) ? OptionalDouble.empty() : time.read(cursor);
        if (found.isEmpty() || !Double.isFinite(found.getAsDouble())) {
            throw new RecordingFault(MeasuredCell.place(table.origin(), cursor, columns.time()), "the time is \"" + cursor.text(column) + "\"",
                    "write " + time.wanted() + " in every row");
        }
        return found.getAsDouble();
    }

    private int position(String name) {
        return table.schema().indexOf(name).orElseThrow(() -> new RecordingFault(table.origin(), "there is no column " + name,
                "choose one of " + String.join(", ", table.schema().names())));
    }

    private CellType type(String name) {
        return table.schema().columns().get(position(name)).type();
    }
}
