package org.modestead.nodes.figure;

import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.ToDoubleFunction;
import org.modestead.engine.forecast.ReconstructionRow;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Snapshots;

/** What the fitted functions make of one channel of one run. */
final class ReconstructionFigure {
    private static final int MOST_POINTS = 2000;

    private ReconstructionFigure() {}

    /** Draws the first run that was reconstructed; empty when the channel has no rows. */
    static Optional<Figure> of(Snapshots snapshots, List<ReconstructionRow> all, int channel) {
        List<ReconstructionRow> rows = all.stream().filter(row -> row.channel() == channel
                && row.run().equals(all.get(0).run()))
                .sorted(Comparator.comparingDouble(ReconstructionRow::time)).toList();
        if (rows.isEmpty()) {
            return Optional.empty();
        }
        Channel named = snapshots.channels().get(channel);
        String key = "channel:" + (channel + 1);
        double[] times = Axes.times(snapshots.time(), column(rows, ReconstructionRow::time));
        return Optional.of(new Figure("reconstruction-" + (channel + 1), Figure.Kind.TIME_SERIES,
                "Reconstruction of " + named.name(), "What the fitted functions make of the states of run "
                + rows.get(0).run()
                + ", against what was recorded. Where the curves part, the functions cannot hold the signal.",
                Axes.time(snapshots.time()), Figure.Axis.linear(named.label()), List.of(
                        line("reconstructed", key, times, column(rows, ReconstructionRow::reconstructed),
                                Figure.Emphasis.STRONG),
                        line("recorded", key, times, column(rows, ReconstructionRow::observed), Figure.Emphasis.NORMAL))));
    }

    private static Figure.Line line(String name, String key, double[] times, double[] values, Figure.Emphasis emphasis) {
        Thinning.Curve curve = Thinning.thin(times, values, MOST_POINTS);
        return new Figure.Line(name, key, curve.x(), curve.y(), emphasis);
    }

    private static double[] column(List<ReconstructionRow> rows, ToDoubleFunction<ReconstructionRow> value) {
        return rows.stream().mapToDouble(value).toArray();
    }
}
