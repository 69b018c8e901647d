package org.modestead.engine.spread;

import org.modestead.engine.FitFault;

/**
 * How the sampling spread is measured.
 *
 * @param replicates number of resampled fits, at least 20
 * @param level share of recordings whose interval should hold the truth, in (0, 1)
 * @param seed of the one generator that draws all replicates
 */
public record SpreadPlan(int replicates, double level, long seed) {

    /** 200 replicates, 90 %, seed 1. */
    public static final SpreadPlan DEFAULT = new SpreadPlan(200, 0.9, 1);

    private static final int LEAST = 20;

    /** Checks the ranges. */
    public SpreadPlan {
        if (replicates < LEAST) {
            throw new FitFault("intervals", replicates + " replicates were asked for", "give at least " + LEAST);
        }
        if (!(level > 0 && level < 1)) {
            throw new FitFault("intervals", "the level is " + level, "give a level between 0 and 1, for example 0.9");
        }
    }
}
