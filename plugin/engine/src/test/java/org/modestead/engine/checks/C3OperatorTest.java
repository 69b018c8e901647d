package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.OccupationFunctions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.GeneralEigen;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.operator.Compression;
import org.modestead.engine.operator.FactoredCompression;
import org.modestead.engine.operator.GramCompression;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.recording.Run;
import org.modestead.engine.spectrum.ModalExpansion;

/** CHECKS C3.7-C3.10: operators on the space of exp(xy) with known singular values, traces and eigenvalues. Derived. */
class C3OperatorTest {

    /** CHECKS C3.7: a 50 x 50 truncation agrees to 1e-14. */
    static final int SIZE = 50;

    private static final MonomialSpace FOCK = new MonomialSpace(Fits.exponential());

    static double[] singular(DMatrixRMaj a) {
        return LinearAlgebra.installed().svd(a).values();
    }

    private static double squaredSize(DMatrixRMaj a) {
        return Math.pow(NormOps_DDRM.normF(a), 2);
    }

    // ---- C3.7 ----

    // composition with ax + b; theorem after Carswell, MacCluer and Schuster 2003 (from memory), numbers derived

    @Test
    void compositionWithAnAffineMap() {
        // closed forms exp(b²/(2(1-a²))), exp(b²/(1-a²))/(1-a²), 1/(1-a); 1e-12 as in CHECKS C3.7
        DMatrixRMaj operator = FOCK.matrix(MonomialSpace.composition(0.5, 1), SIZE);
        double[] values = singular(operator);
        assertEquals(1.94773404105468, values[0], 1e-12);
        assertEquals(5.05822385957757, squaredSize(operator), 1e-12);
        GeneralEigen eigen = LinearAlgebra.installed().eigen(operator);
        assertEquals(2, eigen.values().stream().mapToDouble(Complex::re).sum(), 1e-12);
        for (int k = 0; k < 12; k++) {
            // singular values norm·|a|^k to rounding of the largest, eigenvalues a^k
            assertEquals(1.94773404105468 * Math.pow(0.5, k), values[k], 1e-12);
            double expected = Math.pow(0.5, k);
            assertEquals(0, eigen.values().stream().mapToDouble(value -> Math.hypot(value.re() - expected, value.im()))
                    .min().orElseThrow(), 1e-12);
        }
        assertEquals(2.0 / 3, CommonOps_DDRM.trace(FOCK.matrix(MonomialSpace.composition(-0.5, 1), SIZE)), 1e-12);
    }

    @Test
    void eigenfunctionsOfTheCompositionAreAboutItsFixedPoint() {
        // closed form (x - b/(1-a))^k at a = .5, b = 1: 1, x - 2, x² - 4x + 4; in orthonormal monomials
        DMatrixRMaj operator = FOCK.matrix(MonomialSpace.composition(0.5, 1), SIZE);
        GeneralEigen eigen = LinearAlgebra.installed().eigen(operator);
        int at = Fits.nearest(eigen.values(), 0.25);
        double quadratic = eigen.vectors().getReal(2, at) / FOCK.norm(2);
        assertEquals(-4, eigen.vectors().getReal(1, at) / FOCK.norm(1) / quadratic, 1e-10);
        assertEquals(4, eigen.vectors().getReal(0, at) / FOCK.norm(0) / quadratic, 1e-10);
    }

    /** The step map x -> ax + b on sections at equispaced points, as the engine fits it from data. */
    private static OrthonormalCompression fittedComposition(double a, double b, double reach, int rank) {
        double[][] x = IntStream.rangeClosed(-20, 20).mapToObj(k -> new double[] {reach * k / 20}).toArray(double[][]::new);
        double[][] y = Arrays.stream(x).map(p -> new double[] {a * p[0] + b}).toArray(double[][]::new);
        return new KernelStepEstimator(Fits.exponential(), 41).compress(Fits.pairs(1, x, y), Progress.NONE).whiten(rank);
    }

