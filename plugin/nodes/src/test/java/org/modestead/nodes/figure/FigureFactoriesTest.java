package org.modestead.nodes.figure;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.modestead.engine.choose.KernelVerdict;
import org.modestead.engine.choose.RankedKernel;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.kernel.ModeRoom;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.wellposed.Grade;
import org.modestead.nodes.report.ReportFixture;
import org.modestead.nodes.words.TimeUnit;

class FigureFactoriesTest {

    @Test
    void thePlaneMarksZeroGrowthAndLeavesOutWeakModesFarAwaySayingSo() {
        Figure plane = EigenvaluePlane.figure(ReportFixture.spectrum(), Optional.empty());
        assertTrue(plane.layers().stream().anyMatch(layer -> layer instanceof Figure.Rule rule && rule.vertical()
                && rule.at() == 0));
        assertEquals(List.of("mode:3", "mode:1", "mode:2"), plane.layers().stream().map(Figure.Layer::selection)
                .filter(key -> !key.isEmpty()).toList());
        assertTrue(plane.caption().contains("Left out: 2 modes"), plane.caption());
        assertEquals("growth rate [1/s]", plane.x().label());
        assertEquals("frequency [Hz]", plane.y().label());
    }

    @Test
    void theVerdictIsToldByTheShapeOfTheMark() {
        Figure plane = EigenvaluePlane.figure(ReportFixture.spectrum(), Optional.of(ReportFixture.verdict(Grade.STANDS)));
        List<Figure.Points> points = plane.layers().stream().filter(Figure.Points.class::isInstance)
                .map(Figure.Points.class::cast).toList();
        assertEquals(points.size(), points.stream().map(Figure.Points::mark).distinct().count());
        assertEquals(Grade.values().length, Arrays.stream(Grade.values()).map(VerdictMarks::mark).distinct().count());
    }

    @Test
    void intervalsAreBarsThroughTheMarkOfTheirMode() {
        Figure plane = EigenvaluePlane.figure(ReportFixture.withIntervals(), Optional.empty());
        List<Figure.Line> bars = plane.layers().stream().filter(Figure.Line.class::isInstance).map(Figure.Line.class::cast).toList();
        assertEquals(List.of("mode:1", "mode:1"), bars.stream().map(Figure.Line::selection).toList());
        assertArrayEquals(new double[] {-0.25, -0.1}, bars.get(0).x());
        assertArrayEquals(new double[] {9.55 / (2 * Math.PI), 9.55 / (2 * Math.PI)}, bars.get(0).y());
        assertArrayEquals(new double[] {-0.1719, -0.1719}, bars.get(1).x());
        assertArrayEquals(new double[] {1.5, 1.54}, bars.get(1).y(), 1e-12);
        assertTrue(plane.caption().contains("Bars are 90 % intervals."), plane.caption());
    }

    private static RankedKernel kernel(String family, Map<String, Double> parameters, double error, Optional<Grade> grade) {
        return new RankedKernel(new KernelSpec(family, parameters), 3, error, 0.5,
                grade.map(given -> new KernelVerdict(given, 0.9, 0.1, 0.01, Optional.empty(), true, "")), ModeRoom.AFFINE, "");
    }

    @Test
    void theRankingIsALineAFamilyWithTheChosenKernelAndEachVerdictInWords() {
        List<RankedKernel> rows = List.of(kernel("linear", Map.of(), 0.1, Optional.of(Grade.STANDS)),
                kernel("gaussian", Map.of("scale", 2.0), 0.05, Optional.of(Grade.DRIFTS)),
                kernel("gaussian", Map.of("scale", 1.0), 0.2, Optional.empty()));
        Figure figure = RankingFigure.of(rows, 1).orElseThrow();
        List<Figure.Line> lines = figure.layers().stream().filter(Figure.Line.class::isInstance).map(Figure.Line.class::cast).toList();
        assertEquals(List.of("Linear", "Gaussian"), lines.stream().map(Figure.Line::name).toList());
        assertArrayEquals(new double[] {0.1, 0.1}, lines.get(0).y(), "no scale: a level line");
        assertArrayEquals(new double[] {1, 2}, lines.get(1).x(), "by rising scale");
        List<Figure.Points> points = figure.layers().stream().filter(Figure.Points.class::isInstance).map(Figure.Points.class::cast).toList();
        assertEquals(List.of("stands", "drifts", "not judged"), points.stream().map(Figure.Points::name).toList());
        assertEquals("chosen: Linear, stands", points.get(0).labels().get(0));
        assertEquals(VerdictMarks.mark(Grade.DRIFTS), points.get(1).mark());
        assertTrue(figure.x().logarithmic());
        assertEquals(Figure.Kind.BARS, RankingFigure.of(List.of(rows.get(0), rows.get(0)), 1).orElseThrow().kind(), "no scale at all");
        assertTrue(RankingFigure.of(rows.subList(0, 1), 1).isEmpty());
    }

