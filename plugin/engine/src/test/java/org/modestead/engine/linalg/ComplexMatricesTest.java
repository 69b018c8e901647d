package org.modestead.engine.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.junit.jupiter.api.Test;

class ComplexMatricesTest {

    @Test
    void theConjugateTransposeTimesARealMatrixIsThatTimesItAsAComplexOne() {
        ZMatrixRMaj a = ComplexMatrices.joined(AwkwardMatrices.random(7, 4, 61), AwkwardMatrices.random(7, 4, 62));
        DMatrixRMaj b = AwkwardMatrices.random(7, 5, 63);
        ZMatrixRMaj expected = ComplexMatrices.conjugateTransposeProduct(a, ComplexMatrices.of(b));
        ZMatrixRMaj found = ComplexMatrices.conjugateTransposeProduct(a, b);
        for (int i = 0; i < expected.data.length; i++) {
            // sums of seven products of numbers of order 1
            assertEquals(expected.data[i], found.data[i], 1e-14 * Math.max(1, Math.abs(expected.data[i])));
        }
    }
}
