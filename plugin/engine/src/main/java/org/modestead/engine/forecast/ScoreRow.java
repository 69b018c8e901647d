package org.modestead.engine.forecast;

/**
 * How well one method forecast the holdout up to one horizon.
 *
 * <p>Pooled over channels and over lead times 1, 2, ..., h steps, from every origin from which the whole horizon is
 * observed. Errors are in recorded units when there is one channel or all channels share a known unit, and in
 * prepared units (recorded error divided by the channel's scale) otherwise.
 *
 * @param method {@code modal}, {@code projection}, {@code persistence}, {@code seasonal-naive}, {@code drift} or
 *     {@code mean}
 * @param horizon h times the step, in time units
 * @param rmse root mean squared error
 * @param mae mean absolute error
 * @param mase mean absolute scaled error, see {@link Scores#naiveScale}; no unit; NaN without a training scale
 * @param coverage share of the observations inside the bands, over the lead times that have one and the origins that
 *     they were not calibrated on, in [0, 1]; NaN without any
 * @param intervalScore mean interval score of the same bands, see {@link Scores#interval}; NaN without any
 */
public record ScoreRow(
        String method, double horizon, double rmse, double mae, double mase, double coverage, double intervalScore) {}
