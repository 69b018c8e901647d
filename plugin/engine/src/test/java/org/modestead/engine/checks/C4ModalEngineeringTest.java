package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebra.SymmetricEigen;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.GramCompression;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.spectrum.Damping;
import org.modestead.engine.spectrum.ModalAssurance;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeShapes;
import org.modestead.engine.spectrum.Spectrum;

/** CHECKS C4.1-C4.6: modal analysis in the terms of the trades that use it. */
class C4ModalEngineeringTest {

    // ---- C4.1 ----

    @ParameterizedTest
    @CsvSource({"0.01,0.0628349949000885", "0.05,0.314552702288800", "0.2,1.28254983016186"})
    void logarithmicDecrement(double ratio, double decrement) {
        // closed form (any vibration text); 1e-14 relative, the digits printed
        assertEquals(decrement, new Damping(ratio).logarithmicDecrement(), 1e-14 * decrement);
        assertEquals(ratio, Damping.ofLogarithmicDecrement(decrement).ratio(), 1e-14 * ratio);
    }

    @Test
    void dampingFromTheDecrementAndCyclesToHalf() {
        // closed form; 1e-14 relative, the digits printed
        assertEquals(0.0793266968436585, Damping.ofLogarithmicDecrement(0.5).ratio(), 7e-16);
        assertEquals(0.109652580999385, Damping.ofLogarithmicDecrement(Math.log(2)).ratio(), 1e-15);
        assertEquals(2.20359633065097, new Damping(0.05).cyclesToHalf(), 2e-14);
    }

    // ---- C4.2 ----

    @Test
    void halfPowerBandwidthOfOneDegreeOfFreedom() {
        // closed form; the difference of the two points cancels 1/(2ζ) digits: 1e-14 absolute
        assertEquals(0.0100010003501451, new Damping(0.01).halfPowerBandwidth(), 1e-14);
        Damping five = new Damping(0.05);
        assertEquals(0.0501261052113887, five.halfPowerBandwidth(), 1e-14);
        double difference = Math.pow(five.upperHalfPower(), 2) - Math.pow(five.lowerHalfPower(), 2);
        assertEquals(0.0499374608885954, difference / 4, 1e-15);
        assertEquals(10.0125234864352, five.amplification(), 1e-13);
    }

    @Test
    void dampingThatHasNoHalfPowerPointsIsRefused() {
        assertThrows(IllegalArgumentException.class, () -> new Damping(0.4).halfPowerBandwidth());
        assertThrows(IllegalArgumentException.class, () -> new Damping(-0.1).halfPowerBandwidth());
        assertThrows(IllegalArgumentException.class, () -> new Damping(0.71).amplification());
        assertThrows(IllegalArgumentException.class, () -> new Damping(1));
    }

    // ---- C4.3 ----

    /** A single channel that rings: Re e^(λt). */
    private static Run ringDown(Complex rate, int samples, double step) {
        return Fits.run("ring-down", samples, step, time -> new double[] {rate.times(time).exp().re()});
    }

    @Test
    void eigenvalueToEngineeringTerms() {
        // closed form: fn = 10 Hz, ζ = 0.05; 1e-14 relative for the conversion
        Complex rate = new Damping(0.05).rate(10);
        assertEquals(-3.14159265358979, rate.re(), 1e-13);
        assertEquals(62.7532641066156, rate.im(), 1e-12);
        assertEquals(0.05, Damping.ofRate(rate).ratio(), 1e-15);
        Complex multiplier = rate.times(0.01).exp();
        assertEquals(0.969072426304811, multiplier.abs(), 1e-14);
        assertEquals(0.627532641066156, multiplier.arg(), 1e-14);
    }

    @Test
    void aRingDownIsToldWithDampedAndNaturalFrequency() {
        // closed form; 200 exact samples at 0.01 s leave rounding only: 1e-10
        Run run = ringDown(new Damping(0.05).rate(10), 200, 0.01);
        Spectrum spectrum = Fits.spectrum(Fits.snapshots(0.01, 2, List.of(run)), new LinearEstimator(), 2);
        Mode mode = spectrum.modes().get(0);
        assertEquals(9.98749217771909, mode.frequency(), 1e-10);
        assertEquals(10, mode.naturalFrequency(), 1e-10);
        assertEquals(0.05, mode.dampingRatio(), 1e-12);
        assertEquals(-3.14159265358979, mode.rate().re(), 1e-10);
        assertEquals(62.7532641066156, mode.rate().im(), 1e-9);
        assertEquals(0.969072426304811, spectrum.eigenvalues().get(mode.indices().get(0)).abs(), 1e-12);
        assertEquals(0.627532641066156, spectrum.eigenvalues().get(mode.indices().get(0)).arg(), 1e-12);
        assertEquals(0.314552702288800, Damping.ofRate(mode.rate()).logarithmicDecrement(), 1e-11);
    }

