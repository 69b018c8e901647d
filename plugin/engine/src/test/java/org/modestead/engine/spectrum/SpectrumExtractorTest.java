package org.modestead.engine.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

class SpectrumExtractorTest {

    private static final double STEP = 0.1;

    /** x' = A x with A = [[-0.1, 2], [-2, -0.1]]: closed form of a fading rotation. */
    private static double[] rotation(double x, double y, double t) {
        double c = Math.cos(2 * t);
        double s = Math.sin(2 * t);
        double fade = Math.exp(-0.1 * t);
        return new double[] {fade * (c * x + s * y), fade * (c * y - s * x)};
    }

    private static Snapshots rotations() {
        List<Run> runs = new ArrayList<>();
        double[][] starts = {{1, 0}, {0.3, -0.8}, {-0.5, 0.2}, {0.1, 0.9}, {-0.7, -0.6}, {0.4, 0.5}};
        for (double[] start : starts) {
            runs.add(Motions.run("r" + runs.size(), 16, STEP, t -> rotation(start[0], start[1], t)));
        }
        return Motions.snapshots(STEP, 1, runs, List.of());
    }

    private static List<Estimator> exactEstimators() {
        return List.of(new LinearEstimator(), new DictionaryEstimator(Dictionary.monomials(2)),
                new KernelStepEstimator(Motions.kernel("polynomial", "degree", 2, "offset", 1), 50),
                new KernelStepEstimator(Motions.kernel("linear"), 50),
                new OccupationEstimator(Motions.kernel("linear"), new SegmentPlan(5, 0), 1),
                new OccupationEstimator(Motions.kernel("polynomial", "degree", 2, "offset", 1), new SegmentPlan(5, 0), 1));
    }

    private static int fullRank(Estimator estimator) {
        return estimator.describe().toLowerCase(Locale.ROOT).contains("linear") ? 2 : 6;
    }

    @Test
    void stepMapAndGeneratorOfLinearMotionAgreeOnTheRates() {
        for (Estimator estimator : exactEstimators()) {
            Spectrum spectrum = Motions.spectrum(rotations(), estimator, fullRank(estimator));
            Mode mode = Motions.nearest(spectrum, -0.1, 2);
            // closed form; quadrature of order 6 at steps of 0.1 leaves 1e-7
            assertEquals(-0.1, mode.rate().re(), 1e-6, estimator.describe());
            assertEquals(2, mode.rate().im(), 1e-6, estimator.describe());
            assertEquals(1, mode.energyShare(), 1e-5, estimator.describe());
        }
    }

    @Test
    void eigenfunctionsAtNewPointsMoveAsTheirRateSays() {
        double[] start = {-0.35, 0.66};
        for (Estimator estimator : exactEstimators()) {
            FittedOperator operator = Motions.fit(rotations(), estimator, fullRank(estimator));
            ModalExpansion expansion = ModalExpansion.of(operator.chosen());
            for (double tau : new double[] {0.1, 0.37, 2}) {
                ZMatrixRMaj before = expansion.eigenfunctions(new DMatrixRMaj(new double[][] {start}));
                ZMatrixRMaj after = expansion.eigenfunctions(new DMatrixRMaj(new double[][] {rotation(start[0], start[1],
                        tau)}));
                for (int j = 0; j < expansion.rank(); j++) {
                    // step maps keep 1e-9; the rate of a generator is off by the quadrature, times tau
                    Complex expected = expansion.rates().get(j).times(tau).exp().times(ComplexMatrices.entry(before, 0, j));
                    assertEquals(0, ComplexMatrices.entry(after, 0, j).minus(expected).abs(), 1e-4,
                            estimator.describe() + ", tau " + tau);
                }
            }
        }
    }

    @Test
    void aConjugatePairIsOneModeWithTheTwoColumns() {
        Spectrum spectrum = Motions.spectrum(rotations(), new LinearEstimator(), 2);
        assertEquals(1, spectrum.modes().size());
        assertEquals(List.of(0, 1), spectrum.modes().get(0).indices());
        assertTrue(spectrum.rates().get(0).im() > 0);
        assertTrue(spectrum.modes().get(0).oscillates());
    }

    @Test
    void jointWeightsOfAPairReproduceTheSignal() {
        Snapshots snapshots = rotations();
        FittedOperator operator = Motions.fit(snapshots, new LinearEstimator(), 2);
        ModalExpansion expansion = ModalExpansion.of(operator.chosen());
        DMatrixRMaj states = TrainingSample.of(snapshots).states();
        DMatrixRMaj parts = Contributions.of(expansion.eigenfunctions(states), expansion.joint(), List.of(0, 1), 0, 2);
        for (int i = 0; i < states.getNumElements(); i++) {
            assertEquals(states.data[i], parts.data[i], 1e-12);
        }
    }

