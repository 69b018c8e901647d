package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.MatrixExponential;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/** CHECKS C2.1-C2.4: motions whose spectra are known. */
class C2KnownSpectraTest {

    private static DMatrixRMaj matrix(double[]... rows) {
        return new DMatrixRMaj(rows);
    }

    private static double norm(DMatrixRMaj a) {
        return LinearAlgebra.installed().svd(a).values()[0];
    }

    private static void assertRate(Spectrum spectrum, double re, double im, double tolerance) {
        Mode mode = Fits.nearest(spectrum, re, im);
        assertEquals(re, mode.rate().re(), tolerance, "real part of " + re + " + " + im + "i");
        assertEquals(im, mode.rate().im(), tolerance, "imaginary part of " + re + " + " + im + "i");
    }

    // ---- C2.1 ----

    @Test
    void exponentialOfMolerAndVanLoan() {
        // Moler and Van Loan 1978; closed form -2e^-1+3e^-17, ...; CHECKS C2.1: 1e-13 relative
        double[] expected = {-0.7357587581447531, 0.5518190996580977, -1.471517599088261, 1.103638240715573};
        DMatrixRMaj found = MatrixExponential.of(matrix(new double[] {-49, 24}, new double[] {-64, 31}));
        for (int i = 0; i < 4; i++) {
            assertEquals(expected[i], found.data[i], 1e-13 * Math.abs(expected[i]), "entry " + i);
        }
    }

    @Test
    void multipliersOfARotationThatDecays() {
        // closed form; one step of 0.1: rounding only
        DMatrixRMaj step = MatrixExponential.of(matrix(new double[] {-0.01, 0.2}, new double[] {-0.2, -0.01}));
        Complex multiplier = LinearAlgebra.installed().eigen(step).values().get(0);
        assertEquals(0.970314752454837, multiplier.re(), 1e-15);
        assertEquals(0.196692537924709, multiplier.im(), 1e-15);
    }

    @Test
    void productsOfEigenfunctionsAddTheirRates() {
        // closed form: (w1·x)^i (w2·x)^j has the rate i l1 + j l2; degree 2, rates -1 and -0.3, exact samples
        DMatrixRMaj step = MatrixExponential.of(matrix(new double[] {-0.1, 0.05}, new double[] {0, -0.03}));
        double[][] x = grid();
        Spectrum spectrum = Fits.spectrum(Fits.pairs(0.1, x, moved(x, step)),
                new DictionaryEstimator(Dictionary.monomials(2)), 6);
        for (double rate : new double[] {0, -1, -0.3, -2, -1.3, -0.6}) {
            assertRate(spectrum, rate, 0, 1e-10);
        }
    }

    private static double[][] grid() {
        List<double[]> points = new ArrayList<>();
        for (int i = -2; i <= 2; i++) {
            for (int j = -2; j <= 2; j++) {
                points.add(new double[] {0.5 * i + 0.05 * j, 0.4 * j});
            }
        }
        return points.toArray(double[][]::new);
    }

    private static double[][] moved(double[][] x, DMatrixRMaj step) {
        DMatrixRMaj y = Matrices.productTranspose(new DMatrixRMaj(x), step);
        double[][] out = new double[x.length][];
        for (int i = 0; i < x.length; i++) {
            out[i] = Arrays.copyOfRange(y.data, 2 * i, 2 * i + 2);
        }
        return out;
    }

    // ---- C2.2 ----

    private static final DMatrixRMaj TRANSIENT = matrix(new double[] {-1, 100}, new double[] {0, -2});

    private static DMatrixRMaj transientAt(double time) {
        return MatrixExponential.of(Matrices.scaled(TRANSIENT, time));
    }

    @Test
    void stableMotionMayGrowFirst() {
        // derived; closed form 100(e^-t - e^-2t), exactly 25 at ln 2; rounding only
        assertEquals(25, transientAt(Math.log(2)).get(0, 1), 1e-12);
        assertEquals(23.254415793482963, transientAt(1).get(0, 1), 1e-12);
    }

