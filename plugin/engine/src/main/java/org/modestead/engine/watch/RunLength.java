package org.modestead.engine.watch;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * Average run length of a two-sided chart of exponentially weighted moving averages: how many windows pass on the mean until
 *
 * <pre>    y_t = (1-w) y_(t-1) + w z_t,   y_0 = 0,   z_t independent N(m, d²)</pre>
 *
 * leaves {@code [-h, h]}. It solves the integral equation of Crowder (Technometrics 29:401, 1987)
 *
 * <pre>    L(u) = 1 + 1/w ∫_(-h)^h L(y) f((y - (1-w)u)/w) dy,   f the density of z</pre>
 *
 * at the nodes of Gauss and Legendre. The chart is that of Roberts, Technometrics 1:239, 1959.
 */
final class RunLength {

    /** Longest run length that is told: beyond it the equation is singular to rounding. */
    static final double LONGEST = 1e9;
    private static final GaussLegendre RULE = GaussLegendre.of(32);
    private static final double ROOT = 1 / Math.sqrt(2 * Math.PI);

    private RunLength() {}

    /**
     * @param weight w in (0, 1)
     * @param limit h, positive
     * @param mean m of the scores
     * @param deviation d of the scores, positive
     * @return at least 1, at most {@link #LONGEST}
     */
    static double of(double weight, double limit, double mean, double deviation) {
        int n = RULE.nodes().length;
        DMatrixRMaj system = CommonOps_DDRM.identity(n);
        double width = weight * deviation;
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                system.data[i * n + j] -= limit * RULE.weights()[j]
                        * density((limit * RULE.nodes()[j] - (1 - weight) * limit * RULE.nodes()[i] - weight * mean) / width) / width;
            }
        }
        DMatrixRMaj ones = new DMatrixRMaj(n, 1);
        CommonOps_DDRM.fill(ones, 1);
        DMatrixRMaj lengths = new DMatrixRMaj(n, 1);
        if (!CommonOps_DDRM.solve(system, ones, lengths)) {
            return LONGEST;
        }
        double sum = 1;
        for (int j = 0; j < n; j++) {
            sum += limit * RULE.weights()[j] * density((limit * RULE.nodes()[j] - weight * mean) / width) / width * lengths.data[j];
        }
        return sum >= 1 && sum < LONGEST ? sum : sum > 0 && sum < 1 ? 1 : LONGEST;
    }

    private static double density(double z) {
        return ROOT * Math.exp(-z * z / 2);
    }
}
