package org.modestead.engine.wellposed;

/**
 * Whether one exact eigenfunction carries all that a cluster of eigenvalues at the fitted rank carries. Directions that only rounding fills add eigenvalues of
 * their own anywhere, next to a true one as well, and such neighbours look like a defective motion. Where a lower rung has one function that moves as its rate
 * says on the judging runs and adds to the signal what the whole cluster adds, nothing is left for a generalised eigenfunction {@code t e^(λt)}: the motion is
 * not defective, or not in a part that the signal has.
 *
 * <p>Alone means that the rung did not need a second function to take away most of the first: of one function normed in the space the weight vector has the size
 * {@code weight ‖φ‖_H / ‖φ‖_L2}, while halves of a defective motion that lie ε apart have weights of some 1/ε times that, against one another.
 */
final class CarriedAlone {

    /** A thousandth of the mode: more than rounding and quadrature leave, less than any part that is told of. */
    private static final double EXACT = 1e-3;

    /** The weight vector of an oscillation and its conjugate together is up to √2 times that of one function; halves of one motion are far above. */
    private static final double ALONE = 2;

    private CarriedAlone() {}

    static boolean at(int mode, Evidence evidence) {
        double whole = evidence.fittedOf(mode).weight();
        return evidence.ladderOf(mode).stream().anyMatch(row -> row.rank() < evidence.operator().rank() && row.rawResidual() <= EXACT
                && row.weightNorm() <= ALONE * row.weight() * row.normRatio()
                && NoiseEffect.relativeDifference(row.weight(), whole) <= EXACT);
    }
}