    // ---- C4.4 ----

    /** Stiffness of equal masses and springs, m = k = 1; the last mass free or held by a spring to a second wall. */
    static SymmetricEigen chain(int masses, boolean secondWall) {
        DMatrixRMaj stiffness = new DMatrixRMaj(masses, masses);
        for (int i = 0; i < masses; i++) {
            stiffness.set(i, i, i == masses - 1 && !secondWall ? 1 : 2);
            if (i > 0) {
                stiffness.set(i, i - 1, -1);
                stiffness.set(i - 1, i, -1);
            }
        }
        return LinearAlgebra.installed().symmetricEigen(stiffness);
    }

    static double[] rising(SymmetricEigen eigen) {
        int n = eigen.values().length;
        return IntStream.range(0, n).mapToDouble(k -> Math.sqrt(eigen.values()[n - 1 - k])).toArray();
    }

    @Test
    void frequenciesOfSpringMassChains() {
        // closed forms 2 sin((2k-1)π/(2(2n+1))) and 2 sin(kπ/(2(n+1))); 1e-13 as in CHECKS C4.4
        assertArrayEquals(new double[] {0.618033988749895, 1.61803398874989}, rising(chain(2, false)), 1e-13);
        assertArrayEquals(new double[] {1, 1.73205080756888}, rising(chain(2, true)), 1e-13);
        assertArrayEquals(new double[] {0.765366864730180, 1.41421356237310, 1.84775906502257},
                rising(chain(3, true)), 1e-13);
    }

    @Test
    void aChainSetFreeRingsInItsModes() {
        // closed form: shape k of the wall-wall chain is sin(jkπ/(n+1)); exact samples: 1e-9
        double[] natural = {0.765366864730180, 1.41421356237310, 1.84775906502257};
        double[] weight = {1, 0.6, 0.4};
        Run run = Fits.run("chain", 400, 0.2, time -> {
            double[] displacement = new double[3];
            for (int k = 1; k <= 3; k++) {
                for (int j = 1; j <= 3; j++) {
                    displacement[j - 1] += weight[k - 1] * Math.sin(j * k * Math.PI / 4) * Math.cos(natural[k - 1] * time);
                }
            }
            return displacement;
        });
        var snapshots = Fits.snapshots(0.2, 2, List.of(run));
        Spectrum spectrum = Fits.spectrum(snapshots, new LinearEstimator(), 6);
        for (int k = 1; k <= 3; k++) {
            Mode mode = Fits.nearest(spectrum, 0, natural[k - 1]);
            assertEquals(natural[k - 1], mode.rate().im(), 1e-9);
            assertEquals(0, mode.rate().re(), 1e-9);
            List<Complex> shape = ModeShapes.of(spectrum, mode, snapshots.preparation()).stream()
                    .filter(entry -> entry.delay() == 0)
                    .map(entry -> new Complex(0, entry.phase()).exp().times(entry.magnitude())).toList();
            int number = k;
            List<Complex> expected = IntStream.rangeClosed(1, 3)
                    .mapToObj(j -> new Complex(Math.sin(j * number * Math.PI / 4), 0)).toList();
            assertEquals(1, ModalAssurance.of(shape, expected), 1e-12, "shape " + k);
        }
    }

    // ---- C4.5 ----

    private static final int POLYNOMIALS = 16;

