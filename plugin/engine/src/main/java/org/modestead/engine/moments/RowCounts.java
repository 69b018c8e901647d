package org.modestead.engine.moments;

/**
 * What a pass counted.
 *
 * @param rows read
 * @param runs begun
 * @param gaps found
 * @param missing rows left out because a channel had no number
 * @param scattered training samples left out because their piece has too few for two states
 * @param training samples that train
 */
public record RowCounts(long rows, long runs, long gaps, long missing, long scattered, long training) {

    static final RowCounts NONE = new RowCounts(0, 0, 0, 0, 0, 0);

    /** Returns those of both together. */
    public RowCounts plus(RowCounts other) {
        return new RowCounts(rows + other.rows, runs + other.runs, gaps + other.gaps, missing + other.missing, scattered + other.scattered,
                training + other.training);
    }
}
