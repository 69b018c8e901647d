package org.modestead.engine.moments;

import java.util.Objects;

/**
 * What of a recording is kept in memory for the steps that must look at it: the size of modes, intervals, held-out residuals, forecasts.
 * Runs are cut into stretches by time; those with the smallest draws are kept up to a number of samples, which is a random sample that does not
 * depend on the order of reading and merges (bottom-k sampling: Cohen and Kaplan, PODC 2007).
 *
 * @param seed of the draws
 * @param apart what the fit must not see
 * @param stretch samples of a stretch, at least 2
 * @param training most samples kept of what trains, at least one stretch
 * @param judging most samples kept of each of the other parts, at least one stretch
 */
public record Keeping(long seed, Apart apart, int stretch, int training, int judging) {

    /** Checks the ranges. */
    public Keeping {
        Objects.requireNonNull(apart);
        if (stretch < 2 || training < stretch || judging < stretch) {
            throw new IllegalArgumentException("stretches of " + stretch + " samples, " + training + " and " + judging + " kept");
        }
    }
}
