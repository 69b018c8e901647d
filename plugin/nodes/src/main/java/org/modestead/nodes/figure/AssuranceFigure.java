package org.modestead.nodes.figure;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.modestead.engine.spectrum.ShapeComparison;
import org.modestead.engine.spectrum.ShapeComparison.Pair;

/** The likeness of all pairs of modes as a map: shape and filling of a mark tell how alike, in words below. */
public final class AssuranceFigure {

    private AssuranceFigure() {}

    /** How alike two shapes are; the bounds only sort marks, the label tells the figure. */
    private enum Likeness {
        PAIRED("paired", Figure.Mark.DISC, Figure.Emphasis.STRONG, 0),
        HIGH("0.9 and more", Figure.Mark.SQUARE, Figure.Emphasis.NORMAL, 0.9),
        MIDDLE("0.5 to 0.9", Figure.Mark.TRIANGLE, Figure.Emphasis.NORMAL, 0.5),
        LOW("0.1 to 0.5", Figure.Mark.RING, Figure.Emphasis.FAINT, 0.1),
        NONE("below 0.1", Figure.Mark.CROSS, Figure.Emphasis.FAINT, 0);

        private final String words;
        private final Figure.Mark mark;
        private final Figure.Emphasis emphasis;
        private final double from;

        Likeness(String words, Figure.Mark mark, Figure.Emphasis emphasis, double from) {
            this.words = words;
            this.mark = mark;
            this.emphasis = emphasis;
            this.from = from;
        }

        private static Likeness of(Pair pair) {
            if (pair.paired()) {
                return PAIRED;
            }
            if (pair.assurance() >= HIGH.from) {
                return HIGH;
            }
            return pair.assurance() >= MIDDLE.from ? MIDDLE : pair.assurance() >= LOW.from ? LOW : NONE;
        }
    }

    /**
     * Draws a mark for every pair of modes.
     *
     * @param comparison of two spectra, or of one with itself
     * @param itself whether it is one spectrum with itself
     * @return kind {@link Figure.Kind#MARKS}, selection keys {@code pair:<a>-<b>}
     */
    public static Figure figure(ShapeComparison comparison, boolean itself) {
        List<Figure.Layer> layers = new ArrayList<>();
        for (Likeness likeness : Likeness.values()) {
            comparison.pairs().stream().filter(pair -> Likeness.of(pair) == likeness).forEach(pair -> layers.add(mark(pair, likeness)));
        }
        String reading = itself ? "Beside the diagonal a high figure says that two modes look alike: these channels cannot tell them apart by"
                + " shape." : "Pairs were taken for the same mode; a high figure elsewhere says that two modes look alike.";
        return new Figure("modal-assurance", Figure.Kind.MARKS, "Likeness of mode shapes", "Modal assurance of every pair of modes over "
                + comparison.channels().size() + (comparison.channels().size() == 1 ? " channel" : " channels") + ": 1 for shapes that are"
                + " proportional, 0 for shapes that have nothing in common. " + reading,
                Figure.Axis.whole("mode of spectrum a"), Figure.Axis.whole(itself ? "mode of spectrum a" : "mode of spectrum b"), layers);
    }

    private static Figure.Points mark(Pair pair, Likeness likeness) {
        String label = pair.assurance() >= Likeness.LOW.from ? String.format(Locale.ROOT, "%.2f", pair.assurance()) : "";
        return new Figure.Points(likeness.words, "pair:" + pair.a().number() + "-" + pair.b().number(), new double[] {pair.a().number()},
                new double[] {pair.b().number()}, List.of(label), likeness.emphasis, likeness.mark);
    }
}
