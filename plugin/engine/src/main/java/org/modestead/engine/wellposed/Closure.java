package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.OrthonormalCompression;

/**
 * Whether the fitted functions are all there are, and whether a mode is an eigenfunction among them. Where the fitted rank takes in all
 * directions that are not rounding noise, the last of them clear of it, no function is left to join: the space is finite and the
 * compression is the operator on it, so that there is nothing to settle and no norm that could grow without bound. What is left to ask
 * is whether the mode moves as its eigenvalue says.
 *
 * <p>A space of so few functions that no ladder of three rungs stands in it (the lines of three channels, say) has been seen whole as well where
 * the ladder reaches its end: noise joins the last function, which a fit that predicts best leaves out. And a dictionary of which the
 * ladder takes in every function has ended, however faint its last direction, for a mode that is an eigenfunction with and without that.
 *
 * <p>The residual on the judging runs answers that: in a finite space an eigenfunction misses by rounding or by what the noise explains, while a
 * projection that only imitates misses by more, however little that may be (x' = x² seen through polynomials of degree 5: 0.5 to 20 %).
 */
final class Closure {

    /** Residual up to which nothing but rounding, and what stacked samples leave between them, is to blame. */
    private static final double EXACT = 1e-3;

    /** The same of a generator, whose integrals along the runs are quadratures: a tenth of a radian a step costs about so much. */
    private static final double EXACT_QUADRATURE = 3e-3;

    /** Largest residual of an eigenfunction that noise blurs. */
    private static final double BLURRED = 0.1;

    /**
     * Largest square of what is left of the residual once the noise is taken off, over what was taken off. The fitted rates carry the noise of
     * the training runs, so that the two are of one size where the mode is an eigenfunction; an imitation misses by many times that.
     */
    private static final double TIMES_NOISE = 8;

    /** Largest share of it where there is no sign of an imitation at all. */
    private static final double TENTH = 0.1;

    /**
     * Least square of the last singular value over the first. Where directions fade steadily, as in any space of infinitely many, the last
     * one before rounding lies close above it (1e-11): the ladder was cut, not ended.
     */
    private static final double CLEAR = 1e-7;

    private Closure() {}

    /** Returns the rank of the whole space where the ladder reaches its end; empty otherwise. */
    private static OptionalInt whole(Evidence evidence) {
        int trusted = Ladder.trusted(evidence.operator());
        double[] singular = evidence.operator().functions().singular();
        boolean reached = trusted == evidence.operator().rank() || evidence.rungs().size() < Settling.LEAST_RUNGS && evidence.rungs().contains(trusted);
        return reached && Math.pow(singular[trusted - 1] / singular[0], 2) > CLEAR ? OptionalInt.of(trusted) : OptionalInt.empty();
    }

    /**
     * Returns a mode as it is among all functions of a dictionary, where noise explains all but a tenth of its squared residual there and with one
     * function less. A dictionary has so many functions and no more; the landmarks of a kernel are a choice among functions without end.
     */
    private static Optional<LadderRow> twice(int mode, Evidence evidence) {
        OrthonormalCompression compression = evidence.operator().compression();
        int all = compression.basis().size();
        int last = evidence.rungs().size() - 1;
        if (compression.innerProduct() != InnerProduct.DATA || last < 1 || evidence.rungs().get(last) != all) {
            return Optional.empty();
        }
        List<LadderRow> top = evidence.ladderOf(mode).stream().filter(row -> row.rank() >= evidence.rungs().get(last - 1)).toList();
        return top.size() == 2 && top.stream().allMatch(row -> row.takenOff() > 0 && row.withinNoise(TENTH)) ? Optional.of(top.get(1)) : Optional.empty();
    }

    /** Returns a mode of a space that has ended as it is in all of it, where it is an eigenfunction; empty otherwise. */
    static Optional<LadderRow> row(int mode, Evidence evidence) {
        OptionalInt whole = whole(evidence);
        return evidence.ladderOf(mode).stream().filter(row -> whole.isPresent() && row.rank() == whole.getAsInt() && closed(row, evidence)).findFirst()
                .or(() -> twice(mode, evidence));
    }

    /** Returns the residual of a mode of a space that has ended, where it is an eigenfunction of it; empty otherwise. */
    static OptionalDouble missed(int mode, Evidence evidence) {
        return row(mode, evidence).stream().mapToDouble(LadderRow::residual).findFirst();
    }

    private static boolean closed(LadderRow row, Evidence evidence) {
        boolean quadrature = evidence.operator().evolution() instanceof Evolution.Generator;
        return row.residual() <= (quadrature ? EXACT_QUADRATURE : EXACT) || row.residual() <= BLURRED && row.withinNoise(TIMES_NOISE);
    }
}
