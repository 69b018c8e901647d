package org.modestead.nodes.figure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.spectrum.AveragedPower;
import org.modestead.engine.spectrum.Pole;
import org.modestead.engine.spectrum.PoleLine;
import org.modestead.engine.spectrum.Stabilisation;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.TimeUnit;

/** Poles over the model order: what a pole kept from the order before is told by shape and filling of its mark, in words below. */
public final class StabilisationFigure {

    private static final double DECIBEL = 10;
    private static final double FLOOR = 1e-12;

    private StabilisationFigure() {}

    /** What a pole kept from the order before. */
    private enum Kept {
        ALL("frequency, damping and shape stay", Figure.Mark.DISC, Figure.Emphasis.STRONG),
        NOT_DAMPING("frequency and shape stay", Figure.Mark.SQUARE, Figure.Emphasis.NORMAL),
        NOT_SHAPE("frequency and damping stay", Figure.Mark.TRIANGLE, Figure.Emphasis.NORMAL),
        FREQUENCY("only the frequency stays", Figure.Mark.RING, Figure.Emphasis.NORMAL),
        NOTHING("new at this order", Figure.Mark.CROSS, Figure.Emphasis.FAINT);

        private final String words;
        private final Figure.Mark mark;
        private final Figure.Emphasis emphasis;

        Kept(String words, Figure.Mark mark, Figure.Emphasis emphasis) {
            this.words = words;
            this.mark = mark;
            this.emphasis = emphasis;
        }

        private static Kept of(Pole pole) {
            if (!pole.stableFrequency()) {
                return NOTHING;
            }
            if (pole.stableDamping()) {
                return pole.stableShape() ? ALL : NOT_SHAPE;
            }
            return pole.stableShape() ? NOT_DAMPING : FREQUENCY;
        }
    }

    /**
     * Draws every pole that oscillates, at its frequency and order, over the averaged power of the recording.
     *
     * @param found poles and lines
     * @param power of the recording, where there is one
     * @param fitted rank of the operator
     * @param least orders from which on a line is labelled with its frequency
     * @param unit of time
     * @return kind {@link Figure.Kind#MARKS}; selection keys {@code line:<number>} for labelled lines
     */
    public static Figure figure(Stabilisation found, Optional<AveragedPower> power, int fitted, int least, TimeUnit unit) {
        List<Figure.Layer> layers = new ArrayList<>();
        power.ifPresent(spectrum -> layers.add(backdrop(spectrum)));
        layers.add(new Figure.Rule("fitted rank", "", false, fitted));
        lineLabels(found, least, unit).forEach(layers::add);
        marks(found).forEach(layers::add);
        String behind = power.isPresent() ? " The line behind is the power of the recording, mean over the channels, read on the right." : "";
        return new Figure("stabilisation", Figure.Kind.MARKS, "Poles over the model order", "Each mark is a pole that oscillates, at its"
                + " frequency and model order; its shape tells what the pole kept from the order before, within the limits set. A column"
                + " of full discs is a mode of the system; what moves from order to order fits noise." + behind,
                Axes.frequency(unit), Figure.Axis.whole("model order (number of functions)"),
                power.map(spectrum -> Figure.Axis.linear("power density [dB, prepared units]")), layers);
    }

    private static Figure.Backdrop backdrop(AveragedPower power) {
        double largest = Arrays.stream(power.density()).max().orElse(0);
        double[] decibels = Arrays.stream(power.density()).map(value -> value > FLOOR * largest ? DECIBEL * Math.log10(value) : Double.NaN)
                .toArray();
        // the mean of every piece was taken off, and the last line is but half of one: neither says anything
        decibels[0] = Double.NaN;
        decibels[decibels.length - 1] = Double.NaN;
        return new Figure.Backdrop("power of the recording", "", power.frequency(), decibels);
    }

    /** The highest pole of every line that many orders share, labelled with the frequency of the line. */
    private static List<Figure.Layer> lineLabels(Stabilisation found, int least, TimeUnit unit) {
        List<Figure.Layer> labels = new ArrayList<>();
        for (int i = 0; i < found.lines().size(); i++) {
            PoleLine line = found.lines().get(i);
            double frequency = line.median(Pole::frequency);
            if (line.poles().size() >= least && frequency > 0) {
                Kept kept = Kept.of(line.last());
                labels.add(new Figure.Points(kept.words, "line:" + (i + 1), new double[] {line.last().frequency()},
                        new double[] {line.last().order()}, List.of(Digits.frequency(frequency, unit.frequency())), kept.emphasis, kept.mark));
            }
        }
        return labels;
    }

    private static List<Figure.Layer> marks(Stabilisation found) {
        Map<Kept, List<Pole>> sorted = new LinkedHashMap<>();
        for (Kept kept : Kept.values()) {
            sorted.put(kept, found.poles().stream().filter(pole -> pole.frequency() > 0 && Kept.of(pole) == kept).toList());
        }
        return sorted.entrySet().stream().filter(entry -> !entry.getValue().isEmpty()).<Figure.Layer>map(entry -> new Figure.Points(
                entry.getKey().words, "", entry.getValue().stream().mapToDouble(Pole::frequency).toArray(),
                entry.getValue().stream().mapToDouble(Pole::order).toArray(), Collections.nCopies(entry.getValue().size(), ""),
                entry.getKey().emphasis, entry.getKey().mark)).toList();
    }
}
