package org.modestead.engine.forecast;

import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import org.modestead.engine.forecast.Backtest.Errors;

/** How well the methods forecast the holdout as distributions, in a sentence. */
final class DistributionScores {

    private DistributionScores() {}

    /**
     * Returns the mean score of every method that has one, over all lead times up to the longest scored horizon and the
     * origins that did not calibrate; empty when the first method has none.
     *
     * @param methods the judged route first
     */
    static Optional<String> sentence(ForecastTask task, List<Judged> methods, ErrorUnits units) {
        int horizon = task.longestScored();
        if (horizon == 0 || Double.isNaN(mean(task, methods.get(0), units, horizon))) {
            return Optional.empty();
        }
        String scores = methods.stream().filter(method -> !Double.isNaN(mean(task, method, units, horizon)))
                .map(method -> method.route().id() + " " + Summary.figure(mean(task, method, units, horizon)))
                .collect(Collectors.joining(", "));
        return Optional.of("As distributions, each value with its errors of calibration around it, up to horizon "
                + Summary.figure(horizon * task.step()) + " (CRPS, smaller is better): " + scores + ".");
    }

    private static double mean(ForecastTask task, Judged method, ErrorUnits units, int horizon) {
        return Scores.mean(method.holdout().errors().stream().filter(task.bands()::judges)
                .filter(errors -> errors.leads() >= horizon)
                .flatMapToDouble(errors -> scores(errors, method.distribution(), units, horizon))
                .filter(score -> !Double.isNaN(score)));
    }

    private static DoubleStream scores(Errors errors, ErrorDistribution distribution, ErrorUnits units, int leads) {
        int n = errors.values().numCols;
        return IntStream.range(0, leads * n).mapToDouble(k -> units.pooled()[k % n]
                * distribution.score(k / n + 1, k % n, errors.values().data[k]));
    }
}
