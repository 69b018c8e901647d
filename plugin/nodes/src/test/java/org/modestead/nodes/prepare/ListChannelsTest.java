package org.modestead.nodes.prepare;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Recording;
import org.modestead.engine.recording.Snapshots;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.ListCell;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.TableSchema;

/** A column of lists of numbers is several channels, one an entry. */
class ListChannelsTest {

    private static final SnapshotBuilderNode NODE = new SnapshotBuilderNode();
    private static final RunContext CONTEXT = new RunContext(Progress.NONE, Path.of("."), Path.of("."));
    private static final Column ACCEL = new Column("accel [m/s2]", CellType.DOUBLE_LIST);
    private static final ListCell MISSING_ENTRY = new ListCell(List.of(Optional.of(5.0), Optional.empty()));

    private static MemoryTable.Builder table(Column... columns) {
        return MemoryTable.builder(TableSchema.of(columns), "rig.parquet");
    }

    private static RecordingColumns columns(List<String> channels, List<String> inputs, Map<String, String> units) {
        return new RecordingColumns("", 1, "s", "", channels, inputs, units);
    }

    private static Recording read(MemoryTable table, RecordingColumns columns) {
        return RecordingReader.read(table, columns, Progress.NONE).recording();
    }

    private static RunningSettings settings(Map<String, Object> raw) {
        return new RunningSettings(SettingsReader.read(NODE, raw).settings().orElseThrow());
    }

    private record RunningSettings(Settings settings) {
        Outlook outlook(TableSchema schema) {
            return NODE.expect(new Expected(Map.of("table", schema), Map.of()), settings, CONTEXT).values().get("snapshots");
        }

        NodeResult run(MemoryTable table) {
            return NODE.run(new NodeInputs(Map.of("table", table)), settings, CONTEXT);
        }
    }

    @Test
    void entriesStandAmongSingleChannelsInOrderAndTakeNameAndUnitOfTheirColumn() {
        Recording recording = read(table(Column.number("flow [m3/h]"), ACCEL, Column.whole("stage")).row(1.0, ListCell.of(2.0, 3.0), 4L)
                .row(1.5, ListCell.of(2.5, 3.5), 5L).build(), columns(List.of(), List.of(), Map.of()));
        assertEquals(List.of(new Channel("flow", "m3/h"), new Channel("accel 1", "m/s2"), new Channel("accel 2", "m/s2"),
                new Channel("stage", "")), recording.channels());
        assertArrayEquals(new double[] {1, 2, 3, 4, 1.5, 2.5, 3.5, 5}, recording.runs().get(0).values().data);
    }

    @Test
    void aMissingListAndAMissingEntryAreMissingCells() {
        Recording recording = read(table(ACCEL).row(new Object[] {null}).row(MISSING_ENTRY).row(ListCell.of(7.0, 8.0)).build(),
                columns(List.of(), List.of(), Map.of()));
        assertArrayEquals(new double[] {Double.NaN, Double.NaN, 5, Double.NaN, 7, 8}, recording.runs().get(0).values().data);
    }

    @Test
    void namesOfEntriesAreKeptUnlessAnotherColumnHasThem() {
        Column named = new Column("rig", CellType.LONG_LIST, List.of("x [mm]", "y [mm]"));
        Recording recording = read(table(named).row(ListCell.of(1L, 2L)).row(ListCell.of(3L, 4L)).build(),
                columns(List.of(), List.of(), Map.of()));
        assertEquals(List.of(new Channel("x", "mm"), new Channel("y", "mm")), recording.channels());
        Recording taken = read(table(named, Column.number("y [mm]")).row(ListCell.of(1L, 2L), 2.0).row(ListCell.of(3L, 4L), 4.0).build(),
                columns(List.of(), List.of(), Map.of()));
        assertEquals(List.of("rig 1", "rig 2", "y"), taken.channels().stream().map(Channel::name).toList());
        Recording both = read(table(named, new Column("bed", CellType.LONG_LIST, named.entries())).row(ListCell.of(1L, 2L),
                ListCell.of(5L, 6L)).row(ListCell.of(3L, 4L), ListCell.of(7L, 8L)).build(), columns(List.of(), List.of(), Map.of()));
        assertEquals(List.of("rig 1", "rig 2", "bed 1", "bed 2"), both.channels().stream().map(Channel::name).toList());
        Recording numbered = read(table(ACCEL, Column.number("accel 1 [m/s2]")).row(ListCell.of(1.0), 2.0).row(ListCell.of(1.5), 3.0).build(),
                columns(List.of(), List.of(), Map.of()));
        assertEquals(List.of("accel entry 1", "accel 1"), numbered.channels().stream().map(Channel::name).toList());
    }

    @Test
    void aUnitIsGivenToOneEntryOrToAllOfThem() {
        MemoryTable table = table(new Column("accel", CellType.DOUBLE_LIST)).row(ListCell.of(1.0, 2.0)).row(ListCell.of(1.0, 2.0)).build();
        assertEquals(List.of(new Channel("accel 1", "g"), new Channel("accel 2", "m/s2")),
                read(table, columns(List.of(), List.of(), Map.of("accel", "g", "accel 2", "m/s2"))).channels());
        SettingFault unknown = assertThrows(SettingFault.class, () -> settings(Map.of("units", List.of("accel 3=g"))).run(table));
        assertTrue(unknown.getMessage().contains("accel 3") && unknown.getMessage().contains("accel 2"), unknown.getMessage());
    }

