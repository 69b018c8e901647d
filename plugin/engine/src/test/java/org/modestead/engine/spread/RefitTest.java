package org.modestead.engine.spread;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.operator.ObservedRun;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.operator.Structure;
import org.modestead.engine.operator.StructuredEstimator;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.ModalExpansion;

/** A replicate is the fit that the estimator itself would make of the runs as often as they were drawn. */
class RefitTest {

    /** Two channels, a fading rotation from random starts, noise on every sample. */
    private static List<Run> runs(int count, int samples) {
        Random random = new Random(5);
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            double size = 0.5 + random.nextDouble();
            double phase = 6 * random.nextDouble();
            runs.add(Motions.run("r" + i, Motions.grid(samples, 0.1), t -> new double[] {
                size * Math.exp(-0.2 * t) * Math.cos(2 * t + phase), size * Math.exp(-0.2 * t) * Math.sin(2 * t + phase)}, 0.02, random));
        }
        return runs;
    }

    private static Snapshots snapshots(List<Run> runs, int depth) {
        return Motions.snapshots(0.1, depth, runs, List.of());
    }

    private static FittedOperator fit(Snapshots snapshots, Estimator estimator, int rank, double ridge) {
        return OperatorFitter.fit(snapshots, estimator, new RankRule.Fixed(rank), ridge, Progress.NONE);
    }

    private static List<Complex> sorted(List<Complex> rates) {
        return rates.stream().sorted(Comparator.comparingDouble(Complex::im).thenComparingDouble(Complex::re)).toList();
    }

    /** Refits the runs, each so many times, by their sums. */
    private static Refit refit(FittedOperator operator, double... times) {
        Frame frame = Frame.of(operator);
        List<Moments> cells = operator.estimator().observed(operator.snapshots(), frame.functions())
                .map(run -> Moments.of(frame.scaled(run))).toList();
        return frame.refit(Moments.sum(cells, times)).orElseThrow();
    }

    private static void assertRates(List<Complex> expected, List<Complex> actual, double tolerance, String what) {
        List<Complex> a = sorted(expected);
        List<Complex> b = sorted(actual);
        for (int j = 0; j < a.size(); j++) {
            assertEquals(0, a.get(j).minus(b.get(j)).abs(), tolerance * Math.max(1, a.get(j).abs()),
                    what + ": " + a + " against " + b);
        }
    }

    private static void assertOnceIsTheFit(Estimator estimator, int depth, int rank, double ridge) {
        FittedOperator operator = fit(snapshots(runs(6, 30), depth), estimator, rank, ridge);
        double[] once = new double[6];
        Arrays.fill(once, 1);
        Refit refit = refit(operator, once);
        ModalExpansion fitted = ModalExpansion.of(operator.chosen());
        // sums square the condition of the functions in use: 1e-16 of the largest, amplified by the spread of singular values
        assertRates(fitted.rates(), refit.rates(), 1e-6, estimator.describe());
    }

    @Test
    void everyRunOnceIsTheFitItselfForEveryEstimator() {
        for (NoiseCorrection correction : NoiseCorrection.values()) {
            assertOnceIsTheFit(new LinearEstimator(correction), 1, 2, 0);
            assertOnceIsTheFit(new LinearEstimator(correction), 6, 4, 0);
        }
        assertOnceIsTheFit(new LinearEstimator(), 6, 4, 0.01);
        assertOnceIsTheFit(new DictionaryEstimator(Dictionary.monomials(3)), 1, 8, 0);
        assertOnceIsTheFit(new KernelStepEstimator(Motions.kernel("exponential", "rate", 1), 40), 1, 5, 0);
        assertOnceIsTheFit(new KernelStepEstimator(Motions.kernel("exponential", "rate", 1), 40), 1, 5, 1e-4);
        assertOnceIsTheFit(new OccupationEstimator(Motions.kernel("exponential", "rate", 1), new SegmentPlan(10, 0), 1), 1, 4, 0);
        assertOnceIsTheFit(new OccupationEstimator(Motions.kernel("exponential", "rate", 1), new SegmentPlan(10, 5), 0.9), 1, 4, 0);
    }

    @Test
    void weightsOfRunsAreRefittedAlike() {
        List<Run> weighted = runs(6, 30);
        weighted.set(1, weighted.get(1).weighted(3));
        weighted.set(4, weighted.get(4).weighted(0.2));
        double[] once = {1, 1, 1, 1, 1, 1};
        for (Estimator estimator : List.of(new LinearEstimator(), new LinearEstimator(NoiseCorrection.TOTAL_LEAST_SQUARES),
                new DictionaryEstimator(Dictionary.monomials(1)), new KernelStepEstimator(Motions.kernel("linear"), 40),
                new OccupationEstimator(Motions.kernel("linear"), new SegmentPlan(10, 0), 1))) {
            FittedOperator operator = fit(snapshots(weighted, 1), estimator, 2, 0);
            assertRates(ModalExpansion.of(operator.chosen()).rates(), refit(operator, once).rates(), 1e-6, estimator.describe());
        }
    }

    @Test
    void arraysHeldByFactorsAreRefittedAlike() {
        Snapshots many = snapshots(runs(30, 60), 1);
        double[] once = new double[30];
        Arrays.fill(once, 1);
        for (Estimator estimator : List.of(new KernelStepEstimator(Motions.kernel("exponential", "rate", 1), 40),
                new OccupationEstimator(Motions.kernel("exponential", "rate", 1), new SegmentPlan(20, 0), 1))) {
            FittedOperator operator = fit(many, estimator, 5, 0);
            assertRates(ModalExpansion.of(operator.chosen()).rates(), refit(operator, once).rates(), 1e-6, estimator.describe());
        }
    }

    @Test
    void runsDrawnTwiceOrNotAtAllGiveTheFitOfThoseRuns() {
        List<Run> six = runs(6, 30);
        List<Run> drawn = List.of(six.get(0), six.get(0), six.get(2), six.get(3), six.get(5), six.get(5));
        for (Estimator estimator : List.of(new LinearEstimator(), new LinearEstimator(NoiseCorrection.TOTAL_LEAST_SQUARES),
                new LinearEstimator(NoiseCorrection.FORWARD_BACKWARD))) {
            // 12 state components: the frame holds all of them, so nothing is lost
            Refit replicate = refit(fit(snapshots(six, 6), estimator, 4, 0), 2, 0, 1, 1, 0, 2);
            FittedOperator again = fit(snapshots(drawn, 6), estimator, 4, 0);
            assertRates(ModalExpansion.of(again.chosen()).rates(), replicate.rates(), 1e-6, estimator.describe());
        }
    }

    @Test
    void structuresAreImposedOnReplicatesToo() {
        for (Structure structure : List.of(Structure.SELF_ADJOINT, Structure.UNITARY, Structure.STABLE)) {
            assertOnceIsTheFit(new StructuredEstimator(new LinearEstimator(), structure), 3, 4, 0);
            assertOnceIsTheFit(new StructuredEstimator(new KernelStepEstimator(Motions.kernel("exponential", "rate", 1), 40),
                    structure), 1, 4, 0);
        }
    }

    @Test
    void inputsAreSeparatedInEveryReplicate() {
        List<Run> six = drivenRuns();
        List<Run> drawn = List.of(six.get(0), six.get(0), six.get(2), six.get(3), six.get(5), six.get(5));
        for (Estimator estimator : List.of(new LinearEstimator(), new DictionaryEstimator(Dictionary.monomials(1)))) {
            FittedOperator operator = fit(driven(six), estimator, 2, 0);
            double[] once = {1, 1, 1, 1, 1, 1};
            assertRates(ModalExpansion.of(operator.chosen()).rates(), refit(operator, once).rates(), 1e-8, estimator.describe());
            FittedOperator again = fit(driven(drawn), estimator, 2, 0);
            assertRates(ModalExpansion.of(again.chosen()).rates(), refit(operator, 2, 0, 1, 1, 0, 2).rates(), 1e-8, estimator.describe());
        }
    }

    /** A fading rotation pushed by a known random input and by unknown noise. */
    private static List<Run> drivenRuns() {
        Random random = new Random(11);
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < 6; i++) {
            DMatrixRMaj values = new DMatrixRMaj(30, 2);
            DMatrixRMaj inputs = new DMatrixRMaj(30, 1);
            for (int t = 0; t < 30; t++) {
                double u = random.nextGaussian();
                inputs.set(t, 0, u);
                double x = t == 0 ? random.nextGaussian() : values.get(t - 1, 0);
                double y = t == 0 ? random.nextGaussian() : values.get(t - 1, 1);
                double before = t == 0 ? 0 : inputs.get(t - 1, 0);
                values.set(t, 0, 0.9 * x - 0.3 * y + before + 0.05 * random.nextGaussian());
                values.set(t, 1, 0.3 * x + 0.9 * y - 0.5 * before + 0.05 * random.nextGaussian());
            }
            runs.add(new Run("r" + i, Motions.grid(30, 0.1), values, inputs, 0));
        }
        return runs;
    }

    private static Snapshots driven(List<Run> runs) {
        Snapshots plain = snapshots(runs, 1);
        return new Snapshots(plain.channels(), List.of(new Channel("u", "")), plain.time(), runs, List.of(), List.of(), plain.step(),
                plain.delay(), plain.preparation(), List.of(), List.of());
    }

    @Test
    void weightsOfAReplicateRebuildTheState() {
        List<Run> six = runs(6, 30);
        FittedOperator operator = fit(snapshots(six, 1), new LinearEstimator(), 2, 0);
        Refit replicate = refit(operator, 2, 0, 1, 1, 0, 2);
        ObservedRun first = operator.estimator().observed(operator.snapshots(), operator.compression()).findFirst().orElseThrow();
        for (int i = 0; i < first.count(); i++) {
            for (int c = 0; c < 2; c++) {
                Complex sum = Complex.ZERO;
                for (int j = 0; j < 2; j++) {
                    Complex phi = Complex.ZERO;
                    for (int k = 0; k < 2; k++) {
                        phi = phi.plus(new Complex(replicate.functions().getReal(k, j), replicate.functions().getImag(k, j))
                                .times(first.now().get(i, k)));
                    }
                    sum = sum.plus(phi.times(new Complex(replicate.weights().getReal(j, c), replicate.weights().getImag(j, c))));
                }
                // two functions span two components: nothing but rounding is left
                assertEquals(first.target().get(i, c), sum.re(), 1e-10);
                assertEquals(0, sum.im(), 1e-10);
            }
        }
    }

    @Test
    void sumsThatDoNotHoldTheRankGiveNoReplicate() {
        Run still = Motions.run("still", 20, 0.1, t -> new double[] {0, 0});
        List<Run> runs = List.of(still, Motions.run("turning", 20, 0.1, t -> new double[] {Math.cos(t), Math.sin(t)}));
        FittedOperator operator = fit(snapshots(runs, 1), new LinearEstimator(), 2, 0);
        Frame frame = Frame.of(operator);
        List<Moments> cells = operator.estimator().observed(operator.snapshots(), frame.functions()).map(Moments::of).toList();
        assertTrue(frame.refit(Moments.sum(cells, new double[] {2, 0})).isEmpty());
    }
}
