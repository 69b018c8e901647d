package org.modestead.nodes.prepare;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZonedDateTime;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.Cancelled;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Recording;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

class RecordingReaderTest {

    private static final String ORIGIN = "pumps.csv";

    private static MemoryTable.Builder table(Column... columns) {
        return MemoryTable.builder(TableSchema.of(columns), ORIGIN);
    }

    private static RecordingColumns columns(String time, String run, String... channels) {
        return new RecordingColumns(time, 1, "", run, List.of(channels), List.of(), Map.of());
    }

    private static Recording read(MemoryTable.Builder table, RecordingColumns columns) {
        return RecordingReader.read(table.build(), columns, Progress.NONE).recording();
    }

    private static RecordingFault fault(MemoryTable.Builder table, RecordingColumns columns) {
        return assertThrows(RecordingFault.class, () -> read(table, columns));
    }

    @Test
    void numbersBecomeOneRunOfAllNumericColumns() {
        Recording recording = read(table(Column.number("t"), Column.number("flow [m3/h]"), Column.whole("stage"),
                Column.text("note"))
                .row(0.0, 1.5, 3L, "a").row(0.5, 2.5, null, "b"), columns("t", ""));
        assertEquals(List.of(new Channel("flow", "m3/h"), new Channel("stage", "")), recording.channels());
        Run run = recording.runs().get(0);
        assertArrayEquals(new double[] {0, 0.5}, run.times());
        assertArrayEquals(new double[] {1.5, 3, 2.5, Double.NaN}, run.values().data);
        assertEquals(TimeAxis.Kind.NUMBER, recording.time().kind());
    }

    @Test
    void rowsOfRunsMayBeMixedAndRunsComeInOrderOfTheirFirstRow() {
        Recording recording = read(table(Column.text("run"), Column.number("t"), Column.number("x")).row("B", 5.0,
                1.0).row("A", 1.0, 2.0)
                .row("B", 6.0, 3.0).row("A", 2.0, 4.0), columns("t", "run"));
        assertEquals(List.of("B", "A"), recording.runs().stream().map(Run::id).toList());
        assertArrayEquals(new double[] {1, 3}, recording.runs().get(0).values().data);
        assertArrayEquals(new double[] {1, 2}, recording.runs().get(1).times());
    }

    @Test
    void withoutATimeColumnRowsOfEachRunFollowAtTheGivenStep() {
        RecordingColumns columns = new RecordingColumns("", 0.25, "s", "run", List.of(), List.of(), Map.of());
        Recording recording = read(table(Column.whole("run"), Column.number("x")).row(1, 1.0).row(1, 2.0).row(2,
                3.0).row(1, 4.0), columns);
        assertArrayEquals(new double[] {0, 0.25, 0.5}, recording.runs().get(0).times());
        assertArrayEquals(new double[] {0}, recording.runs().get(1).times());
        assertEquals("s", recording.time().unit());
    }

    @Test
    void inputsAreKeptApartFromChannels() {
        RecordingColumns columns = new RecordingColumns("t", 1, "s", "", List.of(), List.of("valve"), Map.of("x", "bar",
                "valve", "%"));
        Recording recording = read(table(Column.number("t"), Column.number("valve"), Column.number("x")).row(0.0, 10.0,
                1.0)
                .row(1.0, 20.0, 2.0), columns);
        assertEquals(List.of(new Channel("x", "bar")), recording.channels());
        assertEquals(List.of(new Channel("valve", "%")), recording.inputs());
        assertArrayEquals(new double[] {10, 20}, recording.runs().get(0).inputs().data);
        assertArrayEquals(new double[] {1, 2}, recording.runs().get(0).values().data);
    }

    @Test
    void namesKeepTheirUnitsWhereTheyWouldOtherwiseCollide() {
        Recording recording = read(table(Column.number("T [C]"), Column.number("T [K]")).row(1.0, 2.0).row(1.0, 2.0),
                columns("", ""));
        assertEquals(List.of(new Channel("T [C]", "C"), new Channel("T [K]", "K")), recording.channels());
    }

    @Test
    void datesCountInDaysAndComeBack() {
        Recording recording = read(table(new Column("day", CellType.DATE), Column.number("x")).row(LocalDate.of(1970, 1,
                2), 1.0)
                .row(LocalDate.of(1970, 1, 4), 2.0), columns("day", ""));
        assertArrayEquals(new double[] {1, 3}, recording.runs().get(0).times());
        assertEquals(new TimeAxis(TimeAxis.Kind.DATE, "d"), recording.time());
        assertEquals("1970-01-04", recording.time().format(3));
    }

