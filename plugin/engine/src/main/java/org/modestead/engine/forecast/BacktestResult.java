package org.modestead.engine.forecast;

import java.util.List;
import java.util.Objects;
import org.modestead.engine.Doubt;

/**
 * What a backtest hands on.
 *
 * @param scores by method and horizon, the route that the verdict allows first
 * @param errors by method, origin, scored horizon and channel
 * @param routeUsed {@link Route#MODAL} or {@link Route#PROJECTION}: the one that is judged; the other is scored too
 * @param summary what was done and how it came out, one sentence each
 * @param doubts what a reader of the results must know
 */
public record BacktestResult(
        List<ScoreRow> scores, List<ErrorRow> errors, Route routeUsed, List<String> summary, List<Doubt> doubts) {

    /** Takes immutable copies. */
    public BacktestResult {
        scores = List.copyOf(scores);
        errors = List.copyOf(errors);
        Objects.requireNonNull(routeUsed);
        summary = List.copyOf(summary);
        doubts = List.copyOf(doubts);
    }
}
