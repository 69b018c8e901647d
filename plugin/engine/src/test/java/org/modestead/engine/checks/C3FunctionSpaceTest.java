package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.LandmarkFeatures;
import org.modestead.engine.basis.OccupationFunctions;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.GeneralEigen;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.MatrixExponential;
import org.modestead.engine.operator.Compression;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.SpectrumExtractor;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.JudgeSettings;
import org.modestead.engine.wellposed.NormalityDefect;
import org.modestead.engine.wellposed.SymmetryDefect;
import org.modestead.engine.wellposed.WellPosedness;

/** CHECKS C3.1-C3.4: facts of the space of exp(xy), the real Fock space (Bargmann 1961). All derived. */
class C3FunctionSpaceTest {

    static final MonomialSpace FOCK = new MonomialSpace(Fits.exponential());

    // ---- C3.1 ----

    @Test
    void monomialsWeighFactorials() {
        // closed form n!; in F_mu n!/mu^n; a few roundings a factor
        double factorial = 1;
        for (int n = 0; n <= 12; n++) {
            factorial *= Math.max(1, n);
            assertEquals(factorial, Fits.exponential().monomialNormSquared(n).orElseThrow(), 1e-14 * factorial);
            double scaled = factorial / Math.pow(2.5, n);
            assertEquals(scaled, Fits.kernel("exponential", "rate", 2.5).monomialNormSquared(n).orElseThrow(),
                    1e-14 * scaled);
        }
        // closed form α! = 2! 0! 3!
        assertEquals(12, Fits.exponential().monomialNormSquared(2, 0, 3).orElseThrow(), 1e-13);
    }

    @Test
    void theKernelIsTheSumOfItsOrthonormalMonomials() {
        // so the monomials are orthogonal with these norms: K(x, y) = Σ x^α y^α/‖x^α‖²; terms to degree 30 reach rounding
        double[] x = {0.7, -1.2};
        double[] y = {1.1, 0.4};
        double sum = 0;
        for (int i = 0; i <= 30; i++) {
            for (int j = 0; j <= 30; j++) {
                sum += Math.pow(x[0] * y[0], i) * Math.pow(x[1] * y[1], j) / Fits.exponential().monomialNormSquared(i, j)
                        .orElseThrow();
            }
        }
        double kernel = Fits.exponential().matrix(new DMatrixRMaj(new double[][] {x}), new DMatrixRMaj(new double[][] {y}))
                .data[0];
        assertEquals(kernel, sum, 1e-14);
    }

    @Test
    void monomialsAreOrthogonalOnLandmarks() {
        // n! δ through the landmark functions alone; what 17 sections miss of a square or cube stays below 1e-8
        LandmarkFeatures features = landmarks();
        double[] expected = {1, 1, 2, 6};
        for (int m = 0; m < 4; m++) {
            for (int n = 0; n < 4; n++) {
                int p = m;
                int q = n;
                double found = inner(features, x -> Math.pow(x, p), x -> Math.pow(x, q));
                assertEquals(m == n ? expected[n] : 0, found, 1e-8, "<x^" + m + ", x^" + n + ">");
            }
        }
    }

    private static LandmarkFeatures landmarks() {
        double[] points = IntStream.rangeClosed(0, 80).mapToDouble(i -> 2 * Math.cos(Math.PI * i / 80)).toArray();
        return LandmarkFeatures.choose(Fits.exponential(), Fits.column(points), 40, Progress.NONE);
    }

    /** Inner product of two functions in the space through their coefficients on the landmark functions. */
    private static double inner(LandmarkFeatures features, DoubleUnaryOperator f, DoubleUnaryOperator g) {
        double[] z = features.landmarks().data;
        DMatrixRMaj left = Matrices.transposeProduct(features.inverseTransposed(),
                Fits.column(Arrays.stream(z).map(f).toArray()));
        DMatrixRMaj right = Matrices.transposeProduct(features.inverseTransposed(),
                Fits.column(Arrays.stream(z).map(g).toArray()));
        return Matrices.transposeProduct(left, right).data[0];
    }

