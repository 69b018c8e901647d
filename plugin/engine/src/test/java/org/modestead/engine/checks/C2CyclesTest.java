package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/** CHECKS C2.5 to C2.7 and C2.14 to C2.17: harmonics of cycles, maps, and what stands around them. Periods: C2 of the table. */
class C2CyclesTest {

    private static void assertHarmonics(List<Orbit.Oscillation> found, double base, double[] odd, double tolerance) {
        for (int k = 0; k < odd.length; k++) {
            assertEquals((2 * k + 1) * base, found.get(k).rate().im(), 1e-6 * base, "frequency of harmonic " + (2 * k + 1));
            assertEquals(odd[k], found.get(k).amplitude(), tolerance, "harmonic " + (2 * k + 1));
        }
    }

    @Test
    void vanDerPolHasOddHarmonicsOnly() {
        // CHECKS C2.5, derived, from the recorded cycle at mu = 1; 1e-8 as for the period. An even harmonic above 1e-8
        // would stand among these
        double[] odd = {2.01490646420275, 0.23764828260019, 0.04798720079108, 0.01091714346827, 0.00261285746080,
            0.00064320114369};
        Orbit cycle = MeasuredSystems.recordedCycle();
        assertHarmonics(cycle.oscillations(90, x -> x[0], 1e-8), 2 * Math.PI / 6.66328685932313019, odd, 1e-8);
        assertEquals(0, cycle.mean(90, x -> x[0] + 1) - 1, 1e-8, "x itself has no mean");
    }

    @Test
    void duffingHarmonics() {
        // CHECKS C2.6, textbook, at amplitude 1
        double[] odd = {0.981710616281666, 0.017960677962690, 0.000322798128581, 5.80145290350e-6};
        Orbit cycle = Orbit.of(x -> new double[] {x[1], -x[0] - Math.pow(x[0], 3)}, new double[] {1, 0}, 0, 0.2, 150);
        assertHarmonics(cycle.oscillations(40, x -> x[0], 1e-7), 2 * Math.PI / 4.768022029102461, odd, 1e-10);
    }

    @Test
    void pendulumHarmonics() {
        // CHECKS C2.7, textbook, from rest at 90 degrees; the sum of all is the angle at the start
        double[] odd = {1.594147261353547, 0.023953509686336, 0.000621125032678};
        Orbit cycle = Orbit.of(x -> new double[] {x[1], -Math.sin(x[0])}, new double[] {Math.PI / 2, 0}, 0, 0.2, 300);
        double base = 1 / 1.180340599016096;
        assertHarmonics(cycle.oscillations(80, x -> x[0], 1e-6), base, odd, 1e-10);
    }

    private static List<Complex> eigenvalues(double[]... rows) {
        return LinearAlgebra.installed().eigen(new DMatrixRMaj(rows)).values();
    }

    private static void assertHolds(List<Complex> values, double re, double im, double tolerance) {
        assertEquals(0, values.stream().mapToDouble(value -> Math.hypot(value.re() - re, value.im() - im)).min().orElseThrow(),
                tolerance, re + " + " + im + "i");
    }

    @Test
    void restPointsOfTheDampedDuffingOscillatorAndPendulum() {
        // CHECKS C2.6 and C2.7, textbook, digits printed
        List<Complex> well = eigenvalues(new double[] {0, 1}, new double[] {-2, -0.5});
        assertHolds(well, -0.25, 1.391941090707505, 1e-14);
        List<Complex> saddle = eigenvalues(new double[] {0, 1}, new double[] {1, -0.5});
        assertHolds(saddle, 0.780776406404415, 0, 1e-14);
        assertHolds(saddle, -1.280776406404415, 0, 1e-14);
        assertHolds(eigenvalues(new double[] {0, 1}, new double[] {-1, -0.2}), -0.1, 0.994987437106620, 1e-14);
    }

    @Test
    void smallSwingsOfADampedPendulumFromData() {
        // CHECKS C2.7; at an angle of 1e-5 the nonlinear part is 1e-11 of the linear one
        Orbit swing = Orbit.of(x -> new double[] {x[1], -0.2 * x[1] - Math.sin(x[0])}, new double[] {1e-5, 0}, 0, 0.2, 60);
        Run run = Fits.run("swing", 60, 0.2, time -> swing.states()[(int) Math.round(time / 0.2)]);
        Mode mode = Fits.spectrum(Fits.snapshots(0.2, 1, List.of(run)), new LinearEstimator(), 2).modes().get(0);
        assertEquals(-0.1, mode.rate().re(), 1e-8);
        assertEquals(0.994987437106620, mode.rate().im(), 1e-8);
    }