    @ParameterizedTest
    @CsvSource({"s, 3600", "min, 60", "h, 1", "d, 0.041666666666666664"})
    void dateTimesCountInTheUnitAskedForAndComeBack(String unit, double expected) {
        RecordingColumns columns = new RecordingColumns("at", 1, unit, "", List.of(), List.of(), Map.of());
        Recording recording = read(table(new Column("at", CellType.DATE_TIME), Column.number("x"))
                .row(LocalDateTime.of(1970, 1, 1, 0, 0), 1.0).row(LocalDateTime.of(1970, 1, 1, 1, 0), 2.0), columns);
        double[] times = recording.runs().get(0).times();
        assertEquals(expected, times[1], 1e-15);
        assertEquals("1970-01-01T01:00:00", recording.time().format(times[1]));
    }

    @Test
    void timesOfOurDaysComeBackToTheMicrosecondInEveryUnit() {
        LocalDateTime at = LocalDateTime.of(2026, 12, 1, 17, 36, 20, 123_456_000);
        for (String unit : TimeAxis.unitsOf(TimeAxis.Kind.DATE_TIME)) {
            TimeAxis axis = new TimeAxis(TimeAxis.Kind.DATE_TIME, unit);
            // half a microsecond: a double of 1.8e9 s resolves 2.4e-7 s
            assertEquals(at, axis.toDateTime(TimeAxis.ofDateTime(at) / axis.calendarUnitsPerUnit()), unit);
        }
    }

    @Test
    void zonedTimesAreReadAtUtc() {
        Recording recording = read(table(new Column("at", CellType.ZONED_DATE_TIME), Column.number("x"))
                .row(ZonedDateTime.parse("1970-01-01T02:00:00+02:00"),
                        1.0).row(ZonedDateTime.parse("1970-01-01T00:00:01Z"), 2.0),
                columns("at", ""));
        assertArrayEquals(new double[] {0, 1}, recording.runs().get(0).times());
    }

    @ParameterizedTest
    @CsvSource({"1970-01-02, 1970-01-03, DATE, 2", "1970-01-01T00:00:00, 1970-01-01T00:00:02.5, DATE_TIME, 2.5",
        "1970-01-01 00:00:00, 1970-01-01 00:01, DATE_TIME, 60", "1970-01-01T00:00:00Z, 1970-01-01T01:00:00+00:30,"
                + " DATE_TIME, 1800"})
    void timesWrittenAsTextAreRead(String first, String second, TimeAxis.Kind kind, double expected) {
        Recording recording = read(table(Column.text("t"), Column.number("x")).row(first, 1.0).row(second, 2.0),
                columns("t", ""));
        assertEquals(kind, recording.time().kind());
        assertEquals(expected, recording.runs().get(0).times()[1]);
    }

    @Test
    void aTextThatIsNoDateNamesTableRowColumnAndValue() {
        RecordingFault fault = fault(table(Column.text("t"), Column.number("x")).row("2015-06-30", 1.0).row("30.6.2015",
                2.0),
                columns("t", ""));
        assertEquals("pumps.csv, row 2 below the header, column t: the time is \"30.6.2015\"; write a date such as"
                + " 2015-06-30, or choose another time column.", fault.getMessage());
    }

    @Test
    void textInANumberColumnNamesTableRowColumnAndValue() {
        RecordingFault fault = fault(table(Column.text("flow")).row("1.5").row("n/a"), columns("", "", "flow"));
        assertEquals("pumps.csv, row 2 below the header, column flow", fault.where());
        assertEquals("the value is the text \"n/a\"", fault.seen());
    }

    @Test
    void numbersInAColumnOfTextAreReadWhenItIsNamed() {
        Recording recording = read(table(Column.text("flow")).row("1.5").row("-2e3").row(""), columns("", "", "flow"));
        assertArrayEquals(new double[] {1.5, -2000, Double.NaN}, recording.runs().get(0).values().data);
    }

    @Test
    void aColumnOfNumbersSpoiltByFewTextsIsNotLeftOutInSilence() {
        MemoryTable spoilt = table(Column.number("x"), Column.text("flow"), Column.text("note")).row(1.0, "1.5",
                "a").row(2.0, "n/a", "b")
                .row(3.0, "2.5", "c").build();
        RecordingReader.Reading reading = RecordingReader.read(spoilt, columns("", ""), Progress.NONE);
        assertEquals(1, reading.doubts().size());
        assertTrue(reading.doubts().get(0).sentence().contains("row 2 (\"n/a\")"), reading.doubts().toString());
    }

