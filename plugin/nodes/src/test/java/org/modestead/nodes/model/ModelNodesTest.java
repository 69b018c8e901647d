package org.modestead.nodes.model;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.ejml.data.ZMatrixRMaj;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.engine.Cancelled;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.testing.Ringing;
import org.modestead.nodes.testing.Steps;

/** Fit once, write, read elsewhere, and go on with recordings that the fit never saw. */
class ModelNodesTest {

    private static final Map<String, Object> PREPARED = Map.of("time-column", "time", "run-column", "run", "time-unit", "s", "scaling", "std",
            "detrend", "mean", "delay-depth", 2, "holdout", "run-share", "holdout-run-share", 0.2, "calibration", "run-share",
            "calibration-run-share", 0.2);
    private static final Map<String, Object> PLAIN = Map.of("time-column", "time", "run-column", "run", "time-unit", "s");

    @TempDir
    static Path folder;
    private static Map<String, Object> fitted;

    @BeforeAll
    static void fitOnce() {
        fitted = new HashMap<>();
        fitted.put("snapshots", snapshots(Ringing.numbers(6), PREPARED));
        fitted.put("operator", Steps.run("operator-fitter", Map.of("snapshots", fitted.get("snapshots")),
                Map.of("rank-rule", "fixed", "rank", 3)).outputs().get("operator"));
        fitted.put("spectrum", Steps.run("spectrum-extractor", Map.of("operator", fitted.get("operator")), Map.of()).outputs().get("spectrum"));
        fitted.put("verdict", Steps.run("wellposedness-checker", fitted, Map.of()).outputs().get("verdict"));
    }

    private static Object snapshots(Table table, Map<String, Object> settings) {
        return Steps.run("snapshot-builder", Map.of("table", table), settings).outputs().get("snapshots");
    }

    private static NodeResult write(Path file) {
        Map<String, Object> parts = new HashMap<>(fitted);
        parts.remove("snapshots");
        return Steps.run("model-writer", parts, Map.of("file", file.toString(), "name", "test bench", "notes", "Two sensors."));
    }

    private static NodeResult read(Path file) {
        return Steps.run("model-reader", Map.of(), Map.of("file", file.toString()));
    }

    private static NodeResult applied(Object model, Object fresh) {
        return Steps.run("model-applier", Map.of("model", model, "snapshots", fresh), Map.of());
    }

    private static Object model() {
        return write(folder.resolve("shared.zip")).outputs().get("model");
    }

    @Test
    void aModelReadBackForecastsWhatTheFitForecasts() throws IOException {
        Path file = folder.resolve("deep/er/model.zip");
        write(file);
        NodeResult read = read(file);
        assertTrue(read.summary().get(0).startsWith("The model \"test bench\" is a linear least squares in delay coordinates of rank 3 on 2 channels"),
                read.summary().get(0));
        assertEquals("Two sensors.", read.summary().get(2));
        assertTrue(Steps.texts(read, "facts").contains(List.of("time unit", "s")), Steps.texts(read, "facts").toString());
        NodeResult own = Steps.run("model-applier", Map.of("model", read.outputs().get("model")), Map.of());
        Map<String, Object> settings = Map.of("horizon", 1, "route", "modal");
        assertEquals(Steps.texts(Steps.run("forecast", fitted, settings), "forecast"),
                Steps.texts(Steps.run("forecast", own.outputs(), settings), "forecast"));
        try (Stream<Path> left = Files.list(file.getParent())) {
            assertEquals(List.of(file), left.toList(), "no part is left behind");
        }
    }

    /** Runs 6 and 7 start at other phases; noise-free, so the modes of runs 0 to 3 and the mean forecast them to rounding. */
    @Test
    void newRecordingsAreForecastWithoutFitting() {
        NodeResult applied = applied(model(), snapshots(laterRuns(), PLAIN));
        Snapshots now = (Snapshots) applied.outputs().get("snapshots");
        assertEquals(List.of("r6", "r0 (new)"), now.holdout().stream().map(run -> run.id()).toList());
        Map<String, Object> inputs = new HashMap<>(applied.outputs());
        NodeResult forecast = Steps.run("forecast", inputs, Map.of("origin", "before-holdout", "route", "modal", "horizon", 1));
        assertTrue(Steps.column(forecast, "forecast", "run").contains("r6"));
        int row = Steps.column(forecast, "scores", "method").indexOf("modal");
        assertEquals(0, Steps.number(forecast, "scores", "rmse", row), 1e-9);
        NodeResult judged = Steps.run("wellposedness-checker", inputs, Map.of());
        assertEquals(Steps.column(Steps.run("wellposedness-checker", fitted, Map.of()), "modes", "verdict"), Steps.column(judged, "modes",
                "verdict"));
    }

