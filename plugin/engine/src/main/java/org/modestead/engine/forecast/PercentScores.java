package org.modestead.engine.forecast;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import org.modestead.engine.forecast.Backtest.Errors;
import org.modestead.engine.recording.Preparation;

/**
 * How far the methods are off in percent of what was observed, in a sentence. Told only where that can mean something: where
 * all that was observed of every channel is positive and none of it small against the rest.
 */
final class PercentScores {

    /** Below this share of the largest value a single small one would decide the mean. */
    private static final double SMALL = 0.05;

    private PercentScores() {}

    /**
     * Returns the mean over all lead times up to the longest scored horizon, from every origin that reaches it; empty where
     * percent mean nothing or nothing is scored.
     *
     * @param methods the judged route first
     */
    static Optional<String> sentence(ForecastTask task, List<Judged> methods) {
        int horizon = task.longestScored();
        if (horizon == 0 || !positive(task) || !isKnown(pairs(task, methods.get(0), horizon))) {
            return Optional.empty();
        }
        String scores = methods.stream().filter(method -> isKnown(pairs(task, method, horizon)))
                .map(method -> method.route().id() + " " + figures(pairs(task, method, horizon))).collect(Collectors.joining(", "));
        return Optional.of("In percent of what was observed, up to horizon " + Summary.figure(horizon * task.step())
                + " (MAPE; of the mean of observed and forecast in brackets): " + scores
                + ". Read it only where 0 on the scale means nothing.");
    }

    /** A method may reach the horizon from no origin, as the seasonal one where less than a season came before. */
    private static boolean isKnown(Pairs pairs) {
        return pairs.errors().length > 0 && !Double.isNaN(Scores.percent(pairs.errors(), pairs.observed()));
    }

    private static String figures(Pairs pairs) {
        return Summary.figure(Scores.percent(pairs.errors(), pairs.observed())) + " ("
                + Summary.figure(Scores.symmetricPercent(pairs.errors(), pairs.observed())) + ")";
    }

    private static boolean positive(ForecastTask task) {
        int n = task.snapshots().channels().size();
        return IntStream.range(0, n).allMatch(c -> {
            double[] all = task.holdout().stream().flatMapToDouble(series -> IntStream.range(series.first(), series.length())
                    .mapToDouble(k -> observed(task, series, k, c))).toArray();
            double most = Arrays.stream(all).max().orElse(0);
            return Arrays.stream(all).allMatch(y -> y > 0 && y >= SMALL * most);
        });
    }

    /** Errors and what was observed, recorded units. */
    private record Pairs(double[] errors, double[] observed) {}

    private static Pairs pairs(ForecastTask task, Judged method, int horizon) {
        Preparation preparation = task.snapshots().preparation();
        List<Errors> reaching = method.holdout().errors().stream().filter(errors -> errors.leads() >= horizon).toList();
        double[] errors = reaching.stream().flatMapToDouble(e -> {
            int n = e.values().numCols;
            return IntStream.range(0, horizon * n).mapToDouble(k -> e.values().data[k] * preparation.scale()[k % n]);
        }).toArray();
        double[] observed = reaching.stream().flatMapToDouble(e -> observed(task, e, horizon)).toArray();
        return new Pairs(errors, observed);
    }

    private static DoubleStream observed(ForecastTask task, Errors errors, int horizon) {
        int n = errors.values().numCols;
        Series series = task.holdout().get(errors.series());
        return IntStream.range(0, horizon * n)
                .mapToDouble(k -> observed(task, series, errors.origin() + 1 + k / n, k % n));
    }

    private static double observed(ForecastTask task, Series series, int sample, int channel) {
        return task.snapshots().preparation().restore(channel, series.times()[sample], series.values().get(sample, channel));
    }
}
