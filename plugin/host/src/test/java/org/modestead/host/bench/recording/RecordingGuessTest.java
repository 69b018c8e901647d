package org.modestead.host.bench.recording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.IntFunction;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;
import org.modestead.host.workflow.Workflow;
import org.modestead.host.workflow.WorkflowChecker;

/** What is guessed of recordings: those of the test workflows, and files as loggers and spreadsheets write them. */
class RecordingGuessTest {

    private static final Path WORKFLOWS = Path.of("..", "..", "test-workflows").toAbsolutePath().normalize();

    @TempDir
    private Path folder;

    private static RecordingGuess known(String file) {
        return RecordingGuess.of(WORKFLOWS.resolve(file), RecordingWish.NONE);
    }

    private RecordingGuess guess(String name, String text) throws IOException {
        return guess(name, text, StandardCharsets.UTF_8);
    }

    private RecordingGuess guess(String name, String text, Charset charset) throws IOException {
        return RecordingGuess.of(Files.writeString(folder.resolve(name), text, charset), RecordingWish.NONE);
    }

    private static String rows(int count, IntFunction<String> row) {
        return IntStream.range(0, count).mapToObj(row).collect(Collectors.joining("\n", "", "\n"));
    }

    private static String number(double value) {
        return String.format(Locale.ROOT, "%.4f", value);
    }

    private static void assertRoles(String time, String unit, String run, List<String> channels, List<String> inputs, RecordingGuess guess) {
        assertEquals(new RecordingWish.Roles(time, unit, run, channels, inputs), guess.roles());
    }

    @Test
    void thePumpHouseIsSixteenRunsOfEightChannels() {
        RecordingGuess guess = known("pump-house/data/recordings.csv");
        assertRoles("time", "", "run", List.of("suction_pressure [bar]", "discharge_pressure [bar]", "flow [m3/h]", "sump_level [m]", "motor_current [A]",
                "bearing_vibration [mm/s]", "casing_vibration [mm/s]", "bearing_temperature [degC]"), List.of(), guess);
        assertEquals(List.of(), guess.problems());
        assertEquals(16, guess.runs().runs().size());
        assertEquals(0.05, guess.step(), 0.002, "4 % jitter");
        assertFalse(guess.runs().isEven());
        assertEquals(8, guess.figure().orElseThrow().layers().size());
    }

    @Test
    void theOtherTestWorkflowsAreReadAsTheirAuthorsDid() {
        assertRoles("date", "d", "", List.of("temp_max", "temp_min", "wind"), List.of(), known("city-weather/data/city_weather_daily.csv"));
        assertRoles("time [s]", "s", "run", List.of("level [m]"), List.of("gate [%]", "pump [m3/s]"), known("driven-shaft/data/recordings.csv"));
        assertRoles("year", "year", "", List.of("sunspots"), List.of(), known("sunspots/data/sunspot_year_1700_2008.csv"));
        assertRoles("x", "", "", List.of("y"), List.of(), known("three-decays/data/nist_lanczos1.csv"));
        assertEquals(2, known("driven-shaft/data/recordings.csv").step(), 1e-9);
        assertEquals(1, known("city-weather/data/city_weather_daily.csv").step(), 1e-9);
    }

    @Test
    void semicolonsDecimalCommasUmlautsAndUnitsInParentheses() throws IOException {
        RecordingGuess guess = guess("german.csv", "Zeit [s];Druck (bar);Durchfluß\n"
                + rows(200, i -> (number(0.1 * i) + ";" + number(StrictMath.sin(0.3 * i)) + ";" + number(StrictMath.cos(0.3 * i))).replace('.', ',')), StandardCharsets.ISO_8859_1);
        assertRoles("Zeit [s]", "s", "", List.of("Druck (bar)", "Durchfluß"), List.of(), guess);
        assertEquals(Map.of("format", "csv", "delimiter", "semicolon", "decimal", "comma", "header", true, "skip-lines", 0, "time-format", "", "encoding", "latin-1"),
                guess.reading());
        assertEquals(0.1, guess.step(), 1e-9);
        Workflow workflow = RecordingPlan.workflow(guess, "german", "german.csv", folder.resolve("workflow.json"));
        assertEquals(List.of("Druck (bar)=bar"), workflow.step("snapshots").orElseThrow().settings().get("units"));
        assertSetUp(workflow);
    }

    @Test
    void aLogWithLinesBeforeItsHeaderAndDatesOfAnotherForm() throws IOException {
        RecordingGuess guess = guess("log.csv", "Logger 4711\nStation: north\n\nTimestamp;flow;valve;remark\n"
                + rows(300, i -> String.format(Locale.ROOT, "%02d.03.2021 %02d:%02d;%.4f;%d;ok", 1 + i / 1440, i / 60 % 24, i % 60, StrictMath.sin(0.3 * i), i / 50 % 2)));
        assertRoles("Timestamp", "min", "", List.of("flow"), List.of("valve"), guess);
        assertEquals(3, guess.reading().get("skip-lines"));
        assertEquals("%d.%m.%Y %H:%M", guess.reading().get("time-format"));
        assertEquals(1, guess.step(), 1e-9);
        assertEquals("none", guess.role("remark"));
        assertSetUp(RecordingPlan.workflow(guess, "log", "log.csv", folder.resolve("workflow.json")));
    }

