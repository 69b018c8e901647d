package org.modestead.engine.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

class MatrixExponentialPropertiesTest {

    @Property(tries = 150, seed = "20261201")
    void longTimesAreShortTimesInARow(@ForAll long seed, @ForAll @IntRange(min = 1, max = 12) int n,
            @ForAll @DoubleRange(min = 0, max = 3) double s, @ForAll @DoubleRange(min = 0, max = 3) double t) {
        DMatrixRMaj a = AwkwardMatrices.random(n, n, seed);
        DMatrixRMaj first = MatrixExponential.of(Matrices.scaled(a, s));
        DMatrixRMaj second = MatrixExponential.of(Matrices.scaled(a, t));
        DMatrixRMaj whole = MatrixExponential.of(Matrices.scaled(a, s + t));
        DMatrixRMaj chained = Matrices.product(first, second);
        // errors are relative to the sizes that are multiplied, which may cancel in the product
        double size = n * CommonOps_DDRM.elementMaxAbs(first) * CommonOps_DDRM.elementMaxAbs(second);
        for (int i = 0; i < n * n; i++) {
            assertEquals(whole.data[i], chained.data[i], 1e-12 * size);
        }
    }

    @Property(tries = 100, seed = "20261201")
    void determinantIsTheExponentialOfTheTrace(@ForAll long seed, @ForAll @IntRange(min = 1, max = 6) int n) {
        DMatrixRMaj a = AwkwardMatrices.random(n, n, seed);
        double expected = Math.exp(CommonOps_DDRM.trace(a));
        DMatrixRMaj e = MatrixExponential.of(a);
        // a determinant is good to the product of the column sizes
        double size = 1;
        for (int j = 0; j < n; j++) {
            double column = 0;
            for (int i = 0; i < n; i++) {
                column = Math.hypot(column, e.get(i, j));
            }
            size *= column;
        }
        assertEquals(expected, CommonOps_DDRM.det(e), 1e-12 * (expected + size));
    }
}
