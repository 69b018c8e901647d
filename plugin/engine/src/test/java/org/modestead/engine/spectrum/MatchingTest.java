package org.modestead.engine.spectrum;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import org.junit.jupiter.api.Test;

class MatchingTest {

    @Test
    void theTotalCostIsSmallestEvenWhereTheNearestPairIsGivenUp() {
        // greedy takes 1 and is left with 10; the best total is 2 + 2
        assertArrayEquals(new int[] {1, 0}, Matching.of(new double[][] {{1, 2}, {2, 10}}, 20));
    }

    @Test
    void pairsThatAreTooFarStayUnmatched() {
        assertArrayEquals(new int[] {0, -1}, Matching.of(new double[][] {{0.1, 5}, {5, 5}}, 1));
    }

    @Test
    void moreRowsThanColumnsLeaveRowsOver() {
        assertArrayEquals(new int[] {-1, 0, -1}, Matching.of(new double[][] {{3}, {1}, {2}}, 10));
    }

    @Test
    void moreColumnsThanRowsLeaveColumnsOver() {
        assertArrayEquals(new int[] {2}, Matching.of(new double[][] {{3, 2, 1}}, 10));
    }

    @Test
    void nothingMatchesNothing() {
        assertArrayEquals(new int[0], Matching.of(new double[0][0], 1));
        assertArrayEquals(new int[] {-1}, Matching.of(new double[1][0], 1));
    }
}