    @Test
    void normOfTheCompositionFromData() {
        // the largest singular value of C* on the span; Ritz values err by the square of the angle, below 1e-9 at rank 11
        double[] squares = LinearAlgebra.installed().symmetricEigen(fittedComposition(0.5, 1, 1.5, 11).second()).values();
        assertEquals(1.94773404105468, Math.sqrt(squares[0]), 1e-9);
        assertEquals(1.94773404105468 / 2, Math.sqrt(squares[1]), 1e-6);
    }

    @Test
    void compositionsThatAreNotContractionsAreUnbounded() {
        // translation, dilation by more than one, a square: ‖C*K_x‖²/‖K_x‖² = K(y, y)/K(x, x) has no bound
        double[] x = {1, 2, 4, 8};
        double[] translated = ratio(x, p -> p + 1);
        double[] dilated = ratio(x, p -> 1.1 * p);
        double[] squared = ratio(Arrays.copyOf(x, 3), p -> p * p);
        double[] contracted = ratio(x, p -> p / 2 + 1);
        for (int k = 1; k < 3; k++) {
            assertTrue(translated[k] > 2 * translated[k - 1] && dilated[k] > 1.5 * dilated[k - 1]
                    && squared[k] > 2 * squared[k - 1]);
        }
        assertTrue(Arrays.stream(contracted).max().orElseThrow() <= 1.94773404105468 * 1.94773404105468);
    }

    private static double[] ratio(double[] x, DoubleUnaryOperator map) {
        double[] from = Fits.exponential().diagonal(Fits.column(x));
        double[] to = Fits.exponential().diagonal(Fits.column(Arrays.stream(x).map(map).toArray()));
        return IntStream.range(0, x.length).mapToDouble(k -> to[k] / from[k]).toArray();
    }

    // ---- C3.8 ----

    // scaled generator, Rosenfeld, Kamalapurkar, Gruss and Johnson 2022 (definition from memory), values derived

    @Test
    void scaledGeneratorOfLinearMotion() {
        // closed forms n aⁿ, a/(1-a)², q(1+q)/(1-q)³, largest n aⁿ; 1e-12, sums of falling terms
        DMatrixRMaj operator = FOCK.matrix(MonomialSpace.liouville(0.5, 0, 1), 100);
        assertEquals(2, LinearAlgebra.installed().eigen(operator).values().stream().mapToDouble(Complex::re).sum(), 1e-12);
        assertEquals(0.740740740740741, squaredSize(operator), 1e-12);
        assertEquals(0.5, singular(operator)[0], 1e-12);
    }

    @Test
    void scaledGeneratorOfConstantMotionIsQuasiNilpotent() {
        // closed forms √n|a|ⁿ and q/(1-q)²; strictly triangular, so every eigenvalue is exactly 0
        DMatrixRMaj operator = FOCK.matrix(MonomialSpace.liouville(0.5, 1), SIZE);
        assertEquals(0.444444444444444, squaredSize(operator), 1e-12);
        double[] expected = IntStream.rangeClosed(1, 6).mapToDouble(n -> Math.sqrt(n) * Math.pow(0.5, n)).map(s -> -s)
                .sorted().map(s -> -s).toArray();
        assertArrayEquals(expected, Arrays.copyOf(singular(operator), 6), 1e-12);
        LinearAlgebra.installed().eigen(operator).values().forEach(value -> assertEquals(0, value.abs()));
    }

    @Test
    void scaledGeneratorOfQuadraticMotionHasNoModeAlthoughItIsCompact() {
        // closed forms n√(n+1)|a|ⁿ, 2q(1+2q)/(1-q)⁴, largest at n = 2
        DMatrixRMaj operator = FOCK.matrix(MonomialSpace.liouville(0.5, 0, 0, 1), 100);
        assertEquals(2.37037037037037, squaredSize(operator), 1e-12);
        assertEquals(0.866025403784439, singular(operator)[0], 1e-12);
        // triangular but for an order of its own, so every eigenvalue is 0
        LinearAlgebra.installed().eigen(FOCK.matrix(MonomialSpace.liouville(0.5, 0, 0, 1), 6)).values()
                .forEach(value -> assertEquals(0, value.abs(), 1e-15));
    }

