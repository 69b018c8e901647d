package org.modestead.engine.forecast;

import java.util.Objects;

/**
 * How to backtest.
 *
 * @param forecast route, horizon, coverage, season and scored horizons; without horizon a quarter of the longest
 *     lead time that the holdout holds, so that most of it can serve as origin; its own origin is not used
 * @param origins largest number of origins over all holdout runs, at least 1
 * @param refit when the operator is fitted
 */
public record BacktestPlan(ForecastPlan forecast, int origins, Refit refit) {

    /** Ten origins, refitted before each. */
    public static final BacktestPlan DEFAULT = new BacktestPlan(ForecastPlan.DEFAULT, 10, Refit.EVERY_ORIGIN);

    /**
     * Checks the range.
     *
     * @throws ForecastFault if the number of origins is not positive
     */
    public BacktestPlan {
        Objects.requireNonNull(forecast);
        Objects.requireNonNull(refit);
        if (origins < 1) {
            throw new ForecastFault("backtest origins", "there are " + origins, "there must be at least 1");
        }
    }
}
