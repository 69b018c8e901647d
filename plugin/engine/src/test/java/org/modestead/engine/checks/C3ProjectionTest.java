package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.basis.LandmarkFeatures;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.ModalExpansion;

/**
 * CHECKS C3.5 and C3.6: the signal g(x) = x on the exponentials e^(λx), which are the sections K(., λ) of exp(xy). All
 * values derived; computed with 80 digits.
 */
class C3ProjectionTest {

    private static final int EQUISPACED_FROM = 4;

    static double[] integers(int n) {
        double[] out = new double[n];
        Arrays.setAll(out, k -> k);
        return out;
    }

    static double[] equispaced(int n) {
        double[] out = new double[n];
        Arrays.setAll(out, k -> -1 + 2.0 * k / (n - 1));
        return out;
    }

    /** Sections at λ, and where a shift x -> x + 0.5 carries them: K(., λ) is an eigenfunction with e^(0.5 λ). */
    private static Snapshots shifted(double[] exponents) {
        double[][] x = Arrays.stream(exponents).mapToObj(value -> new double[] {value}).toArray(double[][]::new);
        double[][] y = Arrays.stream(exponents).mapToObj(value -> new double[] {value + 0.5}).toArray(double[][]::new);
        return Fits.pairs(0.5, x, y);
    }

    private static OrthonormalCompression projection(double[] exponents) {
        return new KernelStepEstimator(Fits.exponential(), exponents.length).compress(shifted(exponents), Progress.NONE)
                .whiten(exponents.length);
    }

    /** ‖x‖² - ‖Px‖² as the captured share takes it: the coefficients of x on the orthonormal functions. */
    static double residual(double[] exponents) {
        OrthonormalCompression compression = projection(exponents);
        assertEquals(exponents.length, compression.rank());
        double held = Arrays.stream(compression.observable().data).map(c -> c * c).sum();
        return Fits.exponential().space().coordinateNormSquared().orElseThrow() - held;
    }

    static double condition(Kernel kernel, double[] exponents) {
        double[] singular = LinearAlgebra.installed().svd(kernel.matrix(Fits.column(exponents), Fits.column(exponents)))
                .values();
        return singular[0] / singular[singular.length - 1];
    }

    // ---- C3.5 ----

    @ParameterizedTest
    @ValueSource(ints = {0, 1, 2, 3, 4, 5, 6, 7, 8})
    void gramMatrixOfExponentials(int row) {
        // CHECKS C3.5: 1e-8 relative, the condition 2.5e7 times rounding
        ReferenceTable table = ReferenceTable.read("exp_gram_conditioning.csv");
        int n = (int) table.number(row, 1);
        double[] exponents = row < EQUISPACED_FROM ? integers(n) : equispaced(n);
        DMatrixRMaj gram = Fits.exponential().matrix(Fits.column(exponents), Fits.column(exponents));
        double[] values = LinearAlgebra.installed().symmetricEigen(gram).values();
        assertRelative(table.number(row, 3), values[n - 1], 1e-8);
        assertRelative(table.number(row, 4), values[0], 1e-8);
        assertRelative(table.number(row, 5), condition(Fits.exponential(), exponents), 1e-8);
        // normalised, exp(-(λ_i-λ_j)²/2) is the Gaussian kernel of scale 1
        assertRelative(table.number(row, 6), condition(Fits.kernel("gaussian", "scale", 1), exponents), 1e-8);
        // determinant by the pivots of the landmark factor
        LandmarkFeatures features = LandmarkFeatures.choose(Fits.exponential(), Fits.column(exponents), n, Progress.NONE);
        double determinant = 1;
        for (int i = 0; i < n; i++) {
            determinant /= Math.pow(features.inverseTransposed().get(i, i), 2);
        }
        assertRelative(table.number(row, 2), determinant, 1e-8);
        assertEquals(table.number(row, 7), residual(exponents), n <= 5 ? 1e-8 * table.number(row, 7) : 1e-8,
                "1e-8 of ‖x‖² = 1");
    }

    private static void assertRelative(double expected, double found, double tolerance) {
        assertEquals(expected, found, tolerance * Math.abs(expected));
    }

    // ---- C3.6 ----

    /** Weights w = G⁻¹ λ through the landmark factor, in the order of the exponents. */
    private static double[] weights(double[] exponents) {
        int n = exponents.length;
        LandmarkFeatures features = LandmarkFeatures.choose(Fits.exponential(), Fits.column(exponents), n, Progress.NONE);
        assertEquals(n, features.size());
        DMatrixRMaj coefficients = Matrices.transposeProduct(features.inverseTransposed(), features.landmarks());
        double[] found = Matrices.product(features.inverseTransposed(), coefficients).data;
        double[] out = new double[n];
        for (int i = 0; i < n; i++) {
            int at = Arrays.stream(features.landmarks().data).boxed().toList().indexOf(exponents[i]);
            out[i] = found[at];
        }
        return out;
    }

