package org.modestead.engine.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.junit.jupiter.api.Test;

class ComplexSystemTest {

    @Test
    void theSolutionOfASquareSystemReproducesTheRightSide() {
        ZMatrixRMaj v = ComplexMatrices.joined(AwkwardMatrices.random(5, 5, 51), AwkwardMatrices.random(5, 5, 52));
        DMatrixRMaj b = AwkwardMatrices.random(5, 3, 53);
        ZMatrixRMaj x = ComplexSystem.of(v).solve(b);
        for (int i = 0; i < 5; i++) {
            for (int k = 0; k < 3; k++) {
                Complex sum = Complex.ZERO;
                for (int j = 0; j < 5; j++) {
                    sum = sum.plus(ComplexMatrices.entry(v, i, j).times(ComplexMatrices.entry(x, j, k)));
                }
                // a random 5 x 5 matrix has condition some tens
                assertEquals(b.get(i, k), sum.re(), 1e-12);
                assertEquals(0, sum.im(), 1e-12);
            }
        }
    }

    @Test
    void theMissOfATallSystemIsOrthogonalToItsColumns() {
        ZMatrixRMaj v = ComplexMatrices.joined(AwkwardMatrices.random(8, 3, 54), AwkwardMatrices.random(8, 3, 55));
        DMatrixRMaj b = AwkwardMatrices.random(8, 1, 56);
        ZMatrixRMaj x = ComplexSystem.of(v).solve(b);
        for (int j = 0; j < 3; j++) {
            Complex product = Complex.ZERO;
            for (int i = 0; i < 8; i++) {
                Complex miss = new Complex(-b.get(i, 0), 0);
                for (int k = 0; k < 3; k++) {
                    miss = miss.plus(ComplexMatrices.entry(v, i, k).times(ComplexMatrices.entry(x, k, 0)));
                }
                product = product.plus(ComplexMatrices.entry(v, i, j).conj().times(miss));
            }
            assertEquals(0, product.abs(), 1e-12);
        }
    }

    @Test
    void parallelColumnsShareTheWeightInsteadOfFailing() {
        ZMatrixRMaj v = ComplexMatrices.of(new DMatrixRMaj(new double[][] {{0.6, 0.6}, {0.8, 0.8}}));
        ComplexSystem system = ComplexSystem.of(v);
        ZMatrixRMaj x = system.solve(new DMatrixRMaj(new double[][] {{3}, {4}}));
        // 5 = 2.5 + 2.5 is the shortest pair of weights
        assertEquals(2.5, x.getReal(0, 0), 1e-13);
        assertEquals(2.5, x.getReal(1, 0), 1e-13);
        assertTrue(system.condition() > 1e15);
    }

    @Test
    void conditionOfOrthonormalColumnsIsOne() {
        double s = Math.sqrt(0.5);
        ZMatrixRMaj v = ComplexMatrices.joined(new DMatrixRMaj(new double[][] {{s, s}, {0, 0}}),
                new DMatrixRMaj(new double[][] {{0, 0}, {s, -s}}));
        assertEquals(1, ComplexSystem.of(v).condition(), 1e-14);
    }
}
