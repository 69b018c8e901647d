package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.fixtures.Motions.Flow;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/**
 * An invariant span needs no ladder; one that was merely cut by rounding, or that holds a defective block, is
 * not taken for it.
 */
class ClosureTest {

    @Test
    void aDecayInDelaysEndsTheLadderAndIsReported() {
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < 6; i++) {
            double start = 1 + i;
            runs.add(Motions.run("r" + i, 40, 0.1, t -> new double[] {start * Math.exp(-t)}));
        }
        Snapshots snapshots = Motions.snapshots(0.1, 4, runs.subList(0, 4), runs.subList(4, 6));
        assertEquals(Grade.STANDS, Motions.judge(Motions.fit(snapshots, new LinearEstimator(), 1),
                JudgeSettings.DEFAULT).overall().grade());
    }

    @Test
    void threeChannelsLeaveNoRoomForALadderAndAreJudgedWhole() {
        // three phases a third of a turn apart: a rotation in the plane of sum 0, orthogonal in the space of x·y; noise joins the third direction
        Random random = new Random(11);
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < 12; i++) {
            double size = 0.5 + random.nextDouble();
            double start = 2 * Math.PI * random.nextDouble();
            runs.add(Motions.run("r" + i, Motions.grid(60, 0.1), t -> new double[] {size * Math.cos(3 * t + start),
                size * Math.cos(3 * t + start - 2 * Math.PI / 3), size * Math.cos(3 * t + start + 2 * Math.PI / 3)}, 0.01, random));
        }
        Verdict verdict = Motions.judge(Motions.fit(Motions.snapshots(0.1, 1, runs.subList(0, 9), runs.subList(9, 12)),
                new KernelStepEstimator(Motions.kernel("linear"), 300), 2), JudgeSettings.DEFAULT);
        assertEquals(Grade.STANDS, verdict.overall().grade(), verdict.overall().sentence());
    }

    @Test
    void aDictionaryHasEndedWhenEveryFunctionOfItIsInHoweverFaintTheLast() {
        // x(k+3) = x(k): mean and a third of a turn, three of four delays; the fourth holds noise only, whose square is 1e-8 of the signal's
        double[] cycle = {0.15, 0.49, 0.96};
        Random random = new Random(5);
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < 12; i++) {
            int phase = random.nextInt(3);
            runs.add(Motions.run("r" + i, Motions.grid(60, 1), t -> new double[] {cycle[(phase + (int) Math.rint(t)) % 3]}, 1e-4, random));
        }
        Verdict verdict = Motions.judge(Motions.fit(Motions.snapshots(1, 4, runs.subList(0, 9), runs.subList(9, 12)), new LinearEstimator(), 4), JudgeSettings.DEFAULT.withSplits(1));
        assertTrue(verdict.overall().grade().compareTo(Grade.SETTLES) <= 0, verdict.overall().sentence());
    }

    @Test
    void polynomialsUnderTranslationAreOneDefectiveBlockAndDrift() {
        // d/dx is nilpotent on polynomials: x is a generalised eigenfunction only, CHECKS C2.18
        Snapshots snapshots = snapshots(Double::sum);
        assertEquals(Grade.DRIFTS, Motions.judge(Motions.fit(snapshots, new DictionaryEstimator(Dictionary.monomials(4)), 5),
                JudgeSettings.DEFAULT).overall().grade());
    }

    @Test
    void polynomialsThatOnlyImitateAnEigenfunctionAreNotClosedHoweverLittleTheyMiss() {
        // x' = x²: exp(-λ/x) is an eigenfunction for every λ and no polynomial; on [0.5, 1.2] degree 5 misses by a few per cent and less
        Flow flow = (a, t) -> a / (1 - a * t);
        Snapshots snapshots = Motions.snapshots(0.4 / 19, 1, Motions.spread(flow, 24, 0.5, 1.2, 20, 0.4, 0, 1),
                Motions.spread(flow, 8, 0.55, 1.15, 20, 0.4, 0, 2));
        Verdict verdict = Motions.judge(Motions.fit(snapshots, new DictionaryEstimator(Dictionary.monomials(5)), 6), JudgeSettings.DEFAULT);
        assertTrue(verdict.ladder().stream().anyMatch(row -> row.rank() == 6 && row.mode() > 0 && row.residual() > 0.001 && row.residual() < 0.05),
                "one of them misses by little");
        assertTrue(verdict.overall().grade().compareTo(Grade.SETTLES) > 0, verdict.overall().sentence());
    }

    @Test
    void aLadderThatRoundingCutsIsNotAtItsEnd() {
        Snapshots snapshots = snapshots(Double::sum);
        for (int rank : new int[] {8, 9, 10}) {
            Verdict verdict = Motions.judge(Motions.fit(snapshots,
                    new OccupationEstimator(Motions.kernel("exponential", "rate", 1),
                    SegmentPlan.WHOLE_RUNS, 1), rank), JudgeSettings.DEFAULT);
            assertTrue(verdict.overall().grade().compareTo(Grade.SETTLES) > 0, "rank " + rank);
        }
    }

    @Test
    void inAGaussianSpaceNothingStands() {
        Snapshots snapshots = snapshots((a, t) -> a * Math.exp(t));
        Verdict verdict = Motions.judge(Motions.fit(snapshots, new OccupationEstimator(Motions.kernel("gaussian",
                "scale", 1),
                SegmentPlan.WHOLE_RUNS, 1), 6), JudgeSettings.DEFAULT);
        assertTrue(verdict.findings().stream().anyMatch(f -> f.check().equals("signal-in-space") && !f.passed()));
        assertTrue(verdict.modes().stream().filter(ModeVerdict::counts).noneMatch(mode -> mode.grade() == Grade.STANDS));
    }

    private static Snapshots snapshots(Flow flow) {
        return Motions.snapshots(0.4 / 19, 1, Motions.spread(flow, 40, -1, 1, 20, 0.4, 0, 1),
                Motions.spread(flow, 9, -0.9, 0.9, 20, 0.4, 0, 2));
    }
}
