package org.modestead.engine.operator;

import java.util.Optional;
import org.modestead.engine.basis.FunctionBasis;

/**
 * The orthonormal functions q_1..q_R that data hold, of which the leading r are the compression of rank r: all of them at hand
 * ({@link OrthonormalCompression}), or those up to the fitted rank at hand and the others made when somebody asks ({@link StagedFunctions}).
 */
public sealed interface Whitened permits OrthonormalCompression, StagedFunctions {

    /** Returns the functions b_1..b_p from which the q are combined. */
    FunctionBasis basis();

    /** Returns the R singular values of the whitening, falling, positive. */
    double[] singular();

    /** Returns the number of snapshot pairs or occupation functions behind it. */
    int snapshots();

    /** Returns in which the q are orthonormal. */
    InnerProduct innerProduct();

    /** Returns step map or generator. */
    Evolution evolution();

    /** Returns what known inputs add, where they are separated. */
    Optional<InputEffect> inputs();

    /** Returns R, the largest rank. */
    default int rank() {
        return singular().length;
    }

    /** Returns the number of functions of the state that the q are combined from. */
    default int functions() {
        return basis().size() - inputs().map(effect -> effect.terms().size()).orElse(0);
    }

    /**
     * Returns the compression onto the leading r functions: the same bytes whatever was asked before.
     *
     * @param r in [1, R]
     */
    OrthonormalCompression leading(int r);

    /** Returns the compression onto all R functions, whose leading ones are those of {@link #leading}. */
    OrthonormalCompression whole();

    /**
     * Returns the same functions, ready to be used at a rank.
     *
     * @param r in [1, R]
     */
    Whitened at(int r);
}