    @Test
    void largestNormOfTheTransient() {
        // derived; ten printed digits of the norm, eight of the time; the maximum is flat, so the
        // time is found from the slope
        assertEquals(25.00625097, norm(transientAt(0.69284713)), 6e-9);
        double low = 0.6;
        double high = 0.8;
        while (high - low > 1e-9) {
            double middle = (low + high) / 2;
            double slope = norm(transientAt(middle + 1e-3)) - norm(transientAt(middle - 1e-3));
            low = slope > 0 ? middle : low;
            high = slope > 0 ? high : middle;
        }
        // the symmetric difference is off by h²/6 times the third derivative over the second: about 1e-6
        assertEquals(0.69284713, low, 2e-6);
        assertEquals(25.00625097, norm(transientAt(low)), 6e-9);
    }

    // ---- C2.3 ----

    // Brunton, Brunton, Proctor and Kutz, PLoS ONE 11(2):e0150171, 2016 (citation from memory); values are closed forms

    private static final double MU = -0.05;
    private static final double LAMBDA = -1;
    private static final double B = LAMBDA / (LAMBDA - 2 * MU);

    private static double[] slowManifold(double[] start, double time) {
        double square = start[0] * start[0];
        return new double[] {start[0] * Math.exp(MU * time),
            (start[1] - B * square) * Math.exp(LAMBDA * time) + B * square * Math.exp(2 * MU * time)};
    }

    private static Snapshots slowRuns() {
        List<Run> runs = new ArrayList<>();
        double[][] starts = {{2, -1}, {-1.5, 1}, {1, 2}, {-0.5, -2}};
        for (double[] start : starts) {
            runs.add(Fits.run("from " + start[0], 31, 0.1, time -> slowManifold(start, time)));
        }
        return Fits.snapshots(0.1, 1, runs);
    }

    private static final ListedFunctions CLOSED = ListedFunctions.of(x -> 1, x -> x[0], x -> x[1], x -> x[0] * x[0]);

    @Test
    void slowManifoldGeneratorCarriesTheObservables() {
        // closed form; 1e-12 relative as in CHECKS C2.3
        DMatrixRMaj generator = matrix(new double[] {MU, 0, 0}, new double[] {0, LAMBDA, -LAMBDA},
                new double[] {0, 0, 2 * MU});
        DMatrixRMaj carried = Matrices.product(MatrixExponential.of(Matrices.scaled(generator, 3)), Fits.column(2, -1, 4));
        assertEquals(1.721415952850116, carried.data[0], 2e-12);
        assertEquals(3.021462497471487, carried.data[1], 3e-12);
    }

    @Test
    void slowManifoldSpectrumAndForecastFromData() {
        // closed form; CHECKS C2.3: 1e-10
        ModalExpansion expansion = slowExpansion();
        for (double expected : new double[] {1, 0.995012479192682, 0.904837418035960, 0.990049833749168}) {
            Complex found = expansion.eigenvalues().get(Fits.nearest(expansion.eigenvalues(), expected));
            assertEquals(expected, found.re(), 1e-12);
            assertEquals(0, found.im(), 1e-12);
        }
        double[] ahead = slowForecast();
        assertEquals(1.721415952850116, ahead[0], 1e-10);
        assertEquals(3.021462497471487, ahead[1], 1e-10);
    }

    /** From (2, -1), three time units on, by the operator that the runs give. */
    static double[] slowForecast() {
        FittedOperator operator = Fits.fit(slowRuns(), new DictionaryEstimator(CLOSED), 4);
        DMatrixRMaj start = operator.chosen().evaluate(matrix(new double[] {2, -1}));
        return Matrices.product(Matrices.product(start, operator.propagator(3)), operator.chosen().observable()).data;
    }

    /** The four modes of the slow manifold from its runs. */
    static ModalExpansion slowExpansion() {
        return ModalExpansion.of(Fits.fit(slowRuns(), new DictionaryEstimator(CLOSED), 4).chosen());
    }