    @Test
    void listsCanBeKnownInputs() {
        Recording recording = read(table(Column.number("x"), new Column("valves", CellType.DOUBLE_LIST)).row(1.0, ListCell.of(0.0, 1.0))
                .row(2.0, ListCell.of(1.0, 0.0)).build(), columns(List.of("x"), List.of("valves"), Map.of()));
        assertEquals(List.of("valves 1", "valves 2"), recording.inputs().stream().map(Channel::name).toList());
        assertArrayEquals(new double[] {0, 1, 1, 0}, recording.runs().get(0).inputs().data);
    }

    @Test
    void aListOfAnotherLengthIsNamedByRowAndColumn() {
        RecordingFault fault = assertThrows(RecordingFault.class, () -> read(table(ACCEL).row(ListCell.of(1.0, 2.0)).row(ListCell.of(1.0)).build(),
                columns(List.of(), List.of(), Map.of())));
        assertTrue(fault.getMessage().contains("row 2") && fault.getMessage().contains("accel [m/s2]")
                && fault.getMessage().contains("1 entry, not 2"), fault.getMessage());
        Column named = new Column("rig", CellType.DOUBLE_LIST, List.of("x", "y", "z"));
        RecordingFault fewer = assertThrows(RecordingFault.class, () -> read(table(named).row(ListCell.of(1.0, 2.0)).build(),
                columns(List.of(), List.of(), Map.of())));
        assertTrue(fewer.getMessage().contains("row 1") && fewer.getMessage().contains("2 entries, not 3"), fewer.getMessage());
    }

    @Test
    void aColumnWithoutAnyListIsNamed() {
        RecordingFault fault = assertThrows(RecordingFault.class, () -> read(table(Column.number("x"), ACCEL).row(1.0, null).row(2.0, null).build(),
                columns(List.of(), List.of(), Map.of())));
        assertTrue(fault.getMessage().contains("accel [m/s2]") && fault.getMessage().contains("no row holds a list"), fault.getMessage());
        RecordingFault empty = assertThrows(RecordingFault.class, () -> read(table(ACCEL).row(ListCell.of()).build(),
                columns(List.of(), List.of(), Map.of())));
        assertTrue(empty.getMessage().contains("row 1") && empty.getMessage().contains("empty"), empty.getMessage());
    }

    @Test
    void anInfiniteEntryIsNamed() {
        RecordingFault fault = assertThrows(RecordingFault.class, () -> read(table(ACCEL).row(ListCell.of(1.0, Double.POSITIVE_INFINITY)).build(),
                columns(List.of(), List.of(), Map.of())));
        assertTrue(fault.getMessage().contains("entry 2"), fault.getMessage());
    }

    @Test
    void channelsAreToldBeforeRunningWhereTheTableNamesTheEntries() {
        TableSchema named = TableSchema.of(Column.number("t"), new Column("rig", CellType.DOUBLE_LIST, List.of("x [mm]", "y [mm]")));
        RunningSettings settings = settings(Map.of("time-column", "t", "time-unit", "s"));
        assertEquals(List.of(new Channel("x", "mm"), new Channel("y", "mm")), settings.outlook(named).channels());
        TableSchema unnamed = TableSchema.of(Column.number("t"), ACCEL);
        assertEquals(List.of(), settings.outlook(unnamed).channels());
        assertFalse(settings.outlook(unnamed).complete());
    }

    @Test
    void aUnitOfAnEntryThatIsNotThereIsToldBeforeRunningWhereTheTableNamesTheEntries() {
        TableSchema named = TableSchema.of(new Column("rig", CellType.DOUBLE_LIST, List.of("x", "y")));
        assertEquals(1, NODE.check(Map.of("table", named), settings(Map.of("units", List.of("z=mm"))).settings()).size());
        assertEquals(List.of(), NODE.check(Map.of("table", named), settings(Map.of("units", List.of("rig=mm"))).settings()));
    }

    @Test
    void listsAreTheSameSnapshotsAsColumnsAndTheSummaryTellsOfThem() {
        MemoryTable.Builder lists = table(Column.number("t"), ACCEL);
        MemoryTable.Builder single = table(Column.number("t"), Column.number("accel 1 [m/s2]"), Column.number("accel 2 [m/s2]"));
        for (int k = 0; k < 60; k++) {
            double x = StrictMath.sin(0.3 * k);
            double y = StrictMath.cos(0.3 * k);
            lists.row(k * 0.1, ListCell.of(x, y));
            single.row(k * 0.1, x, y);
        }
        Map<String, Object> raw = new HashMap<>(Map.of("time-column", "t", "time-unit", "s", "detrend", "mean", "holdout", "tail-share"));
        NodeResult one = settings(raw).run(lists.build());
        NodeResult other = settings(raw).run(single.build());
        Snapshots snapshots = (Snapshots) one.outputs().get("snapshots");
        Snapshots expected = (Snapshots) other.outputs().get("snapshots");
        assertEquals(expected.channels(), snapshots.channels());
        assertArrayEquals(expected.training().get(0).values().data, snapshots.training().get(0).values().data);
        assertTrue(one.summary().contains("Column accel [m/s2] holds lists of 2 numbers, each a channel or input of its own: accel 1 [m/s2],"
                + " accel 2 [m/s2]."), one.summary().toString());
        try (RowCursor cursor = ((MemoryTable) one.outputs().get("summary")).open()) {
            boolean told = false;
            while (cursor.next()) {
                told |= cursor.text(0).equals("list accel [m/s2]") && cursor.text(1).equals("accel 1 [m/s2], accel 2 [m/s2]");
            }
            assertTrue(told);
        }
    }
}
