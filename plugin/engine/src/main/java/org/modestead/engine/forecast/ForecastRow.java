package org.modestead.engine.forecast;

/**
 * One forecast value, in recorded units.
 *
 * @param run name of the run it continues
 * @param time that is forecast, in the time unit
 * @param channel index among the snapshots' channels, from 0
 * @param value forecast, finite
 * @param low lower end of the band; NaN where there is no band
 * @param high upper end of the band; NaN where there is no band
 */
public record ForecastRow(String run, double time, int channel, double value, double low, double high) {}