    /**
     * Roots βL of a cantilever: the compliance operator in the energy inner product ∫u''v'', on functions clamped at 0
     * whose second derivatives are orthonormal Legendre polynomials, so G = I and M_ij = ∫ b_i b_j has eigenvalues 1/β⁴.
     */
    static double[] cantilever() {
        double[][] twice = new double[POLYNOMIALS][];
        for (int k = 0; k < POLYNOMIALS; k++) {
            double[] legendre = new double[k + 1];
            legendre[k] = Math.sqrt(2 * k + 1);
            twice[k] = integral(integral(legendre));
        }
        DMatrixRMaj gram = CommonOps_DDRM.identity(POLYNOMIALS);
        DMatrixRMaj mass = new DMatrixRMaj(POLYNOMIALS, POLYNOMIALS);
        for (int i = 0; i < POLYNOMIALS; i++) {
            for (int j = 0; j < POLYNOMIALS; j++) {
                for (int n = 0; n < Math.min(twice[i].length, twice[j].length); n++) {
                    mass.add(i, j, twice[i][n] * twice[j][n] / (2 * n + 1));
                }
            }
        }
        var compression = new GramCompression(new Unevaluated(POLYNOMIALS), gram, mass, gram,
                new DMatrixRMaj(POLYNOMIALS, 1), InnerProduct.SPACE,
                new Evolution.Generator(1)).whiten(POLYNOMIALS);
        return ModalExpansion.of(compression).eigenvalues().stream().mapToDouble(Complex::re).map(value -> -value).sorted()
                .map(value -> Math.pow(-value, -0.25)).toArray();
    }

    /** ∫_0^x of a series of Legendre polynomials P_n(2x-1), zero at x = 0: ∫P_n = (P_(n+1) - P_(n-1))/(2(2n+1)). */
    private static double[] integral(double[] series) {
        double[] out = new double[series.length + 1];
        for (int n = 0; n < series.length; n++) {
            double part = series[n] / (2 * (2 * n + 1));
            out[n + 1] += part;
            out[n == 0 ? 0 : n - 1] += n == 0 ? part : -part;
        }
        return out;
    }

    private record Unevaluated(int size) implements FunctionBasis {
        @Override
        public DMatrixRMaj evaluate(DMatrixRMaj states) {
            throw new UnsupportedOperationException("only the arrays are needed");
        }

        @Override
        public String describe() {
            return "clamped polynomials";
        }
    }

    @Test
    void rootsOfTheCantilever() {
        // Blevins 1979, from memory, recomputed; the Ritz values of degree 17 are converged to rounding: 1e-12
        double[] expected = {1.87510406871196, 4.69409113297418, 7.85475743823761, 10.9955407348755};
        double[] roots = cantilever();
        for (int k = 0; k < 4; k++) {
            assertEquals(expected[k], roots[k], 1e-12 * expected[k], "root " + k);
            assertEquals(-1, Math.cos(roots[k]) * Math.cosh(roots[k]), 1e-7, "cos b cosh b = -1, steep in b");
        }
        // frequency ratios to the 12 printed digits
        assertEquals(6.26689302577, Math.pow(roots[1] / roots[0], 2), 6e-12);
        assertEquals(17.5474819368, Math.pow(roots[2] / roots[0], 2), 6e-11);
        assertEquals(34.3860611572, Math.pow(roots[3] / roots[0], 2), 6e-11);
    }

    // ---- C4.6 ----

    private static List<Complex> real(double... values) {
        return Arrays.stream(values).mapToObj(value -> new Complex(value, 0)).toList();
    }

    @Test
    void modalAssuranceOfKnownPairs() {
        // Allemang and Brown 1982; closed form 289/294, one rounding
        assertEquals(0.982993197278912, ModalAssurance.of(real(1, 2, 3), real(1, 2, 4)), 1e-15);
        assertEquals(0, ModalAssurance.of(List.of(new Complex(1, 0), new Complex(0, 1)),
                List.of(new Complex(1, 0), new Complex(0, -1))));
    }

    @Test
    void modalAssuranceIgnoresComplexFactors() {
        List<Complex> shape = List.of(new Complex(1, 2), new Complex(-0.5, 0.1), new Complex(0, 3));
        List<Complex> turned = shape.stream().map(z -> z.times(new Complex(-0.3, 4))).toList();
        assertEquals(1, ModalAssurance.of(shape, turned), 1e-15);
        assertEquals(ModalAssurance.of(shape, real(1, 2, 3)), ModalAssurance.of(turned, real(1, 2, 3)), 1e-15);
    }

    @Test
    void modalAssuranceRefusesWhatItCannotCompare() {
        assertThrows(IllegalArgumentException.class, () -> ModalAssurance.of(real(1, 2), real(1, 2, 3)));
        assertThrows(IllegalArgumentException.class, () -> ModalAssurance.of(real(0, 0), real(1, 2)));
    }
}
