package org.modestead.nodes.figure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.ToDoubleFunction;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.modestead.engine.forecast.ForecastResult;
import org.modestead.engine.forecast.ForecastRow;
import org.modestead.engine.forecast.ReconstructionRow;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/** Forecast with its band against what was recorded, and the reconstruction of what was recorded. */
public final class ForecastFigures {
    private static final int MOST_POINTS = 2000;
    private static final double HISTORY = 2;

    private ForecastFigures() {}

    /**
     * Draws one forecast figure and one reconstruction figure for each of the first channels, each for one run: the
     * last run forecast, the first run reconstructed.
     *
     * @param snapshots from which the forecast was made
     * @param result recorded units
     * @param channels at most how many, at least 1
     * @return kind {@link Figure.Kind#TIME_SERIES}, selection keys {@code channel:<number>} counted from 1; forecasts
     *     first; none where the result has no rows
     */
    public static List<Figure> figures(Snapshots snapshots, ForecastResult result, int channels) {
        int shown = Math.min(channels, snapshots.channels().size());
        Stream<Figure> forecasts = IntStream.range(0, shown).boxed()
                .flatMap(c -> forecast(snapshots, result.forecast(), c));
        Stream<Figure> reconstructions = IntStream.range(0, shown).boxed()
                .flatMap(c -> reconstruction(snapshots, result.reconstruction(), c));
        return Stream.concat(forecasts, reconstructions).toList();
    }

    private static Stream<Figure> forecast(Snapshots snapshots, List<ForecastRow> all, int channel) {
        if (all.isEmpty()) {
            return Stream.empty();
        }
        String run = all.get(all.size() - 1).run();
        List<ForecastRow> rows = all.stream().filter(row -> row.run().equals(run) && row.channel() == channel)
                .sorted(Comparator.comparingDouble(ForecastRow::time)).toList();
        if (rows.isEmpty()) {
            return Stream.empty();
        }
        double[] times = column(rows, ForecastRow::time);
        List<Figure.Layer> layers = new ArrayList<>();
        String key = "channel:" + (channel + 1);
        boolean banded = rows.stream().anyMatch(row -> Double.isFinite(row.low()) && Double.isFinite(row.high()));
        if (banded) {
            layers.add(new Figure.Band("forecast band", key, times, column(rows, ForecastRow::low),
                    column(rows, ForecastRow::high)));
        }
        layers.addAll(recorded(snapshots, run, channel, times));
        layers.add(new Figure.Line("forecast", key, times, column(rows, ForecastRow::value), Figure.Emphasis.STRONG));
        Channel named = snapshots.channels().get(channel);
        String band = banded ? " The shaded area is the band in which new values are expected."
                : " No band could be given.";
        return Stream.of(new Figure("forecast-" + (channel + 1), Figure.Kind.TIME_SERIES, "Forecast of " + named.name(),
                "Forecast of run " + run + " against what was recorded." + band, Axes.time(snapshots.time()),
                Figure.Axis.linear(named.label()), layers));
    }

    private static List<Figure.Layer> recorded(Snapshots snapshots, String run, int channel, double[] forecastTimes) {
        double first = forecastTimes[0];
        double last = forecastTimes[forecastTimes.length - 1];
        double from = first - HISTORY * (last - first);
        List<Figure.Layer> lines = new ArrayList<>();
        Stream.of(Snapshots.Part.values()).flatMap(part -> snapshots.runs(part).stream())
                .filter(part -> part.id().equals(run))
                .sorted(Comparator.comparingDouble(part -> part.times()[0]))
                .forEach(part -> window(snapshots, part, channel, from, last).ifPresent(lines::add));
        return lines;
    }

    private static Optional<Figure.Layer> window(Snapshots snapshots, Run run, int channel, double from, double to) {
        double[] values = RecordedValues.of(run, channel, snapshots.preparation());
        int[] inside = IntStream.range(0, values.length).filter(i -> run.times()[i] >= from && run.times()[i] <= to)
                .toArray();
        if (inside.length == 0) {
            return Optional.empty();
        }
        Thinning.Curve curve = Thinning.thin(Arrays.stream(inside).mapToDouble(i -> run.times()[i]).toArray(),
                Arrays.stream(inside).mapToDouble(i -> values[i]).toArray(), MOST_POINTS);
        return Optional.of(new Figure.Line("recorded", "channel:" + (channel + 1), curve.x(), curve.y(),
                Figure.Emphasis.NORMAL));
    }

    private static Stream<Figure> reconstruction(Snapshots snapshots, List<ReconstructionRow> all, int channel) {
        if (all.isEmpty()) {
            return Stream.empty();
        }
        String run = all.get(0).run();
        List<ReconstructionRow> rows = all.stream().filter(row -> row.run().equals(run) && row.channel() == channel)
                .sorted(Comparator.comparingDouble(ReconstructionRow::time)).toList();
        if (rows.isEmpty()) {
            return Stream.empty();
        }
        Channel named = snapshots.channels().get(channel);
        String key = "channel:" + (channel + 1);
        return Stream.of(new Figure("reconstruction-" + (channel + 1), Figure.Kind.TIME_SERIES,
                "Reconstruction of " + named.name(),
                "Run " + run + " rebuilt from its start by the fitted operator, against what was recorded. Where the"
                + " curves part, the"
                        + " operator misses something.",
                Axes.time(snapshots.time()), Figure.Axis.linear(named.label()), List.of(
                        thinned("recorded", key, rows, ReconstructionRow::observed, Figure.Emphasis.NORMAL),
                        thinned("reconstructed", key, rows, ReconstructionRow::reconstructed, Figure.Emphasis.STRONG))));
    }

    private static Figure.Layer thinned(String name, String key, List<ReconstructionRow> rows,
            ToDoubleFunction<ReconstructionRow> value,
            Figure.Emphasis emphasis) {
        Thinning.Curve curve = Thinning.thin(column(rows, ReconstructionRow::time), column(rows, value), MOST_POINTS);
        return new Figure.Line(name, key, curve.x(), curve.y(), emphasis);
    }

    private static <T> double[] column(List<T> rows, ToDoubleFunction<T> value) {
        return rows.stream().mapToDouble(value).toArray();
    }
}
