package org.modestead.engine.linalg;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.Duration;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.hipparchus.linear.EigenDecompositionNonSymmetric;
import org.hipparchus.linear.EigenDecompositionSymmetric;
import org.hipparchus.linear.MatrixUtils;
import org.hipparchus.linear.RealMatrix;
import org.hipparchus.linear.SingularValueDecomposition;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.modestead.engine.FitFault;

/**
 * What every implementation of {@link LinearAlgebra} must do. Numbers are judged by scaled residuals: below this
 * threshold an answer is as good as one rounding error in each entry of the input (common practice; LAPACK's own tests
 * use 20 to 50).
 */
public abstract class LinearAlgebraContract {

    private static final double THRESHOLD = 30;

    protected abstract LinearAlgebra algebra();

    @TestFactory
    Stream<DynamicTest> eigenpairsSolveTheEigenproblem() {
        return AwkwardMatrices.square().entrySet().stream().map(entry -> DynamicTest.dynamicTest(entry.getKey(), () -> {
            double ratio = AwkwardMatrices.eigenRatio(entry.getValue(), algebra().eigen(entry.getValue()));
            assertTrue(ratio < THRESHOLD, "scaled residual " + ratio);
        }));
    }

    @TestFactory
    Stream<DynamicTest> eigenvectorsHaveLengthOneAndTheirLargestEntryIsPositive() {
        return AwkwardMatrices.square().entrySet().stream().map(entry -> DynamicTest.dynamicTest(entry.getKey(), () -> {
            GeneralEigen eigen = algebra().eigen(entry.getValue());
            for (int j = 0; j < entry.getValue().numCols; j++) {
                double length = 0;
                Complex largest = Complex.ZERO;
                for (int i = 0; i < entry.getValue().numRows; i++) {
                    Complex value = ComplexMatrices.entry(eigen.vectors(), i, j);
                    length = Math.hypot(length, value.abs());
                    largest = value.abs() > largest.abs() * (1 + 1e-6) ? value : largest;
                }
                assertEquals(1, length, 1e-13);
                assertTrue(largest.re() > 0 && Math.abs(largest.im()) < 1e-9, "largest entry " + largest);
            }
        }));
    }

    @TestFactory
    Stream<DynamicTest> complexEigenvaluesComeAsNeighbouringExactConjugates() {
        return AwkwardMatrices.square().entrySet().stream().map(entry -> DynamicTest.dynamicTest(entry.getKey(), () -> {
            GeneralEigen eigen = algebra().eigen(entry.getValue());
            for (int j = 0; j < eigen.values().size(); j++) {
                if (eigen.values().get(j).im() == 0) {
                    continue;
                }
                assertTrue(eigen.values().get(j).im() > 0, "the positive imaginary part comes first");
                assertEquals(eigen.values().get(j).conj(), eigen.values().get(j + 1));
                for (int i = 0; i < entry.getValue().numRows; i++) {
                    assertEquals(ComplexMatrices.entry(eigen.vectors(), i, j).conj(),
                            ComplexMatrices.entry(eigen.vectors(), i, j + 1));
                }
                j++;
            }
        }));
    }

    @Test
    void equalEigenvaluesOfADiagonalisableMatrixHaveIndependentVectors() {
        DMatrixRMaj a = AwkwardMatrices.square().get("repeated eigenvalue, diagonalisable");
        // the eigenvectors of a random similarity: condition of its columns, far below the 1e8 of a defective matrix
        assertTrue(ComplexSystem.of(algebra().eigen(a).vectors()).condition() < 1e4);
    }

    @Test
    void eigenvaluesOfTheCyclicShiftAreTheRootsOfUnity() {
        for (int n : new int[] {7, 8}) {
            for (Complex value : algebra().eigen(AwkwardMatrices.shift(n)).values()) {
                assertEquals(1, value.abs(), 1e-14);
                // closed form; a normal matrix moves its eigenvalues by no more than rounding
                assertEquals(0, Math.IEEEremainder(value.arg() * n, 2 * Math.PI), 1e-13 * n);
            }
        }
    }

