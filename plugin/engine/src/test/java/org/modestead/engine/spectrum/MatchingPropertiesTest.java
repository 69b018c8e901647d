package org.modestead.engine.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class MatchingPropertiesTest {

    @Property(tries = 200)
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
