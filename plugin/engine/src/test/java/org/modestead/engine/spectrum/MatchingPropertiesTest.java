package org.modestead.engine.spectrum;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class MatchingPropertiesTest {

    @Property(tries = 200, seed = "20261201")
    void theTotalIsTheSmallestOfAllPermutations(@ForAll long seed, @ForAll @IntRange(min = 1, max = 6) int n) {
        Random random = new Random(seed);
        double[][] cost = new double[n][n];
        for (double[] row : cost) {
            for (int j = 0; j < n; j++) {
                row[j] = random.nextDouble();
            }
        }
        int[] matched = Matching.of(cost, 1);
        double total = 0;
        for (int i = 0; i < n; i++) {
            total += cost[i][matched[i]];
        }
        assertEquals(best(cost, 0, new boolean[n]), total, 1e-12);
    }

    /** A table is also searched when it is made ambiguous: two rows more that are equally near to a column more, and to nothing else. */
    @Property(tries = 200, seed = "20261201")
    void whatIsSeenAtOnceIsWhatASearchFinds(@ForAll long seed, @ForAll @IntRange(min = 1, max = 6) int rows,
            @ForAll @IntRange(min = 1, max = 6) int columns, @ForAll @IntRange(min = 1, max = 4) int scale) {
        Random random = new Random(seed);
        double[][] cost = new double[rows][columns];
        double[][] ambiguous = new double[rows + 2][columns + 1];
        for (int i = 0; i < rows + 2; i++) {
            for (int j = 0; j < columns + 1; j++) {
                boolean inner = i < rows && j < columns;
                ambiguous[i][j] = inner ? scale * random.nextDouble() : i >= rows && j == columns ? 0.5 : 9;
                if (inner) {
                    cost[i][j] = ambiguous[i][j];
                }
            }
        }
        assertArrayEquals(Matching.of(cost, 1), Arrays.copyOf(Matching.of(ambiguous, 1), rows));
    }

    private static double best(double[][] cost, int row, boolean[] taken) {
        if (row == cost.length) {
            return 0;
        }
        double best = Double.POSITIVE_INFINITY;
        for (int j = 0; j < cost.length; j++) {
            if (!taken[j]) {
                taken[j] = true;
                best = Math.min(best, cost[row][j] + best(cost, row + 1, taken));
                taken[j] = false;
            }
        }
        return best;
    }
}