    /** The order of channels, other columns, preparation and split of the new recordings do not matter. */
    @Test
    void newRecordingsArePreparedAsThoseOfTheModel() {
        Snapshots plain = (Snapshots) applied(model(), snapshots(laterRuns(), PLAIN)).outputs().get("snapshots");
        Map<String, Object> otherwise = new HashMap<>(PREPARED);
        otherwise.put("delay-depth", 3);
        otherwise.put("holdout", "tail-share");
        otherwise.put("calibration", "tail-share");
        Snapshots other = (Snapshots) applied(model(), snapshots(swapped(laterRuns()), otherwise)).outputs().get("snapshots");
        assertEquals(plain.channels(), other.channels());
        assertEquals(plain.holdout().size(), other.holdout().size());
        for (int i = 0; i < plain.holdout().size(); i++) {
            assertArrayEquals(plain.holdout().get(i).times(), other.holdout().get(i).times());
            assertArrayEquals(plain.holdout().get(i).values().data, other.holdout().get(i).values().data, 1e-12);
        }
        assertEquals(2, plain.delay().depth());
        assertArrayEquals(((Snapshots) fitted.get("snapshots")).preparation().scale(), plain.preparation().scale());
    }

    private static MemoryTable laterRuns() {
        return table("run", "time", "x [bar]", "y [m]", 1, 0.05);
    }

