package org.modestead.engine.operator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.MatrixExponential;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.SpectrumExtractor;

class OperatorFitterTest {

    /** Two oscillations seen by many channels, with white noise: rank 4 and nothing else. */
    private static Snapshots lowRank(double noise, long seed) {
        Random random = new Random(seed);
        int channels = 40;
        double[][] shape = new double[channels][4];
        for (double[] row : shape) {
            for (int m = 0; m < 4; m++) {
                row[m] = random.nextGaussian();
            }
        }
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < 5; i++) {
            double turn = i;
            runs.add(Motions.run("r" + i, Motions.grid(60, 0.1), t -> {
                double[] q = {Math.cos(2 * t + turn), Math.sin(2 * t + turn), 0.7 * Math.cos(5 * t - turn),
                        0.7 * Math.sin(5 * t - turn)};
                double[] row = new double[channels];
                for (int c = 0; c < channels; c++) {
                    for (int m = 0; m < 4; m++) {
                        row[c] += shape[c][m] * q[m];
                    }
                }
                return row;
            }, noise, random));
        }
        return Motions.snapshots(0.1, 1, runs, List.of());
    }

    private static FittedOperator fit(Snapshots snapshots, RankRule rule, double ridge) {
        return OperatorFitter.fit(snapshots, new LinearEstimator(), rule, ridge, Progress.NONE);
    }

    @Test
    void aRankAboveWhatTheDataHoldIsAFaultThatSaysWhatTheyHold() {
        FitFault fault = assertThrows(FitFault.class, () -> fit(lowRank(0, 1), new RankRule.Fixed(5), 0));
        assertTrue(fault.getMessage().contains("rank 5") && fault.getMessage().contains("only 4 independent"),
                fault.getMessage());
        assertThrows(FitFault.class, () -> fit(lowRank(0, 1), new RankRule.Fixed(0), 0));
    }

    @ParameterizedTest
    @CsvSource({"1, 0.1", "2, 0.3", "3, 1"})
    void theHardThresholdFindsTheRankUnderWhiteNoise(long seed, double noise) {
        FittedOperator operator = fit(lowRank(noise, seed), new RankRule.HardThreshold(), 0);
        assertEquals(4, operator.rank(), operator.rankChoice());
        assertTrue(operator.rankChoice().contains("threshold"));
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3})
    void heldOutDataFindTheRankUnderNoise(long seed) {
        int rank = fit(lowRank(0.3, seed), new RankRule.Holdout(12), 0).rank();
        // four directions are needed; a few more of noise hardly change the prediction
        assertTrue(rank >= 4 && rank <= 10, "rank " + rank);
    }

    @ParameterizedTest
    @ValueSource(doubles = {1e-6, 0.01, 0.1})
    void theClearDropIsTheRankOfTheSignalWhateverTheWeakNoise(double noise) {
        FittedOperator operator = fit(lowRank(noise, 8), new RankRule.Drop(30), 0);
        assertEquals(4, operator.rank(), operator.rankChoice());
        assertTrue(operator.rankChoice().contains("last clear drop"), operator.rankChoice());
    }

    @Test
    void withoutAClearDropHeldOutDataDecide() {
        FittedOperator operator = fit(lowRank(2, 9), new RankRule.Drop(12), 0);
        FittedOperator byHoldout = fit(lowRank(2, 9), new RankRule.Holdout(12), 0);
        assertEquals(byHoldout.rank(), operator.rank());
        assertEquals("no singular value drops clearly below the one before; " + byHoldout.rankChoice(), operator.rankChoice());
    }

    @Test
    void aDropBeyondTheLargestRankIsNotSeen() {
        assertTrue(fit(lowRank(0.01, 8), new RankRule.Drop(3), 0).rank() <= 3);
    }

    @Test
    void energyIsTheSmallestRankThatHoldsTheShare() {
        FittedOperator operator = fit(lowRank(0.3, 4), new RankRule.Energy(0.9), 0);
        double[] s = operator.compression().singular();
        double total = 0;
        double held = 0;
        for (int k = 0; k < s.length; k++) {
            total += s[k] * s[k];
            held += k < operator.rank() ? s[k] * s[k] : 0;
        }
        double below = held - s[operator.rank() - 1] * s[operator.rank() - 1];
        assertTrue(held >= 0.9 * total && below < 0.9 * total);
        assertEquals(s.length, fit(lowRank(0.3, 4), new RankRule.Energy(1), 0).rank());
    }

    @Test
    void rulesOutsideTheirRangeAreFaults() {
        for (double share : new double[] {0, -1, 1.5, Double.NaN}) {
            assertThrows(FitFault.class, () -> fit(lowRank(0.1, 1), new RankRule.Energy(share), 0));
        }
        assertThrows(FitFault.class, () -> fit(lowRank(0.1, 1), new RankRule.Holdout(0), 0));
        assertThrows(FitFault.class, () -> fit(lowRank(0.1, 1), new RankRule.Drop(0), 0));
        for (double ridge : new double[] {-1e-3, Double.NaN, Double.POSITIVE_INFINITY}) {
            FitFault fault = assertThrows(FitFault.class, () -> fit(lowRank(0.1, 1), new RankRule.Fixed(2), ridge));
            assertTrue(fault.getMessage().contains(Double.toString(ridge)), fault.getMessage());
        }
    }

    @Test
    void aRidgeSolvesTheRegularisedNormalEquations() {
        Snapshots snapshots = lowRank(0.3, 5);
        double ridge = 0.05;
        OrthonormalCompression plain = fit(snapshots, new RankRule.Fixed(4), 0).compression();
        OrthonormalCompression ridged = fit(snapshots, new RankRule.Fixed(4), ridge).compression();
        double first = plain.singular()[0] * plain.singular()[0];
        for (int i = 0; i < plain.rank(); i++) {
            double s2 = plain.singular()[i] * plain.singular()[i];
            for (int j = 0; j < plain.rank(); j++) {
                // in whitened coordinates (S² + ρ s_1² I) K' = S² K, row by row
                assertEquals(s2 * plain.action().get(i, j), (s2 + ridge * first) * ridged.action().get(i, j), 1e-12);
            }
        }
    }

    @Test
    void theRankIsChosenWithTheRidgeThatIsFitted() {
        String plain = fit(lowRank(0.1, 6), new RankRule.Holdout(8), 0).rankChoice();
        String ridged = fit(lowRank(0.1, 6), new RankRule.Holdout(8), 0.5).rankChoice();
        // the figure in the reason is the error of the trial: a heavy ridge must show in it
        assertTrue(error(ridged) > 2 * error(plain), ridged + " against " + plain);
    }

    private static double error(String reason) {
        return Double.parseDouble(reason.substring(reason.lastIndexOf(' ') + 1));
    }

    @Test
    void aRidgeShrinksTheMultipliers() {
        double plain = SpectrumExtractor.extract(fit(lowRank(0.1, 6), new RankRule.Fixed(4), 0),
                Progress.NONE).eigenvalues().get(0).abs();
        double ridged = SpectrumExtractor.extract(fit(lowRank(0.1, 6), new RankRule.Fixed(4), 0.1),
                Progress.NONE).eigenvalues().get(0).abs();
        assertTrue(ridged < plain - 0.01, ridged + " against " + plain);
    }

    @Test
    void thinDirectionsFewSnapshotsAndInputsAreDoubted() {
        Snapshots thin = Motions.snapshots(0.1, 4, List.of(Motions.run("a", 12, 0.1,
                t -> new double[] {Math.exp(-t) + 1e-9 * Math.cos(9 * t)})),
                List.of());
        FittedOperator operator = fit(thin, new RankRule.Fixed(3), 0);
        List<String> codes = operator.doubts().stream().map(doubt -> doubt.code()).toList();
        assertTrue(codes.contains("ill-conditioned") && codes.contains("few-snapshots"), codes.toString());
        assertTrue(fit(lowRank(0.1, 1), new RankRule.Fixed(4), 0).doubts().isEmpty());
        FittedOperator scaled = OperatorFitter.fit(lowRank(0.1, 1), new OccupationEstimator(Motions.kernel("linear"),
                new SegmentPlan(5, 0), 0.9),
                new RankRule.Fixed(2), 0, Progress.NONE);
        assertTrue(scaled.doubts().stream().anyMatch(doubt -> doubt.code().equals("scaled-generator")));
    }

    @Test
    void thePropagatorOfAStepMapIsItsPowerAndOfAGeneratorItsExponential() {
        FittedOperator map = fit(lowRank(0.1, 7), new RankRule.Fixed(4), 0);
        DMatrixRMaj action = map.chosen().action();
        assertArrayEquals(Matrices.product(action, Matrices.product(action, action)).data, map.propagator(0.3).data, 1e-12);
        assertThrows(IllegalArgumentException.class, () -> map.propagator(0.25));
        assertThrows(IllegalArgumentException.class, () -> map.propagator(-0.1));
        FittedOperator generator = OperatorFitter.fit(lowRank(0, 7), new OccupationEstimator(Motions.kernel("linear"),
                new SegmentPlan(5, 0), 1),
                new RankRule.Fixed(4), 0, Progress.NONE);
        assertArrayEquals(MatrixExponential.of(Matrices.scaled(generator.chosen().action(), 0.25)).data,
                generator.propagator(0.25).data);
    }
}
