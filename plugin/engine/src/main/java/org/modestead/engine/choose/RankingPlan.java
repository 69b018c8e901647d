package org.modestead.engine.choose;

/**
 * How kernels are compared.
 *
 * @param largestRank largest rank tried for each kernel, at least 1
 * @param stepsAhead sampling steps over which a prediction reaches, at least 1
 * @param judged how many kernels of every family are judged, those of the least error; 0 for none
 */
public record RankingPlan(int largestRank, int stepsAhead, int judged) {

    /** Checks the ranges. */
    public RankingPlan {
        if (largestRank < 1 || stepsAhead < 1 || judged < 0) {
            throw new IllegalArgumentException("largest rank " + largestRank + ", " + stepsAhead + " steps ahead, " + judged + " judged");
        }
    }
}