    // ---- C3.2; 1e-14 as in CHECKS ----

    static double[] powers(double a) {
        return MonomialSpace.series(60, n -> Math.pow(a, n));
    }

    static double[] sine() {
        return MonomialSpace.series(60, n -> new double[] {0, 1, 0, -1}[n % 4]);
    }

    static double[] cosine() {
        return MonomialSpace.series(60, n -> new double[] {1, 0, -1, 0}[n % 4]);
    }

    /** Σ c_i c_j Re e^(a_i conj(a_j)) for exponents ±i: a conj(b) is real and equals the dot product in the plane. */
    private static double trigonometric(double sign) {
        DMatrixRMaj exponents = new DMatrixRMaj(new double[][] {{0, 1}, {0, -1}});
        DMatrixRMaj weights = Fits.column(0.5, sign * 0.5);
        return Matrices.transposeProduct(weights, Matrices.product(Fits.exponential().matrix(exponents, exponents),
                weights)).data[0];
    }

    @Test
    void sineAndCosine() {
        // closed forms sinh 1, cosh 1, sin 1
        assertEquals(1.175201193643801, FOCK.inner(sine(), sine()), 1e-14);
        assertEquals(1.543080634815244, FOCK.inner(cosine(), cosine()), 1e-14);
        assertEquals(1.175201193643801, trigonometric(-1), 1e-14);
        assertEquals(1.543080634815244, trigonometric(1), 1e-14);
        assertEquals(Math.sin(1), FOCK.inner(sine(), powers(1)), 1e-14);
    }

    @Test
    void exponentialsReproduce() {
        // closed forms <e^ax, e^bx> = e^ab = K(a, b); ‖e^((.5+2i)x)‖² = e^4.25, the kernel in the plane
        double kernel = Fits.exponential().matrix(Fits.column(0.7), Fits.column(-1.3)).data[0];
        assertEquals(Math.exp(-0.91), kernel, 1e-15);
        assertEquals(kernel, FOCK.inner(powers(0.7), powers(-1.3)), 1e-14);
        double complex = Fits.exponential().diagonal(new DMatrixRMaj(new double[][] {{0.5, 2}}))[0];
        assertEquals(70.10541234668786, complex, 1e-14 * 71);
    }

    @Test
    void derivativesOfSections() {
        // closed forms (1+a²) e^(a²) and (2+4a²+a⁴) e^(a²) at a = 1
        double[] first = MonomialSpace.product(new double[] {0, 1}, powers(1));
        double[] second = MonomialSpace.product(new double[] {0, 0, 1}, powers(1));
        assertEquals(5.43656365691809, FOCK.inner(first, first), 1e-14 * 5.5);
        assertEquals(19.02797279921332, FOCK.inner(second, second), 1e-14 * 20);
        // the same through landmark functions, which see values only; what they miss is below 1e-10
        DoubleUnaryOperator values = x -> x * Math.exp(x);
        assertEquals(5.43656365691809, inner(landmarks(), values, values), 1e-10);
    }

    @Test
    void aGaussianBumpUpwardsIsAMixtureOfSections() {
        // e^(bx²) = ∫ K(x, √(2b) t) e^(-t²/2)/√(2π) dt, norm² (1-4b²)^-1/2 = 1.25 at b = .3; the trapezoidal rule is
        // exact to rounding
        OccupationFunctions mixture = bumpOfSections();
        assertEquals(Math.exp(0.3 * 0.49), mixture.evaluate(Fits.column(0.7)).data[0], 1e-14);
        assertEquals(1.25, squaredNorm(mixture), 1e-14);
    }

    /** Of an occupation function of one segment. */
    static double squaredNorm(OccupationFunctions single) {
        OccupationFunctions.Segment segment = single.segments().get(0);
        return Matrices.transposeProduct(Fits.column(segment.weights()), single.evaluate(segment.states())).data[0];
    }

