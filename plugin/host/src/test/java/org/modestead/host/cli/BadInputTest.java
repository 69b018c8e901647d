package org.modestead.host.cli;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/**
 * Everything that can be wrong with what a person brings, through the command line and all real nodes: each is answered
 * with one sentence that names the place, the value and the remedy, with the right exit code, and without a trace on
 * the disk.
 */
class BadInputTest {

    @TempDir
    Path folder;

    private int exit;
    private String said;

    @Test
    void emptyFile() throws IOException {
        given("");
        refused(2, "step source", "pumps.csv", "the file is empty (0 bytes)", "give a table with a header and at least one "
                + "row");
    }

    @Test
    void headerOnly() throws IOException {
        given("time,flow\n");
        refused(2, "step source", "pumps.csv", "a header (time, flow) but no row", "give a table with at least one row");
    }

    @Test
    void textInANumberColumn() throws IOException {
        given(samples(50).replaceAll("\n1\\.5,[^\n]*", "\n1.5,abc"));
        refused(2, "step source", "pumps.csv, row 16 (line 17), column flow", "\"abc\"", "correct the cell");
    }

    @Test
    void textBehindTheSample() throws IOException {
        given(samples(30000) + "3000.0,abc\n");
        refused(1, "step source", "pumps.csv, row 30001 (line 30002), column flow", "\"abc\"", "correct the cell");
    }

    @Test
    void oneRow() throws IOException {
        given("time,flow\n0,1.5\n");
        refused(1, "step build", "pumps.csv", "one row only", "give at least two rows");
    }

    @Test
    void constantChannel() throws IOException {
        given(samples(100).replaceAll("(?m)^([0-9.]+),.*$", "$1,2.5"));
        refused(1, "step build", "channel flow is 2.5 in every sample", "name at least one channel that moves");
    }

    @Test
    void channelWithoutANumber() throws IOException {
        given(samples(100).replaceAll("(?m)^([0-9.]+),.*$", "$1,NaN"));
        refused(1, "step build", "flow");
    }

    @Test
    void equalTimes() throws IOException {
        given(samples(50).replace("\n1.5,", "\n1.4,"));
        refused(1, "step build", "row 16", "1.4");
    }

    @Test
    void fallingTimes() throws IOException {
        given(samples(50).replace("\n1.5,", "\n0.5,"));
        refused(1, "step build", "row 16", "0.5");
    }

    @Test
    void runTooShortForTheDelays() throws IOException {
        given(samples(20));
        refused(1, "step build", "20", "delay");
    }

    @Test
    void rankAboveWhatTheDataHold() throws IOException {
        given(samples(100));
        run("build.delay-depth=2", "fit.rank-rule=fixed", "fit.rank=50");
        assertTrue(exit == 1 && said.contains("step fit") && said.contains("50") && said.contains("2"), said);
    }

    @Test
    void unknownNodeSettingTypeCircleAndMissingLinkAllAtOnce() throws IOException {
        given(samples(100));
        TestWorkflows.write(folder, List.of("source:table-sorce", "build:snapshot-builder:{\"delay-deph\": 2, \"scaling\": "
                + "\"wide\"}",
                "a:table-query", "b:table-query", "fit:operator-fitter:{\"rank\": \"ten\"}"),
                List.of("a.table>b.input", "b.table>a.input", "b.table>fit.snapshots"));
        run();
        assertEquals(2, exit);
        assertAll(Stream.of("step source, field node: there is no node \"table-sorce\", perhaps you meant table-source",
                "step build, setting delay-deph: no setting of that name in snapshot-builder, perhaps you meant delay-depth",
                "step build, setting scaling: the text \"wide\"; use one of none, ",
                "step fit, setting rank: the text \"ten\"; use a whole number",
                "link b.table -> fit.snapshots: a Table cannot feed an input that takes Snapshots",
                "the steps a -> b -> a feed each other in a circle",
                "step build, input table: nothing is linked to it")
                .map(part -> () -> assertTrue(said.contains(part), part + "\n" + said)));
    }

    @Test
    void unknownColumn() throws IOException {
        given(samples(100));
        run("build.channels=flwo");
        assertEquals(2, exit);
        assertTrue(said.contains("--set, step build, setting channels: the input has no column flwo") || said.contains(
                "workflow.json, step build, setting channels: the input has no column flwo"), said);
    }

    @Test
    void unwritableOutput() throws IOException {
        given(samples(100));
        Files.writeString(folder.resolve("taken"), "a file");
        run("--out", folder.resolve("taken/results").toString());
        assertEquals(1, exit);
        assertTrue(said.contains(folder.resolve("taken") + " is not a folder; choose a file in a folder"), said);
    }

    @Test
    void unwritableTarget() throws IOException {
        given(samples(100));
        Files.createDirectory(folder.resolve("taken.csv"));
        TestWorkflows.write(folder, List.of("source:table-source:{\"path\": \"pumps.csv\"}", "sink:table-sink:{\"path\": "
                + "\"taken.csv\"}"),
                List.of("source.table>sink.table"));
        refused(2, "step sink", "taken.csv", "this is a folder, not a file", "name a file in it");
    }

    private void given(String csv) throws IOException {
        Files.writeString(folder.resolve("pumps.csv"), csv);
        TestWorkflows.write(folder, List.of("source:table-source:{\"path\": \"pumps.csv\"}",
                "build:snapshot-builder:{\"time-column\": \"time\", \"time-unit\": \"s\", \"channels\": [\"flow\"], "
                + "\"delay-depth\": 30}",
                "fit:operator-fitter", "spectrum:spectrum-extractor"),
                List.of("source.table>build.table", "build.snapshots>fit.snapshots", "fit.operator>spectrum.operator"));
    }

    private void refused(int code, String... parts) {
        run();
        assertEquals(code, exit, said);
        String sentence = said.lines().filter(line -> line.contains(parts[0] + ",") || line.contains(parts[0] + ":"))
                .filter(line -> !line.endsWith("failed")).findFirst().orElse("");
        for (String part : parts) {
            assertTrue(sentence.contains(part), () -> part + " is missing in: " + said);
        }
        assertTrue(sentence.contains("; ") && sentence.endsWith("."), sentence);
    }

    private void run(String... arguments) {
        List<String> all = new ArrayList<>(List.of("run", folder.toString()));
        for (String argument : arguments) {
            boolean setting = argument.contains("=");
            all.addAll(setting ? List.of("--set", argument) : List.of(argument));
        }
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ByteArrayOutputStream err = new ByteArrayOutputStream();
        Terminal terminal = new Terminal(new PrintStream(out, true, StandardCharsets.UTF_8),
                new PrintStream(err, true, StandardCharsets.UTF_8), false);
        exit = new CommandLineHost(terminal, TestWorkflows::allNodes).run(all.toArray(String[]::new));
        said = err.toString(StandardCharsets.UTF_8);
        assertFalse(said.contains("\tat ") || said.contains("Exception"), said);
    }

    private static String samples(int count) {
        StringBuilder text = new StringBuilder("time,flow\n");
        for (int i = 0; i < count; i++) {
            text.append(String.format(Locale.ROOT, "%.1f,%.6f%n", i / 10.0, Math.exp(-0.01 * i) * Math.cos(0.3 * i)));
        }
        return text.toString().replace("\r\n", "\n");
    }
}
