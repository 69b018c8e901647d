package org.modestead.nodes.prepare;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.recording.Snapshots;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.TableSchema;

class SnapshotBuilderNodeTest {

    private static final SnapshotBuilderNode NODE = new SnapshotBuilderNode();
    private static final TableSchema SCHEMA = TableSchema.of(Column.text("run"), Column.number("t"),
            Column.number("flow [m3/h]"),
            Column.number("level"), new Column("day", CellType.DATE));

    private static Settings settings(Map<String, Object> raw) {
        return SettingsReader.read(NODE, raw).settings().orElseThrow();
    }

    private static List<SettingProblem> check(Map<String, Object> raw) {
        return NODE.check(Map.of("table", SCHEMA), settings(raw));
    }

    private static MemoryTable twoRuns() {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("run"), Column.number("t"),
                Column.number("flow [m3/h]"),
                Column.number("level")), "pumps.csv");
        for (String run : List.of("A", "B")) {
            for (int k = 0; k < 50; k++) {
                rows.row(run, k * 0.1, Math.sin(k * 0.3), 5 + Math.cos(k * 0.3));
            }
        }
        return rows.build();
    }

    private static NodeResult run(Map<String, Object> raw) {
        return NODE.run(new NodeInputs(Map.of("table", twoRuns())), settings(raw), new RunContext(Progress.NONE,
                Path.of("."), Path.of(".")));
    }

    @Test
    void settingsReachTheSnapshots() {
        NodeResult result = run(Map.of("time-column", "t", "time-unit", "s", "run-column", "run", "delay-depth", 3,
                "detrend", "mean",
                "holdout", "runs", "holdout-runs", List.of("B"), "units", List.of("level=m")));
        Snapshots snapshots = (Snapshots) result.outputs().get("snapshots");
        assertEquals(List.of("flow [m3/h]", "level [m]"), snapshots.channels().stream().map(c -> c.label()).toList());
        assertEquals(3, snapshots.delay().depth());
        assertEquals(1, snapshots.training().size());
        assertEquals("B", snapshots.holdout().get(0).id());
        // the mean over 50 samples of channel 2 is near 5, far from 0
        assertEquals(5, snapshots.preparation().offset()[1], 0.2);
        assertEquals(0.1, snapshots.step().orElseThrow(), 1e-12);
    }

    /** Spreadsheets and arrays write the number of a run as 1.0. */
    @Test
    void decimalsThatAreWholeNameRunsAndOthersAreRefusedWithTheirPlace() {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.number("run"), Column.number("t"), Column.number("x")), "pumps.csv");
        for (int k = 0; k < 80; k++) {
            rows.row(k < 40 ? 1.0 : 12.0, k % 40 * 0.1, Math.sin(k * 0.3));
        }
        Settings settings = settings(Map.of("time-column", "t", "run-column", "run"));
        RunContext context = new RunContext(Progress.NONE, Path.of("."), Path.of("."));
        Snapshots snapshots = (Snapshots) NODE.run(new NodeInputs(Map.of("table", rows.build())), settings, context).outputs().get("snapshots");
        assertEquals(List.of("1", "12"), snapshots.training().stream().map(run -> run.id()).toList());
        rows.row(12.5, 4.0, 0.0);
        assertEquals("pumps.csv, row 81 below the header, column run: the run is 12.5, which is no whole number; number runs by whole numbers, or choose the"
                + " column that names them.", assertThrows(org.modestead.engine.RecordingFault.class,
                        () -> NODE.run(new NodeInputs(Map.of("table", rows.build())), settings, context)).getMessage());
    }

    @Test
    void theSummaryTableAndTheSentencesTellWhatWasFound() {
        NodeResult result = run(Map.of("time-column", "t", "run-column", "run"));
        try (RowCursor cursor = ((MemoryTable) result.outputs().get("summary")).open()) {
            cursor.next();
            assertEquals("pumps.csv", cursor.text(1));
            cursor.next();
            assertEquals("100", cursor.text(1));
        }
        assertTrue(result.summary().get(0).startsWith("100 rows of pumps.csv became 2 training runs with 100 samples of"
                + " 2 channels"));
        assertEquals("recording", result.figures().get(0).id());
    }

    @Test
    void eachKindOfHoldoutIsUnderstood() {
        Map<String, Object> base = Map.of("time-column", "t", "run-column", "run");
        for (String kind : List.of("run-share", "tail-share", "tail-time")) {
            Map<String, Object> raw = new java.util.HashMap<>(base);
            raw.put("holdout", kind);
            raw.put("holdout-run-share", 0.5);
            Snapshots snapshots = (Snapshots) run(raw).outputs().get("snapshots");
            assertTrue(!snapshots.holdout().isEmpty(), kind);
        }
    }

    @Test
    void aColumnWithTwoPartsIsTold() {
        assertEquals(List.of("inputs"), keys(check(Map.of("channels", List.of("level"), "inputs", List.of("level")))));
        assertEquals(List.of("time-column"), keys(check(Map.of("channels", List.of("level", "t"), "time-column", "t"))));
        assertEquals(List.of("run-column"), keys(check(Map.of("run-column", "run", "time-column", "run"))));
    }

    @Test
    void unitsOfUnknownChannelsAndEntriesWithoutUnitAreTold() {
        assertEquals(List.of(new SettingProblem("units", "there is no channel leval, perhaps you meant level",
                "use one of flow, level, flow [m3/h]")), check(Map.of("time-column", "t", "units", List.of("leval=m",
                        "flow=l/s"))));
        assertEquals(List.of("units"), keys(check(Map.of("units", List.of("level")))));
    }

    @Test
    void aTimeUnitThatTheColumnCannotCountInIsTold() {
        assertEquals(List.of(new SettingProblem("time-unit", "the unit s for a time column of date", "use one of d,"
                + " week, year")),
                check(Map.of("time-column", "day", "time-unit", "s")));
        assertEquals(List.of(), check(Map.of("time-column", "t", "time-unit", "fortnight")),
                "numbers may be in any unit");
    }

    @Test
    void aTimeUnitThatDatesWrittenAsTextCannotCountInIsToldWhenTheyAreSeen() {
        MemoryTable table = MemoryTable.builder(TableSchema.of(Column.text("day"), Column.number("x")),
                "days.csv").row("2015-06-30", 1.0)
                .row("2015-07-01", 2.0).build();
        SettingFault fault = assertThrows(SettingFault.class, () -> NODE.run(new NodeInputs(Map.of("table", table)),
                settings(Map.of("time-column", "day", "time-unit", "h")), new RunContext(Progress.NONE, Path.of("."),
                        Path.of("."))));
        assertEquals("the unit h for a time column of dates", fault.seen());
    }

    @Test
    void namedRunsNeedAName() {
        assertEquals(List.of("holdout-runs"), keys(check(Map.of("holdout", "runs"))));
    }

    private static List<String> keys(List<SettingProblem> problems) {
        return problems.stream().map(SettingProblem::key).toList();
    }

    @Test
    void weightsOfRunsReachTheSnapshots() {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("run"), Column.number("t"), Column.number("level"),
                Column.number("trust")), "pumps.csv");
        for (int run = 0; run < 3; run++) {
            for (int k = 0; k < 20; k++) {
                rows.row("r" + run, k * 0.1, Math.cos(k * 0.3 + run), (double) run);
            }
        }
        Map<String, Object> raw = Map.of("time-column", "t", "run-column", "run", "run-weights", "given", "weight-column", "trust");
        NodeResult result = NODE.run(new NodeInputs(Map.of("table", rows.build())), settings(raw), new RunContext(Progress.NONE,
                Path.of("."), Path.of(".")));
        Snapshots snapshots = (Snapshots) result.outputs().get("snapshots");
        assertEquals(List.of("level"), snapshots.channels().stream().map(c -> c.name()).toList());
        assertEquals(List.of("r1", "r2"), snapshots.training().stream().map(r -> r.id()).toList());
        assertEquals(2, snapshots.training().get(1).weight() / snapshots.training().get(0).weight(), 1e-14);
        // a table of the same samples without the wish leaves the column a channel
        assertEquals(1, ((Snapshots) run(Map.of("time-column", "t", "run-column", "run")).outputs().get("snapshots")).training().get(0)
                .weight());
    }

    @Test
    void aColumnOfWeightsMustBeNamedAndHaveNoOtherPart() {
        assertEquals("no column of weights is named", check(Map.of("run-weights", "given")).get(0).seen());
        assertEquals(List.of("weight-column"), check(Map.of("time-column", "t", "channels", List.of("level"), "run-weights", "given",
                "weight-column", "level")).stream().map(SettingProblem::key).toList());
    }
}