    /** e^(0.3 x²). */
    static OccupationFunctions bumpOfSections() {
        int count = 161;
        double[] times = new double[count];
        double[] weights = new double[count];
        DMatrixRMaj states = new DMatrixRMaj(count, 1);
        for (int i = 0; i < count; i++) {
            times[i] = -12 + 0.15 * i;
            weights[i] = 0.15 * Math.exp(-times[i] * times[i] / 2) / Math.sqrt(2 * Math.PI);
            states.set(i, 0, Math.sqrt(0.6) * times[i]);
        }
        return new OccupationFunctions(Fits.exponential(),
                List.of(new OccupationFunctions.Segment(times, states, weights, new double[1], new double[1])));
    }

    @Test
    void aSteepBumpIsNotInTheSpace() {
        // closed form: at b = 1/2 the squared norms of the partial sums grow like 2√(terms/π), at b = .3 they converge to
        // 1.25
        assertEquals(1.25, bump(0.3, 80), 1e-14);
        assertEquals(2, bump(0.5, 80) / bump(0.5, 20), 0.02);
    }

    static double bump(double b, int terms) {
        double sum = 0;
        double ratio = 1;
        for (int k = 0; k < terms; k++) {
            ratio *= k == 0 ? 1 : b / k;
            sum += ratio * ratio * Fits.exponential().monomialNormSquared(2 * k).orElseThrow();
        }
        return sum;
    }

    // ---- C3.3 ----

    private static final int SIZE = 12;

    private static void assertLeading(DMatrixRMaj expected, DMatrixRMaj found) {
        DMatrixRMaj a = Matrices.block(expected, 0, SIZE - 3, 0, SIZE - 3);
        DMatrixRMaj b = Matrices.block(found, 0, SIZE - 3, 0, SIZE - 3);
        assertArrayEquals(a.data, b.data, 1e-13);
    }

    private static DMatrixRMaj adjoint(DMatrixRMaj a) {
        return CommonOps_DDRM.transpose(a, null);
    }

    @Test
    void adjointsOfMultiplicationAndDifferentiation() {
        // M* = D/mu; A_1* = M at mu = 1; A_x* = A_x; A_{x²}* = x D²: away from the cut, to rounding
        for (double mu : new double[] {1, 2}) {
            MonomialSpace space = new MonomialSpace(Fits.kernel("exponential", "rate", mu));
            DMatrixRMaj multiplication = space.matrix(MonomialSpace.multiplication(), SIZE);
            assertLeading(Matrices.scaled(space.matrix(MonomialSpace.liouville(1, 1), SIZE), 1 / mu),
                    adjoint(multiplication));
        }
        DMatrixRMaj linear = FOCK.matrix(MonomialSpace.liouville(1, 0, 1), SIZE);
        assertEquals(0, SymmetryDefect.of(linear));
        for (int n = 0; n < SIZE; n++) {
            assertEquals(n, linear.get(n, n), 1e-14 * SIZE);
        }
        DMatrixRMaj quadratic = FOCK.matrix(MonomialSpace.liouville(1, 0, 0, 1), SIZE);
        DMatrixRMaj second = FOCK.matrix(n -> n < 2 ? new double[1] : MonomialSpace.monomial(n - 1, n * (n - 1.0)), SIZE);
        assertLeading(second, adjoint(quadratic));
    }

