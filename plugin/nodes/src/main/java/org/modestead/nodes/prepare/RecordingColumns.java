package org.modestead.nodes.prepare;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
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
 * @param channels columns of measured quantities; empty = every column of numbers without another part
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

    private static final Pattern NAME_AND_UNIT = Pattern.compile("(.*\\S)\\s*\\[([^\\[\\]]*)\\]\\s*");

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
                .filter(column -> column.type().isNumber() && !taken.contains(column.name()))
                .map(Column::name)
                .toList();
    }

    /** Returns what is known of a recording made from such a table; the kind of times in a column of text is told by its cells only. */
    Outlook outlook(TableSchema schema) {
        List<String> known = channelColumns(schema);
        return new Outlook(describe(known), describe(inputs), axis(schema));
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

    /**
     * Returns name and unit of each column. Where dropping the unit from the names would make two of them equal, the
     * names stay as they are in the table.
     */
    List<Channel> describe(List<String> columns) {
        List<Channel> named = new ArrayList<>();
        for (String column : columns) {
            Matcher match = NAME_AND_UNIT.matcher(column);
            boolean bracketed = match.matches();
            String name = bracketed ? match.group(1) : column;
            String unit = bracketed ? match.group(2).strip() : "";
            named.add(new Channel(name, units.getOrDefault(column, units.getOrDefault(name, unit))));
        }
        boolean unique = new LinkedHashSet<>(named.stream().map(Channel::name).toList()).size() == named.size();
        List<Channel> kept = new ArrayList<>();
        for (int i = 0; i < columns.size(); i++) {
            kept.add(unique ? named.get(i) : new Channel(columns.get(i), named.get(i).unit()));
        }
        return kept;
    }
}
