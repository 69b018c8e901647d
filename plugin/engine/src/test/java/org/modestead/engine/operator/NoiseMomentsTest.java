package org.modestead.engine.operator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.SpectrumExtractor;

/** Noise biases least squares; what it adds to the moments can be taken off, in any functions. */
class NoiseMomentsTest {

    private static final double NOISE = 0.02;

    private static Snapshots decays(double noise, Random random) {
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < 40; i++) {
            double a = 2 * random.nextDouble() - 1;
            double b = 2 * random.nextDouble() - 1;
            runs.add(Motions.run("r" + i, Motions.grid(60, 0.05), t -> new double[] {a * Math.exp(-0.4 * t), b * Math.exp(-1.1 * t)}, noise, random));
        }
        return Motions.snapshots(0.05, 1, runs, List.of());
    }

    private static double rateNear(Estimator estimator, Snapshots snapshots, int rank, double wanted) {
        FittedOperator operator = OperatorFitter.fit(snapshots, estimator, new RankRule.Fixed(rank), 0, Progress.NONE);
        Mode mode = Motions.nearest(SpectrumExtractor.extract(operator, Progress.NONE), wanted, 0);
        return mode.rate().re();
    }

    /** Mean distance of the rate -1.1 from the truth over ten recordings drawn from one generator. */
    private static double bias(Estimator estimator, int rank) {
        Random random = new Random(3);
        double sum = 0;
        for (int k = 0; k < 10; k++) {
            sum += rateNear(estimator, decays(NOISE, random), rank, -1.1) + 1.1;
        }
        return sum / 10;
    }

    @Test
    void theBiasOfALinearFitIsTakenOff() {
        // least squares: multiplier divided by 1 + σ²/s², here a rate too low by about σ²/(s² Δt) = 0.0004/(0.05 0.05) = 0.16, s² = mean
        // square of the fading channel
        double plain = bias(new LinearEstimator(), 2);
        double corrected = bias(new ExtrapolatedEstimator(new LinearEstimator()), 2);
        assertTrue(plain < -0.1, "least squares is biased: " + plain);
        assertTrue(Math.abs(corrected) < 0.15 * Math.abs(plain), plain + " against " + corrected);
    }

    @Test
    void theBiasOfADictionaryOfMonomialsIsTakenOff() {
        double plain = bias(new DictionaryEstimator(Dictionary.monomials(2)), 6);
        double corrected = bias(new ExtrapolatedEstimator(new DictionaryEstimator(Dictionary.monomials(2))), 6);
        assertTrue(Math.abs(corrected) < 0.3 * Math.abs(plain), plain + " against " + corrected);
    }

    @Test
    void withoutNoiseNothingChanges() {
        Snapshots snapshots = decays(0, new Random(3));
        double plain = rateNear(new LinearEstimator(), snapshots, 2, -1.1);
        assertEquals(plain, rateNear(new ExtrapolatedEstimator(new LinearEstimator()), snapshots, 2, -1.1), 1e-7,
                "what a cubic misses of these curves is 1e-7 of their size");
    }

    @Test
    void withoutNoiseTwiceTheStepFindsTheSameDecayWhereItFoldsTheMotion() {
        // amounts handed round five places, 0.97 of each a step: multipliers 0.97 e^(2πik/5), of which k = ±2 turn by more than half a turn in two steps
        Random random = new Random(5);
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < 20; i++) {
            double[] start = random.doubles(5, -1, 1).toArray();
            runs.add(Motions.run("r" + i, 36, 1, t -> IntStream.range(0, 5)
                    .mapToDouble(j -> Math.pow(0.97, t) * start[Math.floorMod(j - (int) t, 5)]).toArray()));
        }
        Snapshots snapshots = Motions.snapshots(1, 1, runs, List.of());
        Estimator twice = new ExtrapolatedEstimator(new LinearEstimator()).otherStep(snapshots).orElseThrow();
        for (Complex rate : ModalExpansion.of(twice.compress(snapshots, Progress.NONE).whiten(5)).rates()) {
            assertEquals(Math.log(0.97), rate.re(), 1e-12, "no noise is taken off");
        }
    }

    @Test
    void anOperatorThatOverflowsWithinAStepBoundsNoNoise() {
        Snapshots snapshots = decays(NOISE, new Random(3));
        OrthonormalCompression fitted = new LinearEstimator().compress(snapshots, Progress.NONE).whiten(2);
        DMatrixRMaj explosive = new DMatrixRMaj(new double[][] {{1e5, 1e4}, {-1e4, 1e5}});
        OrthonormalCompression wild = new OrthonormalCompression(fitted.basis(), fitted.map(), explosive, fitted.second(), fitted.observable(),
                fitted.singular(), fitted.snapshots(), fitted.innerProduct(), new Evolution.Generator(1));
        List<StateRun> runs = snapshots.states(Snapshots.Part.TRAINING);
        double[] bounds = PredictionError.leastOfNewest(wild, runs, runs.stream().map(run -> wild.evaluate(run.states())).toList(), List.of(2), 2);
        assertArrayEquals(new double[] {Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY}, bounds);
    }

    @Test
    void everyRankIsCorrectedForItself() {
        Snapshots snapshots = decays(NOISE, new Random(3));
        Estimator estimator = new ExtrapolatedEstimator(new DictionaryEstimator(Dictionary.monomials(2)));
        OrthonormalCompression full = estimator.compress(snapshots, Progress.NONE).whiten(6);
        OrthonormalCompression direct = estimator.compress(snapshots, Progress.NONE).whiten(3);
        for (int k = 0; k < 9; k++) {
            assertEquals(direct.action().data[k], full.leading(3).action().data[k], 1e-9 * Math.abs(direct.action().data[0]));
        }
    }

    @Test
    void aRidgeBesideTheCorrectionIsRefused() {
        FitFault fault = org.junit.jupiter.api.Assertions.assertThrows(FitFault.class, () -> OperatorFitter.fit(decays(NOISE, new Random(3)),
                new ExtrapolatedEstimator(new LinearEstimator()), new RankRule.Fixed(2), 1e-3, Progress.NONE));
        assertTrue(fault.getMessage().contains("ridge"), fault.getMessage());
    }
}
