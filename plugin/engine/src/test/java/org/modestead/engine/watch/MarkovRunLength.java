package org.modestead.engine.watch;

import java.util.Arrays;
import org.hipparchus.distribution.continuous.NormalDistribution;
import org.hipparchus.linear.Array2DRowRealMatrix;
import org.hipparchus.linear.ArrayRealVector;
import org.hipparchus.linear.LUDecomposition;
import org.hipparchus.linear.RealMatrix;

/**
 * Run length of a chart of moving averages as that of a Markov chain (Brook and Evans, Biometrika 59:539, 1972): the interval within the
 * limits is cut into t cells, the average stands in the middle of its cell, and the chance to move from cell i to cell j is that of a score
 * which carries it there. The run lengths solve {@code (I - P) L = 1}; the answer is that of the middle cell. Its error falls with t²
 * (Lucas and Saccucci, Technometrics 32:1, 1990), which one extrapolation removes. Written with another library than the engine's.
 */
final class MarkovRunLength {

    private static final int CELLS = 101;

    private MarkovRunLength() {}

    static double of(double weight, double limit, double mean, double deviation) {
        double coarse = of(weight, limit, mean, deviation, CELLS);
        double fine = of(weight, limit, mean, deviation, 3 * CELLS);
        return fine + (fine - coarse) / 8;
    }

    private static double of(double weight, double limit, double mean, double deviation, int cells) {
        NormalDistribution score = new NormalDistribution(mean, deviation);
        double width = 2 * limit / cells;
        RealMatrix system = new Array2DRowRealMatrix(cells, cells);
        for (int i = 0; i < cells; i++) {
            double carried = (1 - weight) * (-limit + (i + 0.5) * width);
            double below = score.cumulativeProbability((-limit - carried) / weight);
            for (int j = 0; j < cells; j++) {
                double above = score.cumulativeProbability((-limit + (j + 1) * width - carried) / weight);
                system.setEntry(i, j, (i == j ? 1 : 0) - (above - below));
                below = above;
            }
        }
        double[] ones = new double[cells];
        Arrays.fill(ones, 1);
        return new LUDecomposition(system).getSolver().solve(new ArrayRealVector(ones)).getEntry(cells / 2);
    }
}
