package org.modestead.nodes.prepare;

import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/**
 * Which columns of a table mean what.
 *
 * @param time column of sample times; empty = the row number within the run times {@code rowStep}
 * @param rowStep time from row to row where there is no time column, positive
 * @param timeUnit unit of time, see {@link RecordingReader}; empty = that of the column
 * @param run column that names the run of each row; empty = one run
 * @param channels columns of measured quantities; empty = every column of numbers, or lists of numbers, without another part
 * @param inputs columns of known inputs
 * @param weight column with the weight of each run, the same number in all its rows; empty = none
 * @param units unit by column name or channel name; others are read from {@code name [unit]}
 */
record RecordingColumns(
        String time,
        double rowStep,
        String timeUnit,
        String run,
        List<String> channels,
        List<String> inputs,
        String weight,
        Map<String, String> units) {

    RecordingColumns {
        channels = List.copyOf(channels);
        inputs = List.copyOf(inputs);
        units = Map.copyOf(units);
    }

    /** Without a column of weights. */
    RecordingColumns(String time, double rowStep, String timeUnit, String run, List<String> channels, List<String> inputs,
            Map<String, String> units) {
        this(time, rowStep, timeUnit, run, channels, inputs, "", units);
    }

    /** Returns the channel columns, found from the schema where none are named. */
    List<String> channelColumns(TableSchema schema) {
        if (!channels.isEmpty()) {
            return channels;
        }
        Set<String> taken = new HashSet<>(inputs);
        taken.add(time);
        taken.add(run);
        taken.add(weight);
        return schema.columns().stream()
                .filter(column -> (column.type().isNumber() || column.type().isNumberList()) && !taken.contains(column.name()))
                .map(Column::name)
                .toList();
    }

    /**
     * Returns what is known of a recording made from such a table. The kind of times in a column of text is told by its cells only, and
     * so is the number of channels in lists whose entries have no names.
     */
    Outlook outlook(TableSchema schema) {
        return new Outlook(ListWidths.told(schema, channelColumns(schema)).map(this::describe).orElse(List.of()),
                ListWidths.told(schema, inputs).map(this::describe).orElse(List.of()), axis(schema));
    }

    private Optional<TimeAxis> axis(TableSchema schema) {
        if (time.isEmpty()) {
            return Optional.of(new TimeAxis(TimeAxis.Kind.NUMBER, timeUnit));
        }
        Optional<CellType> type = schema.columns().stream().filter(column -> column.name().equals(time)).map(Column::type).findFirst();
        return type.filter(found -> found != CellType.TEXT).map(found -> RecordedTime.axis(found, "", timeUnit));
    }

    /** Returns columns of text that nobody named and that therefore take no part. */
    List<String> unusedTexts(TableSchema schema) {
        Set<String> taken = new HashSet<>(inputs);
        taken.addAll(channels);
        taken.add(time);
        taken.add(run);
        taken.add(weight);
        return !channels.isEmpty() ? List.of() : schema.columns().stream()
                .filter(column -> column.type() == CellType.TEXT && !taken.contains(column.name()))
                .map(Column::name)
                .toList();
    }

    /** Returns name and unit of the channels of some columns. */
    List<Channel> describe(List<MeasuredColumn> measured) {
        return MeasuredColumn.channels(measured, units);
    }
}
