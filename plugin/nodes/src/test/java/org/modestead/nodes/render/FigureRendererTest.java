package org.modestead.nodes.render;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertDoesNotThrow;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.StringReader;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;
import javax.imageio.ImageIO;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.wellposed.Grade;
import org.modestead.nodes.figure.EigenvaluePlane;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.figure.ForecastFigures;
import org.modestead.nodes.figure.LadderFigures;
import org.modestead.nodes.figure.RecordingFigure;
import org.modestead.nodes.figure.ScoreFigures;
import org.modestead.nodes.figure.ShapeFigures;
import org.modestead.nodes.report.ReportFixture;
import org.modestead.nodes.words.TimeUnit;
import org.w3c.dom.Document;
import org.xml.sax.InputSource;

class FigureRendererTest {

    static List<Figure> figures() {
        Snapshots snapshots = ReportFixture.snapshots();
        List<Figure> figures = new ArrayList<>();
        figures.add(EigenvaluePlane.figure(ReportFixture.spectrum(), Optional.of(ReportFixture.verdict(Grade.STANDS))));
        figures.add(RecordingFigure.figure(snapshots, 2));
        figures.add(RecordingFigure.figure(ReportFixture.snapshots(snapshots.channels(),
                new TimeAxis(TimeAxis.Kind.DATE_TIME, "s"), 1.4e9, 3600), 2));
        figures.addAll(ShapeFigures.figures(ReportFixture.spectrum(), Preparation.identity(2), 1));
        figures.addAll(LadderFigures.figures(ReportFixture.spectrum(), ReportFixture.verdict(Grade.ABSENT)));
        figures.addAll(ForecastFigures.figures(snapshots, ReportFixture.forecast(snapshots), 1));
        figures.add(ScoreFigures.figure(ReportFixture.forecast(snapshots).scores(), new TimeUnit("s")));
        figures.add(curves(Figure.Axis.log("nothing"), List.of()));
        figures.add(marks());
        return figures;
    }

    @ParameterizedTest
    @MethodSource("figures")
    void svgIsWellFormedSpeaksAndRefersToNothingOutside(Figure figure) throws Exception {
        String svg = FigureRenderer.svg(figure);
        Document parsed = DocumentBuilderFactory.newInstance().newDocumentBuilder()
                .parse(new InputSource(new StringReader(svg)));
        assertEquals("svg", parsed.getDocumentElement().getTagName());
        assertTrue(parsed.getDocumentElement().getAttribute("aria-label").endsWith(figure.caption()));
        assertFalse(svg.contains("href") || svg.contains("<!DOCTYPE") || svg.contains("<?xml"));
        assertFalse(svg.replace("xmlns=\"http://www.w3.org/2000/svg\"", "").contains("http"));
    }

    @ParameterizedTest
    @MethodSource("figures")
    void theSameFigureGivesTheSameBytes(Figure figure) {
        assertEquals(FigureRenderer.svg(figure), FigureRenderer.svg(figure));
        assertArrayEquals(FigureRenderer.png(figure, 1), FigureRenderer.png(figure, 1));
    }

    @Test
    void idsStartWithTheFiguresIdSoThatManyFitOnOnePage() {
        Figure figure = figures().get(1);
        String svg = FigureRenderer.svg(figure);
        List<String> ids = Pattern.compile(" id=\"([^\"]*)\"").matcher(svg).results().map(m -> m.group(1))
                .toList();
        assertFalse(ids.isEmpty());
        assertTrue(ids.stream().allMatch(id -> id.startsWith(figure.id() + "-")));
        assertTrue(Pattern.compile("url\\(#([^)]*)\\)").matcher(svg).results()
                .allMatch(m -> ids.contains(m.group(1))));
    }

    @Test
    void pixelsFollowTheScale() throws IOException {
        Figure figure = figures().get(0);
        BufferedImage once = ImageIO.read(new ByteArrayInputStream(FigureRenderer.png(figure, 1)));
        BufferedImage twice = ImageIO.read(new ByteArrayInputStream(FigureRenderer.png(figure, 2)));
        assertEquals(2 * once.getWidth(), twice.getWidth());
        assertEquals(2 * once.getHeight(), twice.getHeight());
        assertThrows(IllegalArgumentException.class, () -> FigureRenderer.png(figure, 0));
    }

    /** Marks over a backdrop with an axis of its own. */
    private static Figure marks() {
        double[] x = {0, 1, 2};
        return new Figure("marks", Figure.Kind.MARKS, "Marks", "What they show.", Figure.Axis.linear("x"), Figure.Axis.linear("y"),
                Optional.of(Figure.Axis.linear("behind")), List.of(new Figure.Points("seen", "", x, x, List.of("", "a label at the edge", ""),
                Figure.Emphasis.STRONG, Figure.Mark.TRIANGLE), new Figure.Backdrop("power", "", x, new double[] {-300, Double.NaN, 900})));
    }

    @Test
    void aBackdropHasItsOwnScaleAndNeedsItsAxis() {
        Figure figure = marks();
        assertEquals(2.1, Range.y(figure).high(), 1e-12, "the marks alone scale the left axis");
        assertEquals(960, Range.right(figure, figure.right().orElseThrow()).high(), 1e-12);
        Figure without = new Figure(figure.id(), figure.kind(), "Marks", "What.", figure.x(), figure.y(), figure.layers());
        assertThrows(IllegalArgumentException.class, () -> FigureRenderer.svg(without));
    }