    /** -b in the eigenfunction x2 - b x1² of the fast multiplier. */
    static double slowParabola(ModalExpansion expansion) {
        var functions = ComplexMatrices.product(expansion.compression().map(), expansion.vectors());
        int fast = Fits.nearest(expansion.eigenvalues(), 0.904837418035960);
        return functions.getReal(3, fast) / functions.getReal(2, fast);
    }

    @Test
    void slowManifoldIsReadOffTheEigenfunction() {
        // closed form: x2 - b x1^2, b = 1.111111111111; CHECKS C2.3: 1e-10
        ModalExpansion expansion = slowExpansion();
        var functions = ComplexMatrices.product(expansion.compression().map(), expansion.vectors());
        int fast = Fits.nearest(expansion.eigenvalues(), 0.904837418035960);
        assertEquals(-1.111111111111111, slowParabola(expansion), 1e-10);
        assertEquals(0, functions.getReal(0, fast) / functions.getReal(2, fast), 1e-10);
        assertEquals(0, functions.getReal(1, fast) / functions.getReal(2, fast), 1e-10);
    }

    @Test
    void residualsVanishOnlyWhereTheObservablesAreClosed() {
        // CHECKS C2.3: zero to rounding, √ε after the root of a difference of squares; without x1^2 the residual is of
        // order one percent or more
        ModalExpansion closed = slowExpansion();
        for (int j = 0; j < 4; j++) {
            assertEquals(0, Fits.residual(closed, j), 1e-7, "closed, " + closed.eigenvalues().get(j));
        }
        ListedFunctions open = ListedFunctions.of(x -> 1, x -> x[0], x -> x[1]);
        ModalExpansion leaking = ModalExpansion.of(Fits.fit(slowRuns(), new DictionaryEstimator(open), 3).chosen());
        assertTrue(Fits.residual(leaking, Fits.nearest(leaking.eigenvalues(), 0.904837418035960)) > 0.01);
    }

    // ---- C2.4 ----

    // Stuart-Landau; lattice after Bagheri, J. Fluid Mech. 726:596, 2013 (from memory); identities derived

    static final double GROWTH = 0.25;
    static final double GAMMA = 2;
    static final double BETA = 0.5;

    /** Exact flow in polar coordinates. */
    static double[] stuartLandau(double radius, double angle, double time) {
        double squared = GROWTH / (1 + (GROWTH / (radius * radius) - 1) * Math.exp(-2 * GROWTH * time));
        double now = Math.sqrt(squared);
        return new double[] {now, angle + (GAMMA - BETA * GROWTH) * time + BETA * Math.log(now / radius)};
    }

    private static Snapshots polarRuns() {
        List<Run> runs = new ArrayList<>();
        for (double radius : new double[] {0.1, 0.3, 0.8, 1.2}) {
            runs.add(Fits.run("radius " + radius, 41, 0.05, time -> stuartLandau(radius, 3 * radius, time)));
        }
        return Fits.snapshots(0.05, 1, runs);
    }

    static double radial(double[] state) {
        return 1 - GROWTH / (state[0] * state[0]);
    }

    private static double phase(double[] state) {
        return state[1] - BETA * Math.log(state[0]);
    }

    /** The exact eigenfunctions with -2μj + inω0, j = 0, 1, n = -2..2, as real functions. */
    private static final ListedFunctions LATTICE = ListedFunctions.of(
            x -> 1, x -> radial(x), x -> Math.cos(phase(x)), x -> Math.sin(phase(x)),
            x -> Math.cos(2 * phase(x)), x -> Math.sin(2 * phase(x)),
            x -> radial(x) * Math.cos(phase(x)), x -> radial(x) * Math.sin(phase(x)),
            x -> radial(x) * Math.cos(2 * phase(x)), x -> radial(x) * Math.sin(2 * phase(x)));

