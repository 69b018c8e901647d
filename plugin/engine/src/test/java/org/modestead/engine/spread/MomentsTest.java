package org.modestead.engine.spread;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

class MomentsTest {

    private static Moments cell(int functions, int channels, Random random) {
        return new Moments(matrix(functions, functions, random), matrix(functions, functions, random), matrix(functions, functions, random),
                matrix(functions, channels, random));
    }

    private static DMatrixRMaj matrix(int rows, int columns, Random random) {
        return DMatrixRMaj.wrap(rows, columns, random.doubles((long) rows * columns, -1, 1).toArray());
    }

    @Test
    void sumsOfSeveralDrawsAreThoseOfEachDraw() {
        Random random = new Random(1);
        List<Moments> cells = new ArrayList<>();
        for (int k = 0; k < 30; k++) {
            cells.add(cell(70, 3, random)); // 4900 sums, more than one strip
        }
        List<double[]> times = new ArrayList<>();
        for (int b = 0; b < 7; b++) {
            times.add(random.ints(cells.size(), 0, 4).asDoubleStream().toArray());
        }
        List<Moments> sums = Moments.sums(cells, times);
        assertEquals(times.size(), sums.size());
        for (int b = 0; b < times.size(); b++) {
            Moments expected = Moments.sum(cells, times.get(b));
            assertNear(expected.gram(), sums.get(b).gram());
            assertNear(expected.cross(), sums.get(b).cross());
            assertNear(expected.second(), sums.get(b).second());
            assertNear(expected.observable(), sums.get(b).observable());
        }
    }

    /** Thirty terms of at most three, in another order: a few roundings of ninety. */
    private static void assertNear(DMatrixRMaj expected, DMatrixRMaj actual) {
        assertEquals(expected.numRows, actual.numRows);
        assertEquals(expected.numCols, actual.numCols);
        for (int i = 0; i < expected.data.length; i++) {
            assertEquals(expected.data[i], actual.data[i], 1e-13);
        }
    }
}
