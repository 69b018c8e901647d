package org.modestead.engine.forecast;

import java.util.List;
import java.util.Objects;
import org.modestead.engine.Doubt;

/**
 * What a forecast hands on.
 *
 * @param forecast by run, time and channel
 * @param reconstruction of every part, by part, run, time and channel
 * @param scores by method and horizon; empty without holdout
 * @param routeUsed {@link Route#MODAL} or {@link Route#PROJECTION}
 * @param summary what was done and how it came out, one sentence each
 * @param doubts what a reader of the results must know
 */
public record ForecastResult(
        List<ForecastRow> forecast,
        List<ReconstructionRow> reconstruction,
        List<ScoreRow> scores,
        Route routeUsed,
        List<String> summary,
        List<Doubt> doubts) {

    /** Takes immutable copies. */
    public ForecastResult {
        Objects.requireNonNull(routeUsed);
        forecast = List.copyOf(forecast);
        reconstruction = List.copyOf(reconstruction);
        scores = List.copyOf(scores);
        summary = List.copyOf(summary);
        doubts = List.copyOf(doubts);
    }
}
