package org.modestead.nodes.figure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.ToDoubleFunction;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.LadderRow;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.words.TimeUnit;

/** What becomes of each mode as the basis grows: the ladder of ranks, one curve a mode. */
public final class LadderFigures {
    private static final int MOST_MODES = 6;
    private static final double CARRIES = 1e-3;
    private static final double TWO_PI = 2 * Math.PI;

    private static final int STRONGEST = 0;

    private LadderFigures() {}

    /**
     * Draws frequency (when a mode oscillates), growth rate, weight, norm ratio and residual over the rank, for the at
     * most six strongest modes that carry at least 0.1 % of the signal and are not the constant; where some of them cannot be
     * followed over all ranks, also for the strongest mode of each rank.
     *
     * @param spectrum the modes at the fitted rank
     * @param verdict with the ladder; an empty ladder gives no figures
     * @return kind {@link Figure.Kind#CURVES}, selection keys {@code mode:<number>}; quantities without a finite value
     *     are left out
     */
    public static List<Figure> figures(Spectrum spectrum, Verdict verdict) {
        TimeUnit unit = new TimeUnit(spectrum.timeUnit());
        Ladder ladder = new Ladder(spectrum, verdict.ladder());
        List<Figure> figures = new ArrayList<>();
        if (ladder.modes().stream().anyMatch(Mode::oscillates)) {
            ladder.add(figures, "ladder-frequency", "Frequency over the ladder", Axes.frequency(unit),
                    LadderFigures::frequency, "A mode that exists keeps its frequency as functions are added.");
        }
        ladder.add(figures, "ladder-growth", "Growth rate over the ladder", Axes.growth(unit), row -> row.rate().re(),
                "A mode that exists keeps its growth rate as functions are added.");
        ladder.add(figures, "ladder-weight", "Weight over the ladder", Figure.Axis.log("weight [prepared units]"),
                LadderRow::weightNorm,
                "A weight that keeps changing belongs to one projection only, not to the system.");
        ladder.add(figures, "ladder-norm", "Norm ratio over the ladder", Figure.Axis.log("norm in the space / norm over"
                + " the data"),
                LadderRow::normRatio, "A level curve: the eigenfunction belongs to the space. A rising one: it only"
                + " imitates an"
                + " eigenfunction on the sampled region.");
        ladder.add(figures, "ladder-residual", "Holdout residual over the ladder", Figure.Axis.log("relative residual"),
                LadderRow::residual, "How far the eigenfunction misses its own law on data the fit never saw (on the"
                + " training data"
                + " where nothing was held out). It must fall or stay small.");
        return List.copyOf(figures);
    }

    private static double frequency(LadderRow row) {
        return row.rate().im() == 0 ? Double.NaN : Math.abs(row.rate().im()) / TWO_PI;
    }

    private record Ladder(List<Mode> modes, List<LadderRow> rows, int rank) {

        Ladder(Spectrum spectrum, List<LadderRow> rows) {
            this(spectrum.modes().stream().filter(mode -> !mode.constant() && mode.energyShare() >= CARRIES)
                    .limit(MOST_MODES).toList(),
                    rows.stream().sorted(Comparator.comparingInt(LadderRow::rank)).toList(), spectrum.rank());
        }

        void add(List<Figure> figures, String id, String title, Figure.Axis y, ToDoubleFunction<LadderRow> value,
                String reading) {
            List<Figure.Layer> layers = new ArrayList<>();
            for (Mode mode : modes) {
                line("mode " + mode.number(), mode.number(), layers.isEmpty() ? Figure.Emphasis.STRONG : Figure.Emphasis.NORMAL, y,
                        value).ifPresent(layers::add);
            }
            if (!layers.isEmpty() && modes.stream().anyMatch(mode -> count(mode.number()) < count(STRONGEST))) {
                line("strongest of each rank", STRONGEST, Figure.Emphasis.FAINT, y, value).ifPresent(layers::add);
            }
            if (!layers.isEmpty()) {
                layers.add(new Figure.Rule("fitted rank", "", true, rank));
                figures.add(new Figure(id, Figure.Kind.CURVES, title, reading, Figure.Axis.linear("rank (number of"
                        + " functions)"), y, layers));
            }
        }

        private Optional<Figure.Layer> line(String name, int mode, Figure.Emphasis emphasis, Figure.Axis y,
                ToDoubleFunction<LadderRow> value) {
            List<LadderRow> own = rows.stream().filter(row -> row.mode() == mode).toList();
            double[] values = own.stream().mapToDouble(value).map(v -> drawable(v, y) ? v : Double.NaN).toArray();
            return Arrays.stream(values).allMatch(Double::isNaN) ? Optional.empty()
                    : Optional.of(new Figure.Line(name, mode == STRONGEST ? "" : "mode:" + mode,
                            own.stream().mapToDouble(LadderRow::rank).toArray(), values, emphasis));
        }

        private long count(int mode) {
            return rows.stream().filter(row -> row.mode() == mode).count();
        }

        private static boolean drawable(double value, Figure.Axis y) {
            return Double.isFinite(value) && (!y.logarithmic() || value > 0);
        }
    }
}
