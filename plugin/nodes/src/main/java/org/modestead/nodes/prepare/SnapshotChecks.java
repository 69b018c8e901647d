package org.modestead.nodes.prepare;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import java.util.stream.Stream;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.contract.NearestName;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.TableSchema;

/** Checks the settings of the Snapshot Builder against each other and against the columns of the table. */
final class SnapshotChecks {

    private SnapshotChecks() {}

    /** Returns what is wrong whatever the table holds. */
    static List<SettingProblem> withoutTable(Settings settings) {
        List<SettingProblem> problems = new ArrayList<>();
        for (String entry : settings.texts(SnapshotSettings.UNITS)) {
            if (entry.lastIndexOf('=') < 1) {
                problems.add(new SettingProblem(SnapshotSettings.UNITS, "the entry \"" + entry + "\" has no channel and"
                        + " unit",
                        "write channel=unit, for example flow=m3/h"));
            }
        }
        emptyRuns(settings, SnapshotSettings.HOLDOUT).ifPresent(problems::add);
        emptyRuns(settings, SnapshotSettings.CALIBRATION).ifPresent(problems::add);
        problems.addAll(partsTwice(settings));
        if (settings.text(SnapshotSettings.RUN_WEIGHTS).equals("given") && settings.text(SnapshotSettings.WEIGHT_COLUMN).isEmpty()) {
            problems.add(new SettingProblem(SnapshotSettings.WEIGHT_COLUMN, "no column of weights is named", "name it, or choose"
                    + " other weights"));
        }
        return problems;
    }

    /** Returns what is wrong with the columns and the time unit. Existence and types are checked elsewhere. */
    static List<SettingProblem> againstTable(TableSchema schema, Settings settings) {
        List<SettingProblem> problems = new ArrayList<>();
        RecordingColumns columns = SnapshotSettings.columns(settings);
        List<String> channels = columns.channelColumns(schema);
        if (channels.isEmpty()) {
            problems.add(new SettingProblem(SnapshotSettings.CHANNELS, "no column of numbers is left for the channels",
                    "choose the channels among " + String.join(", ", schema.names())));
        }
        timeUnit(schema, settings).ifPresent(problems::add);
        List<String> read = Stream.concat(channels.stream(), columns.inputs().stream()).toList();
        if (read.stream().allMatch(name -> schema.indexOf(name).isPresent())) {
            ListWidths.told(schema, read).ifPresent(measured -> problems.addAll(unknownUnits(columns, measured)));
        }
        return problems;
    }

    private static Optional<SettingProblem> emptyRuns(Settings settings, String key) {
        boolean empty = settings.text(key).equals("runs") && settings.texts(key + "-runs").isEmpty();
        return empty ? Optional.of(new SettingProblem(key + "-runs", "no run is named", "name at least one run"))
                : Optional.empty();
    }

    private static List<SettingProblem> partsTwice(Settings settings) {
        List<SettingProblem> problems = new ArrayList<>();
        Set<String> channels = new LinkedHashSet<>(settings.texts(SnapshotSettings.CHANNELS));
        for (String input : settings.texts(SnapshotSettings.INPUTS)) {
            if (channels.contains(input)) {
                problems.add(new SettingProblem(SnapshotSettings.INPUTS, "the column " + input + " is a channel as well",
                        "give each column one part"));
            }
        }
        for (String key : List.of(SnapshotSettings.TIME_COLUMN, SnapshotSettings.RUN_COLUMN)) {
            String column = settings.text(key);
            if (channels.contains(column) || settings.texts(SnapshotSettings.INPUTS).contains(column)) {
                problems.add(new SettingProblem(key, "the column " + column + " is a channel or an input as well",
                        "give each column one part"));
            }
        }
        String weight = SnapshotSettings.weightColumn(settings);
        if (!weight.isEmpty() && (channels.contains(weight) || settings.texts(SnapshotSettings.INPUTS).contains(weight)
                || weight.equals(settings.text(SnapshotSettings.TIME_COLUMN)) || weight.equals(settings.text(SnapshotSettings.RUN_COLUMN)))) {
            problems.add(new SettingProblem(SnapshotSettings.WEIGHT_COLUMN, "the column " + weight + " has another part as well",
                    "give each column one part"));
        }
        String time = settings.text(SnapshotSettings.TIME_COLUMN);
        if (!time.isEmpty() && time.equals(settings.text(SnapshotSettings.RUN_COLUMN))) {
            problems.add(new SettingProblem(SnapshotSettings.RUN_COLUMN, "the column " + time + " is the time column as"
                    + " well",
                    "give each column one part"));
        }
        return problems;
    }

    private static Optional<SettingProblem> timeUnit(TableSchema schema, Settings settings) {
        OptionalInt index = schema.indexOf(settings.text(SnapshotSettings.TIME_COLUMN));
        String unit = settings.text(SnapshotSettings.TIME_UNIT).strip();
        if (index.isEmpty() || unit.isEmpty()) {
            return Optional.empty();
        }
        CellType type = schema.columns().get(index.getAsInt()).type();
        List<String> allowed = type == CellType.TEXT ? TimeAxis.unitsOf(TimeAxis.Kind.DATE_TIME)
                : TimeAxis.unitsOf(RecordedTime.kind(type, ""));
        return allowed.isEmpty() || allowed.contains(unit) ? Optional.empty()
                : Optional.of(new SettingProblem(SnapshotSettings.TIME_UNIT, "the unit " + unit + " for a time column of "
                        + type.title(), "use one of " + String.join(", ", allowed)));
    }

    /**
     * Returns units of channels that are not there.
     *
     * @param columns and what they mean
     * @param measured channels and inputs, the entries of lists known
     */
    static List<SettingProblem> unknownUnits(RecordingColumns columns, List<MeasuredColumn> measured) {
        Set<String> known = new LinkedHashSet<>();
        measured.forEach(column -> column.names().forEach(name -> known.add(MeasuredColumn.base(name))));
        measured.forEach(column -> known.addAll(column.names()));
        measured.forEach(column -> known.addAll(List.of(MeasuredColumn.base(column.column()), column.column())));
        return columns.units().keySet().stream().filter(name -> !known.contains(name)).sorted()
                .map(name -> new SettingProblem(SnapshotSettings.UNITS, "there is no channel " + name
                        + NearestName.hint(name, known),
                        "use one of " + String.join(", ", known)))
                .toList();
    }
}
