package org.modestead.engine.operator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.fixtures.Driven;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;

class RunWeightsTest {

    private static final double STEP = 0.1;

    /** Every operator, by formed arrays and by factors, with the rank at which it is compared. */
    private record Look(Estimator estimator, int samples, int rank) {}

    private static List<Look> looks() {
        return List.of(new Look(new LinearEstimator(), 60, 2), new Look(new LinearEstimator(NoiseCorrection.TOTAL_LEAST_SQUARES), 60, 2),
                new Look(new LinearEstimator(NoiseCorrection.FORWARD_BACKWARD), 60, 2),
                new Look(new StructuredEstimator(new LinearEstimator(), Structure.UNITARY), 60, 2),
                new Look(new DictionaryEstimator(Dictionary.monomials(3)), 60, 6),
                new Look(new KernelStepEstimator(Motions.kernel("polynomial", "degree", 3, "offset", 1), 60), 40, 4),
                new Look(new KernelStepEstimator(Motions.kernel("polynomial", "degree", 3, "offset", 1), 60), 250, 4),
                new Look(new OccupationEstimator(Motions.kernel("polynomial", "degree", 3, "offset", 1), new SegmentPlan(10, 0), 1), 60, 4),
                new Look(new OccupationEstimator(Motions.kernel("polynomial", "degree", 3, "offset", 1), new SegmentPlan(10, 0), 1), 900, 4));
    }

    private static List<Run> runs(int samples) {
        Random random = new Random(6);
        List<Run> runs = new ArrayList<>();
        for (int k = 0; k < 3; k++) {
            double phase = k;
            runs.add(Motions.run("r" + k, Motions.grid(samples, STEP), t -> new double[] {Math.exp(-0.001 * t) * Math.cos(2 * t + phase),
                Math.sin(2 * t + phase)}, 0.05, random));
        }
        return runs;
    }

    private static double[] eigenvalues(Look look, List<Run> runs) {
        OrthonormalCompression white = look.estimator().compress(Motions.snapshots(STEP, 1, runs, List.of()), Progress.NONE)
                .whiten(look.rank());
        return LinearAlgebra.installed().eigen(white.action()).values().stream()
                .sorted(Comparator.comparingDouble(Complex::re).thenComparingDouble(Complex::im))
                .flatMapToDouble(value -> java.util.stream.DoubleStream.of(value.re(), value.im())).toArray();
    }

    /** Rounding of the arrays, times the condition of the functions kept; formed Gram matrices square it. */
    private static void assertSame(double[] expected, double[] found, Look look) {
        assertArrayEquals(expected, found, 1e-8, look.estimator().describe() + ", " + look.samples() + " samples");
    }

    @Test
    void aRunOfWeightTwoIsOneThatIsThereTwice() {
        for (Look look : looks()) {
            List<Run> runs = runs(look.samples());
            List<Run> twice = List.of(runs.get(0), runs.get(1), runs.get(2), new Run("again", runs.get(1).times(), runs.get(1).values()));
            List<Run> weighted = List.of(runs.get(0), runs.get(1).weighted(2), runs.get(2));
            assertSame(eigenvalues(look, twice), eigenvalues(look, weighted), look);
            assertTrue(Math.abs(eigenvalues(look, runs)[0] - eigenvalues(look, weighted)[0]) > 1e-7, "and it makes a difference");
        }
    }

    @Test
    void aRunOfWeightZeroIsNotThere() {
        for (Look look : looks()) {
            List<Run> runs = runs(look.samples());
            assertArrayEquals(eigenvalues(look, runs.subList(0, 2)), eigenvalues(look, List.of(runs.get(0), runs.get(1), runs.get(2).weighted(0))));
        }
    }

    @Test
    void onlyRatiosOfWeightsMatterAndTheOrderOfRunsDoesNot() {
        for (Look look : looks()) {
            List<Run> runs = runs(look.samples());
            double[] expected = eigenvalues(look, List.of(runs.get(0).weighted(1), runs.get(1).weighted(3), runs.get(2).weighted(0.5)));
            assertSame(expected, eigenvalues(look, List.of(runs.get(0).weighted(7), runs.get(1).weighted(21), runs.get(2).weighted(3.5))), look);
            assertSame(expected, eigenvalues(look, List.of(runs.get(2).weighted(0.5), runs.get(0).weighted(1), runs.get(1).weighted(3))), look);
        }
    }

    @Test
    void weightsGoTogetherWithInputs() {
        Run one = Driven.noisy(Driven.run("a", 80, 1, 0, Driven.random(1), false), 0.05, new Random(1));
        Run other = Driven.noisy(Driven.run("b", 80, 0, 1, Driven.random(2), false), 0.05, new Random(2));
        Run again = new Run("c", other.times(), other.values(), other.inputs(), 0);
        Mode twice = Motions.spectrum(Driven.snapshots(1, List.of(one, other, again), List.of()), new LinearEstimator(), 2).modes().get(0);
        Mode weighted = Motions.spectrum(Driven.snapshots(1, List.of(one, other.weighted(2)), List.of()), new LinearEstimator(), 2).modes().get(0);
        assertEquals(0, twice.rate().minus(weighted.rate()).abs(), 1e-11);
    }

    @Test
    void weightsByNoiseBringTheRatesNearerToTheTruth() {
        Random random = new Random(9);
        double plain = 0;
        double weighted = 0;
        for (int draw = 0; draw < 60; draw++) {
            Run clean = Motions.run("a", Motions.grid(60, STEP), t -> new double[] {Math.cos(2 * t), Math.sin(2 * t)}, 0.01, random);
            Run noisy = Motions.run("b", Motions.grid(60, STEP), t -> new double[] {Math.cos(2 * t), Math.sin(2 * t)}, 0.2, random);
            plain += error(List.of(clean, noisy));
            weighted += error(List.of(clean.weighted(400), noisy));
        }
        assertTrue(weighted < plain / 3, weighted + " against " + plain);
    }

    private static double error(List<Run> runs) {
        Snapshots snapshots = Motions.snapshots(STEP, 1, runs, List.of());
        return Motions.nearest(Motions.spectrum(snapshots, new LinearEstimator(), 2), 0, 2).rate().minus(new Complex(0, 2)).abs();
    }

    @Test
    void withoutAnyWeightNothingIsFitted() {
        List<Run> none = runs(60).stream().map(run -> run.weighted(0)).toList();
        assertThrows(FitFault.class, () -> Motions.fit(Motions.snapshots(STEP, 1, none, List.of()), new LinearEstimator(), 2));
        assertThrows(IllegalArgumentException.class, () -> none.get(0).weighted(-1));
        assertThrows(IllegalArgumentException.class, () -> none.get(0).weighted(Double.NaN));
    }
}