    @Test
    void datesWithTheMonthFirstAreToldByTheirNumbers() throws IOException {
        RecordingGuess guess = guess("us.csv", "date,value\n" + rows(100, i -> String.format(Locale.ROOT, "%02d/%02d/2020,%.3f", 1 + i / 28, 1 + i % 28, StrictMath.sin(i))));
        assertEquals("%m/%d/%Y", guess.reading().get("time-format"));
        assertEquals("date", guess.roles().time());
        RecordingGuess british = guess("uk.csv", "date,value\n" + rows(100, i -> String.format(Locale.ROOT, "%02d/%02d/2020,%.3f", 1 + i % 28, 1 + i / 28, StrictMath.sin(i))));
        assertEquals("%d/%m/%Y", british.reading().get("time-format"));
    }

    @Test
    void momentsWithATimeZoneAreTimes() throws IOException {
        RecordingGuess guess = guess("zone.csv", "logged at,inside [degC]\n" + rows(300, i -> String.format(Locale.ROOT, "2026-03-%02dT%02d:%02d:00+01:00,%.3f",
                1 + i / 144, i / 6 % 24, i % 6 * 10, StrictMath.sin(0.3 * i))));
        assertRoles("logged at", "min", "", List.of("inside [degC]"), List.of(), guess);
        assertEquals(10, guess.step(), 1e-9);
        assertEquals(List.of(), guess.problems());
        assertSetUp(RecordingPlan.workflow(guess, "zone", "zone.csv", folder.resolve("workflow.json")));
    }

    @Test
    void textsInColumnsOfNumbersCountAsMissingAndAreTold() throws IOException {
        RecordingGuess guess = guess("texts.csv", "# made by a logger\ntime;p [kPa];q\n" + rows(300, i -> number(0.1 * i) + ";"
                + (i >= 40 && i < 44 ? "sensor off" : number(StrictMath.sin(0.3 * i))) + ";" + (i == 90 ? "---" : number(StrictMath.cos(0.3 * i)))));
        assertRoles("time", "", "", List.of("p [kPa]", "q"), List.of(), guess);
        assertEquals(List.of(), guess.problems());
        assertTrue(guess.sentences().contains("Cells that hold \"sensor off\" or \"---\" count as missing."), guess.sentences().toString());
        assertEquals(List.of(0L, 4L, 1L), guess.columns().stream().map(ColumnFacts::missing).toList());
        Workflow workflow = RecordingPlan.workflow(guess, "texts", "texts.csv", folder.resolve("workflow.json"));
        assertTrue(String.valueOf(workflow.step("source").orElseThrow().settings().get("missing")).contains("sensor off, ---"));
        assertSetUp(workflow);
    }

    /** Three readings a time, in rows of their own; the first run misses one. */
    @Test
    void oneRowAReadingBecomesOneRowATime() throws IOException {
        RecordingGuess guess = guess("long.csv", "id,trial,time_ms,sensor,value,by\n" + rows(900, i -> i + 1 + "," + (1 + i / 450) + "," + i / 3 % 150 * 5 + ","
                + List.of("acc x", "acc y", "level's").get(i % 3) + "," + number(StrictMath.sin(0.1 * (i / 3)) + i % 3) + ",anna")
                .replaceFirst("\n5,[^\n]*", ""));
        assertRoles("time_ms", "ms", "trial", List.of("acc x", "acc y", "level's"), List.of(), guess);
        assertEquals(300, guess.rows());
        assertEquals(List.of(), guess.problems());
        assertTrue(guess.sentences().contains("Column sensor names what column value measures: each of its 3 names becomes a column."), guess.sentences().toString());
        assertEquals(1, guess.columns().stream().filter(facts -> facts.column().name().equals("acc y")).findFirst().orElseThrow().missing());
        Workflow workflow = RecordingPlan.workflow(guess, "long", "long.csv", folder.resolve("workflow.json"));
        assertEquals("table-query", workflow.step("wide").orElseThrow().node());
        assertSetUp(workflow);
    }

    @Test
    void withoutATimeRowsCountAsEvenlySpaced() throws IOException {
        RecordingGuess guess = guess("plain.csv", "a,b\n" + rows(100, i -> number(StrictMath.sin(0.3 * i)) + "," + number(StrictMath.cos(0.3 * i))));
        assertRoles("", "", "", List.of("a", "b"), List.of(), guess);
        assertTrue(guess.sentences().contains("No column of times was found: rows count as evenly spaced."), guess.sentences().toString());
        assertEquals(List.of(), guess.problems());
        assertSetUp(RecordingPlan.workflow(guess, "plain", "plain.csv", folder.resolve("workflow.json")));
    }

    @Test
    void withoutAHeaderColumnsAreCalledByTheirPosition() throws IOException {
        RecordingGuess guess = guess("bare.txt", rows(100, i -> number(0.1 * i) + "\t" + number(StrictMath.sin(0.3 * i))));
        assertEquals(false, guess.reading().get("header"));
        assertEquals("tab", guess.reading().get("delimiter"));
        assertRoles("column1", "", "", List.of("column2"), List.of(), guess);
    }