    @Test
    void ladderCurvesRunFromLowToHighRankAndHoldNothingALogarithmCannotShow() {
        List<Figure> figures = LadderFigures.figures(ReportFixture.spectrum(), ReportFixture.verdict(Grade.STANDS));
        assertEquals(List.of("ladder-frequency", "ladder-growth", "ladder-weight", "ladder-norm", "ladder-residual"),
                figures.stream().map(Figure::id).toList());
        for (Figure figure : figures) {
            for (Figure.Layer layer : figure.layers()) {
                if (layer instanceof Figure.Line line) {
                    assertArrayEquals(new double[] {4, 6, 8}, line.x());
                    assertTrue(!figure.y().logarithmic() || Arrays.stream(line.y()).noneMatch(v -> v <= 0));
                }
            }
        }
    }

    @Test
    void channelsOfOneUnitAreDrawnInItAndOthersAsDistanceFromTheMean() {
        List<Channel> levels = List.of(new Channel("north", "m"), new Channel("south", "m"));
        Figure one = RecordingFigure.figure(ReportFixture.snapshots(levels, ReportFixture.SECONDS, 0, 0.1), 2);
        assertEquals("value [m]", one.y().label());
        Figure mixed = RecordingFigure.figure(ReportFixture.snapshots(), 2);
        assertEquals("distance from the mean [standard deviations]", mixed.y().label());
        assertTrue(mixed.layers().stream().anyMatch(layer -> layer instanceof Figure.Rule rule
                && rule.name().equals("holdout starts")));
    }

    @Test
    void ofRunsAtTheSameTimesOnlyTheEarliestIsDrawnAndTheCaptionSaysSo() {
        Snapshots one = ReportFixture.snapshots();
        List<Run> same = List.of(one.training().get(0), one.training().get(0));
        Figure figure = RecordingFigure.figure(new Snapshots(one.channels(), one.inputs(), one.time(), same, List.of(),
                List.of(),
                one.step(), one.delay(), one.preparation(), List.of(), List.of()), 1);
        assertEquals(1, figure.layers().size());
        assertTrue(figure.caption().endsWith("Drawn: 1 of 2 runs; the others lie at the same times."), figure.caption());
    }

    @Test
    void timesCountedInYearsAreDrawnAsDates() {
        TimeAxis years = new TimeAxis(TimeAxis.Kind.DATE, "year");
        LocalDate first = LocalDate.of(1990, 1, 1);
        double start = TimeAxis.ofDate(first) / 365.25;
        Snapshots snapshots = ReportFixture.snapshots(List.of(new Channel("level", "m")), years, start, 1 / 365.25);
        Figure figure = RecordingFigure.figure(snapshots, 1);
        assertEquals("date", figure.x().time());
        Figure.Line line = (Figure.Line) figure.layers().get(0);
        // Days since 1970 of about 7000, divided and multiplied by 365.25: a few units in the last place.
        assertEquals(first.toEpochDay(), line.x()[0], 1e-9);
    }

    @Test
    void theLargestMagnitudeOfAShapeIsOne() {
        List<Figure> shapes = ShapeFigures.figures(ReportFixture.spectrum(), Preparation.identity(2), 2);
        assertEquals(4, shapes.size());
        Figure.Bars bars = (Figure.Bars) shapes.get(0).layers().get(0);
        assertArrayEquals(new double[] {0.5, 1}, bars.heights());
        assertEquals(List.of("pressure", "flow"), shapes.get(0).x().categories());
    }

    @Test
    void aForecastShowsItsBandAndTwiceItsLengthOfHistory() {
        Snapshots snapshots = ReportFixture.snapshots();
        List<Figure> figures = ForecastFigures.figures(snapshots, ReportFixture.forecast(snapshots), 1);
        assertEquals(List.of("forecast-1", "reconstruction-1"), figures.stream().map(Figure::id).toList());
        assertTrue(figures.get(0).layers().stream().anyMatch(Figure.Band.class::isInstance));
        Figure.Line history = (Figure.Line) figures.get(0).layers().get(2);
        double forecastLength = 99 * 0.05;
        // The first sample inside the window lies at most one step of 0.05 after its edge.
        assertEquals(25 - 2 * forecastLength, history.x()[0], 0.05);
    }

    @Test
    void withoutScoresThePictureIsEmptyAndSaysWhy() {
        Figure empty = ScoreFigures.figure(List.of(), new TimeUnit("s"));
        assertTrue(empty.layers().isEmpty());
        assertTrue(empty.caption().contains("Nothing was held out"));
        assertFalse(ScoreFigures.figure(ReportFixture.forecast(ReportFixture.snapshots()).scores(), new TimeUnit("s")).layers().isEmpty());
    }
}
