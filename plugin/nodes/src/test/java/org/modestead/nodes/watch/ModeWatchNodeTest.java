package org.modestead.nodes.watch;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.render.FigureRenderer;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.testing.Steps;

/** A model of stops that ring down at 1.5 Hz, and later stops: alike, or ringing 3 % lower from the thirteenth on. */
class ModeWatchNodeTest {

    private static final int SAMPLES = 60;
    private static final double STEP = 0.05;
    private static final Model MODEL = model();
    private static final Map<String, Object> QUICK = Map.of("window", 6, "window-replicates", 0);

    private static MemoryTable stops(String name, int count, int lowerFrom, long seed) {
        Random random = new Random(seed);
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("run"), Column.number("time"), Column.number("x [bar]"),
                Column.number("y [m]")), name);
        for (int run = 0; run < count; run++) {
            double omega = 2 * Math.PI * 1.5 * (run < lowerFrom ? 1 : 0.97) * (1 + 0.003 * random.nextGaussian());
            double phase = 2 * Math.PI * random.nextDouble();
            for (int k = 0; k < SAMPLES; k++) {
                double size = Math.exp(-0.03 * omega * k * STEP);
                rows.row(name + run, k * STEP, size * Math.cos(omega * k * STEP + phase) + 0.01 * random.nextGaussian(),
                        2 * size * Math.sin(omega * k * STEP + phase) + 0.02 * random.nextGaussian());
            }
        }
        return rows.build();
    }

    private static Object snapshots(MemoryTable table, Map<String, Object> more) {
        Map<String, Object> settings = new java.util.HashMap<>(Map.of("time-column", "time", "time-unit", "s", "run-column", "run"));
        settings.putAll(more);
        return Steps.run("snapshot-builder", Map.of("table", table), settings).outputs().get("snapshots");
    }

    private static Model model() {
        Object recorded = snapshots(stops("a", 30, 30, 1), Map.of("holdout", "run-share"));
        FittedOperator operator = (FittedOperator) Steps.run("operator-fitter", Map.of("snapshots", recorded), Map.of("rank-rule", "fixed",
                "rank", 2)).outputs().get("operator");
        Spectrum spectrum = (Spectrum) Steps.run("spectrum-extractor", Map.of("operator", operator), Map.of("intervals", "none")).outputs()
                .get("spectrum");
        Verdict verdict = (Verdict) Steps.run("wellposedness-checker", Map.of("snapshots", recorded, "operator", operator, "spectrum", spectrum),
                Map.of()).outputs().get("verdict");
        return new Model("stops", "", operator, spectrum, verdict);
    }

    private static NodeResult watch(MemoryTable table, Map<String, Object> settings) {
        return Steps.run("mode-watch", Map.of("model", MODEL, "snapshots", snapshots(table, Map.of())), settings);
    }

    @Test
    void aChangeIsOneRowOfTheAlarmTableAndASentence() {
        NodeResult result = watch(stops("b", 24, 12, 2), QUICK);
        assertEquals(List.of("frequency"), Steps.column(result, "alarms", "kind"), Steps.texts(result, "alarms").toString());
        // two stops of 3 s a window: the thirteenth stop begins window 7, and two windows alarm from zero
        assertTrue(List.of("7", "8").contains(Steps.column(result, "alarms", "first_window").get(0)));
        assertEquals("true", Steps.column(result, "alarms", "ongoing").get(0));
        // 0.3 % from stop to stop, 12 stops after and 30 before
        assertEquals(-0.03, Steps.number(result, "alarms", "change", 0), 0.004);
        String message = Steps.column(result, "alarms", "message").get(0);
        assertTrue(message.startsWith("Mode 1 (1.5") && message.contains("frequency lower by 3.") && message.contains("since window 7 (0 s)")
                || message.contains("frequency lower by 2.9 %"), message);
        assertTrue(result.summary().contains(message), result.summary().toString());
    }

    @Test
    void nothingIsSaidToHaveChangedWhereNothingHas() {
        NodeResult result = watch(stops("c", 24, 24, 3), QUICK);
        assertEquals(List.of(), Steps.texts(result, "alarms"));
        assertTrue(result.summary().stream().anyMatch(sentence -> sentence.startsWith("No alarm")), result.summary().toString());
        assertEquals(12, Steps.texts(result, "watch").size());
        assertTrue(Steps.column(result, "watch", "alarm").stream().allMatch(String::isEmpty));
        assertEquals(List.of("frequency", "damping", "shape"), Steps.column(result, "limits", "quantity"));
        // 1.5 Hz for 6 s
        assertEquals(9, Steps.number(result, "limits", "cycles", 0), 0.1);
        assertTrue(result.doubts().stream().map(Doubt::code).toList().contains("short-windows"));
    }

    @Test
    void picturesShowLimitsAverageAndAlarmsAndCanBeDrawn() {
        List<Figure> figures = watch(stops("b", 24, 12, 2), QUICK).figures();
        assertEquals(List.of("watch-frequency-1", "watch-scores-1"), figures.stream().map(Figure::id).toList());
        List<String> names = figures.get(0).layers().stream().map(Figure.Layer::name).toList();
        assertEquals(List.of("limits of the average", "centre", "moving average", "window", "window in alarm"), names);
        // stops begin at time 0 each: windows are counted
        assertEquals("window", figures.get(0).x().label());
        figures.forEach(figure -> assertTrue(FigureRenderer.svg(figure).contains("<svg"), figure.id()));
    }

    @Test
    void whatDoesNotSuitTheModelIsToldBeforeRunning() {
        Outlook model = Outlook.of(MODEL).orElseThrow();
        ModeWatchNode node = new ModeWatchNode();
        RunContext context = new RunContext(Progress.NONE, Path.of("."), Path.of("."));
        Outlook other = new Outlook(List.of(new Channel("x", "bar")), List.of(), Optional.of(new TimeAxis(TimeAxis.Kind.NUMBER, "s")));
        assertThrows(RecordingFault.class, () -> node.expect(new Expected(Map.of(), Map.of("model", model, "snapshots", other)),
                SettingsReader.read(node, Map.of()).settings().orElseThrow(), context));
        Expected told = node.expect(new Expected(Map.of(), Map.of("model", model, "snapshots", model)),
                SettingsReader.read(node, Map.of()).settings().orElseThrow(), context);
        NodeResult result = watch(stops("c", 8, 8, 3), QUICK);
        Stream.of("watch", "alarms").forEach(port -> assertEquals(told.tables().get(port),
                ((MemoryTable) result.outputs().get(port)).schema(), port));
    }

    @Test
    void aFewResampledFitsOfAWindowAreRefusedWithWhatWouldBeRight() {
        assertEquals("window-replicates", Steps.check("mode-watch", Map.of("window-replicates", 5)).get(0).key());
        assertEquals(List.of(), Steps.check("mode-watch", Map.of("window-replicates", 20)));
    }
}