    @Test
    void stuartLandauSpectrumIsALattice() {
        // derived; exact flow, so far inside the 1e-6 that CHECKS C2.4 asks of fine data
        Spectrum spectrum = Fits.spectrum(polarRuns(), new DictionaryEstimator(LATTICE), 10);
        for (double[] point : new double[][] {{0, 0}, {-0.5, 0}, {0, 1.875}, {0, 3.75}, {-0.5, 1.875}, {-0.5, 3.75}}) {
            assertRate(spectrum, point[0], point[1], 1e-9);
        }
    }

    @Test
    void stuartLandauIsCarriedByItsEigenfunctions() {
        // closed form; from r = 0.1, θ = 0 over t = 10: CHECKS C2.4 asks 1e-12 of the formula, 1e-6 of fine data
        double[] functions = latticeAhead(polarRuns());
        assertEquals(-24, LATTICE.evaluate(matrix(new double[] {0.1, 0})).data[1], 1e-12);
        assertEquals(-0.161710727978051, functions[1], 1e-9);
        assertEquals(Math.exp(-5), functions[1] / -24, 1e-10);
        double[] polar = polar(functions);
        assertEquals(0.463896402263257, polar[0], 1e-9);
        assertEquals(19.51724553516256, polar[1], 1e-9);
    }

    /** Values of the listed eigenfunctions ten time units after r = 0.1, θ = 0, by the operator that runs give. */
    static double[] latticeAhead(Snapshots runs) {
        FittedOperator operator = Fits.fit(runs, new DictionaryEstimator(LATTICE), 10);
        DMatrixRMaj start = operator.chosen().evaluate(matrix(new double[] {0.1, 0}));
        DMatrixRMaj carried = Matrices.product(start, operator.propagator(10));
        // back from the orthonormal functions to the listed ones: values at t = 10 of f = q <f, q>
        DMatrixRMaj samples = runs.states(Snapshots.Part.TRAINING).get(1).states();
        DMatrixRMaj weights = leastSquares(operator.chosen().evaluate(samples), LATTICE.evaluate(samples));
        return Matrices.product(carried, weights).data;
    }

    /** Radius and angle from those values; three turns have passed, the sine and cosine of the phase know the rest. */
    static double[] polar(double[] functions) {
        double radius = Math.sqrt(GROWTH / (1 - functions[1]));
        return new double[] {radius, Math.atan2(functions[3], functions[2]) + BETA * Math.log(radius) + 6 * Math.PI};
    }

    private static DMatrixRMaj leastSquares(DMatrixRMaj a, DMatrixRMaj b) {
        LinearAlgebra.Svd svd = LinearAlgebra.installed().svd(a);
        DMatrixRMaj coefficients = Matrices.transposeProduct(svd.u(), b);
        CommonOps_DDRM.divideRows(svd.values(), coefficients);
        return Matrices.product(svd.v(), coefficients);
    }

    @Test
    void stuartLandauCycleFromASingleChannel() {
        // closed form: radius √μ = 0.5, ω0 = 1.875, period 3.351032163829113; exact samples
        Run run = Fits.run("cycle", 200, 0.05, time -> {
            double[] state = stuartLandau(Math.sqrt(GROWTH), 0, time);
            return new double[] {state[0] * Math.cos(state[1])};
        });
        Mode mode = Fits.spectrum(Fits.snapshots(0.05, 2, List.of(run)), new LinearEstimator(), 2).modes().get(0);
        assertEquals(0.5, mode.amplitude(), 1e-10);
        assertEquals(1.875, mode.rate().im(), 1e-10);
        assertEquals(3.351032163829113, mode.period(), 1e-10);
        assertEquals(0, mode.rate().re(), 1e-10);
    }

    @Test
    void stuartLandauFloquetMultiplier() {
        // closed form: exponent -2μ = -0.5, over one period 0.187211538057668
        Spectrum spectrum = Fits.spectrum(polarRuns(), new DictionaryEstimator(LATTICE), 10);
        Mode attracting = Fits.nearest(spectrum, -0.5, 0);
        assertEquals(0.187211538057668, attracting.rate().times(Fits.nearest(spectrum, 0, 1.875).period()).exp().re(), 1e-9);
    }
}
