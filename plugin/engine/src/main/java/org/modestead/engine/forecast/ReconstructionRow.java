package org.modestead.engine.forecast;

/**
 * One observed value and what the fitted functions make of the state it belongs to, in recorded units.
 *
 * @param run name of the run
 * @param time of the sample, in the time unit
 * @param channel index among the snapshots' channels, from 0
 * @param observed value after gap policy and resampling
 * @param reconstructed value
 */
public record ReconstructionRow(String run, double time, int channel, double observed, double reconstructed) {}
