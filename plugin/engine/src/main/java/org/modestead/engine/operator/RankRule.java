package org.modestead.engine.operator;

/** How the rank r is chosen. */
public sealed interface RankRule {

    /**
     * As told.
     *
     * @param rank at least 1; more than the data hold is refused
     */
    record Fixed(int rank) implements RankRule {}

    /**
     * The smallest rank whose squared singular values hold a share of their sum.
     *
     * @param share in (0, 1]
     */
    record Energy(double share) implements RankRule {}

    /**
     * Singular values above {@code ω(β)} times their median, the optimal hard threshold under white noise of unknown
     * size, β the aspect ratio. Gavish and Donoho, IEEE Trans. Inf. Theory 60:5040, 2014, equation 5 with the
     * approximation {@code ω(β) ≈ 0.56β³ - 0.95β² + 1.82β + 1.43}.
     */
    record HardThreshold() implements RankRule {}

    /**
     * The rank that predicts best one step ahead on a quarter of the training data that is left out while choosing.
     *
     * @param largest largest rank tried, at least 1
     */
    record Holdout(int largest) implements RankRule {}

    /**
     * The singular values that stand above the last clear drop, {@code s_{r+1} <= s_r / 5}: under weak noise a sum of few modes in stacked
     * samples ends in such a drop, and what follows it falls slowly. Where there is none up to the largest rank, {@link Holdout} decides.
     * Juang and Pappa, J. Guidance 8:620, 1985, take the same drop for the order of a system.
     *
     * @param largest largest rank tried, at least 1
     */
    record Drop(int largest) implements RankRule {}
}
