package org.modestead.nodes.figure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.watch.Alarm;
import org.modestead.engine.watch.Quantity;
import org.modestead.engine.watch.Reference;
import org.modestead.engine.watch.WatchResult;
import org.modestead.engine.watch.WatchRow;
import org.modestead.engine.watch.WatchedMode;
import org.modestead.nodes.words.ModeWords;
import org.modestead.nodes.words.TimeUnit;

/** Control charts: the frequency of every watched mode in its limits, and how near all its figures are to theirs. */
public final class WatchFigures {

    private static final int MOST_MODES = 6;

    private final WatchResult result;
    private final TimeAxis axis;
    private final TimeUnit unit;
    private final double[] x;
    private final boolean overTime;

    private WatchFigures(WatchResult result, TimeAxis axis) {
        this.result = result;
        this.axis = axis;
        this.unit = new TimeUnit(axis.unit());
        double[] middles = result.looks().stream().mapToDouble(look -> (look.window().start() + look.window().end()) / 2).toArray();
        this.overTime = IntStream.range(1, middles.length).allMatch(t -> middles[t] > middles[t - 1]);
        this.x = overTime ? Axes.times(axis, middles) : IntStream.rangeClosed(1, middles.length).asDoubleStream().toArray();
    }

    /**
     * Draws two charts a mode, over time where the windows follow each other in time, else over their numbers.
     *
     * @param result of a watch
     * @param axis of its recordings
     * @return kind {@link Figure.Kind#TIME_SERIES}, selection keys {@code mode:<number>}, of the first modes
     */
    public static List<Figure> figures(WatchResult result, TimeAxis axis) {
        WatchFigures figures = new WatchFigures(result, axis);
        return result.modes().stream().limit(MOST_MODES).flatMap(mode -> List.of(figures.frequency(mode), figures.scores(mode)).stream()).toList();
    }

    private Figure frequency(WatchedMode mode) {
        List<WatchRow> rows = rows(mode);
        double[] found = rows.stream().mapToDouble(row -> row.sighting().map(seen -> seen.figure(Quantity.FREQUENCY)).orElse(Double.NaN)).toArray();
        List<Figure.Layer> layers = new ArrayList<>();
        mode.reference(Quantity.FREQUENCY).ifPresent(reference -> layers.addAll(limits(mode, reference, rows)));
        layers.add(points("window", mode, found, t -> !alarmed(rows.get(t)), Figure.Emphasis.NORMAL, Figure.Mark.DISC));
        layers.add(points("window in alarm", mode, found, t -> alarmed(rows.get(t)), Figure.Emphasis.STRONG, Figure.Mark.TRIANGLE));
        missing(rows).forEach(layers::add);
        return new Figure("watch-frequency-" + mode.mode().number(), Figure.Kind.TIME_SERIES, "Frequency of " + named(mode), "Each mark is the"
                + " frequency found in one window. The line is their moving average, the shaded area its limits: where the line leaves it, the"
                + " frequency has changed. Single marks may lie outside.", horizontal(), Axes.frequency(unit), drawn(layers));
    }

    private List<Figure.Layer> limits(WatchedMode mode, Reference reference, List<WatchRow> rows) {
        double[] low = new double[x.length];
        double[] high = new double[x.length];
        Arrays.fill(low, reference.limitFigure(-1));
        Arrays.fill(high, reference.limitFigure(1));
        double[] average = rows.stream().mapToDouble(row -> reference.figure(row.averages().get(Quantity.FREQUENCY) * reference.limitHeight()))
                .toArray();
        return List.of(new Figure.Band("limits of the average", key(mode), x, low, high),
                new Figure.Rule("centre", "", false, reference.figure(0)),
                new Figure.Line("moving average", key(mode), x, average, Figure.Emphasis.STRONG));
    }

    private Figure scores(WatchedMode mode) {
        List<WatchRow> rows = rows(mode);
        List<Figure.Layer> layers = new ArrayList<>();
        for (Quantity quantity : mode.quantities()) {
            layers.add(new Figure.Line(quantity.word(), key(mode), x, rows.stream().mapToDouble(row -> row.averages().get(quantity)).toArray(),
                    Figure.Emphasis.NORMAL));
        }
        layers.add(new Figure.Rule("limit", "", false, 1));
        layers.add(new Figure.Rule("limit", "", false, -1));
        return new Figure("watch-scores-" + mode.mode().number(), Figure.Kind.TIME_SERIES, "Charts of " + named(mode), "The moving averages of"
                + " frequency, damping ratio and shape, each divided by its limit: beyond 1 or below \u22121 the figure has changed. A shape can only"
                + " become less alike, so below \u22121 it says nothing.", horizontal(), Figure.Axis.linear("moving average over its limit"), layers);
    }

    /** Where the mode counts as missing a mark stands at its stored frequency. */
    private List<Figure.Layer> missing(List<WatchRow> rows) {
        return List.of(new Figure.Points("not found", "", x, IntStream.range(0, x.length)
                .mapToDouble(t -> rows.get(t).sighting().isEmpty() && rows.get(t).look().fitted() ? rows.get(t).mode().mode().frequency() : Double.NaN)
                .toArray(), labels(), Figure.Emphasis.NORMAL, Figure.Mark.CROSS));
    }

    private Figure.Points points(String name, WatchedMode mode, double[] y, IntPredicate shown, Figure.Emphasis emphasis, Figure.Mark mark) {
        return new Figure.Points(name, key(mode), x, IntStream.range(0, x.length).mapToDouble(t -> shown.test(t) ? y[t] : Double.NaN).toArray(),
                labels(), emphasis, mark);
    }

    /** Leaves out marks of which there is none, so that the legend names only what is drawn, and positions without a mark. */
    private static List<Figure.Layer> drawn(List<Figure.Layer> layers) {
        List<Figure.Layer> out = new ArrayList<>();
        for (Figure.Layer layer : layers) {
            if (!(layer instanceof Figure.Points points)) {
                out.add(layer);
                continue;
            }
            int[] there = IntStream.range(0, points.x().length).filter(t -> !Double.isNaN(points.y()[t])).toArray();
            if (there.length > 0) {
                out.add(new Figure.Points(points.name(), points.selection(), Arrays.stream(there).mapToDouble(t -> points.x()[t]).toArray(),
                        Arrays.stream(there).mapToDouble(t -> points.y()[t]).toArray(), Collections.nCopies(there.length, ""), points.emphasis(),
                        points.mark()));
            }
        }
        return out;
    }

    private List<String> labels() {
        return Collections.nCopies(x.length, "");
    }

    private static boolean alarmed(WatchRow row) {
        return row.alarms().contains(Alarm.Kind.FREQUENCY);
    }

    private List<WatchRow> rows(WatchedMode mode) {
        return result.rows().stream().filter(row -> row.mode().mode().number() == mode.mode().number()).toList();
    }

    private Figure.Axis horizontal() {
        return overTime ? Axes.time(axis) : Figure.Axis.whole("window");
    }

    private String named(WatchedMode mode) {
        return "mode " + mode.mode().number() + " (" + ModeWords.cycle(mode.mode(), unit) + ")";
    }

    private static String key(WatchedMode mode) {
        return "mode:" + mode.mode().number();
    }
}