    @Test
    void textFromDataIsEscaped() {
        Figure figure = new Figure("x", Figure.Kind.CURVES, "<script>alert(1)</script>", "\"&<", Figure.Axis.linear("<x>"),
                Figure.Axis.linear("y"), List.of());
        String svg = FigureRenderer.svg(figure);
        assertFalse(svg.contains("<script"));
        assertTrue(svg.contains("&lt;script&gt;"));
    }

    @Test
    void aLineOfManyPointsIsOnePathSoThatDashesRunThrough() {
        double[] x = new double[500];
        Arrays.setAll(x, i -> i);
        String with = FigureRenderer.svg(curves(Figure.Axis.linear("y"), List.of(line(x, x))));
        assertFalse(with.contains("<line"));
        assertTrue(Pattern.compile("<path[^>]*( L[^ ]*){499}").matcher(with).find());
    }

    @Test
    void gapsInfinitiesAndSinglePointsAreDrawnWithoutComplaint() {
        double[] x = {0, 1, 2, 3};
        double[] broken = {1, Double.NaN, Double.POSITIVE_INFINITY, 0};
        Figure.Band band = new Figure.Band("band", "", x, new double[] {0, Double.NaN, 1, 1}, new double[] {1, 2, 2, 2});
        for (Figure.Axis axis : List.of(Figure.Axis.linear("y"), Figure.Axis.log("y"))) {
            assertDoesNotThrow(() -> FigureRenderer.svg(curves(axis, List.of(band, line(x, broken)))));
            assertDoesNotThrow(() -> FigureRenderer.svg(curves(axis, List.of(line(new double[] {1}, new double[] {1})))));
            assertDoesNotThrow(() -> FigureRenderer.svg(curves(axis, List.of(line(x, new double[] {-1, -1, -1, -1})))));
        }
    }

    @Test
    void everyNameOfACrowdedAxisFindsItsPlaceBelowThePlot() {
        List<String> names = List.of("suction_pressure", "discharge_pressure", "flow", "sump_level", "motor_current",
                "bearing_vibration");
        Figure level = bars(List.of("a", "b", "c", "d", "e", "f"));
        Figure crowded = bars(names);
        assertTrue(SlantedLabels.NONE.height() == 0 && new SlantedLabels(names, "channel", x -> x).height() > 40);
        assertFalse(FigureRenderer.svg(level).contains("viewBox=\"" + viewBox(crowded) + "\""));
    }

    @Test
    void ticksAreWrittenWithoutTheErrorsOfStepping() {
        assertEquals("0.3", HouseStyle.tick(0.1 + 0.2));
        assertEquals("\u22120.05", HouseStyle.tick(-0.05));
        assertEquals("100000", HouseStyle.tick(1e5));
        assertEquals("1 \u00d7 10\u2076", HouseStyle.tick(1e6));
        assertEquals("0.0001", HouseStyle.tick(1e-4));
        assertEquals("1.5 \u00d7 10\u207b\u2077", HouseStyle.tick(1.5e-7));
        assertEquals("0", HouseStyle.tick(-0.0));
    }

    @Test
    void barsWithoutCategoriesAreRefused() {
        Figure figure = curves(Figure.Axis.linear("y"), List.of(new Figure.Bars("", "", new double[] {1})));
        assertThrows(IllegalArgumentException.class, () -> FigureRenderer.svg(figure));
    }

    private static Figure.Line line(double[] x, double[] y) {
        return new Figure.Line("line", "", x, y, Figure.Emphasis.NORMAL);
    }

    private static Figure curves(Figure.Axis y, List<Figure.Layer> layers) {
        return new Figure("curves", Figure.Kind.CURVES, "Curves", "What they show.", Figure.Axis.linear("x"), y, layers);
    }

    private static Figure bars(List<String> names) {
        double[] heights = new double[names.size()];
        Arrays.fill(heights, 1);
        return new Figure("bars", Figure.Kind.SHAPES, "Bars", "How high.", Figure.Axis.categories("channel", names),
                Figure.Axis.linear("height"), List.of(new Figure.Bars("", "", heights)));
    }

    private static String viewBox(Figure figure) {
        String svg = FigureRenderer.svg(figure);
        int from = svg.indexOf("viewBox=\"") + "viewBox=\"".length();
        return svg.substring(from, svg.indexOf('"', from));
    }

    @Test
    void aCurveThatHardlyChangesLooksLevelAndATimeSeriesKeepsItsRange() {
        double[] rank = {1, 2, 3};
        Figure.Layer line = new Figure.Line("mode 1", "", rank, new double[] {1, 1 + 1e-6, 1}, Figure.Emphasis.STRONG);
        Figure curve = new Figure("a", Figure.Kind.CURVES, "", "", Figure.Axis.linear("rank"), Figure.Axis.linear("frequency"), List.of(line));
        // two per cent of the value with a margin of a twentieth on either side
        assertEquals(0.022, Range.y(curve).high() - Range.y(curve).low(), 1e-6);
        Figure series = new Figure("a", Figure.Kind.TIME_SERIES, "", "", Figure.Axis.linear("time"), Figure.Axis.linear("value"), List.of(line));
        assertEquals(1.1e-6, Range.y(series).high() - Range.y(series).low(), 1e-12);
    }
}
