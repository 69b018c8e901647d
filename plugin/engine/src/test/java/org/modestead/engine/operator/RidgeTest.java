package org.modestead.engine.operator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.linalg.LinearAlgebra;

class RidgeTest {

    private static final DMatrixRMaj NOW = new DMatrixRMaj(new double[][] {{1, 0.2}, {0.3, -1}, {2, 0.5}, {-1, 0.7}});
    private static final DMatrixRMaj NEXT = new DMatrixRMaj(new double[][] {{0.9, 0.1}, {0.2, -0.8}, {1.7, 0.3}, {-0.8, 0.5}});

    private static OrthonormalCompression plain() {
        return new FactoredCompression(new Coordinates(2), NOW, NEXT, NOW, InnerProduct.DATA, new Evolution.StepMap(1)).whiten(2);
    }

    @Test
    void theEigenvaluesAreThoseOfTheTikhonovSolution() {
        double ridge = 0.1;
        OrthonormalCompression plain = plain();
        double first = plain.singular()[0] * plain.singular()[0];
        // independent: (G + rho s1^2 I) K = M solved as it stands, 2 x 2
        double[][] g = product(NOW, NOW);
        double[][] m = product(NOW, NEXT);
        g[0][0] += ridge * first;
        g[1][1] += ridge * first;
        double determinant = g[0][0] * g[1][1] - g[0][1] * g[1][0];
        double trace = (g[1][1] * m[0][0] - g[0][1] * m[1][0] + g[0][0] * m[1][1] - g[1][0] * m[0][1]) / determinant;
        double product = (m[0][0] * m[1][1] - m[0][1] * m[1][0]) / determinant;
        var values = LinearAlgebra.installed().eigen(Ridge.apply(plain, ridge).action()).values();
        assertEquals(trace, values.get(0).re() + values.get(1).re(), 1e-14, "trace, rounding only");
        assertEquals(product, values.get(0).times(values.get(1)).re(), 1e-14, "determinant, rounding only");
    }

    @Test
    void takingTheRidgeOffGivesTheActionBack() {
        OrthonormalCompression plain = plain();
        assertArrayEquals(plain.action().data, Ridge.removed(Ridge.apply(plain, 0.3), 0.3).data, 1e-15, "rounding only");
        assertSame(plain, Ridge.apply(plain, 0));
    }

    @Test
    void aNegativeRidgeIsAFault() {
        FitFault fault = assertThrows(FitFault.class, () -> Ridge.apply(plain(), -1));
        assertEquals("ridge: the ridge is -1.0; give 0 or a small positive number.", fault.getMessage());
    }

    private static double[][] product(DMatrixRMaj a, DMatrixRMaj b) {
        double[][] out = new double[2][2];
        for (int i = 0; i < 2; i++) {
            for (int j = 0; j < 2; j++) {
                for (int k = 0; k < a.numRows; k++) {
                    out[i][j] += a.get(k, i) * b.get(k, j);
                }
            }
        }
        return out;
    }
}