    private static MemoryTable table(String run, String time, String x, String y, double size, double step) {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text(run), Column.number(time), Column.number(x), Column.number(y)),
                "later");
        for (List<String> row : Steps.texts(Ringing.numbers(8))) {
            if (row.get(0).equals("r6") || row.get(0).equals("r7")) {
                rows.row(row.get(0).equals("r7") ? "r0" : "r6", Double.parseDouble(row.get(1)) / Ringing.STEP * step,
                        size * Double.parseDouble(row.get(2)), size * Double.parseDouble(row.get(3)));
            }
        }
        return rows.build();
    }

    private static MemoryTable swapped(MemoryTable table) {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("run"), Column.number("time"), Column.number("z"),
                Column.number("y [m]"), Column.number("x [bar]")), "swapped");
        double z = 0;
        for (List<String> row : Steps.texts(table)) {
            rows.row(row.get(0), Double.parseDouble(row.get(1)), Math.sin(z++), Double.parseDouble(row.get(3)), Double.parseDouble(row.get(2)));
        }
        return rows.build();
    }

    @Test
    void recordingsThatDoNotSuitAreRefusedWithWhatWouldBeRight() {
        assertEquals("new recording: it has no channel y; bring every channel of the model: x [bar], y [m].",
                refused(table("run", "time", "x [bar]", "w [m]", 1, 0.05), PLAIN));
        assertEquals("channel y: it is recorded in mm, in the model in m; convert it before.",
                refused(table("run", "time", "x [bar]", "y [mm]", 1, 0.05), PLAIN));
        assertEquals("new recording: its step is 0.1 s; resample it to the step of the model, 0.05 s.",
                refused(table("run", "time", "x [bar]", "y [m]", 1, 0.1), PLAIN));
        assertEquals("new recording: its times are numbers in min, those of the model numbers in s; give them alike, and count them in the same unit.",
                refused(laterRuns(), Map.of("time-column", "time", "run-column", "run", "time-unit", "min")));
    }

    private static String refused(MemoryTable table, Map<String, Object> settings) {
        return assertThrows(RecordingFault.class, () -> applied(model(), snapshots(table, settings))).getMessage();
    }

    @Test
    void whatDoesNotSuitIsToldBeforeAnythingRuns() {
        Path file = folder.resolve("early.zip");
        write(file);
        RunContext context = new RunContext(Progress.NONE, folder, folder);
        Outlook model = new ModelReaderNode().expect(new Expected(Map.of(), Map.of()), new Settings(Map.of("file", "early.zip")), context).values()
                .get("model");
        assertEquals(Outlook.of(fitted.get("snapshots")).orElseThrow(), model);
        Outlook same = Outlook.of(snapshots(laterRuns(), PLAIN)).orElseThrow();
        Outlook other = Outlook.of(snapshots(table("run", "time", "x [bar]", "w [m]", 1, 0.05), PLAIN)).orElseThrow();
        Node applier = new ModelApplierNode();
        assertEquals(model, applier.expect(new Expected(Map.of(), Map.of("model", model, "snapshots", same)), new Settings(Map.of()), context).values()
                .get("spectrum"));
        assertThrows(RecordingFault.class, () -> applier.expect(new Expected(Map.of(), Map.of("model", model, "snapshots", other)),
                new Settings(Map.of()), context));
        assertEquals(Map.of(), applier.expect(new Expected(Map.of(), Map.of()), new Settings(Map.of()), context).values());
    }

    @Test
    void recordingsOutsideTheRangeOfTheFitAreDoubted() {
        NodeResult far = applied(model(), snapshots(table("run", "time", "x [bar]", "y [m]", 3, 0.05), PLAIN));
        assertTrue(far.doubts().stream().anyMatch(doubt -> doubt.code().equals("beyond-training")), far.doubts().toString());
        assertFalse(applied(model(), snapshots(laterRuns(), PLAIN)).doubts().stream().anyMatch(doubt -> doubt.code().equals("beyond-training")));
    }

    @Test
    void partsOfDifferentFitsAreNoModel() {
        Object other = Steps.run("operator-fitter", Map.of("snapshots", fitted.get("snapshots")), Map.of("rank-rule", "fixed", "rank", 2))
                .outputs().get("operator");
        Map<String, Object> parts = Map.of("operator", other, "spectrum", fitted.get("spectrum"), "verdict", fitted.get("verdict"));
        FitFault fault = assertThrows(FitFault.class, () -> Steps.run("model-writer", parts, Map.of("file", folder.resolve("no.zip").toString())));
        assertEquals("model: the spectrum (rank 3, 2 channels) is not that of the operator (rank 2, 2 channels); extract the spectrum from this"
                + " operator.", fault.getMessage());
        assertFalse(Files.exists(folder.resolve("no.zip")));
    }

    @Test
    void readingAndWritingCanBeStoppedAndLeaveNothingHalfDone() throws IOException {
        Path file = folder.resolve("stopped/model.zip");
        Model model = (Model) model();
        assertThrows(Cancelled.class, () -> new ModelPath(file, "model.zip").write(model, STOPPED));
        try (Stream<Path> left = Files.list(file.getParent())) {
            assertEquals(List.of(), left.toList());
        }
        assertThrows(Cancelled.class, () -> new ModelPath(folder.resolve("shared.zip"), "shared.zip").read(STOPPED));
    }

    /** Moving a file there would replace the device for everybody. */
    @Test
    void aPipeIsNeitherReadNorReplaced() throws Exception {
        Path pipe = folder.resolve("pipe.zip");
        assumeTrue(new ProcessBuilder("mkfifo", pipe.toString()).start().waitFor() == 0, "pipes can be made (POSIX)");
        ModelPath path = new ModelPath(pipe, "pipe.zip");
        String told = "pipe.zip: this is a device or a pipe, not an ordinary file; name an ordinary file.";
        assertEquals(told, assertThrows(ModelFileFault.class, () -> path.write((Model) model(), Progress.NONE)).getMessage());
        assertEquals(told, assertThrows(ModelFileFault.class, () -> path.read(Progress.NONE)).getMessage());
        assertTrue(Files.exists(pipe) && !Files.isRegularFile(pipe));
    }

    private static final Progress STOPPED = new Progress() {
        @Override
        public void report(double fraction, String message) {
            // nobody watches
        }

        @Override
        public void checkCancelled() {
            throw new Cancelled("stopped");
        }
    };

    @Test
    void filesThatAreNotThereOrBrokenAreNamed() throws IOException {
        Path broken = Files.write(folder.resolve("broken.zip"), new byte[] {'P', 'K', 3, 4, 0});
        ModelFileFault fault = assertThrows(ModelFileFault.class, () -> read(broken));
        assertTrue(fault.getMessage().startsWith(broken + ", model file: "), fault.getMessage());
        assertEquals(folder + ": this is a folder, not a file; name a file in it.",
                assertThrows(ModelFileFault.class, () -> read(folder)).getMessage());
        assertThrows(ModelFileFault.class, () -> read(folder.resolve("none.zip")));
        assertThrows(ModelFileFault.class, () -> write(broken.resolve("below/a/file.zip")));
    }

    private static NodeResult projected(Map<String, Object> inputs) {
        return Steps.run("model-applier", inputs, Map.of("coordinates", true));
    }

    private static Complex coordinate(List<String> row) {
        return new Complex(Double.parseDouble(row.get(3)), Double.parseDouble(row.get(4)));
    }

    /** The eigenfunctions that the eigenproblem itself gives, at the states of training, by the first index of each mode. */
    @Test
    void coordinatesOfTheTrainingAreThoseOfTheSpectrum() {
        Model model = (Model) model();
        List<List<String>> rows = Steps.texts(projected(Map.of("model", model)), "coordinates");
        Snapshots snapshots = model.operator().snapshots();
        ModalExpansion expansion = ModalExpansion.of(model.operator().chosen());
        int at = 0;
        for (StateRun run : snapshots.states(Snapshots.Part.TRAINING)) {
            ZMatrixRMaj values = expansion.eigenfunctions(run.states());
            for (int k = 0; k < run.count(); k++) {
                for (Mode mode : model.spectrum().modes()) {
                    List<String> row = rows.get(at++);
                    assertEquals(List.of(run.times()[k], (double) mode.number()), List.of(Double.parseDouble(row.get(1)), Double.parseDouble(row.get(2))));
                    Complex wanted = new Complex(values.getReal(k, mode.indices().get(0)), values.getImag(k, mode.indices().get(0)));
                    // the same products, and as many digits as a text of a double has
                    assertEquals(0, coordinate(row).minus(wanted).abs(), 1e-12);
                }
            }
        }
        assertTrue(at < rows.size(), "calibration and holdout of the model follow");
    }

    /** The recordings are noise-free sums of the modes, so each coordinate goes on at its rate to rounding. */
    @Test
    void coordinatesOfNewRecordingsGoOnAtTheRatesOfTheModel() {
        Model model = (Model) model();
        NodeResult applied = projected(Map.of("model", model, "snapshots", snapshots(laterRuns(), PLAIN)));
        List<List<String>> rows = Steps.texts(applied, "coordinates");
        int modes = model.spectrum().modes().size();
        double step = model.operator().snapshots().step().orElseThrow();
        int pairs = 0;
        for (int i = 0; i + modes < rows.size(); i++) {
            Mode mode = model.spectrum().modes().get(i % modes);
            assertEquals(Integer.toString(mode.number()), rows.get(i).get(2));
            if (rows.get(i).get(0).equals(rows.get(i + modes).get(0))) {
                Complex turned = coordinate(rows.get(i)).times(mode.rate().times(step).exp());
                assertEquals(0, coordinate(rows.get(i + modes)).minus(turned).abs(), 1e-9);
                pairs++;
            }
        }
        assertTrue(pairs > 20, pairs + " pairs");
        assertEquals(List.of("r6", "r0 (new)"), rows.stream().map(row -> row.get(0)).distinct().toList());
    }

    /** Prepared values are sums of joint weights times coordinates, twice the real part for a pair: what the forecast calls the reconstruction. */
    @Test
    void coordinatesAndJointWeightsRebuildTheRecording() {
        Model model = (Model) model();
        NodeResult applied = projected(Map.of("model", model, "snapshots", snapshots(laterRuns(), PLAIN)));
        List<List<String>> rows = Steps.texts(applied, "coordinates");
        List<List<String>> rebuilt = Steps.texts(Steps.run("forecast", new HashMap<>(applied.outputs()), Map.of("origin", "before-holdout", "horizon", 1)),
                "reconstruction").stream().filter(row -> row.get(0).equals("r6") && row.get(2).equals(model.spectrum().channels().get(0).name())).toList();
        int modes = model.spectrum().modes().size();
        for (int k = 0; k < rebuilt.size(); k++) {
            double prepared = 0;
            for (int m = 0; m < modes; m++) {
                Mode mode = model.spectrum().modes().get(m);
                prepared += (mode.indices().size() > 1 ? 2 : 1) * coordinate(rows.get(k * modes + m)).times(mode.weights().get(0)).re();
            }
            double time = Double.parseDouble(rebuilt.get(k).get(1));
            assertEquals(Double.parseDouble(rebuilt.get(k).get(4)), model.spectrum().preparation().restore(0, time, prepared), 1e-9);
        }
        assertTrue(rebuilt.size() > 20);
    }

    @Test
    void withoutTheSwitchThereAreNoCoordinates() {
        assertEquals(List.of(), Steps.texts(applied(model(), snapshots(laterRuns(), PLAIN)), "coordinates"));
    }
}
