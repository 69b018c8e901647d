package org.modestead.engine.wellposed;

import java.util.OptionalDouble;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.spectrum.Mode;

/**
 * Whether the span of the fitted functions is invariant: the motion leads from it into itself. The operator is then block triangular
 * in every larger span, so that its eigenpairs stay eigenpairs whatever joins, and no ladder is needed.
 *
 * <p>It can be told only where the span takes in all directions that are not rounding noise, the last of them clear of it. What is missed is the larger of the relative
 * one-step prediction error of the state and the residual of the mode, both on the judging runs.
 *
 * <p>Eigenpairs stay, but rounding may have split a defective one into several with nearly the same rate and eigenfunction; such a
 * mode is no evidence and nothing is said of it.
 */
final class Closure {

    /** Missed share up to which a span counts as invariant: far above rounding, far below a projection's error. */
    static final double CLOSED = 1e-6;

    /**
     * Least square of the last singular value over the first. Where directions fade steadily, as in any space of infinitely many, the last
     * one before rounding lies close above it (1e-11): the ladder was cut, not ended.
     */
    private static final double CLEAR = 1e-7;

    private static final double PARALLEL = 0.99;

    private Closure() {}

    /** Returns what is missed; empty where functions are left to join, the mode's residual is not known, or it may be defective. */
    static OptionalDouble missed(int mode, Evidence evidence) {
        int fitted = evidence.operator().rank();
        double[] singular = evidence.operator().compression().singular();
        boolean ended = Ladder.trusted(evidence.operator()) == fitted && Math.pow(singular[fitted - 1] / singular[0], 2) > CLEAR;
        if (!ended || splitFromAnother(mode, evidence)) {
            return OptionalDouble.empty();
        }
        double predicted = evidence.predictionErrors().get(evidence.rungs().indexOf(fitted));
        return evidence.ladderOf(mode).stream().filter(row -> row.rank() == fitted && !Double.isNaN(row.residual()))
                .mapToDouble(row -> Math.max(predicted, row.residual())).findFirst();
    }

    /** Whether another mode has a parallel eigenfunction and a rate that the length of the runs cannot tell apart. */
    private static boolean splitFromAnother(int number, Evidence evidence) {
        ZMatrixRMaj gram = ComplexMatrices.conjugateTransposeProduct(evidence.spectrum().vectors(), evidence.spectrum().vectors());
        Mode mode = evidence.spectrum().modes().get(number - 1);
        return evidence.spectrum().modes().stream().anyMatch(other -> other.number() != number
                && EigenfunctionOverlap.largest(gram, mode, other) > PARALLEL
                && Ladder.relativeChange(mode.rate(), other.rate(), evidence.longest()) < evidence.settings().settleThreshold());
    }
}
