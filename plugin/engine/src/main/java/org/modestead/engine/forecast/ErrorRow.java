package org.modestead.engine.forecast;

/**
 * One error of a backtest.
 *
 * @param method see {@link ScoreRow}
 * @param run id
 * @param origin time of the last known sample
 * @param horizon lead time, in time units
 * @param channel index
 * @param error forecast minus observed, recorded units
 */
public record ErrorRow(String method, String run, double origin, double horizon, int channel, double error) {}