    @ParameterizedTest
    @ValueSource(strings = {"constant", "linear", "quadratic", "logistic"})
    void theAdjointOfTheGeneratorOnAnOccupationFunctionIsADifferenceOfSections(String motion) {
        // A_f* K_y = f(y) ∂_y K(., y), integrated along x' = f(x): ∫ f(γ) x K(x, γ) dt = K(x, end) - K(x, start);
        // quadrature below 1e-11
        Run run = Fits.run(motion, 101, 0.005, time -> new double[] {flow(motion, 0.4, time)});
        var compression = new OccupationEstimator(Fits.exponential(), SegmentPlan.WHOLE_RUNS, 1)
                .compress(Fits.snapshots(0.005, 1, List.of(run)), Progress.NONE);
        OccupationFunctions.Segment segment = ((OccupationFunctions) compression.basis()).segments().get(0);
        double[] weights = segment.weights().clone();
        for (int i = 0; i < weights.length; i++) {
            weights[i] *= field(motion, segment.states().get(i, 0));
        }
        var moved = new OccupationFunctions(Fits.exponential(),
                List.of(new OccupationFunctions.Segment(segment.times(), segment.states(), weights, segment.start(),
                        segment.end())));
        DMatrixRMaj points = Fits.column(-1.5, -0.3, 0.2, 1.1, 2);
        DMatrixRMaj ends = Fits.exponential().matrix(points, Fits.column(segment.end()[0], segment.start()[0]));
        for (int i = 0; i < points.numRows; i++) {
            assertEquals(ends.get(i, 0) - ends.get(i, 1), points.data[i] * moved.evaluate(points).data[i], 1e-11);
        }
    }

    /** Exact flow of x' = f(x). */
    private static double flow(String motion, double start, double time) {
        return switch (motion) {
            case "constant" -> start + time;
            case "linear" -> start * Math.exp(time);
            case "affine" -> (start + 0.5) * Math.exp(time) - 0.5;
            case "quadratic" -> start / (1 - start * time);
            case "logistic" -> start * Math.exp(time) / (1 + start * Math.expm1(time));
            case "cubic" -> start / Math.sqrt(1 + 2 * start * start * time);
            default -> throw new IllegalArgumentException(motion);
        };
    }

    private static double field(String motion, double x) {
        return switch (motion) {
            case "constant" -> 1;
            case "linear" -> x;
            case "affine" -> x + 0.5;
            case "quadratic" -> x * x;
            case "logistic" -> x * (1 - x);
            case "cubic" -> -x * x * x;
            default -> throw new IllegalArgumentException(motion);
        };
    }

    /** The generator on ten runs that start in [-0.9, 0.9] and last 0.4. */
    private static Compression generator(String motion) {
        List<Run> runs = IntStream.range(0, 10).mapToObj(i -> Fits.run("run " + i, 41, 0.01,
                time -> new double[] {flow(motion, -0.9 + 0.2 * i, time)}))
                .toList();
        return new OccupationEstimator(Fits.exponential(), SegmentPlan.WHOLE_RUNS, 1)
                .compress(Fits.snapshots(0.01, 1, runs), Progress.NONE);
    }

    @Test
    void onlyLinearMotionHasASymmetricGenerator() {
        // symmetric iff f(y) x = f(x) y, that is f = cx; quadrature leaves 1e-9 of it, all others miss by more than 10 %
        assertEquals(0, SymmetryDefect.of(generator("linear").whiten(4).action()), 1e-7);
        for (String motion : new String[] {"constant", "affine", "quadratic", "logistic", "cubic"}) {
            double defect = SymmetryDefect.of(generator(motion).whiten(4).action());
            assertTrue(defect > 0.1, motion + " " + defect);
            // no motion in one dimension is skew, which would be a defect of 2
            assertTrue(defect < 1.9, motion + " " + defect);
        }
    }

    private static Compression planar(Kernel kernel, double[][] field, double duration) {
        List<Run> runs = IntStream.range(0, 12).mapToObj(i -> Fits.run("run " + i, 41, duration / 40, time -> {
            double[] start = {Math.cos(2.4 * i) * (0.3 + 0.06 * i), Math.sin(2.4 * i) * (0.3 + 0.06 * i)};
            return Matrices.product(MatrixExponential.of(Matrices.scaled(new DMatrixRMaj(field), time)), Fits.column(start))
                    .data;
        })).toList();
        return new OccupationEstimator(kernel, SegmentPlan.WHOLE_RUNS, 1)
                .compress(Fits.snapshots(duration / 40, 1, runs), Progress.NONE);
    }

