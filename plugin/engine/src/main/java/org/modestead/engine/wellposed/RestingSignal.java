package org.modestead.engine.wellposed;

import java.util.Optional;
import java.util.function.IntToDoubleFunction;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.operator.OrthonormalCompression;

/**
 * Where the norm of the projected signal rests while functions join,
 *
 * <pre>    ‖P_r g‖²_H = Σ_(i ≤ r) Σ_k &lt;g_k, q_i&gt;²</pre>
 *
 * A function belongs to the space restricted to the set that was visited just where this is bounded, also where it does not belong to the space as a
 * whole: the coordinates are in a Gaussian space on a circle and not on an interval (the restriction theorem of Aronszajn 1950, section 1.5). On an
 * interval the sum goes on growing by a fifth or so with every other function (the parity of the signal). It rests where squared singular values fall by
 * three decades over at least four further functions and it grows by no more than a five-hundredth; where it does not rest, four functions
 * were never seen to reach a third of that fall. Noise off the set adds directions of its own with singular values as small as
 * the noise, and there it rises again; that says nothing about the set.
 *
 * @param from rank from which it rests
 * @param to rank up to which it does
 * @param squaredNorm of the signal in the restricted space, summed over the channels
 */
record RestingSignal(int from, int to, double squaredNorm) {

    private static final double LEAST_FALL = 1e3;
    private static final int LEAST_FURTHER = 4;
    private static final double GROWTH = 1.002;

    /** Least share of the signal's variance that the resting projection must hold on the judging runs, or it rests elsewhere. */
    private static final double HELD = 0.98;

    /**
     * Returns the first rest; empty where there is none.
     *
     * @param compression in the norm of the space
     * @param held share of the signal's variance that the projection of a rank holds on the judging runs
     */
    static Optional<RestingSignal> of(OrthonormalCompression compression, IntToDoubleFunction held) {
        double[] singular = compression.singular();
        double[] sums = sums(compression.observable());
        for (int a = 0; a < sums.length; a++) {
            int b = a;
            while (b + 1 < sums.length && sums[b + 1] <= GROWTH * sums[a]) {
                b++;
            }
            if (b - a >= LEAST_FURTHER && Math.pow(singular[a] / singular[b], 2) >= LEAST_FALL && held.applyAsDouble(a + 1) >= HELD) {
                return Optional.of(new RestingSignal(a + 1, b + 1, sums[b]));
            }
        }
        return Optional.empty();
    }

    private static double[] sums(DMatrixRMaj observable) {
        double[] sums = new double[observable.numRows];
        double sum = 0;
        for (int i = 0; i < sums.length; i++) {
            for (int k = 0; k < observable.numCols; k++) {
                sum += observable.get(i, k) * observable.get(i, k);
            }
            sums[i] = sum;
        }
        return sums;
    }
}
