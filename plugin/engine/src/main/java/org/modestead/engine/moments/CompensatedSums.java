package org.modestead.engine.moments;

import org.ejml.data.DMatrixRMaj;

/**
 * A matrix of sums, each held as an unevaluated pair {@code high + low}: the rounding error of every addition is found exactly and carried
 * along (two-sum). So after k additions, in whatever order and however they were grouped,
 *
 * <pre>    |high + low - Σ s_i| &lt;= k² u² Σ |s_i|,    u = 2⁻⁵³</pre>
 *
 * which is below the rounding of the result itself for any number of blocks that a machine can read.
 *
 * <p>Knuth, The Art of Computer Programming 2, section 4.2.2 (two-sum); Ogita, Rump and Oishi, SIAM J. Sci. Comput. 26:1955, 2005,
 * proposition 4.5 (bound).
 *
 * @param rows of the matrix
 * @param columns of the matrix
 * @param high leading parts, row by row; not modified
 * @param low what rounding left, likewise
 */
public record CompensatedSums(int rows, int columns, double[] high, double[] low) {

    /** Checks the sizes. */
    public CompensatedSums {
        if (high.length != rows * columns || low.length != high.length) {
            throw new IllegalArgumentException(high.length + " and " + low.length + " sums for " + rows + " x " + columns);
        }
    }

    /** Sums of nothing. */
    static CompensatedSums zero(int rows, int columns) {
        return new CompensatedSums(rows, columns, new double[rows * columns], new double[rows * columns]);
    }

    /**
     * Returns the sums of both together.
     *
     * @throws IllegalArgumentException if the sizes differ
     */
    public CompensatedSums plus(CompensatedSums other) {
        if (other.rows != rows || other.columns != columns) {
            throw new IllegalArgumentException("sums of " + rows + " x " + columns + " and " + other.rows + " x " + other.columns);
        }
        Running sums = new Running(this);
        sums.add(other.high);
        sums.add(other.low);
        return sums.total();
    }

    /** Returns the sums rounded once. */
    public DMatrixRMaj value() {
        double[] out = new double[high.length];
        for (int i = 0; i < out.length; i++) {
            out[i] = high[i] + low[i];
        }
        return DMatrixRMaj.wrap(rows, columns, out);
    }

    /** Sums that grow, for one thread. */
    static final class Running {
        private final int rows;
        private final int columns;
        private final double[] high;
        private final double[] low;

        Running(CompensatedSums from) {
            this.rows = from.rows;
            this.columns = from.columns;
            this.high = from.high.clone();
            this.low = from.low.clone();
        }

        /** Adds one term to every sum. */
        void add(double[] terms) {
            for (int i = 0; i < high.length; i++) {
                add(i, terms[i]);
            }
        }

        /** Adds one term to one sum. */
        void add(int i, double term) {
            double sum = high[i] + term;
            double part = sum - high[i];
            low[i] += (high[i] - (sum - part)) + (term - part);
            high[i] = sum;
        }

        CompensatedSums total() {
            return new CompensatedSums(rows, columns, high.clone(), low.clone());
        }
    }
}