    @Test
    void rotationHasASkewGenerator() {
        // f = Sx with S skew: A* = -A, a defect of exactly 2; quadrature leaves 1e-7 of it
        assertEquals(2, SymmetryDefect.of(planar(Fits.exponential(), new double[][] {{0, 2}, {-2, 0}}, 0.6).whiten(6)
                .action()), 1e-7);
    }

    @Test
    void theGeneratorOfLinearMotionIsNormalExactlyWhenTheMatrixIs() {
        // A_{Ax}* = A_{A'x}; on polynomials to degree 2, which linear motion does not leave, with the norms of (1 + x·y)²
        Kernel kernel = Fits.kernel("polynomial", "degree", 2, "offset", 1);
        assertEquals(0, NormalityDefect.of(planar(kernel, new double[][] {{-0.1, 2}, {-2, -0.1}}, 0.6).whiten(6).action()),
                1e-7);
        assertTrue(NormalityDefect.of(planar(kernel, new double[][] {{-1, 1}, {0, -2}}, 0.6).whiten(6).action()) > 0.05);
    }

    @Test
    void theAdjointOfALinearStepBelongsToTheTransposedMatrix() {
        // M_ij = K(B x_i, x_j) = K(x_i, B'x_j): the actions of B and B' are transposes of each other, to rounding
        double[][] step = {{0.8, 0.3}, {-0.1, 0.6}};
        double[][] transposed = {{0.8, -0.1}, {0.3, 0.6}};
        assertArrayEquals(adjoint(linearStep(step)).data, linearStep(transposed).data, 1e-14);
    }

    private static DMatrixRMaj linearStep(double[][] matrix) {
        double[][] x = {{0.2, 0.5}, {-0.7, 0.1}, {0.4, -0.9}, {1, 0.3}};
        double[][] y = Arrays.stream(x).map(p -> Matrices.product(new DMatrixRMaj(matrix), Fits.column(p)).data)
                .toArray(double[][]::new);
        return new KernelStepEstimator(Fits.exponential(), 4).compress(Fits.pairs(1, x, y), Progress.NONE).action();
    }

    // ---- C3.4 ----

    @ParameterizedTest
    @CsvSource({"-1,0.3,1.2", "0.1,0.9,-2"})
    void underConstantMotionEveryExponentThatIsSampledIsARate(double a, double b, double c) {
        // e^(λx) is in the space for every λ: sections at a, b, c give the rates a, b, c, whatever these are
        double[][] x = {{a}, {b}, {c}};
        double[][] y = {{a + 0.5}, {b + 0.5}, {c + 0.5}};
        ModalExpansion expansion = ModalExpansion.of(
                new KernelStepEstimator(Fits.exponential(), 3).compress(Fits.pairs(0.5, x, y), Progress.NONE).whiten(3));
        double[] found = expansion.rates().stream().mapToDouble(Complex::re).sorted().toArray();
        double[] expected = {a, b, c};
        Arrays.sort(expected);
        assertArrayEquals(expected, found, 1e-11);
        assertTrue(expansion.condition() > 2, "and they overlap: the operator is not normal");
        assertTrue(NormalityDefect.of(expansion.compression().action()) > 0.1);
    }