    @Test
    void eigenvaluesOfACompanionMatrixAreTheRoots() {
        List<Complex> values = algebra().eigen(AwkwardMatrices.companion(8)).values().stream()
                .sorted(Comparator.comparingDouble(Complex::re))
                .toList();
        for (int k = 0; k < 8; k++) {
            // closed form; roots 1..8 have condition numbers up to 1e6
            assertEquals(k + 1, values.get(k).re(), 1e-8);
        }
    }

    @Test
    void eigenvaluesScaleWithTheMatrix() {
        DMatrixRMaj a = AwkwardMatrices.random(9, 9, 1);
        List<Complex> values = algebra().eigen(a).values();
        for (double scale : new double[] {0x1p-490, 0x1p490}) {
            List<Complex> moved = algebra().eigen(AwkwardMatrices.scaled(a, scale)).values();
            for (int j = 0; j < 9; j++) {
                assertEquals(values.get(j).re(), moved.get(j).re() / scale, 1e-12);
                assertEquals(values.get(j).im(), moved.get(j).im() / scale, 1e-12);
            }
        }
    }

    @Test
    void eigenvaluesAgreeWithASecondComputation() {
        DMatrixRMaj a = AwkwardMatrices.random(40, 40, 21);
        List<Complex> values = sorted(algebra().eigen(a).values());
        List<Complex> second = sorted(Arrays.stream(new EigenDecompositionNonSymmetric(hipparchus(a)).getEigenvalues())
                .map(z -> new Complex(z.getRealPart(), z.getImaginaryPart())).toList());
        for (int j = 0; j < 40; j++) {
            // measured 1e-11 apart; random matrices of this size have eigenvalue conditions of a hundred
            assertEquals(0, values.get(j).minus(second.get(j)).abs(), 1e-10);
        }
    }

    @TestFactory
    Stream<DynamicTest> symmetricMatricesAreDiagonalisedByOrthonormalVectorsWithFallingValues() {
        return AwkwardMatrices.symmetric().entrySet().stream().map(entry -> DynamicTest.dynamicTest(entry.getKey(), () -> {
            LinearAlgebra.SymmetricEigen eigen = algebra().symmetricEigen(entry.getValue());
            assertFalling(eigen.values());
            assertTrue(AwkwardMatrices.orthogonalityRatio(eigen.vectors()) < THRESHOLD);
            double ratio = AwkwardMatrices.factorRatio(entry.getValue(), eigen.vectors(), eigen.values(), eigen.vectors());
            assertTrue(ratio < THRESHOLD, "scaled residual " + ratio);
        }));
    }

    @Test
    void symmetricEigenvaluesAgreeWithASecondComputation() {
        DMatrixRMaj a = AwkwardMatrices.symmetrised(AwkwardMatrices.random(60, 60, 22));
        double[] second = new EigenDecompositionSymmetric(hipparchus(a)).getEigenvalues();
        double[] rising = second.clone();
        Arrays.sort(rising);
        double[] values = algebra().symmetricEigen(a).values();
        for (int k = 0; k < 60; k++) {
            assertEquals(rising[59 - k], values[k], 1e-12);
        }
    }

    @TestFactory
    Stream<DynamicTest> singularTriplesMultiplyBackToTheMatrix() {
        return AwkwardMatrices.anyShape().entrySet().stream().map(entry -> DynamicTest.dynamicTest(entry.getKey(), () -> {
            DMatrixRMaj a = entry.getValue();
            LinearAlgebra.Svd svd = algebra().svd(a);
            assertEquals(Math.min(a.numRows, a.numCols), svd.values().length);
            assertFalling(svd.values());
            assertTrue(svd.values()[svd.values().length - 1] >= 0);
            assertTrue(AwkwardMatrices.orthogonalityRatio(svd.u()) < THRESHOLD);
            assertTrue(AwkwardMatrices.orthogonalityRatio(svd.v()) < THRESHOLD);
            double ratio = AwkwardMatrices.factorRatio(a, svd.u(), svd.values(), svd.v());
            assertTrue(ratio < THRESHOLD, "scaled residual " + ratio);
        }));
    }

