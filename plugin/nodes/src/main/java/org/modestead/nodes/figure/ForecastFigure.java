package org.modestead.nodes.figure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.ToDoubleFunction;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.modestead.engine.forecast.ForecastRow;
import org.modestead.engine.forecast.Region;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/**
 * The forecast of one channel of one run with the recording before it and, where there is one, beside it.
 *
 * @param snapshots from which the forecast was made
 * @param rows of the channel and run, rising in time, at least one
 */
record ForecastFigure(Snapshots snapshots, List<ForecastRow> rows) {
    private static final int MOST_POINTS = 2000;
    private static final int MOST_MARKS = 12;
    private static final double HISTORY = 2;

    /** Draws the last run that was forecast; empty when the channel has no rows. */
    static Optional<Figure> of(Snapshots snapshots, List<ForecastRow> all, int channel) {
        List<ForecastRow> rows = all.stream().filter(row -> row.channel() == channel
                && row.run().equals(all.get(all.size() - 1).run()))
                .sorted(Comparator.comparingDouble(ForecastRow::time)).toList();
        return rows.isEmpty() ? Optional.empty() : Optional.of(new ForecastFigure(snapshots, rows).figure());
    }

    private Figure figure() {
        boolean banded = rows.stream().anyMatch(row -> Double.isFinite(row.low()) && Double.isFinite(row.high()));
        double[] times = Axes.times(snapshots.time(), column(ForecastRow::time));
        List<Figure.Layer> layers = new ArrayList<>();
        if (banded) {
            layers.add(new Figure.Band("forecast band", key(), times, column(ForecastRow::low), column(ForecastRow::high)));
        }
        layers.add(new Figure.Line("forecast", key(), times, column(ForecastRow::value), Figure.Emphasis.STRONG));
        layers.addAll(recorded());
        beyond(times).ifPresent(layers::add);
        String band = banded ? " The shaded area is the band in which new values are expected."
                : " No band could be given.";
        return new Figure("forecast-" + (channel() + 1), Figure.Kind.TIME_SERIES, "Forecast of " + named().name(),
                "Forecast of run " + rows.get(0).run() + " against what was recorded." + band
                        + (beyond(times).isPresent() ? " Triangles stand where it leaves the range that the fit has seen: extrapolation." : ""), Axes.time(snapshots.time()),
                Figure.Axis.linear(named().label()), layers);
    }

    /** Where the forecast leaves the range of the training samples by more than a tenth of it. */
    private Optional<Figure.Layer> beyond(double[] times) {
        Region region = Region.of(snapshots);
        int[] outside = IntStream.range(0, rows.size()).filter(k -> region.leaves(channel(),
                snapshots.preparation().prepare(channel(), rows.get(k).time(), rows.get(k).value()))).toArray();
        int every = Math.max(1, outside.length / MOST_MARKS);
        int[] marked = IntStream.range(0, outside.length).filter(k -> k % every == 0).map(k -> outside[k]).toArray();
        return marked.length == 0 ? Optional.empty() : Optional.of(new Figure.Points("extrapolated", key(), Arrays.stream(marked)
                .mapToDouble(k -> times[k]).toArray(), Arrays.stream(marked).mapToDouble(k -> rows.get(k).value()).toArray(),
                Collections.nCopies(marked.length, ""), Figure.Emphasis.STRONG, Figure.Mark.TRIANGLE));
    }

    private List<Figure.Layer> recorded() {
        double first = rows.get(0).time();
        double last = rows.get(rows.size() - 1).time();
        double from = first - HISTORY * (last - first);
        return Stream.of(Snapshots.Part.values()).flatMap(part -> snapshots.runs(part).stream())
                .filter(run -> run.id().equals(rows.get(0).run())).sorted(Comparator.comparingDouble(run -> run.times()[0]))
                .flatMap(run -> window(run, from, last).stream()).toList();
    }

    private Optional<Figure.Layer> window(Run run, double from, double to) {
        int[] inside = IntStream.range(0, run.samples()).filter(i -> run.times()[i] >= from && run.times()[i] <= to)
                .toArray();
        if (inside.length == 0) {
            return Optional.empty();
        }
        double[] values = RecordedValues.of(run, channel(), snapshots.preparation());
        Thinning.Curve curve = Thinning.thin(Arrays.stream(inside).mapToDouble(i -> run.times()[i]).toArray(),
                Arrays.stream(inside).mapToDouble(i -> values[i]).toArray(), MOST_POINTS);
        return Optional.of(new Figure.Line("recorded", key(), Axes.times(snapshots.time(), curve.x()), curve.y(),
                Figure.Emphasis.NORMAL));
    }

    private int channel() {
        return rows.get(0).channel();
    }

    private Channel named() {
        return snapshots.channels().get(channel());
    }

    private String key() {
        return "channel:" + (channel() + 1);
    }

    private double[] column(ToDoubleFunction<ForecastRow> value) {
        return rows.stream().mapToDouble(value).toArray();
    }
}