    @ParameterizedTest
    @CsvSource({"1,0", "-0.7,0", "1,0.5", "-2,0.3"})
    void affineMotionHasThePowersAboutItsRestPoint(double a, double b) {
        // exactly (x + b/a)^n with rate a n; orthogonal only if b = 0
        DMatrixRMaj operator = FOCK.matrix(MonomialSpace.liouville(1, b, a), 8);
        GeneralEigen eigen = LinearAlgebra.installed().eigen(operator);
        for (int n = 0; n < 8; n++) {
            int column = Fits.nearest(eigen.values(), a * n);
            assertEquals(a * n, eigen.values().get(column).re(), 1e-12);
            double[] power = MonomialSpace.composition(1, b / a).image(n);
            double leading = eigen.vectors().getReal(n, column) / FOCK.norm(n);
            for (int k = 0; k <= n; k++) {
                assertEquals(power[k], eigen.vectors().getReal(k, column) / FOCK.norm(k) / leading,
                        1e-10 * Math.max(1, power[k]));
            }
        }
        var gram = ComplexMatrices.conjugateTransposeProduct(eigen.vectors(), eigen.vectors());
        double overlap = ComplexMatrices.entry(gram, Fits.nearest(eigen.values(), 0), Fits.nearest(eigen.values(), a)).abs();
        // closed form <1, x + b/a> over the norms
        assertEquals(Math.abs(b / a) / Math.hypot(1, b / a), overlap, 1e-14);
    }

    @ParameterizedTest
    @CsvSource({"1,0.5", "-2,0.3", "1.5,0"})
    void commutatorOfAnAffineGenerator(double a, double b) {
        // [A, A*] = ab(M + D) + b² I, so normal exactly when b = 0; away from the cut, to rounding
        DMatrixRMaj operator = FOCK.matrix(MonomialSpace.liouville(1, b, a), SIZE);
        DMatrixRMaj commutator = Matrices.productTranspose(operator, operator);
        CommonOps_DDRM.subtractEquals(commutator, Matrices.transposeProduct(operator, operator));
        DMatrixRMaj expected = Matrices.scaled(FOCK.matrix(MonomialSpace.multiplication(), SIZE), a * b);
        CommonOps_DDRM.addEquals(expected, a * b, FOCK.matrix(MonomialSpace.liouville(1, 1), SIZE));
        CommonOps_DDRM.addEquals(expected, b * b, CommonOps_DDRM.identity(SIZE));
        assertLeading(expected, commutator);
        if (b == 0) {
            assertEquals(0, NormalityDefect.of(operator), 1e-15);
        }
    }

    @Test
    void ratesOfAffineMotionFromRuns() {
        // 0, 1, 2 for x' = x + 0.5; the higher rates of a finite span lie above, the low ones have settled to 1e-3
        List<Complex> rates = ModalExpansion.of(generator("affine").whiten(7)).rates();
        for (double expected : new double[] {0, 1, 2}) {
            assertEquals(0, rates.stream().mapToDouble(rate -> Math.hypot(rate.re() - expected, rate.im())).min()
                    .orElseThrow(), 1e-2);
        }
    }

    private static Grade overall(String motion) {
        List<Run> runs = IntStream.range(0, 40).mapToObj(i -> Fits.run("run " + i, 21, 0.02,
                time -> new double[] {flow(motion, -1 + 2 * i / 39.0, time)}))
                .toList();
        Snapshots snapshots = Fits.snapshots(0.02, 1, IntStream.range(0, 40).filter(i -> i % 5 != 2).mapToObj(runs::get)
                .toList(),
                IntStream.range(0, 40).filter(i -> i % 5 == 2).mapToObj(runs::get).toList());
        FittedOperator operator = Fits.fit(snapshots,
                new OccupationEstimator(Fits.exponential(), SegmentPlan.WHOLE_RUNS, 1), 6);
        return WellPosedness.judge(snapshots, operator, SpectrumExtractor.extract(operator, Progress.NONE),
                JudgeSettings.DEFAULT.withLadder(4, 10),
                Progress.NONE).overall().grade();
    }

    @ParameterizedTest
    @CsvSource({"linear,STANDS", "affine,SETTLES", "constant,DRIFTS", "quadratic,ABSENT", "logistic,ABSENT", "cubic,ABSENT"})
    void theVerdictSaysWhichMotionHasModesInTheSpace(String motion, Grade expected) {
        // only affine motion has modes, orthogonal ones only linear motion; under constant motion every exponent is one;
        // of higher degree only constants
        assertEquals(expected, overall(motion));
    }
}
