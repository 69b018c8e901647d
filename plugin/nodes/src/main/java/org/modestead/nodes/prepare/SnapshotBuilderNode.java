package org.modestead.nodes.prepare;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.engine.recording.SnapshotBuilder;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.figure.RecordingFigure;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.words.Sentence;

/** Turns a logged table into snapshots: runs, gaps, steps, units, delays and the parts that only judge. */
public final class SnapshotBuilderNode implements Node {

    private static final TableSchema SUMMARY = TableSchema.of(Column.text("item"), Column.text("value"));
    private static final int MOST_CHANNELS_DRAWN = 6;
    private static final int MOST_NAMED = 6;
    private static final double SHARE_OF_READING = 0.5;

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("snapshot-builder", "Snapshot Builder", NodeDeclaration.Stage.PREPARE,
                "Turns a logged table into snapshots: runs of even or uneven samples, prepared and split for fit and"
                        + " judgement.",
                description(), List.of("Takens, Detecting strange attractors in turbulence, in: Dynamical"
                        + " Systems and Turbulence, Springer 1981"),
                List.of("recording", "time series", "resample", "gap", "delay", "embedding", "holdout", "detrend",
                        "normalise"),
                List.of(Port.of(SnapshotSettings.TABLE, PortType.TABLE, "Table", "Logged samples, one row a time.")),
                List.of(Port.of("snapshots", PortType.SNAPSHOTS, "Snapshots", "Prepared runs, split into parts that"
                        + " fit, calibrate and judge."),
                        Port.table("summary", "Summary", "What was found in the table and done to it.", SUMMARY)),
                SnapshotSettings.declared(), 1);
    }

    private static String description() {
        return """
                Reads the table row by row and sorts the samples into runs. Pauses and missing cells are split, \
                interpolated or refused as set; times are kept or made even; channels can be detrended and scaled, always \
                with figures from the training samples only. Results downstream are given in recorded units again.

                A state can stack earlier samples (delay coordinates): with depth d and spacing s it holds the newest \
                sample and those s, 2s, ..., (d-1)s samples before. Modes that a single channel cannot show at one \
                instant become visible so.

                Keep a holdout. Without data that the fit never saw, modes are judged on the samples that produced them, \
                and no forecast can be scored. Whole runs are the fairest holdout; with one run take its end. A \
                calibration part sets the width of forecast bands.

                Several runs train together. Long ones count more unless runs are weighted: alike, by their noise, or by a \
                column; a run of weight 2 counts as one that is there twice.

                A column of lists is several channels, one an entry, called as the table calls the entries or by the column's name and \
                a number. All lists of a column must have the same length; a missing list, or a missing entry, is a missing cell.

                Values and times beyond 1e100, and channels or time steps all below 1e-100, are refused: their squares are no numbers. \
                Such values mostly mark what is missing.

                The table is streamed; memory is needed for 8 bytes a sample, channel and copy.""";
    }

    @Override
    public List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
        List<SettingProblem> problems = new ArrayList<>(SnapshotChecks.withoutTable(settings));
        Optional.ofNullable(inputs.get(SnapshotSettings.TABLE))
                .ifPresent(schema -> problems.addAll(SnapshotChecks.againstTable(schema, settings)));
        return problems;
    }

    @Override
    public Expected expect(Expected inputs, Settings settings, RunContext context) {
        Optional<Outlook> outlook = Optional.ofNullable(inputs.tables().get(SnapshotSettings.TABLE))
                .map(schema -> SnapshotSettings.columns(settings).outlook(schema));
        return new Expected(Map.of(), outlook.map(found -> Map.of("snapshots", found)).orElse(Map.of()));
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Table table = inputs.get(SnapshotSettings.TABLE, Table.class);
        RecordingColumns columns = SnapshotSettings.columns(settings);
        RecordingReader.Reading reading = RecordingReader.read(table, columns, context.progress().part(0,
                SHARE_OF_READING));
        checkTimeUnit(reading.recording().time());
        checkUnits(columns, reading);
        Snapshots snapshots = SnapshotBuilder.build(reading.recording(), SnapshotSettings.plan(settings),
                context.progress().part(SHARE_OF_READING, 1));
        List<Doubt> doubts = new ArrayList<>(reading.doubts());
        doubts.addAll(snapshots.doubts());
        return new NodeResult(Map.of("snapshots", snapshots, "summary", summary(table, reading, snapshots)),
                List.of(RecordingFigure.figure(snapshots, MOST_CHANNELS_DRAWN)), sentences(table, reading, snapshots),
                        doubts);
    }

    private static void checkTimeUnit(TimeAxis time) {
        List<String> allowed = TimeAxis.unitsOf(time.kind());
        if (!allowed.isEmpty() && !allowed.contains(time.unit())) {
            throw new SettingFault("setting " + SnapshotSettings.TIME_UNIT, "the unit " + time.unit() + " for a time"
                    + " column of "
                    + (time.kind() == TimeAxis.Kind.DATE ? CellType.DATE : CellType.DATE_TIME).title() + "s",
                    "use one of " + String.join(", ", allowed));
        }
    }

    /** How many channels a list gives may be known now only; what is known before is checked before. */
    private static void checkUnits(RecordingColumns columns, RecordingReader.Reading reading) {
        SnapshotChecks.unknownUnits(columns, reading.columns()).stream().findFirst().ifPresent(problem -> {
            throw new SettingFault("setting " + problem.key(), problem.seen(), problem.wanted());
        });
    }

    private static MemoryTable summary(Table table, RecordingReader.Reading reading, Snapshots snapshots) {
        MemoryTable.Builder rows = MemoryTable.builder(SUMMARY, "summary of " + table.origin());
        rows.row("table", table.origin()).row("rows", Long.toString(reading.rows()));
        rows.row("time", timeText(snapshots.time()));
        reading.lists().forEach(list -> rows.row("list " + list.column(), String.join(", ", list.names())));
        snapshots.facts().forEach(fact -> rows.row(fact.item(), fact.value()));
        return rows.build();
    }

    private static List<String> sentences(Table table, RecordingReader.Reading reading, Snapshots snapshots) {
        int samples = snapshots.training().stream().mapToInt(run -> run.samples()).sum();
        String holdout = snapshots.holdout().isEmpty() ? "Nothing was held out: modes can only be judged on the data"
                + " that made them."
                : snapshots.holdout().size() + (snapshots.holdout().size() == 1 ? " run or end of a run" : " runs or"
                        + " ends of runs")
                        + " held out to judge.";
        List<String> all = new ArrayList<>(List.of(reading.rows() + " rows of " + table.origin() + " became " + Sentence.count(snapshots.training().size(), "training run") + " with " + samples + " samples of "
                + Sentence.count(snapshots.channels().size(), "channel") + "; a state has "
                + Sentence.count(snapshots.stateSize(), "component") + ".", holdout));
        reading.lists().forEach(list -> all.add("Column " + list.column() + " holds lists of " + Sentence.count(list.names().size(), "number")
                + (list.names().size() == 1 ? ": " : ", each a channel or input of its own: ") + Sentence.listed(list.names(), MOST_NAMED) + "."));
        return all;
    }

    private static String timeText(TimeAxis time) {
        return switch (time.kind()) {
            case NUMBER -> time.unit().isEmpty() ? "number without unit" : "number in " + time.unit();
            case DATE -> "date, counted in " + time.unit();
            case DATE_TIME -> "date-time (UTC), counted in " + time.unit();
        };
    }
}
