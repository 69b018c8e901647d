package org.modestead.nodes.fit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.Cancelled;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.engine.moments.Moments;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.Snapshots;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.model.MomentsReaderNode;
import org.modestead.nodes.modelfile.MomentFiles;
import org.modestead.nodes.prepare.RecordingRows;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.testing.Steps;

/** The Streaming Fit gives what Snapshot Builder and Operator Fitter give together, and a file of its sums gives it once more. */
class StreamingFitNodeTest {

    private static final Map<String, Object> COLUMNS = Map.of("time-column", "time", "run-column", "run", "time-unit", "s");
    private static final Map<String, Object> APART = Map.of("holdout", "runs", "holdout-runs", List.of("run 2"));

    @TempDir
    Path folder;

    /** Four runs of a noisy swing of a pendulum, seen by its angle and its speed, 900 rows each. */
    private static MemoryTable swings() {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("run"), Column.number("time"), Column.number("angle [rad]"),
                Column.number("speed [rad/s]")), "swings");
        Random random = new Random(6);
        for (int run = 0; run < 4; run++) {
            double angle = 0.5 + 0.4 * run;
            double speed = 0;
            for (int k = 0; k < 900; k++) {
                rows.row("run " + run, 0.1 * k, angle, speed);
                for (int part = 0; part < 10; part++) {
                    speed -= 0.01 * (Math.sin(angle) + 0.02 * speed);
                    angle += 0.01 * speed;
                }
                speed += 0.02 * random.nextGaussian();
            }
        }
        return rows.build();
    }

    private static NodeResult run(Node node, Map<String, Object> inputs, Map<String, Object> raw, Progress progress, Path folder) {
        SettingsReader.Reading reading = SettingsReader.read(node, raw);
        assertEquals(List.of(), reading.problems());
        return node.run(new NodeInputs(inputs), reading.settings().orElseThrow(), new RunContext(progress, folder, folder));
    }

    private NodeResult stream(Map<String, Object> raw, Progress progress) {
        Map<String, Object> all = new HashMap<>(COLUMNS);
        all.putAll(APART);
        all.putAll(raw);
        return run(new StreamingFitNode(), Map.of("table", swings()), all, progress, folder);
    }

    @ParameterizedTest
    @CsvSource({"linear, 6", "monomials, 10"})
    void figuresAreThoseOfTheNodesInMemory(String functions, int rank) {
        Map<String, Object> prepared = Map.of("detrend", "mean", "scaling", "std", "delay-depth", functions.equals("linear") ? 8 : 1);
        Map<String, Object> building = new HashMap<>(COLUMNS);
        building.putAll(prepared);
        building.putAll(APART);
        Object snapshots = Steps.run("snapshot-builder", Map.of("table", swings()), building).outputs().get("snapshots");
        FittedOperator there = (FittedOperator) Steps.run("operator-fitter", Map.of("snapshots", snapshots), functions.equals("linear")
                ? Map.of("rank-rule", "fixed", "rank", rank)
                : Map.of("estimator", "dictionary", "degree", 3, "rank-rule", "fixed", "rank", rank)).outputs().get("operator");
        Map<String, Object> streaming = new HashMap<>(prepared);
        streaming.putAll(Map.of("functions", functions, "degree", 3, "rank-rule", "fixed", "rank", rank));
        NodeResult result = stream(streaming, Progress.NONE);
        FittedOperator here = (FittedOperator) result.outputs().get("operator");
        requireSame(there, here);
        Snapshots kept = (Snapshots) result.outputs().get("snapshots");
        assertEquals(3, kept.training().size());
        assertEquals("run 2", kept.holdout().get(0).id());
        assertTrue(result.summary().get(1).startsWith("3600 rows of 4 runs were read; 2700 samples gave"), result.summary().toString());
    }

    /** The map from functions to the next state does not depend on signs of the functions; rounding of 2700 rows. */
    private static void requireSame(FittedOperator there, FittedOperator here) {
        DMatrixRMaj expected = next(there.chosen());
        DMatrixRMaj found = next(here.chosen());
        for (int i = 0; i < expected.getNumElements(); i++) {
            assertEquals(expected.data[i], found.data[i], 1e-10, "entry " + i);
        }
    }

    private static DMatrixRMaj next(OrthonormalCompression c) {
        return Matrices.product(c.map(), Matrices.product(c.action(), c.observable()));
    }

    @ParameterizedTest
    @CsvSource({"random-waves", "landmarks"})
    void aKernelWithoutScaleTakesTheMedianDistance(String functions) {
        NodeResult result = stream(Map.of("functions", functions, "scaling", "std", "waves", 40, "landmarks", 60, "rank-rule", "fixed", "rank", 25),
                Progress.NONE);
        FittedOperator operator = (FittedOperator) result.outputs().get("operator");
        assertTrue(operator.method().contains("Gaussian (scale "), operator.method());
        assertEquals(25, operator.rank());
    }

    @Test
    void sumsInAFileGiveTheSameFitBitForBit() throws IOException {
        RecordingRows rows = RecordingRows.of(swings(), "time", "s", "run", List.of(), Map.of());
        Map<String, Object> raw = new HashMap<>(COLUMNS);
        raw.putAll(APART);
        raw.putAll(Map.of("delay-depth", 3, "rank-rule", "fixed", "rank", 5));
        StreamedRows streamed = StreamedRows.of(rows, 4, Progress.NONE);
        Moments moments = streamed.moments(StreamSettings.plan(SettingsReader.read(new StreamingFitNode(), raw).settings().orElseThrow(), rows.channels(),
                rows.axis(), 1), Progress.NONE);
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        MomentFiles.write(moments, bytes);
        assertEquals(moments.counts(), MomentFiles.read(new ByteArrayInputStream(bytes.toByteArray())).counts());
        Files.write(folder.resolve("sums.zip"), bytes.toByteArray());
        FittedOperator read = (FittedOperator) run(new MomentsReaderNode(), Map.of(), Map.of("file", "sums.zip", "rank-rule", "fixed", "rank", 5),
                Progress.NONE, folder).outputs().get("operator");
        FittedOperator direct = (FittedOperator) stream(Map.of("delay-depth", 3, "rank-rule", "fixed", "rank", 5), Progress.NONE).outputs()
                .get("operator");
        for (int i = 0; i < 25; i++) {
            assertEquals(direct.chosen().action().data[i], read.chosen().action().data[i], 0);
        }
        Files.write(folder.resolve("cut.zip"), java.util.Arrays.copyOf(bytes.toByteArray(), bytes.size() / 2));
        assertThrows(ModelFileFault.class, () -> run(new MomentsReaderNode(), Map.of(), Map.of("file", "cut.zip"), Progress.NONE, folder));
    }

    @Test
    void rowsOutOfOrderAreRefusedWithTheRemedy() {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("run"), Column.number("time"), Column.number("level")), "mixed");
        for (int k = 0; k < 40; k++) {
            rows.row(k / 10 % 2 == 0 ? "a" : "b", (double) k, Math.sin(k));
        }
        Fault fault = assertThrows(RecordingFault.class, () -> run(new StreamingFitNode(), Map.of("table", rows.build()), COLUMNS, Progress.NONE,
                folder));
        assertTrue(fault.getMessage().contains("ORDER BY"), fault.getMessage());
    }

    @Test
    void aPassCanBeStopped() {
        int[] asked = new int[1];
        Progress stopping = new Progress() {
            @Override
            public void report(double fraction, String message) {
                assertTrue(fraction >= 0 && fraction <= 1);
            }

            @Override
            public void checkCancelled() {
                if (++asked[0] > 1) {
                    throw new Cancelled("stopped by the test");
                }
            }
        };
        assertThrows(Cancelled.class, () -> stream(Map.of(), stopping));
    }
}
