package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Recordings of numbers that no instrument gives, through the whole line of nodes by five ways of fitting: what comes out holds finite
 * numbers only, or the Snapshot Builder, or a fit that cannot use them, refuses them in a sentence.
 */
class HostileRecordingsTest {

    private static final List<String> LINE = List.of("table-source", "snapshot-builder", "operator-fitter", "spectrum-extractor", "wellposedness-checker", "forecast");
    private static final List<String> WITH_KERNEL = List.of("table-source", "snapshot-builder", "kernel-chooser", "operator-fitter", "spectrum-extractor",
            "wellposedness-checker", "forecast");
    /** Figures that every mode, sample and forecast has. */
    private static final List<String> WHOLE = List.of("spectrum-extractor.modes.lambda_real", "spectrum-extractor.modes.lambda_imag",
            "spectrum-extractor.modes.frequency", "spectrum-extractor.modes.amplitude", "spectrum-extractor.modes.energy_share",
            "spectrum-extractor.shapes.magnitude", "forecast.forecast.value", "forecast.reconstruction.reconstructed", "forecast.scores.rmse");

    @TempDir
    Path folder;

    /** The settings of the Snapshot Builder and of the Operator Fitter, by the way of fitting. */
    private static Map<String, Map<String, Map<String, Object>>> ways() {
        Map<String, Map<String, Map<String, Object>>> ways = new LinkedHashMap<>();
        ways.put("linear", way(Map.of(), Map.of("estimator", "linear")));
        ways.put("delays", way(Map.of("scaling", "std", "detrend", "linear", "delay-depth", 4, "smoothing", "automatic"),
                Map.of("estimator", "linear", "noise-correction", "extrapolation")));
        ways.put("dictionary", way(Map.of(), Map.of("estimator", "dictionary", "degree", 3)));
        ways.put("kernel", way(Map.of(), Map.of("estimator", "kernel-step", "rank-rule", "holdout")));
        ways.put("generator", way(Map.of(), Map.of("estimator", "generator")));
        return ways;
    }

    private static Map<String, Map<String, Object>> way(Map<String, Object> preparation, Map<String, Object> fit) {
        Map<String, Object> all = new LinkedHashMap<>(Map.of("time-column", "time", "run-column", "run", "resampling", "uniform", "holdout", "run-share",
                "calibration", "run-share"));
        all.putAll(preparation);
        return Map.of("snapshot-builder", all, "operator-fitter", fit);
    }

    private RecordingLine.Outcome run(String way, String table) throws IOException {
        Files.writeString(folder.resolve("t.csv"), table);
        return new RecordingLine(folder, "t.csv", ways().get(way)).run(way.equals("kernel") || way.equals("generator") ? WITH_KERNEL : LINE);
    }

    @Test
    void oddRecordingsGiveFiniteNumbersByEveryWayOfFittingThatCanUseThem() throws IOException {
        List<String> refused = new ArrayList<>();
        for (Map.Entry<String, String> recording : HostileRecordings.sound().entrySet()) {
            for (String way : ways().keySet()) {
                RecordingLine.Outcome outcome = run(way, recording.getValue());
                assertEquals(List.of(), RecordingLine.unusable(outcome.tables(), WHOLE), recording.getKey() + ", " + way);
                if (!outcome.taken()) {
                    refused.add(recording.getKey() + ", " + way + ": " + outcome.words());
                }
            }
        }
        refused.forEach(System.out::println);
        assertTrue(refused.stream().noneMatch(words -> words.contains("linear: ") || words.startsWith("ordinary")), refused.toString());
        assertTrue(refused.stream().allMatch(words -> words.matches("(?s).*(operator-fitter|snapshot-builder): .+; .+\\.")), refused.toString());
    }

    @Test
    void unusableRecordingsAreRefusedInASentenceBeforeTheFit() throws IOException {
        for (Map.Entry<String, String> recording : HostileRecordings.unsound().entrySet()) {
            RecordingLine.Outcome outcome = run("delays", recording.getValue());
            System.out.println(recording.getKey() + ": " + outcome.words());
            assertEquals("snapshot-builder", outcome.node(), recording.getKey() + ": " + outcome.words());
            assertTrue(outcome.sentence().matches("(?s).+: .+; .+\\."), outcome.sentence());
            assertFalse(outcome.sentence().contains("NaN"), outcome.sentence());
        }
    }

    /** The same numbers in an NPY file, where an infinite one and one that is missing are numbers like any other, come out as from the text. */
    @Test
    void anArrayOfTheSameNumbersIsTakenOrRefusedAsTheText() throws IOException {
        Map<String, String> all = new TreeMap<>(HostileRecordings.sound());
        all.putAll(HostileRecordings.unsound());
        for (Map.Entry<String, String> recording : all.entrySet()) {
            RecordingLine.Outcome text = run("delays", recording.getValue());
            RecordingLine.Outcome array = array(recording.getValue());
            assertEquals(List.of(), RecordingLine.unusable(array.tables(), WHOLE), recording.getKey());
            assertEquals(text.taken(), array.taken(), recording.getKey() + ": " + text.words() + " and " + array.words());
            assertTrue(array.taken() || array.sentence().matches("(?s).+: .+; .+\\."), array.sentence());
        }
    }

    private RecordingLine.Outcome array(String table) throws IOException {
        Files.write(folder.resolve("t.npy"), HostileRecordings.npy(table));
        Map<String, Map<String, Object>> settings = new LinkedHashMap<>(ways().get("delays"));
        Map<String, Object> preparation = new LinkedHashMap<>(settings.get("snapshot-builder"));
        preparation.putAll(Map.of("run-column", "column1", "time-column", "column2"));
        settings.put("snapshot-builder", preparation);
        return new RecordingLine(folder, "t.npy", settings).run(LINE);
    }

    @Test
    void aForecastThatWouldFillTheMemoryIsRefused() throws IOException {
        Files.writeString(folder.resolve("t.csv"), HostileRecordings.sound().get("ordinary"));
        Map<String, Map<String, Object>> settings = new LinkedHashMap<>(ways().get("linear"));
        settings.put("forecast", Map.of("horizon", 1e9));
        RecordingLine.Outcome outcome = new RecordingLine(folder, "t.csv", settings).run(LINE);
        assertEquals("forecast horizon: 1000000000 steps of 6 runs and 2 channels are 1.20e+10 rows; choose a shorter horizon, fewer runs or fewer channels.",
                outcome.sentence());
    }
}
