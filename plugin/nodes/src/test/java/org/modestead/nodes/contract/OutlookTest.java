package org.modestead.nodes.contract;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.modestead.engine.Progress;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.fit.KernelChooserNode;
import org.modestead.nodes.forecast.BacktestNode;
import org.modestead.nodes.forecast.ForecastNode;
import org.modestead.nodes.judge.SpectrumExtractorNode;
import org.modestead.nodes.prepare.SnapshotBuilderNode;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.testing.Ringing;
import org.modestead.nodes.testing.Steps;

/** What nodes tell of their outputs before they run is what comes out. */
class OutlookTest {

    private static Expected expect(Node node, Expected inputs, Map<String, Object> raw) {
        Settings settings = SettingsReader.read(node, raw).settings().orElseThrow();
        return node.expect(inputs, settings, new RunContext(Progress.NONE, Path.of("."), Path.of(".")));
    }

    private static Outlook snapshots(TableSchema schema, Map<String, Object> raw) {
        return expect(new SnapshotBuilderNode(), new Expected(Map.of("table", schema), Map.of()), raw).values().get("snapshots");
    }

    @Test
    void theSnapshotBuilderForeseesItsRecording() {
        Table table = Ringing.numbers(5);
        Map<String, Object> raw = Map.of("time-column", "time", "run-column", "run", "time-unit", "s");
        Object made = Steps.run("snapshot-builder", Map.of("table", table), raw).outputs().get("snapshots");
        assertEquals(Outlook.of(made), Optional.of(snapshots(table.schema(), raw)));
        assertEquals(List.of(new Channel("x", "bar"), new Channel("y", "m")), snapshots(table.schema(), raw).channels());
    }

    @Test
    void theKindOfTimesWrittenAsTextIsForeseenByNobody() {
        TableSchema schema = TableSchema.of(Column.text("t"), Column.number("flow [l/s]"));
        Outlook outlook = snapshots(schema, Map.of("time-column", "t"));
        assertEquals(new Outlook(List.of(new Channel("flow", "l/s")), List.of(), Optional.empty()), outlook);
    }

    @Test
    void aKernelIsForeseenAsFarAsItDoesNotDependOnTheData() {
        Outlook recording = new Outlook(List.of(new Channel("x", "m")), List.of(), Optional.empty());
        Expected inputs = new Expected(Map.of(), Map.of("snapshots", recording));
        assertEquals(recording.withKernel("Polynomial (degree 3, offset 1)"), expect(new KernelChooserNode(), inputs,
                Map.of("family", "polynomial", "degree", 3)).values().get("kernel"));
        assertEquals(Optional.of("Gaussian, its length scale from the data"), expect(new KernelChooserNode(), inputs, Map.of("family", "gaussian"))
                .values().get("kernel").kernel());
        assertEquals(Optional.of("Gaussian (scale 0.8)"), expect(new KernelChooserNode(), inputs, Map.of("family", "gaussian", "scale-mode",
                "explicit", "scale", 0.8)).values().get("kernel").kernel());
        assertEquals(recording, expect(new KernelChooserNode(), inputs, Map.of("choose", "rank")).values().get("kernel"));
    }

    /** What is told before is what comes out. */
    @Test
    void aKernelThatWasForeseenIsTheOneThatComes() {
        Outlook foreseen = expect(new KernelChooserNode(), new Expected(Map.of(), Map.of()), Map.of("family", "linear")).values().get("kernel");
        Object snapshots = Steps.run("snapshot-builder", Map.of("table", Ringing.numbers(5)), Map.of("time-column", "time", "run-column", "run"))
                .outputs().get("snapshots");
        Object kernel = Steps.run("kernel-chooser", Map.of("snapshots", snapshots), Map.of("family", "linear")).outputs().get("kernel");
        assertEquals(foreseen, foreseen.completedBy(kernel));
    }

    @ParameterizedTest
    @EnumSource(TimeAxis.Kind.class)
    void forecastTablesHaveTheTimesOfTheRecording(TimeAxis.Kind kind) {
        CellType type = switch (kind) {
            case NUMBER -> CellType.DOUBLE;
            case DATE -> CellType.DATE;
            case DATE_TIME -> CellType.DATE_TIME;
        };
        Outlook outlook = new Outlook(List.of(new Channel("x", "")), List.of(), Optional.of(new TimeAxis(kind, "d")));
        Expected inputs = new Expected(Map.of(), Map.of("snapshots", outlook));
        Expected forecast = expect(new ForecastNode(), inputs, Map.of());
        assertEquals(new Column("time", type), forecast.tables().get("forecast").columns().get(1));
        assertEquals(new Column("time", type), forecast.tables().get("reconstruction").columns().get(1));
        assertEquals(new Column("origin", type), expect(new BacktestNode(), inputs, Map.of()).tables().get("errors").columns().get(2));
    }

    @Test
    void valuesDownstreamAreOfTheSameRecording() {
        Outlook outlook = new Outlook(List.of(new Channel("x", "m")), List.of(), Optional.empty());
        assertEquals(outlook, expect(new SpectrumExtractorNode(), new Expected(Map.of(), Map.of("operator", outlook)), Map.of())
                .values().get("spectrum"));
    }
}