    @Test
    void amplitudeOfAnOscillationIsItsPeakAtTheStartOfTheRun() {
        Snapshots snapshots = Motions.snapshots(STEP, 6, List.of(Motions.run("a", 200, STEP,
                t -> new double[] {3 * Math.exp(-0.05 * t) * Math.cos(2 * t + 0.7)})), List.of());
        Mode mode = Motions.spectrum(snapshots, new LinearEstimator(), 2).modes().get(0);
        assertEquals(3, mode.amplitude(), 1e-8);
    }

    @Test
    void sharesAreThoseOfTheSquaredPartsAndModesFollowThem() {
        Snapshots snapshots = Motions.snapshots(STEP, 8, List.of(Motions.run("a", 630, STEP,
                t -> new double[] {2 * Math.cos(2 * t) + Math.cos(5 * t)})), List.of());
        Spectrum spectrum = Motions.spectrum(snapshots, new LinearEstimator(), 4);
        assertEquals(2, spectrum.modes().get(0).rate().im(), 1e-9);
        // mean squares 2 and 1/2; the run is not a whole number of periods, which leaves about a percent
        assertEquals(0.8, spectrum.modes().get(0).energyShare(), 0.01);
        assertEquals(0.2, spectrum.modes().get(1).energyShare(), 0.01);
    }

    @Test
    void motionAtTheSamplingLimitIsDoubted() {
        Snapshots near = Motions.snapshots(1, 4, List.of(Motions.run("a", 100, 1,
                t -> new double[] {Math.cos(0.97 * Math.PI * t + 0.4)})),
                List.of());
        assertDoubted(near, "aliasing", true);
        Snapshots slow = Motions.snapshots(1, 4, List.of(Motions.run("a", 100, 1,
                t -> new double[] {Math.cos(0.5 * Math.PI * t + 0.4)})),
                List.of());
        assertDoubted(slow, "aliasing", false);
    }

    @Test
    void aNegativeMultiplierIsDoubted() {
        // (-0.5)^k, CHECKS C2.18: no real motion in continuous time at this step
        Snapshots alternating = Motions.snapshots(1, 1, List.of(Motions.run("a", 12, 1,
                t -> new double[] {Math.pow(-0.5, Math.rint(t))})),
                List.of());
        assertDoubted(alternating, "negative-multiplier", true);
        Mode mode = Motions.spectrum(alternating, new LinearEstimator(), 1).modes().get(0);
        assertEquals(-Math.log(2), mode.rate().re(), 1e-12);
        assertEquals(Math.PI, mode.rate().im(), 1e-12);
    }

    private static void assertDoubted(Snapshots snapshots, String code, boolean expected) {
        int rank = snapshots.stateSize() == 1 ? 1 : 2;
        Spectrum spectrum = Motions.spectrum(snapshots, new LinearEstimator(), rank);
        assertEquals(expected, spectrum.doubts().stream().anyMatch(doubt -> doubt.code().equals(code)),
                spectrum.doubts().toString());
    }

    @Test
    void theConstantFunctionIsMarkedAndCarriesTheMean() {
        Snapshots snapshots = Motions.snapshots(STEP, 1, List.of(
                Motions.run("a", 40, STEP, t -> new double[] {5 + Math.exp(-t)}),
                Motions.run("b", 40, STEP, t -> new double[] {5 - 2 * Math.exp(-t)})), List.of());
        Spectrum spectrum = Motions.spectrum(snapshots, new DictionaryEstimator(Dictionary.monomials(1)), 2);
        Mode constant = Motions.nearest(spectrum, 0, 0);
        assertTrue(constant.constant());
        assertFalse(Motions.nearest(spectrum, -1, 0).constant());
        assertTrue(constant.energyShare() > 0.9);
    }

    @Test
    void aMultiplierOfZeroIsAModeThatIsGoneAfterOneStep() {
        // the second channel only copies the past of nothing: its next value is 0 whatever it is
        Snapshots snapshots = Motions.snapshots(1, 1, List.of(pair(1, 0.5), pair(2, -1), pair(-1, 3)), List.of());
        Spectrum spectrum = Motions.spectrum(snapshots, new LinearEstimator(), 2);
        Mode gone = spectrum.modes().stream().filter(mode -> mode.rate().re() < -20).findFirst().orElseThrow();
        assertEquals(1, gone.dampingRatio(), 1e-12);
        assertTrue(spectrum.modes().stream().allMatch(mode -> Double.isFinite(mode.energyShare())));
    }

    private static Run pair(double a, double b) {
        return new Run("p" + a, new double[] {0, 1}, new DMatrixRMaj(new double[][] {{a, b}, {0.5 * a, 0}}));
    }
}
