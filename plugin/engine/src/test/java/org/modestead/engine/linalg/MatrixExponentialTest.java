package org.modestead.engine.linalg;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.nonstiff.DormandPrince853Integrator;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;

class MatrixExponentialTest {

    @Test
    void exponentialOfZeroIsTheIdentity() {
        assertArrayEquals(CommonOps_DDRM.identity(4).data, MatrixExponential.of(new DMatrixRMaj(4, 4)).data);
    }

    @Test
    void exponentialOfARotationIsCosineAndSine() {
        DMatrixRMaj e = MatrixExponential.of(new DMatrixRMaj(new double[][] {{0, -100}, {100, 0}}));
        // closed form; five squarings double the rounding five times
        assertEquals(Math.cos(100), e.get(0, 0), 1e-13);
        assertEquals(Math.sin(100), e.get(1, 0), 1e-13);
    }

    @Test
    void exponentialOfANilpotentIsItsFiniteSeries() {
        DMatrixRMaj e = MatrixExponential.of(AwkwardMatrices.jordan(4, 0));
        double[] series = {1, 1, 1.0 / 2, 1.0 / 6};
        for (int i = 0; i < 4; i++) {
            for (int j = 0; j < 4; j++) {
                assertEquals(j < i ? 0 : series[j - i], e.get(i, j), 1e-15);
            }
        }
    }

    @Test
    void itCarriesAStateAsAnIntegratorOfTheEquationDoes() {
        int n = 6;
        DMatrixRMaj a = AwkwardMatrices.random(n, n, 31);
        double[] start = {1, -1, 0.5, 2, 0, 1};
        OrdinaryDifferentialEquation equation = new OrdinaryDifferentialEquation() {
            @Override
            public int getDimension() {
                return n;
            }

            @Override
            public double[] computeDerivatives(double t, double[] y) {
                return times(a, y);
            }
        };
        double[] integrated = new DormandPrince853Integrator(1e-8, 0.1, 1e-13, 1e-13).integrate(equation,
                new ODEState(0, start), 1.5)
                .getPrimaryState();
        double[] carried = times(MatrixExponential.of(Matrices.scaled(a, 1.5)), start);
        for (int i = 0; i < n; i++) {
            // the integrator keeps 1e-13 a step over some hundred steps
            assertEquals(integrated[i], carried[i], 1e-10 * (1 + Math.abs(integrated[i])));
        }
    }

    @Test
    void anEntryThatIsNotFiniteIsAFault() {
        DMatrixRMaj a = AwkwardMatrices.random(3, 3, 32);
        for (double bad : new double[] {Double.NaN, Double.NEGATIVE_INFINITY}) {
            for (int at : new int[] {0, 4, 8}) {
                DMatrixRMaj broken = a.copy();
                broken.data[at] = bad;
                assertThrows(FitFault.class, () -> MatrixExponential.of(broken));
            }
        }
    }

    private static double[] times(DMatrixRMaj a, double[] x) {
        return Matrices.product(a, DMatrixRMaj.wrap(x.length, 1, x)).data;
    }
}