    @ParameterizedTest
    @ValueSource(doubles = {1.0, 0.5})
    void timesThatRepeatOrFallAreRefusedWithBothRows(double second) {
        RecordingFault fault = fault(table(Column.number("t"), Column.number("x")).row(1.0, 1.0).row(second, 2.0),
                columns("t", ""));
        assertEquals("pumps.csv, row 2 below the header, column t", fault.where());
        assertTrue(fault.seen().contains("of row 1"), fault.seen());
        assertTrue(fault.wanted().contains("set the run column"), fault.wanted());
    }

    @Test
    void aMissingTimeAndAMissingRunNameAreRefused() {
        assertEquals("the time is missing", fault(table(Column.number("t"), Column.number("x")).row(1.0, 1.0).row(null,
                2.0),
                columns("t", "")).seen());
        assertEquals("the name of the run is missing", fault(table(Column.text("r"), Column.number("x")).row(" ", 1.0),
                columns("", "r")).seen());
    }

    @Test
    void infiniteValuesAndTimesAreRefused() {
        assertEquals("the value is infinite", fault(table(Column.number("x")).row(1.0).row(Double.POSITIVE_INFINITY),
                columns("", "")).seen());
        assertTrue(fault(table(Column.number("t"), Column.number("x")).row(Double.NEGATIVE_INFINITY, 1.0), columns("t",
                ""))
                .seen().contains("Infinity"));
    }

    @Test
    void tablesWithoutEnoughRowsOrColumnsAreRefused() {
        assertEquals("the table has a header but no rows", fault(table(Column.number("x")), columns("", "")).seen());
        assertEquals("the table has one row only", fault(table(Column.number("x")).row(1.0), columns("", "")).seen());
        assertTrue(fault(table(Column.number("t"), Column.text("x")).row(1.0, "a"), columns("t", "")).seen()
                .startsWith("no column of numbers"));
        assertEquals("there is no column flow", fault(table(Column.number("x")).row(1.0),
                columns("", "", "flow")).seen());
    }

    @Test
    void aLongTableCanBeCancelled() {
        MemoryTable.Builder rows = table(Column.number("x"));
        for (int i = 0; i < 10_000; i++) {
            rows.row((double) i);
        }
        MemoryTable table = rows.build();
        Progress stopped = new Progress() {
            @Override
            public void report(double fraction, String message) {
                // not watched here
            }

            @Override
            public void checkCancelled() {
                throw new Cancelled("enough");
            }
        };
        assertThrows(Cancelled.class, () -> RecordingReader.read(table, columns("", ""), stopped));
    }

    private static RecordingColumns weighed() {
        return new RecordingColumns("t", 1, "", "run", List.of(), List.of(), "w", Map.of());
    }

    private static MemoryTable.Builder weights() {
        return table(Column.text("run"), Column.number("t"), Column.number("x"), Column.number("w"));
    }

    @Test
    void aColumnOfWeightsIsNoChannelAndGivesEveryRunItsWeight() {
        Recording recording = read(weights().row("a", 0.0, 1.0, 2.5).row("b", 0.0, 3.0, 0.0).row("a", 1.0, 2.0, 2.5).row("b", 1.0, 4.0, 0.0),
                weighed());
        assertEquals(List.of("x"), recording.channels().stream().map(Channel::name).toList());
        assertEquals(List.of(2.5, 0.0), recording.runs().stream().map(Run::weight).toList());
    }

    @Test
    void weightsThatChangeWithinARunAreMissingOrNegativeAreRefusedWithTheirPlace() {
        assertEquals("pumps.csv, row 2 below the header, column w: the weight is 3.0, but other rows of run a have another; give all rows"
                + " of a run the same weight.", fault(weights().row("a", 0.0, 1.0, 2.0).row("a", 1.0, 2.0, 3.0), weighed()).getMessage());
        assertEquals("the weight is missing", fault(weights().row("a", 0.0, 1.0, null).row("a", 1.0, 2.0, 3.0), weighed()).seen());
        assertEquals("the weight is -1.0", fault(weights().row("a", 0.0, 1.0, -1.0).row("a", 1.0, 2.0, -1.0), weighed()).seen());
    }
}
