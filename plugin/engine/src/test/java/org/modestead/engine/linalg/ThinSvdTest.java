package org.modestead.engine.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.linalg.LinearAlgebra.Svd;

class ThinSvdTest {

    @ParameterizedTest
    @CsvSource({"700, 310", "310, 700", "320, 320"})
    void aLargeMatrixHasTheTriplesOfTheFullDecomposition(int rows, int columns) {
        // singular values 2^0, 2^-1, ..., 2^-19 by construction
        DMatrixRMaj a = withSingularValues(rows, columns, 20, 0.5);
        Svd svd = ThinSvd.of(a, 12);
        assertEquals(12, svd.values().length);
        for (int k = 0; k < 12; k++) {
            // through the smaller Gram matrix directions are found to about ε (s_1/s_k)², then refined
            assertEquals(Math.pow(0.5, k), svd.values()[k], 1e-9 * Math.pow(0.5, k));
        }
        assertTrue(AwkwardMatrices.orthogonalityRatio(svd.u()) < 30);
        assertTrue(AwkwardMatrices.orthogonalityRatio(svd.v()) < 30);
        assertPairs(a, svd, 1e-9);
    }

    @ParameterizedTest
    @CsvSource({"60, 20", "20, 60", "700, 310", "310, 700"})
    void aRankDeficientMatrixHasNoMoreNotableValuesThanItsRank(int rows, int columns) {
        DMatrixRMaj a = Matrices.product(AwkwardMatrices.random(rows, 5, 41), AwkwardMatrices.random(5, columns, 42));
        Svd svd = ThinSvd.of(a, 50);
        long notable = java.util.Arrays.stream(svd.values()).filter(s -> s > 1e-12 * svd.values()[0]).count();
        assertEquals(5, notable);
    }

    @Test
    void bothPathsAgreeOnTheSameMatrix() {
        // 300 columns go to the full decomposition; a column of zeros more goes through the Gram matrix
        DMatrixRMaj small = withSingularValues(500, 300, 15, 0.4);
        DMatrixRMaj large = new DMatrixRMaj(500, 301);
        for (int i = 0; i < 500; i++) {
            System.arraycopy(small.data, i * 300, large.data, i * 301, 300);
        }
        double[] full = ThinSvd.of(small, 15).values();
        double[] gram = ThinSvd.of(large, 15).values();
        for (int k = 0; k < 15; k++) {
            assertEquals(full[k], gram[k], 1e-12 * full[0]);
        }
    }

    @Test
    void aZeroMatrixHasTheValueZeroOnEitherPath() {
        assertEquals(0, ThinSvd.of(new DMatrixRMaj(4, 3), 2).values()[0]);
        assertEquals(0, ThinSvd.of(new DMatrixRMaj(400, 310), 2).values()[0]);
    }

    private static void assertPairs(DMatrixRMaj a, Svd svd, double tolerance) {
        DMatrixRMaj moved = Matrices.product(a, svd.v());
        for (int i = 0; i < a.numRows; i++) {
            for (int k = 0; k < svd.values().length; k++) {
                assertEquals(svd.u().get(i, k) * svd.values()[k], moved.get(i, k), tolerance);
            }
        }
    }

    private static DMatrixRMaj withSingularValues(int rows, int columns, int count, double ratio) {
        LinearAlgebra algebra = LinearAlgebra.installed();
        DMatrixRMaj u = algebra.svd(AwkwardMatrices.random(rows, count, 43)).u();
        DMatrixRMaj v = algebra.svd(AwkwardMatrices.random(columns, count, 44)).u();
        for (int i = 0; i < rows; i++) {
            for (int k = 0; k < count; k++) {
                u.set(i, k, u.get(i, k) * Math.pow(ratio, k));
            }
        }
        return Matrices.productTranspose(u, v);
    }
}
