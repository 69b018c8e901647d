package org.modestead.nodes.prepare;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Recording;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/**
 * Turns a table into a recording, row by row, without holding the table.
 *
 * <p>Rows of different runs may be mixed; the rows of one run must be in order of time. Dates count in days (or weeks,
 * years of 365.25 days), date-times in seconds (or min, h, d, week, year), numbers as they are. A missing cell of a
 * channel stays missing; what happens to it is the snapshot plan's business. A column of lists is as many channels as its lists have
 * entries.
 */
final class RecordingReader {

    private static final int ROWS_BETWEEN_REPORTS = 4096;
    private static final int NONE = -1;
    /** More numbers than an array can hold are not asked for at once. */
    private static final long MOST_EXPECTED = Integer.MAX_VALUE - 8;
    private final Table table;
    private final RecordingColumns columns;
    private final List<MeasuredColumn> channels;
    private final List<MeasuredColumn> inputs;
    private final List<MeasuredCell> channelCells;
    private final List<MeasuredCell> inputCells;
    private final List<TextColumnWatch> watches;
    private final int timeColumn;
    private final boolean timeIsText;
    private final RunName runName;
    private final Optional<NumberCell> weightCell;
    private final Map<String, RunBuffer> runs = new LinkedHashMap<>();

    private RecordingReader(Table table, RecordingColumns columns, Progress progress) {
        this.table = table;
        this.columns = columns;
        this.channels = measured(columns.channelColumns(table.schema()), progress);
        this.inputs = measured(columns.inputs(), progress);
        this.channelCells = channels.stream().map(column -> MeasuredCell.of(table, column)).toList();
        this.inputCells = inputs.stream().map(column -> MeasuredCell.of(table, column)).toList();
        this.watches = columns.unusedTexts(table.schema()).stream()
                .map(name -> new TextColumnWatch(name, position(name))).toList();
        this.timeColumn = columns.time().isEmpty() ? NONE : position(columns.time());
        this.timeIsText = timeColumn != NONE && type(columns.time()) == CellType.TEXT;
        this.runName = RunName.of(table, columns.run());
        this.weightCell = Optional.of(columns.weight()).filter(name -> !name.isEmpty())
                .map(name -> new NumberCell(table.origin(), name, position(name), type(name)));
    }

    /**
     * A recording and what its reader noticed.
     *
     * @param recording as logged
     * @param rows number of table rows read
     * @param columns channels, then inputs
     * @param lists those of them that hold lists
     * @param doubts columns that look as if they should have been numbers
     */
    record Reading(Recording recording, long rows, List<MeasuredColumn> columns, List<MeasuredColumn> lists, List<Doubt> doubts) {}

    /**
     * Reads all rows.
     *
     * @throws RecordingFault naming table, row, column and value when a cell cannot be used
     */
    static Reading read(Table table, RecordingColumns columns, Progress progress) {
        return new RecordingReader(table, columns, progress).read(progress);
    }

    private Reading read(Progress progress) {
        if (channels.isEmpty()) {
            throw new RecordingFault(table.origin(), "no column of numbers is left for the channels among "
                    + String.join(", ", table.schema().names()), "choose the channels or convert their columns to"
                    + " numbers");
        }
        TimeAxis axis = new TimeAxis(TimeAxis.Kind.NUMBER, columns.timeUnit());
        long rows = 0;
        try (RowCursor cursor = table.open()) {
            RecordedTime time = null;
            while (cursor.next()) {
                time = time == null && timeColumn != NONE ? firstTime(cursor) : time;
                axis = time == null ? axis : time.axis();
                append(cursor, time);
                if (++rows % ROWS_BETWEEN_REPORTS == 0) {
                    progress.checkCancelled();
                    progress.report(0, rows + " rows read");
                }
            }
        }
        checkRows(rows);
        List<MeasuredColumn> read = Stream.concat(channels.stream(), inputs.stream()).toList();
        return new Reading(recording(axis), rows, read, read.stream().filter(column -> type(column.column()).isNumberList()).toList(),
                watches.stream().flatMap(watch -> watch.doubt().stream()).toList());
    }

    private List<MeasuredColumn> measured(List<String> names, Progress progress) {
        names.forEach(this::position);
        return ListWidths.told(table.schema(), names).orElseGet(() -> ListWidths.found(table, names, progress));
    }

    private RecordedTime firstTime(RowCursor cursor) {
        return RecordedTime.of(type(columns.time()), timeColumn, cursor.text(timeColumn), columns.timeUnit());
    }

    private void append(RowCursor cursor, RecordedTime time) {
        RunBuffer run = runs.computeIfAbsent(runName.read(cursor), this::buffer);
        double at = time == null ? run.samples() * columns.rowStep() : timeOf(cursor, time);
        if (run.samples() > 0 && at <= run.lastTime()) {
            throw outOfOrder(cursor, run, time, at);
        }
        weightCell.ifPresent(cell -> readWeight(cell, cursor, run));
        run.start(cursor.row(), at);
        channelCells.forEach(cell -> cell.read(cursor, run.values));
        inputCells.forEach(cell -> cell.read(cursor, run.inputs));
        watches.forEach(watch -> watch.see(cursor));
    }

