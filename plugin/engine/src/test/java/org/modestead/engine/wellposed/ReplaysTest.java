package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.ExtrapolatedEstimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.SmoothingRule;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

class ReplaysTest {

    /** x' = -x, y' = -2y: x and y are eigenfunctions, orthogonal in the space of (1 + x·y)². */
    private static Snapshots decays(int runs, double noise, long seed) {
        Random random = new Random(seed);
        List<Run> all = new java.util.ArrayList<>();
        for (int i = 0; i < runs; i++) {
            double x = 2 * random.nextDouble() - 1;
            double y = 2 * random.nextDouble() - 1;
            all.add(Motions.run("r" + i, Motions.grid(40, 0.05), t -> new double[] {x * Math.exp(-t), y * Math.exp(-2 * t)}, noise, random));
        }
        int training = runs - Math.max(1, runs / 4);
        return SmoothingRule.AUTOMATIC.smooth(Motions.snapshots(0.05, 1, all.subList(0, training), all.subList(training, runs)));
    }

    private static FittedOperator fitted(Snapshots snapshots) {
        return OperatorFitter.fit(snapshots, new ExtrapolatedEstimator(new OccupationEstimator(Motions.kernel("polynomial", "degree", 2, "offset", 1),
                new SegmentPlan(10, 10), 1)), new RankRule.Holdout(30), 0, Progress.NONE);
    }

    @Test
    void whereModesExistFewerVerdictsBlameThemForNoise() {
        int without = 0;
        int with = 0;
        int told = 0;
        for (long seed = 1; seed <= 6; seed++) {
            FittedOperator operator = fitted(decays(8, 0.02, seed));
            Verdict plain = Motions.judge(operator, JudgeSettings.DEFAULT.withReplays(0));
            Verdict weighed = Motions.judge(operator, JudgeSettings.DEFAULT);
            without += plain.overall().grade() == Grade.STANDS || plain.overall().grade() == Grade.SETTLES ? 1 : 0;
            with += weighed.overall().grade() == Grade.STANDS || weighed.overall().grade() == Grade.SETTLES ? 1 : 0;
            told += weighed.findings().stream().anyMatch(f -> f.passed() && f.sentence().endsWith("so this is not held against it.")) ? 1 : 0;
        }
        assertTrue(with > without, with + " of 6 reported with replays, " + without + " without");
        assertTrue(told > 0, "an excuse is told in the finding");
    }

    @Test
    void aMotionWithoutModesIsNotExcused() {
        // x' = x^2 has no eigenfunction but the constant in the space of exp(xy) (CHECKS C3.4)
        for (long seed = 1; seed <= 2; seed++) {
            List<Run> all = Motions.spread((start, t) -> start / (1 - start * t), 20, -1, 0.7, 41, 0.8, 0.01, seed);
            Snapshots snapshots = SmoothingRule.AUTOMATIC.smooth(Motions.snapshots(0.02, 1, all.subList(0, 15), all.subList(15, 20)));
            assertTrue(snapshots.smoothing().active());
            FittedOperator operator = OperatorFitter.fit(snapshots, new ExtrapolatedEstimator(new OccupationEstimator(
                    Motions.kernel("exponential", "rate", 1), new SegmentPlan(10, 10), 1)), new RankRule.Holdout(30), 0, Progress.NONE);
            Grade grade = Motions.judge(operator, JudgeSettings.DEFAULT).overall().grade();
            assertTrue(grade == Grade.ABSENT || grade == Grade.DRIFTS, "seed " + seed + ": " + grade);
        }
    }

    @Test
    void inADictionarySettlingIsTheOnlyWitnessAndIsNotExcused() {
        // x' = -x^3 seen through polynomials of degree 5: no eigenfunction among them
        for (long seed = 1; seed <= 3; seed++) {
            List<Run> all = Motions.spread((start, t) -> start / Math.sqrt(1 + 2 * start * start * t), 20, -1.5, 1.5, 41, 2, 0.05, seed);
            Snapshots snapshots = SmoothingRule.AUTOMATIC.smooth(Motions.snapshots(0.05, 1, all.subList(0, 15), all.subList(15, 20)));
            FittedOperator operator = OperatorFitter.fit(snapshots, new ExtrapolatedEstimator(new DictionaryEstimator(Dictionary.monomials(5))),
                    new RankRule.Holdout(30), 0, Progress.NONE);
            Verdict verdict = Motions.judge(operator, JudgeSettings.DEFAULT);
            assertTrue(verdict.findings().stream().noneMatch(f -> f.check().equals("settling") && f.sentence().endsWith("so this is not held against it.")),
                    "seed " + seed);
            assertTrue(verdict.overall().grade() != Grade.STANDS && verdict.overall().grade() != Grade.SETTLES, verdict.overall().sentence());
        }
    }

    @Test
    void withoutNoiseTheReplayOfTrueModesIsTheRecording() {
        Snapshots snapshots = decays(8, 0, 3);
        FittedOperator operator = Motions.fit(snapshots, new LinearEstimator(), 2);
        Spectrum spectrum = SpectrumExtractor.extract(operator, Progress.NONE);
        ReplayedRuns runs = ReplayedRuns.of(operator, spectrum, spectrum.modes());
        for (int i = 0; i < runs.training().size(); i++) {
            double[] replayed = runs.training().get(i).values().data;
            double[] recorded = snapshots.training().get(i).values().data;
            for (int k = 0; k < replayed.length; k++) {
                assertEquals(recorded[k], replayed[k], 1e-10, "the modes hold it exactly");
            }
        }
    }

    @Test
    void recordingsThatWereNotSmoothedAreNotReplayed() {
        Snapshots snapshots = decays(5, 0, 1);
        FittedOperator operator = fitted(snapshots);
        assertEquals(Motions.judge(operator, JudgeSettings.DEFAULT.withReplays(0)), Motions.judge(operator, JudgeSettings.DEFAULT));
    }
}
