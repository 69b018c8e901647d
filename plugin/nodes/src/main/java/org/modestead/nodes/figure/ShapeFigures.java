package org.modestead.nodes.figure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeShapes;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.nodes.words.ModeWords;
import org.modestead.nodes.words.TimeUnit;

/** How strongly, and how far out of step, each channel moves in a mode. */
public final class ShapeFigures {
    private static final int MOST_DRAWN = 1000;

    private ShapeFigures() {}

    /**
     * Draws magnitude and phase by channel for the strongest modes that are not the constant. The largest
     * magnitude is 1; channels of different units are first divided by the scale they were prepared with.
     *
     * @param spectrum the modes
     * @param preparation of the snapshots the operator was fitted to
     * @param modes at most how many
     * @return two figures a mode (magnitude, phase), kind {@link Figure.Kind#SHAPES}, selection keys {@code mode:<number>}
     */
    public static List<Figure> figures(Spectrum spectrum, Preparation preparation, int modes) {
        List<Figure> figures = new ArrayList<>();
        boolean oneUnit = spectrum.channels().stream().map(Channel::unit).distinct().count() == 1;
        spectrum.modes().stream().filter(mode -> !mode.constant()).limit(modes).forEach(mode -> {
            Shape shape = new Shape(spectrum, mode, preparation, newest(spectrum, mode, preparation), oneUnit);
            figures.add(shape.magnitude());
            figures.add(shape.phase());
        });
        return List.copyOf(figures);
    }

    private static List<ModeShapes.Entry> newest(Spectrum spectrum, Mode mode, Preparation preparation) {
        return ModeShapes.of(spectrum, mode, preparation).stream().filter(entry -> entry.delay() == 0)
                .sorted(Comparator.comparingInt(ModeShapes.Entry::channelIndex)).toList();
    }

    private record Shape(Spectrum spectrum, Mode mode, Preparation preparation, List<ModeShapes.Entry> newest, boolean oneUnit) {

        /** Evenly spaced channels where there are more than a picture can show. */
        private List<ModeShapes.Entry> drawn() {
            int every = every();
            return IntStream.range(0, (newest.size() + every - 1) / every).mapToObj(k -> newest.get(k * every)).toList();
        }

        private int every() {
            return Math.max(1, (newest.size() + MOST_DRAWN - 1) / MOST_DRAWN);
        }

        private String thinned() {
            return every() == 1 ? "" : " Of " + newest.size() + " channels one in " + every() + " is drawn.";
        }

        Figure magnitude() {
            double largest = newest.stream().mapToDouble(this::size).max().orElse(0);
            double[] heights = drawn().stream().mapToDouble(this::size).map(size -> largest > 0 ? size / largest : 0).toArray();
            String scaled = oneUnit ? "" : " Units differ, so each channel was first divided by the scale it was"
                    + " prepared with.";
            return new Figure("shape-" + mode.number() + "-magnitude", Figure.Kind.SHAPES, title("magnitude"),
                    "How far each channel moves in this mode, relative to the one that moves most." + scaled + thinned(), channels(),
                    Figure.Axis.linear("relative magnitude"),
                    List.of(new Figure.Bars("", "mode:" + mode.number(), heights)));
        }

        private double size(ModeShapes.Entry entry) {
            return oneUnit ? entry.magnitude() : entry.magnitude() / preparation.scale()[entry.channelIndex()];
        }

        Figure phase() {
            double[] degrees = drawn().stream().mapToDouble(entry -> Math.toDegrees(entry.phase())).toArray();
            double[] positions = new double[degrees.length];
            Arrays.setAll(positions, i -> i);
            return new Figure("shape-" + mode.number() + "-phase", Figure.Kind.SHAPES, title("phase"),
                    "Phase of each channel against the one that moves most: 0° in step, 180° against it. Channels that"
                    + " hardly move"
                            + " have a phase by chance." + thinned(),
                    channels(), Figure.Axis.linear("phase [°]"), List.of(
                            new Figure.Rule("", "", false, -180), new Figure.Rule("", "", false, 0),
                            new Figure.Rule("", "", false, 180),
                            new Figure.Points("", "mode:" + mode.number(), positions, degrees,
                                    Collections.nCopies(degrees.length, ""), Figure.Emphasis.STRONG)));
        }

        private Figure.Axis channels() {
            return Figure.Axis.categories("channel", drawn().stream().map(entry -> entry.channel().name()).toList());
        }

        private String title(String quantity) {
            String what = mode.oscillates() ? ModeWords.cycle(mode, new TimeUnit(spectrum.timeUnit())) : "no oscillation";
            return "Mode " + mode.number() + " (" + what + "): " + quantity;
        }
    }
}
