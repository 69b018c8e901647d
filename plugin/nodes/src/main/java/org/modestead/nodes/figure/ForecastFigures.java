package org.modestead.nodes.figure;

import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.modestead.engine.forecast.ForecastResult;
import org.modestead.engine.recording.Snapshots;

/** Forecast with its band against what was recorded, and the reconstruction of what was recorded. */
public final class ForecastFigures {

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
        Stream<Optional<Figure>> forecasts = IntStream.range(0, shown)
                .mapToObj(c -> ForecastFigure.of(snapshots, result.forecast(), c));
        Stream<Optional<Figure>> reconstructions = IntStream.range(0, shown)
                .mapToObj(c -> ReconstructionFigure.of(snapshots, result.reconstruction(), c));
        return Stream.concat(forecasts, reconstructions).flatMap(Optional::stream).toList();
    }
}