    @Test
    void circleRotationOnItsHarmonics() {
        // CHECKS C2.14, textbook: e^(2πi α) at the golden mean, residual 0
        double alpha = 0.618033988749895;
        double[][] x = IntStream.range(0, 40).mapToObj(k -> new double[] {k * 0.137 % 1}).toArray(double[][]::new);
        double[][] y = IntStream.range(0, 40).mapToObj(k -> new double[] {x[k][0] + alpha}).toArray(double[][]::new);
        ModalExpansion expansion = ModalExpansion.of(
                Fits.fit(Fits.pairs(1, x, y), new DictionaryEstimator(Dictionary.fourier(1, 1)), 3).chosen());
        assertHolds(expansion.eigenvalues(), -0.737368878078320, -0.675490294261524, 1e-12);
        for (int j = 0; j < 3; j++) {
            // the root of a difference of squares: √ε
            assertEquals(0, Fits.residual(expansion, j), 1e-7);
        }
    }

    @Test
    void chaoticLogisticMapOnChebyshevPolynomials() {
        // CHECKS C2.15, derived: U T_k = T_2k for T_k(1 - 2x), so eigenvalues 1, 0, ..., 0 and residual exactly 1 of 0. The
        // samples are quadrature points of the invariant density
        int n = 64;
        double[][] x = IntStream.range(0, n).mapToObj(j -> new double[] {
            Math.pow(Math.sin(Math.PI * (2 * j + 1) / (4 * n)), 2)}).toArray(double[][]::new);
        double[][] y = IntStream.range(0, n).mapToObj(j -> new double[] {4 * x[j][0] * (1 - x[j][0])}).toArray(double[][]::new);
        ListedFunctions.StateFunction[] chebyshev = IntStream.rangeClosed(0, 6)
                .mapToObj(k -> (ListedFunctions.StateFunction) s -> Math.cos(k * Math.acos(1 - 2 * s[0])))
                .toArray(ListedFunctions.StateFunction[]::new);
        ModalExpansion expansion = ModalExpansion.of(
                Fits.fit(Fits.pairs(1, x, y), new DictionaryEstimator(ListedFunctions.of(chebyshev)), 7).chosen());
        List<Complex> falling = expansion.eigenvalues().stream().sorted(Comparator.comparingDouble(z -> -z.abs())).toList();
        assertEquals(1, falling.get(0).re(), 1e-12);
        // nilpotent with a Jordan block of size 3 (T_1, T_2, T_4): rounding to the third root
        assertTrue(falling.get(1).abs() < 1e-4, falling.toString());
        for (int j = 0; j < 7; j++) {
            if (expansion.eigenvalues().get(j).abs() < 0.5) {
                assertEquals(1, Fits.residual(expansion, j), 1e-6);
            }
        }
    }

    @Test
    void restPointsOfLorenz() {
        // CHECKS C2.16, textbook: sigma 10, rho 28, beta 8/3; at the origin and at (√72, √72, 27)
        List<Complex> origin = eigenvalues(new double[] {-10, 10, 0}, new double[] {28, -1, 0}, new double[] {0, 0, -8 / 3.0});
        assertHolds(origin, -22.8277234511635, 0, 1e-12);
        assertHolds(origin, 11.8277234511635, 0, 1e-12);
        assertHolds(origin, -2.66666666666667, 0, 1e-13);
        double c = Math.sqrt(72);
        List<Complex> wing = eigenvalues(new double[] {-10, 10, 0}, new double[] {1, -1, -c}, new double[] {c, c, -8 / 3.0});
        assertHolds(wing, -13.854577914596, 0, 1e-11);
        assertHolds(wing, 0.0939556239646855, 10.1945052209278, 1e-12);
    }

    @Test
    void coherentStateOfTheHarmonicOscillator() {
        // CHECKS C2.17, derived: frequencies n + 1/2 with amplitudes 1/(e n!), 200 samples at 0.25, depth 30, rank 10; 1e-8.
        // Real and imaginary part as two channels: conjugates join, twice as many directions, amplitudes larger by √2
        double[] amplitudes = {0.367879441171442, 0.367879441171442, 0.183939720585721, 0.0613132401952404,
            0.0153283100488101, 0.00306566200976202};
        Run run = Fits.run("amplitude", 200, 0.25, time -> {
            Complex turn = new Complex(0, -time).exp();
            Complex c = new Complex(turn.re() - 1, turn.im() - time / 2).exp();
            return new double[] {c.re(), c.im()};
        });
        Spectrum spectrum = Fits.spectrum(Fits.snapshots(0.25, 30, List.of(run)), new LinearEstimator(), 20);
        for (int n = 0; n < amplitudes.length; n++) {
            Mode mode = Fits.nearest(spectrum, 0, n + 0.5);
            assertEquals(n + 0.5, mode.rate().im(), 1e-8);
            assertEquals(amplitudes[n], mode.amplitude() / Math.sqrt(2), 1e-8);
        }
    }
}
