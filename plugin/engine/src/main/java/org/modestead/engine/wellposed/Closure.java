package org.modestead.engine.wellposed;

import java.util.OptionalDouble;

/**
 * Whether the fitted functions are all there are, and whether a mode is an eigenfunction among them. Where the fitted rank takes in all
 * directions that are not rounding noise, the last of them clear of it, no function is left to join: the space is finite and the
 * compression is the operator on it, so that there is nothing to settle and no norm that could grow without bound. What is left to ask
 * is whether the mode moves as its eigenvalue says, to an accuracy that no imitation reaches by chance.
 *
 * <p>The residual on the judging runs, the share of the noise taken off, answers that. A projection that only imitates misses by several
 * per cent over its own time even on short runs (x' = x² seen through polynomials of degree 5: 6 to 20 %).
 */
final class Closure {

    /** Residual up to which a mode of a finite space counts as an eigenfunction. */
    static final double CLOSED = 0.05;

    /** The same where most of what is seen is noise, so that the rest is known less well. */
    private static final double CLOSED_IN_NOISE = 0.1;

    /** Share of the seen residual below which most of its square is noise. */
    private static final double MOSTLY_NOISE = 0.7;

    /**
     * Least square of the last singular value over the first. Where directions fade steadily, as in any space of infinitely many, the last
     * one before rounding lies close above it (1e-11): the ladder was cut, not ended.
     */
    private static final double CLEAR = 1e-7;

    private Closure() {}

    /** Whether no function is left to join. */
    static boolean ended(Evidence evidence) {
        int fitted = evidence.operator().rank();
        double[] singular = evidence.operator().compression().singular();
        return Ladder.trusted(evidence.operator()) == fitted && Math.pow(singular[fitted - 1] / singular[0], 2) > CLEAR;
    }

    /** Returns the residual of a mode of a space that has ended, where it is an eigenfunction of it; empty otherwise. */
    static OptionalDouble missed(int mode, Evidence evidence) {
        if (!ended(evidence)) {
            return OptionalDouble.empty();
        }
        return evidence.ladderOf(mode).stream().filter(row -> row.rank() == evidence.operator().rank() && closed(row))
                .mapToDouble(LadderRow::residual).findFirst();
    }

    private static boolean closed(LadderRow row) {
        return row.residual() <= CLOSED || row.residual() <= CLOSED_IN_NOISE && row.residual() <= MOSTLY_NOISE * row.rawResidual();
    }
}
