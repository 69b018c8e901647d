package org.modestead.engine.forecast;

import java.util.List;
import java.util.Objects;
import java.util.OptionalDouble;

/**
 * What to forecast and how to judge it.
 *
 * @param route by modes or by projection
 * @param origin where the forecast table starts
 * @param horizon how far, in time units, positive, rounded up to whole steps; empty: the length of the longest
 *     holdout run, without holdout 10 % of the longest run
 * @param coverage share of the observations that the bands should hold, in (0, 1), for example 0.9
 * @param season steps in one season of the seasonal naive baseline; 0: guessed from the period of the strongest
 *     oscillating mode; below 2 there is no such baseline
 * @param scoreHorizons horizons to score, in time units, positive, rounded up to whole steps; empty: one step, a
 *     quarter, half and the whole of the horizon, as far as the holdout reaches
 */
public record ForecastPlan(
        Route route,
        Origin origin,
        OptionalDouble horizon,
        double coverage,
        int season,
        List<Double> scoreHorizons) {

    /** Automatic route from the end of the recording, 90 % bands, season guessed. */
    public static final ForecastPlan DEFAULT =
            new ForecastPlan(Route.AUTO, Origin.RECORDING_END, OptionalDouble.empty(), 0.9, 0, List.of());

    /**
     * Takes immutable copies and checks the ranges.
     *
     * @throws ForecastFault if a horizon is not finite and positive, the coverage not in (0, 1) or the season negative
     */
    public ForecastPlan {
        Objects.requireNonNull(route);
        Objects.requireNonNull(origin);
        scoreHorizons = List.copyOf(scoreHorizons);
        horizon.ifPresent(time -> requirePositive("forecast horizon", time));
        scoreHorizons.forEach(time -> requirePositive("score horizon", time));
        if (!(coverage > 0 && coverage < 1)) {
            throw new ForecastFault("forecast coverage", "it is " + coverage,
                    "it must lie between 0 and 1, for example 0.9");
        }
        if (season < 0) {
            throw new ForecastFault("forecast season", "it is " + season + " steps", "it must be 0 (guessed) or more");
        }
    }

    private static void requirePositive(String where, double time) {
        if (!(time > 0 && time < Double.POSITIVE_INFINITY)) {
            throw new ForecastFault(where, "it is " + time, "it must be a positive time");
        }
    }
}
