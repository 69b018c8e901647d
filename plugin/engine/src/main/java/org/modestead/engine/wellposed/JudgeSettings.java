package org.modestead.engine.wellposed;

/**
 * Thresholds of the checks. Every one is a setting with a documented default.
 *
 * @param ladderFrom lowest rank of the ladder, 0 = 2
 * @param ladderTo highest rank of the ladder, 0 = three times the fitted rank, at least ten more, as far as rounding allows
 * @param shareThreshold energy share from which a mode counts for the overall verdict, in (0, 1); default 0.05
 * @param residualThreshold largest holdout residual of a mode, noise taken off, in (0, 1]; default 0.25
 * @param settleThreshold largest relative difference of rate or weight between the last telling rungs, in (0, 1]; default 0.1
 * @param normGrowthThreshold largest factor by which the space norm may grow from the first third of the ladder to the last, above 1;
 *     default 3
 * @param overlapThreshold largest overlap |&lt;φ, φ'&gt;| of unit eigenfunctions for {@code stands}, in (0, 1); default 0.1
 * @param gapThreshold largest relative difference of joint and solo weights for {@code stands}, in (0, 1); default 0.1
 * @param captureThreshold least share of the signal that the eigenfunctions must hold, in (0, 1); default 0.5
 * @param stepThreshold largest relative difference of rates between a step and the other step; default 0.1
 * @param completenessThreshold least goodness of fit with which 1/‖x‖ heads linearly to zero before a run counts as
 *     escaping, in (0, 1); default 0.98
 * @param replays with noise that a finding is held against, see {@link Replays}, at least 0 = none; default 8
 * @param splits of the runs that are judged in all where few runs were held out, see {@link Splits}, at least 1 = only the one at hand; default 5
 */
public record JudgeSettings(
        int ladderFrom,
        int ladderTo,
        double shareThreshold,
        double residualThreshold,
        double settleThreshold,
        double normGrowthThreshold,
        double overlapThreshold,
        double gapThreshold,
        double captureThreshold,
        double stepThreshold,
        double completenessThreshold,
        int replays,
        int splits) {

    /** The documented defaults. */
    public static final JudgeSettings DEFAULT = new JudgeSettings(0, 0, 0.05, 0.25, 0.1, 3, 0.1, 0.1, 0.5, 0.1, 0.98, 8, 5);

    /** The same with other ends of the ladder. */
    public JudgeSettings withLadder(int from, int to) {
        return new JudgeSettings(from, to, shareThreshold, residualThreshold, settleThreshold, normGrowthThreshold, overlapThreshold,
                gapThreshold, captureThreshold, stepThreshold, completenessThreshold, replays, splits);
    }

    /** The same with another number of replays. */
    public JudgeSettings withReplays(int count) {
        return new JudgeSettings(ladderFrom, ladderTo, shareThreshold, residualThreshold, settleThreshold, normGrowthThreshold, overlapThreshold,
                gapThreshold, captureThreshold, stepThreshold, completenessThreshold, count, splits);
    }

    /** The same with another number of splits. */
    public JudgeSettings withSplits(int count) {
        return new JudgeSettings(ladderFrom, ladderTo, shareThreshold, residualThreshold, settleThreshold, normGrowthThreshold, overlapThreshold,
                gapThreshold, captureThreshold, stepThreshold, completenessThreshold, replays, count);
    }
}