    @Test
    void singularValuesAgreeWithASecondComputation() {
        DMatrixRMaj a = AwkwardMatrices.random(50, 31, 23);
        assertArrayEquals(new SingularValueDecomposition(hipparchus(a)).getSingularValues(), algebra().svd(a).values(),
                1e-12);
    }

    @Test
    void productsAgreeWithTheirDefinition() {
        DMatrixRMaj a = AwkwardMatrices.random(6, 4, 24);
        DMatrixRMaj b = AwkwardMatrices.random(4, 5, 25);
        DMatrixRMaj expected = new DMatrixRMaj(6, 5);
        for (int i = 0; i < 6; i++) {
            for (int j = 0; j < 5; j++) {
                for (int k = 0; k < 4; k++) {
                    expected.add(i, j, a.get(i, k) * b.get(k, j));
                }
            }
        }
        DMatrixRMaj at = CommonOps_DDRM.transpose(a, null);
        DMatrixRMaj bt = CommonOps_DDRM.transpose(b, null);
        // four terms, so four roundings
        assertArrayEquals(expected.data, algebra().multiply(a, b).data, 1e-14);
        assertArrayEquals(expected.data, algebra().multiplyTransA(at, b).data, 1e-14);
        assertArrayEquals(expected.data, algebra().multiplyTransB(a, bt).data, 1e-14);
    }

    @Test
    void gramMatrixIsTheProductAndSymmetricToTheLastBit() {
        for (int[] shape : new int[][] {{1, 1}, {3, 7}, {50, 9}, {700, 33}}) {
            DMatrixRMaj a = AwkwardMatrices.random(shape[0], shape[1], 31);
            DMatrixRMaj gram = algebra().gram(a);
            // sums of up to 700 terms of size 1
            assertArrayEquals(algebra().multiplyTransA(a, a).data, gram.data, 1e-12);
            assertArrayEquals(CommonOps_DDRM.transpose(gram, null).data, gram.data);
        }
    }

    @Test
    void choleskyFactorIsUpperWithAPositiveDiagonalAndMultipliesBack() {
        for (int n : new int[] {1, 5, 40, 150}) {
            DMatrixRMaj a = algebra().gram(AwkwardMatrices.random(n + 5, n, 32));
            DMatrixRMaj r = algebra().cholesky(a).orElseThrow();
            for (int i = 0; i < n; i++) {
                assertTrue(r.get(i, i) > 0);
                for (int j = 0; j < i; j++) {
                    assertEquals(0, r.get(i, j), 0);
                }
            }
            // backward error of n roundings of the largest entry, about n
            assertArrayEquals(a.data, algebra().multiplyTransA(r, r).data, 1e-15 * n * (n + 5) + 1e-14);
        }
    }

    @Test
    void aMatrixThatIsNotPositiveDefiniteHasNoCholeskyFactor() {
        assertTrue(algebra().cholesky(new DMatrixRMaj(new double[][] {{1, 2}, {2, 1}})).isEmpty());
        assertTrue(algebra().cholesky(new DMatrixRMaj(3, 3)).isEmpty());
    }

    @Test
    void divisionByATriangleUndoesTheProduct() {
        DMatrixRMaj r = algebra().cholesky(algebra().gram(AwkwardMatrices.random(90, 20, 33))).orElseThrow();
        DMatrixRMaj a = AwkwardMatrices.random(41, 20, 34);
        // the triangle's condition is about 3
        assertArrayEquals(a.data, algebra().divideByUpper(algebra().multiply(a, r), r).data, 1e-13);
    }