    @Test
    void twoSpacesInsteadOfScaling() {
        // derived: from rate 1 to rate 2, q = 1/2: x: n q^(n/2); constant: √(n μ1) q^((n-1)/2); embedding q^(n/2)
        MonomialSpace one = new MonomialSpace(Fits.kernel("exponential", "rate", 1));
        MonomialSpace two = new MonomialSpace(Fits.kernel("exponential", "rate", 2));
        double q = 0.5;
        assertSingular(IntStream.range(0, 40).mapToDouble(n -> n * Math.pow(q, n / 2.0)),
                one.matrix(MonomialSpace.liouville(1, 0, 1), 40, two));
        assertSingular(IntStream.range(0, 40).mapToDouble(n -> Math.sqrt(n) * Math.pow(q, (n - 1) / 2.0)),
                one.matrix(MonomialSpace.liouville(1, 1), 40, two));
        assertSingular(IntStream.range(0, 40).mapToDouble(n -> Math.pow(q, n / 2.0)),
                one.matrix(n -> MonomialSpace.monomial(n, 1), 40, two));
    }

    private static void assertSingular(DoubleStream expected, DMatrixRMaj operator) {
        double[] falling = expected.map(s -> -s).sorted().map(s -> -s).toArray();
        assertArrayEquals(falling, singular(operator), 1e-12);
    }

    @Test
    void scaledGeneratorFittedFromRunsOfLinearMotion() {
        // closed form n aⁿ at a = .5: 0, .5, .5, .375, .25; six runs span monomials to degree 5 but for a small rest
        List<Run> runs = runs(101, 0.6, 0.3, 0.7, 1, -0.3, -0.7, -1);
        Compression compression = new OccupationEstimator(Fits.exponential(), SegmentPlan.WHOLE_RUNS, 0.5)
                .compress(Fits.snapshots(0.01, 1, runs), Progress.NONE);
        double[] values = ModalExpansion.of(compression.whiten(6)).eigenvalues().stream().mapToDouble(Complex::re)
                .map(s -> -s).sorted().map(s -> -s)
                .toArray();
        assertEquals(0.5, values[0], 0.02);
        assertEquals(0.5, values[1], 0.02);
        assertEquals(0.375, values[2], 0.02);
    }

    // ---- C3.9 ----

    /** Runs c e^t over a duration, one a start c. */
    private static List<Run> runs(int samples, double duration, double... starts) {
        List<Run> runs = new ArrayList<>();
        for (double start : starts) {
            runs.add(Fits.run("from " + start, samples, duration / (samples - 1),
                    time -> new double[] {start * Math.exp(time)}));
        }
        return runs;
    }

    static GramCompression generator(List<Run> runs) {
        double step = runs.get(0).times()[1];
        return (GramCompression) new OccupationEstimator(Fits.exponential(), SegmentPlan.WHOLE_RUNS, 1)
                .compress(Fits.snapshots(step, 1, runs), Progress.NONE);
    }

    @ParameterizedTest
    @CsvSource({"0.5,0.266535431556444", "1,1.317902151454404"})
    void occupationFunctionOfUniformMotion(double duration, double squaredNorm) {
        // derived: <Γ,Γ> = Ei(T²) - 2 ln T - 0.5772156649; CHECKS C3.9: 1e-10, sixth-order quadrature on 201 samples
        GramCompression compression = generator(List.of(Fits.run("uniform", 201, duration / 200,
                time -> new double[] {time})));
        assertEquals(squaredNorm, compression.gram().get(0, 0), 1e-10 * squaredNorm);
        // A* Γ = K(., T) - K(., 0): the action is Γ(T) - Γ(0)
        OccupationFunctions functions = (OccupationFunctions) compression.basis();
        DMatrixRMaj values = functions.evaluate(Fits.column(duration, 0));
        assertEquals(values.data[0] - values.data[1], compression.action().get(0, 0), 1e-14);
        // closed form (e^(xT) - 1)/x, at x = 2; T = 1: 3.194528049465325
        assertEquals(Math.expm1(2 * duration) / 2, functions.evaluate(Fits.column(2)).data[0], 1e-10);
        if (duration == 1) {
            assertEquals(3.194528049465325, functions.evaluate(Fits.column(2)).data[0], 1e-10);
        }
    }

