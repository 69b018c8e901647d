package org.modestead.spark;

import static org.apache.spark.sql.functions.broadcast;
import static org.apache.spark.sql.functions.coalesce;
import static org.apache.spark.sql.functions.col;
import static org.apache.spark.sql.functions.datediff;
import static org.apache.spark.sql.functions.lit;
import static org.apache.spark.sql.functions.to_date;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.apache.spark.sql.Column;
import org.apache.spark.sql.Dataset;
import org.apache.spark.sql.Row;
import org.apache.spark.sql.types.DataType;
import org.apache.spark.sql.types.DataTypes;
import org.apache.spark.sql.types.NumericType;
import org.apache.spark.sql.types.StructField;
import org.modestead.engine.recording.TimeAxis;

/**
 * A table as run, time and channels.
 *
 * @param rows with columns {@value #RUN}, {@value #TIME}, then one a channel, NaN where a cell is missing
 * @param channels names of their columns
 * @param axis how times are written
 */
record RecordedRows(Dataset<Row> rows, List<String> channels, TimeAxis axis) {

    static final String RUN = "modestead_run";
    static final String TIME = "modestead_time";
    private static final String CHANNEL = "modestead_channel_";

    /** @throws JobFault if a column is not there or not of a kind that can be used */
    static RecordedRows of(Dataset<Row> table, JobOptions options) {
        String time = options.required("time-column");
        String run = options.text("run-column", "");
        TimeAxis axis = axis(type(table, time), options.text("time-unit", ""));
        List<String> channels = options.list("channels").isEmpty() ? numbers(table, List.of(time, run)) : options.list("channels");
        List<Column> wanted = new ArrayList<>();
        wanted.add((run.isEmpty() ? lit("1") : quoted(table, run).cast(DataTypes.StringType)).as(RUN));
        wanted.add(time(quoted(table, time), axis).as(TIME));
        for (int c = 0; c < channels.size(); c++) {
            Column cell = quoted(table, channels.get(c)).cast(DataTypes.DoubleType);
            wanted.add(coalesce(cell, lit(Double.NaN)).as(CHANNEL + c));
        }
        return new RecordedRows(table.select(wanted.toArray(Column[]::new)), channels, axis);
    }

    private static List<String> numbers(Dataset<Row> table, List<String> taken) {
        return Arrays.stream(table.schema().fields()).filter(field -> field.dataType() instanceof NumericType && !taken.contains(field.name()))
                .map(StructField::name).toList();
    }

    private static DataType type(Dataset<Row> table, String column) {
        return Arrays.stream(table.schema().fields()).filter(field -> field.name().equals(column)).findFirst()
                .orElseThrow(() -> missing(table, column)).dataType();
    }

    private static Column quoted(Dataset<Row> table, String column) {
        type(table, column);
        return table.col("`" + column.replace("`", "``") + "`");
    }

    private static JobFault missing(Dataset<Row> table, String column) {
        return new JobFault("input", "there is no column " + column, "choose among " + String.join(", ", table.schema().fieldNames()));
    }

    private static TimeAxis axis(DataType type, String unit) {
        if (type instanceof NumericType) {
            return new TimeAxis(TimeAxis.Kind.NUMBER, unit);
        }
        boolean date = type.equals(DataTypes.DateType);
        if (!date && !type.equals(DataTypes.TimestampType)) {
            throw new JobFault("time column", "it is of type " + type.simpleString(), "bring a number, a date or a timestamp");
        }
        return new TimeAxis(date ? TimeAxis.Kind.DATE : TimeAxis.Kind.DATE_TIME, unit.isEmpty() ? (date ? "d" : "s") : unit);
    }

    /** Dates count in days and timestamps in seconds since 1970, or in the unit asked for. */
    private static Column time(Column column, TimeAxis axis) {
        Column number = axis.kind() == TimeAxis.Kind.DATE ? datediff(column, to_date(lit("1970-01-01"))).cast(DataTypes.DoubleType)
                : column.cast(DataTypes.DoubleType);
        return axis.calendarUnitsPerUnit() == 1 ? number : number.divide(axis.calendarUnitsPerUnit());
    }

    /** Returns the first rows in the order of run and time. */
    List<Row> first(int count) {
        return rows.orderBy(col(RUN), col(TIME)).limit(count).collectAsList();
    }

    /** Returns the table with one more column. */
    Dataset<Row> joinedWith(Dataset<Row> ofRuns, boolean small) {
        return rows.join(small ? broadcast(ofRuns) : ofRuns, RUN);
    }
}