    @TestFactory
    Stream<DynamicTest> orthonormalColumnsTimesATriangleGiveTheMatrix() {
        return AwkwardMatrices.anyShape().entrySet().stream().filter(entry -> entry.getValue().numRows >= entry.getValue().numCols)
                .map(entry -> DynamicTest.dynamicTest(entry.getKey(), () -> {
                    DMatrixRMaj a = entry.getValue();
                    LinearAlgebra.Qr qr = algebra().qr(a);
                    assertEquals(a.numCols, qr.q().numCols);
                    assertTrue(AwkwardMatrices.orthogonalityRatio(qr.q()) < THRESHOLD);
                    double[] ones = new double[a.numCols];
                    Arrays.fill(ones, 1);
                    double ratio = AwkwardMatrices.factorRatio(a, qr.q(), ones, CommonOps_DDRM.transpose(qr.r(), null));
                    assertTrue(ratio < THRESHOLD, "scaled residual " + ratio);
                    for (int i = 0; i < a.numCols; i++) {
                        for (int j = 0; j < i; j++) {
                            assertEquals(0, qr.r().get(i, j), 0);
                        }
                    }
                }));
    }

    @Test
    void argumentsAreLeftAsTheyWere() {
        DMatrixRMaj a = AwkwardMatrices.symmetrised(AwkwardMatrices.random(8, 8, 26));
        double[] before = a.data.clone();
        algebra().eigen(a);
        algebra().symmetricEigen(a);
        algebra().svd(a);
        algebra().multiply(a, a);
        algebra().gram(a);
        algebra().qr(a);
        algebra().cholesky(a);
        assertArrayEquals(before, a.data);
    }

    @Test
    void theSameMatrixGivesTheSameBytes() {
        DMatrixRMaj a = AwkwardMatrices.random(20, 20, 27);
        assertArrayEquals(algebra().eigen(a).vectors().data, algebra().eigen(a).vectors().data);
        assertArrayEquals(algebra().svd(a).u().data, algebra().svd(a).u().data);
    }

    @TestFactory
    Stream<DynamicTest> aValueThatIsNotFiniteIsAFault() {
        return Stream.of(Double.NaN, Double.POSITIVE_INFINITY).flatMap(bad -> Stream.of(1, 5, 40).map(n ->
                DynamicTest.dynamicTest(bad + " in " + n + " x " + n, () -> {
                    DMatrixRMaj a = AwkwardMatrices.symmetrised(AwkwardMatrices.random(n, n, 28));
                    a.set(n / 2, n / 2, bad);
                    // a decomposition that never returns is the failure to guard against
                    assertTimeoutPreemptively(Duration.ofSeconds(20), () -> {
                        assertThrows(FitFault.class, () -> algebra().eigen(a));
                        assertThrows(FitFault.class, () -> algebra().symmetricEigen(a));
                        assertThrows(FitFault.class, () -> algebra().svd(a));
                    });
                })));
    }

    @Test
    void eigenvaluesOfAMatrixThatIsNotSquareAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> algebra().eigen(new DMatrixRMaj(3, 2)));
    }

    private static void assertFalling(double[] values) {
        for (int k = 1; k < values.length; k++) {
            assertTrue(values[k] <= values[k - 1], values[k] + " after " + values[k - 1]);
        }
    }

    private static List<Complex> sorted(List<Complex> values) {
        return values.stream().sorted(Comparator.comparingDouble((Complex z) ->
                Math.rint(z.re() * 1e8)).thenComparingDouble(Complex::im)).toList();
    }

    private static RealMatrix hipparchus(DMatrixRMaj a) {
        RealMatrix out = MatrixUtils.createRealMatrix(a.numRows, a.numCols);
        for (int i = 0; i < a.numRows; i++) {
            for (int j = 0; j < a.numCols; j++) {
                out.setEntry(i, j, a.get(i, j));
            }
        }
        return out;
    }
}