    // ---- C3.10 ----

    /** CHECKS C3.10, quadrature of sixth order on 401 samples a run. */
    private static final double TOLERANCE = 1e-9;

    @Test
    void finiteRankTableOfLinearMotion() {
        // derived; 1e-9
        GramCompression compression = generator(runs(401, 1, 0.25, 0.5, 1));
        double[] gram = {1.2062307431964, 1.4640369057768, 2.2006099025829,
            1.4640369057768, 2.2006099025829, 5.4441897386012,
            2.2006099025829, 5.4441897386012, 50.102181852023};
        double[] action = {0.22982817837586, 0.57661144317274, 1.8561348799334,
            0.57661144317274, 1.8561348799334, 10.576085578311,
            1.8561348799334, 10.576085578311, 249.35930407954};
        assertArrayEquals(gram, compression.gram().data, TOLERANCE);
        assertArrayEquals(action, compression.action().data, TOLERANCE);
        assertArrayEquals(new double[] {0.082255626695, 1.86096271464, 6.40856545052}, rising(compression), TOLERANCE);
    }

    @Test
    void landmarkFeaturesOfManySamplesGiveTheSameTable() {
        // 1803 samples are too many to form the arrays entry by entry; the landmark factor stops at 1e-13 of the largest
        Compression compression = new OccupationEstimator(Fits.exponential(), SegmentPlan.WHOLE_RUNS, 1)
                .compress(Fits.snapshots(1 / 600.0, 1, runs(601, 1, 0.25, 0.5, 1)), Progress.NONE);
        assertTrue(compression instanceof FactoredCompression);
        assertEquals(1.2062307431964, compression.gram().get(0, 0), TOLERANCE);
        assertEquals(5.4441897386012, compression.gram().get(1, 2), TOLERANCE);
        assertEquals(1.8561348799334, compression.action().get(0, 2), TOLERANCE);
        assertEquals(249.35930407954, compression.action().get(2, 2), TOLERANCE);
        assertArrayEquals(new double[] {0.082255626695, 1.86096271464, 6.40856545052}, rising(compression), TOLERANCE);
    }

    private static double[] rising(Compression compression) {
        int m = compression.gram().numRows;
        List<Complex> values = ModalExpansion.of(compression.whiten(m)).eigenvalues();
        assertEquals(m, values.size());
        return values.stream().mapToDouble(Complex::re).sorted().toArray();
    }

    @Test
    void ritzValuesFallTowardsTheRatesAsRunsAreAdded() {
        // derived; 1e-9. The k-th is never below k
        double[] starts = {1, 0.5, 0.25, 0.125};
        double[][] expected = {{4.97701486965}, {0.753455049925, 5.7785176543},
            {0.0822556266950, 1.86096271464, 6.40856545052},
            {0.00277518294037, 1.10276799317, 2.83910890466, 7.02296058138}};
        for (int m = 1; m <= 4; m++) {
            double[] found = rising(generator(runs(375, 1, Arrays.copyOf(starts, m))));
            assertArrayEquals(expected[m - 1], found, TOLERANCE, m + " runs");
            for (int k = 0; k < m; k++) {
                assertTrue(found[k] >= k);
            }
        }
    }

    @Test
    void aRunAtRestMakesTheRateZeroExact() {
        // derived: the section at rest is the constant
        double[] found = rising(generator(runs(375, 1, 1, 0.5, 0)));
        assertEquals(0, found[0], 1e-12);
        assertTrue(found[1] >= 1);
    }
}
