package org.modestead.engine.spectrum;

import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Complex;

/** Recognises the constant function with rate 0, which is an eigenfunction of every motion and so is no evidence. */
public final class ConstantFunction {

    private static final double SPREAD = 0.02;

    private ConstantFunction() {}

    /**
     * Tells whether an eigenfunction is constant on sampled states (spread at most 2 % of its mean) and moves by at most 2 %
     * over the longest run.
     *
     * @param functions p x r values of the eigenfunctions
     * @param j which
     * @param rate its λ
     * @param longest duration of the longest run
     */
    public static boolean is(ZMatrixRMaj functions, int j, Complex rate, double longest) {
        if (rate.im() != 0 || Math.abs(rate.re()) * longest > SPREAD) {
            return false;
        }
        double mean = 0;
        for (int i = 0; i < functions.numRows; i++) {
            mean += functions.getReal(i, j) / functions.numRows;
        }
        double spread = 0;
        for (int i = 0; i < functions.numRows; i++) {
            spread += Math.pow(functions.getReal(i, j) - mean, 2) / functions.numRows;
        }
        return Math.sqrt(spread) <= SPREAD * Math.abs(mean);
    }
}
