package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexSystem;
import org.modestead.engine.linalg.GeneralEigen;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.NormalityDeparture;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.NormalityDefect;

/** CHECKS C6.1-C6.4: matrices with known eigenvalues, condition and departure from normality. */
class C6LinearAlgebraTest {

    private static final double EPS = Math.ulp(1.0);

    private interface Entry {
        double at(int i, int j);
    }

    private static DMatrixRMaj matrix(int n, Entry entry) {
        DMatrixRMaj out = new DMatrixRMaj(n, n);
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                out.set(i, j, entry.at(i, j));
            }
        }
        return out;
    }

    static List<Complex> risingEigenvalues(DMatrixRMaj a) {
        return rising(LinearAlgebra.installed().eigen(a).values());
    }

    private static List<Complex> rising(List<Complex> values) {
        return values.stream().sorted(Comparator.comparingDouble(Complex::re)).toList();
    }

    private static double vectorCondition(DMatrixRMaj a) {
        return ComplexSystem.of(LinearAlgebra.installed().eigen(a).vectors()).condition();
    }

    // ---- C6.1 ----

    private static DMatrixRMaj kac(int n) {
        return matrix(n, (i, j) -> j == i + 1 ? j : j == i - 1 ? n - i : 0);
    }

    @Test
    void kacClementEigenvaluesAreTheOddNumbers() {
        // closed form n-1, n-3, ..., -(n-1); CHECKS C6.1: 1e-12
        List<Complex> values = risingEigenvalues(kac(8));
        double product = 1;
        for (int k = 0; k < 8; k++) {
            assertEquals(-7 + 2 * k, values.get(k).re(), 1e-12);
            assertEquals(0, values.get(k).im());
            product *= values.get(k).re();
        }
        // (7·5·3·1)² = 11025; eight factors good to 1e-12 each
        assertEquals(11025, product, 11025 * 8e-12);
    }

    @Test
    void kacClementIsFarFromNormal() {
        // from memory, recomputed (CHECKS C6.1): departure to the printed digits at 1e-12 relative, condition to three
        // digits
        assertEquals(10.5830052442584, NormalityDeparture.of(kac(8)), 1e-12 * 10.6);
        assertEquals(5.26, vectorCondition(kac(8)), 0.005);
    }

    // ---- C6.2 ----

    /** Wilkinson 1965; values from memory, recomputed with 60 digits. */
    private static final double[] FRANK = {0.0310280606440100, 0.0495074291852783, 0.0812276592404050,
        0.143646519769221, 0.284749720558478, 0.643505319004856, 1.55398870913211, 3.51185594858076, 6.96153308556712,
        12.3110774008685, 20.1989886458771, 32.2288915015722};

    static DMatrixRMaj frank() {
        return matrix(12, (i, j) -> j >= i - 1 ? 12 - Math.max(i, j) : 0);
    }

    @Test
    void frankEigenvaluesToTheAccuracyTheirConditionAllows() {
        // CHECKS C6.2: 1e-7 absolute, since the smallest have condition near 1e8
        List<Complex> values = risingEigenvalues(frank());
        double product = 1;
        for (int k = 0; k < 12; k++) {
            assertEquals(FRANK[k], values.get(k).re(), 1e-7, "eigenvalue " + k);
            assertEquals(0, values.get(k).im());
            product *= values.get(k).re();
        }
        // determinant 1; the three smallest lose 1e-7/0.03 each at worst
        assertEquals(1, product, 1e-5);
        // they come in reciprocal pairs; same loss
        assertEquals(1, values.get(0).re() * values.get(11).re(), 1e-7 * 33);
    }

    @Test
    void frankFittedFromDataIsFlaggedAsIllConditioned() {
        // rows e_i -> F e_i: least squares recovers F in another orthonormal basis
        double[][] x = new double[12][12];
        double[][] y = new double[12][12];
        for (int i = 0; i < 12; i++) {
            x[i][i] = 1;
            for (int k = 0; k < 12; k++) {
                y[i][k] = frank().get(k, i);
            }
        }
        Spectrum spectrum = Fits.spectrum(Fits.pairs(1, x, y), new LinearEstimator(), 12);
        List<Complex> values = rising(spectrum.eigenvalues());
        for (int k = 0; k < 12; k++) {
            assertEquals(FRANK[k], values.get(k).re(), 1e-7, "eigenvalue " + k);
        }
        assertTrue(spectrum.doubts().stream().anyMatch(doubt -> doubt.code().equals("eigenvectors-ill-conditioned")),
                spectrum.doubts().toString());
    }

    // ---- C6.3 ----

    private static double[] hilbertSingular(int n) {
        return LinearAlgebra.installed().svd(matrix(n, (i, j) -> 1.0 / (i + j + 1))).values();
    }

    @ParameterizedTest
    @CsvSource({"2,19.2814700679040", "3,524.056777586061", "4,15513.7387389326", "5,476607.250242561",
        "6,14951058.6401312", "8,15257575741.6469", "10,1.602628687021688e13"})
    void hilbertConditionNumbers(int n, double expected) {
        // from memory, recomputed (CHECKS C6.3): relative tolerance about condition times machine precision, not below
        // the 15 printed digits
        double[] singular = hilbertSingular(n);
        assertEquals(expected, singular[0] / singular[n - 1], expected * Math.max(expected * EPS, 1e-14));
    }

    @Test
    void hilbertDeterminantOfOrderFive() {
        // closed form 1/266716800000; condition 5e5 times machine precision is 1e-10
        assertEquals(1 / 266716800000.0, Arrays.stream(hilbertSingular(5)).reduce(1, (a, b) -> a * b), 1e-10
                / 266716800000.0);
    }

    // ---- C6.4 (Henrici 1962; derived; computed independently) ----

    private static DMatrixRMaj grcar() {
        return matrix(20, (i, j) -> j == i - 1 ? -1 : j >= i && j <= i + 3 ? 1 : 0);
    }

    @Test
    void departureOfTriangularMatricesIsWhatStandsAboveTheDiagonal() {
        // closed forms; backward stable Schur form: a few units in the last place of the norm
        assertEquals(1, NormalityDeparture.of(new DMatrixRMaj(new double[][] {{0, 1}, {0, 0}})), 1e-15);
        assertEquals(100, NormalityDeparture.of(new DMatrixRMaj(new double[][] {{-1, -100}, {0, -2}})), 1e-12);
        assertEquals(2.64575131106459, NormalityDeparture.of(matrix(8, (i, j) -> j == i + 1 ? 1 : 0)), 1e-14);
    }

    @Test
    void departureOfTheCyclicShiftIsZero() {
        // closed form; a difference of squares would leave 1e-8
        assertEquals(0, NormalityDeparture.of(matrix(8, (i, j) -> j == (i + 1) % 8 ? 1 : 0)), 1e-13);
    }

    @Test
    void grcarMeasures() {
        DMatrixRMaj a = grcar();
        GeneralEigen eigen = LinearAlgebra.installed().eigen(a);
        double squaredSize = Math.pow(NormOps_DDRM.normF(a), 2);
        double departure = NormalityDeparture.of(a);
        // 1e-12: departure and commutator are well conditioned
        assertEquals(4.62831490824864, departure, 1e-12);
        assertEquals(6.48074069840786, NormalityDefect.of(a) * squaredSize, 1e-12);
        // three printed digits
        assertEquals(686, vectorCondition(a), 0.5);
        // eigenvalue condition up to that of the vectors, 686: 1e-12
        assertEquals(1.61495285015093, eigen.values().stream().mapToDouble(Complex::re).max().orElseThrow(), 1e-12);
        assertEquals(2.22787065141, eigen.values().stream().mapToDouble(Complex::abs).max().orElseThrow(), 1e-11);
    }

    @Test
    void commutatorBoundsHoldTheDepartureOfGrcar() {
        // from memory (CHECKS C6.4): ‖C‖²/(6‖A‖²) <= dep² <= √((n³-n)/12) ‖C‖
        DMatrixRMaj a = grcar();
        double squaredSize = Math.pow(NormOps_DDRM.normF(a), 2);
        double commutator = NormalityDefect.of(a) * squaredSize;
        double squared = Math.pow(NormalityDeparture.of(a), 2);
        assertTrue(commutator * commutator / (6 * squaredSize) <= squared);
        assertTrue(squared <= Math.sqrt((8000 - 20) / 12.0) * commutator);
    }

    @Test
    void departureAgreesWithItsDefinitionByEigenvalues() {
        // √(‖A‖² - Σ|λ|²) on a matrix with complex pairs and real eigenvalues; cancellation leaves about 1e-13
        DMatrixRMaj a = matrix(9, (i, j) -> Math.sin(3 * i + 5 * j * j));
        double squares = Math.pow(NormOps_DDRM.normF(a), 2);
        for (Complex value : LinearAlgebra.installed().eigen(a).values()) {
            squares -= value.abs() * value.abs();
        }
        assertTrue(squares > 1);
        assertEquals(Math.sqrt(squares), NormalityDeparture.of(a), 1e-12);
        DMatrixRMaj turned = CommonOps_DDRM.transpose(a, null);
        assertEquals(NormalityDeparture.of(a), NormalityDeparture.of(turned), 1e-12, "the transpose departs as far");
    }
}