    @Test
    void runsAreFoundByNameOrByBlocksInWhichTimeBeginsAnew() throws IOException {
        IntFunction<String> row = i -> i / 50 + "," + 0.5 * (i % 50) + "," + number(StrictMath.exp(-0.1 * (i % 50)));
        assertRoles("t", "", "trial", List.of("x"), List.of(), guess("named.csv", "trial,t,x\n" + rows(300, row)));
        assertRoles("t", "", "shift", List.of("x"), List.of(), guess("blocks.csv", "shift,t,x\n" + rows(300, row)));
        RecordingGuess stacked = guess("stacked.csv", "t,x\n" + rows(300, i -> row.apply(i).replaceFirst("\\d+,", "")));
        assertEquals(List.of("The time t falls back or stands still at row 51: name the column that tells the runs apart, or take another column as time."),
                stacked.problems());
    }

    /** Spreadsheets and array files write the numbers of runs as 1.0, 2.0. */
    @Test
    void runsWrittenAsDecimalsAreRuns() throws IOException {
        IntFunction<String> row = i -> i / 50 + ".0," + 0.5 * (i % 50) + "," + number(StrictMath.exp(-0.1 * (i % 50)));
        RecordingGuess named = guess("named.csv", "run,t,x\n" + rows(300, row));
        assertRoles("t", "", "run", List.of("x"), List.of(), named);
        assertEquals(6, named.runs().runs().size());
        assertSetUp(RecordingPlan.workflow(named, "named", "named.csv", folder.resolve("workflow.json")));
        assertRoles("t", "", "shift", List.of("x"), List.of(), guess("blocks.csv", "shift,t,x\n" + rows(300, row)));
        RecordingGuess halves = guess("halves.csv", "level,t,x\n" + rows(300, i -> row.apply(i).replaceFirst("\\.0", ".5")));
        assertRoles("t", "", "", List.of("level", "x"), List.of(), halves);
    }

    @Test
    void aColumnThatOnlyCountsOrNeverChangesIsNoChannel() throws IOException {
        RecordingGuess guess = guess("counter.csv", "id,time_ms,const,x\n" + rows(100, i -> i + "," + 20 * i + ",5," + number(StrictMath.sin(0.3 * i))));
        assertRoles("time_ms", "ms", "", List.of("x"), List.of(), guess);
        assertEquals("none", guess.role("id"));
        assertEquals("none", guess.role("const"));
    }

    @Test
    void whatAPersonSaysCounts() throws IOException {
        Path file = Files.writeString(folder.resolve("said.csv"), "p,q,r\n" + rows(100, i -> i + "," + number(StrictMath.sin(0.3 * i)) + "," + i % 7));
        RecordingWish wish = new RecordingWish(Optional.empty(), Optional.of(new RecordingWish.Roles("", "h", "", List.of("q"), List.of("r", "gone"))));
        RecordingGuess guess = RecordingGuess.of(file, wish);
        assertRoles("", "h", "", List.of("q"), List.of("r"), guess);
        assertEquals("input", guess.role("r"));
        assertEquals("none", guess.role("p"));
    }

    @Test
    void filesThatHoldNoRecordingAreToldInASentence() throws IOException {
        assertTrue(guess("empty.csv", "").problems().get(0).contains("the file is empty"), guess("empty.csv", "").problems().toString());
        assertTrue(guess("text.csv", "a,b\n" + rows(50, i -> "x,y")).problems().contains("No channel: take at least one column of numbers as a channel."));
        assertTrue(guess("short.csv", "t,x\n" + rows(5, i -> i + "," + i * i)).problems().contains("5 rows are too few: give at least 20."));
        assertFalse(guess("broken.parquet", "no parquet").problems().isEmpty());
        assertFalse(guess("broken.json", "{").problems().isEmpty());
        assertFalse(guess("binary.csv", "\u0000\u0001\u0002\n\u0003").problems().isEmpty());
    }

    @Test
    void theStepsOfEveryKnownRecordingAreReadyToRun() {
        for (String file : List.of("pump-house/data/recordings.csv", "city-weather/data/city_weather_daily.csv", "driven-shaft/data/recordings.csv",
                "sunspots/data/sunspot_year_1700_2008.csv", "three-decays/data/nist_lanczos1.csv")) {
            Path place = WORKFLOWS.resolve(file);
            Workflow workflow = RecordingPlan.workflow(known(file), "plan", place.getFileName().toString(), place.resolveSibling("workflow.json"));
            assertEquals(List.of("source", "snapshots", "fit", "spectrum", "check", "forecast", "report"), workflow.steps().stream().map(step -> step.id()).toList());
            assertSetUp(workflow);
        }
    }

    private static void assertSetUp(Workflow workflow) {
        assertEquals(List.of(), new WorkflowChecker(TestWorkflows.allNodes()).survey(workflow).problems().stream().map(problem -> problem.sentence()).toList());
    }
}