    /** All rows belong to one run where no column names it. */
    private RunBuffer buffer(String id) {
        long rows = columns.run().isEmpty() ? table.rowCount().orElse(0) : 0;
        long cells = rows * channels.stream().mapToLong(column -> column.names().size()).sum();
        return rows > 0 && cells <= MOST_EXPECTED ? new RunBuffer(id, (int) rows, (int) cells) : new RunBuffer(id);
    }

    private void readWeight(NumberCell cell, RowCursor cursor, RunBuffer run) {
        double weight = cell.read(cursor);
        if (!(weight >= 0)) {
            throw new RecordingFault(place(cursor, cell.name()), "the weight is " + (Double.isNaN(weight) ? "missing"
                    : cursor.text(cell.column())), "give every row the weight of its run, 0 or a positive number");
        }
        if (run.samples() > 0 && weight != run.weight()) {
            throw new RecordingFault(place(cursor, cell.name()), "the weight is " + cursor.text(cell.column())
                    + ", but other rows of run " + run.id() + " have another", "give all rows of a run the same weight");
        }
        run.weigh(weight);
    }

    private double timeOf(RowCursor cursor, RecordedTime time) {
        String name = columns.time();
        if (cursor.isMissing(timeColumn) || timeIsText && cursor.text(timeColumn).isBlank()) {
            throw new RecordingFault(place(cursor, name), "the time is missing", "give every row its time or leave the"
                    + " row out");
        }
        OptionalDouble found = time.read(cursor);
        if (found.isEmpty() || Double.isInfinite(found.getAsDouble())) {
            throw new RecordingFault(place(cursor, name), "the time is \"" + cursor.text(timeColumn) + "\"",
                    "write " + time.wanted() + ", or choose another time column");
        }
        return found.getAsDouble();
    }

    private RecordingFault outOfOrder(RowCursor cursor, RunBuffer run, RecordedTime time, double at) {
        String hint = columns.run().isEmpty() ? ", or set the run column if a new run starts here" : " of the run";
        String within = columns.run().isEmpty() ? "" : " of run " + run.id();
        return new RecordingFault(place(cursor, columns.time()), "the time " + time.axis().format(at)
                + (at == run.lastTime() ? " repeats" : " comes after the later time") + " "
                + time.axis().format(run.lastTime()) + " of row " + run.lastRow() + within,
                "put rows in rising order of time, one row a time" + hint);
    }

    private void checkRows(long rows) {
        if (rows == 0) {
            throw new RecordingFault(table.origin(), "the table has a header but no rows", "give at least two rows");
        }
        if (rows == 1) {
            throw new RecordingFault(table.origin(), "the table has one row only", "give at least two rows");
        }
    }

    private Recording recording(TimeAxis axis) {
        List<Channel> measured = columns.describe(channels);
        List<Channel> known = columns.describe(inputs);
        List<Run> finished = runs.values().stream().map(run -> run.finish(measured.size(), known.size())).toList();
        return new Recording(measured, known, finished, axis);
    }

    private String place(RowCursor cursor, String column) {
        return MeasuredCell.place(table.origin(), cursor, column);
    }

    private int position(String name) {
        return table.schema().indexOf(name).orElseThrow(() -> new RecordingFault(table.origin(), "there is no column "
                + name,
                "choose one of " + String.join(", ", table.schema().names())));
    }

    private CellType type(String name) {
        return table.schema().columns().get(position(name)).type();
    }

    /** The rows of one run so far. */
    private static final class RunBuffer {
        private final String id;
        private final GrowingDoubles times;
        private final GrowingDoubles values;
        private final GrowingDoubles inputs = new GrowingDoubles();
        private long lastRow;
        private double weight = 1;

        RunBuffer(String id) {
            this(id, new GrowingDoubles(), new GrowingDoubles());
        }

        RunBuffer(String id, int rows, int cells) {
            this(id, new GrowingDoubles(rows), new GrowingDoubles(cells));
        }

        private RunBuffer(String id, GrowingDoubles times, GrowingDoubles values) {
            this.id = id;
            this.times = times;
            this.values = values;
        }

        String id() {
            return id;
        }

        int samples() {
            return times.size();
        }

        double weight() {
            return weight;
        }

        void weigh(double given) {
            weight = given;
        }

        double lastTime() {
            return times.last();
        }

        long lastRow() {
            return lastRow;
        }

        void start(long row, double time) {
            lastRow = row;
            times.add(time);
        }

        Run finish(int channels, int knownInputs) {
            DMatrixRMaj measured = DMatrixRMaj.wrap(times.size(), channels, values.toArray());
            DMatrixRMaj known = DMatrixRMaj.wrap(times.size(), knownInputs, inputs.toArray());
            return new Run(id, times.toArray(), measured, known, 0, weight);
        }
    }
}