    /** The same weights as the modes of the shift: joint weight times the eigenfunction scaled to 1 at x = 0. */
    private static double[] modeWeights(double[] exponents) {
        ModalExpansion expansion = ModalExpansion.of(projection(exponents));
        var atZero = expansion.eigenfunctions(Fits.column(0));
        double[] out = new double[exponents.length];
        for (int i = 0; i < exponents.length; i++) {
            int best = Fits.nearest(expansion.rates(), exponents[i]);
            assertEquals(exponents[i], expansion.rates().get(best).re(), 1e-8, "whatever was sampled is an eigenvalue");
            out[i] = expansion.joint().getReal(best, 0) * atZero.getReal(0, best);
        }
        return out;
    }

    @Test
    void oneExponent() {
        // closed form w = a e^(-a²), residual 1 - a² e^(-a²); rounding
        assertEquals(0.367879441171, modeWeights(new double[] {1})[0], 1e-12);
        assertEquals(0.632120558829, residual(new double[] {1}), 1e-12);
    }

    @ParameterizedTest
    @CsvSource({"1,0.425459064120,0.149081871761", "0.5,0.989658790826,0.0103412091745",
            "0.1,4.99991666764,1.66664722243e-5"})
    void asAPairClosesTheResidualVanishesAndTheWeightsGrow(double a, double weight, double residual) {
        // closed form ±a/(2 sinh a²), 1 - a²/sinh a²; twelve printed digits, condition of the pair at most 200
        double[] exponents = {a, -a};
        for (double[] found : new double[][] {weights(exponents), modeWeights(exponents)}) {
            assertEquals(weight, found[0], 1e-11);
            assertEquals(-weight, found[1], 1e-11);
        }
        assertEquals(residual, residual(exponents), 1e-12);
    }

    private static final double[] NESTED = {1, -1, 0.5, -0.5, 0.25, -0.25, 0.75, -0.75, 0.125, -0.125};

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10})
    void nestedExponentsNeverSettle(int n) {
        // CHECKS C3.6: double precision reproduces 1e-8 up to n = 8 and 2e-3 at n = 10 (condition 5.6e12)
        ReferenceTable table = ReferenceTable.read("exp_projection_weights_nested.csv");
        double tolerance = n <= 8 ? 1e-8 : 2e-3;
        double[] found = weights(Arrays.copyOf(NESTED, n));
        for (int i = 0; i < n; i++) {
            assertEquals(table.number(n - 1, 2 + i), found[i], tolerance, "weight on " + NESTED[i] + " of " + n);
        }
        assertEquals(table.number(n - 1, 1), residual(Arrays.copyOf(NESTED, n)), 1e-8, "1e-8 of ‖x‖² = 1");
    }

    @Test
    void signsOfTheLeadingWeightFlipWhileTheResidualFalls() {
        // derived: at n = 3, 4, 6, 8 the weight on λ = 1 is +, -, +, -
        double sign = 1;
        double before = 1;
        for (int n : new int[] {3, 4, 6, 8}) {
            double[] exponents = Arrays.copyOf(NESTED, n);
            assertTrue(sign * weights(exponents)[0] > 0, "sign at " + n);
            assertTrue(residual(exponents) < before, "residual at " + n);
            before = residual(exponents);
            sign = -sign;
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4, 5, 6})
    void onMonomialsTheWeightIsOneForEveryNumberOfThem(int degree) {
        // closed form: x on 1, x, ..., x^n under x' = x; condition of monomials to degree 6 on [-1, 1], about 1e3
        double[][] x = Arrays.stream(equispaced(41)).mapToObj(value -> new double[] {value}).toArray(double[][]::new);
        double[][] y = Arrays.stream(x).map(p -> new double[] {p[0] * Math.exp(0.1)}).toArray(double[][]::new);
        ModalExpansion expansion = ModalExpansion.of(
                Fits.fit(Fits.pairs(0.1, x, y), new DictionaryEstimator(Dictionary.monomials(degree)), degree + 1).chosen());
        var at = expansion.eigenfunctions(Fits.column(1));
        for (int j = 0; j <= degree; j++) {
            boolean linear = Math.abs(expansion.rates().get(j).re() - 1) < 0.5;
            assertEquals(linear ? 1 : 0, expansion.joint().getReal(j, 0) * at.getReal(0, j), 1e-10, "rate "
                    + expansion.rates().get(j));
        }
    }
}
