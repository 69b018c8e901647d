package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

class GradingTest {

    private static final String[] AGAINST = {"space-norm-growth", "holdout-residual", "clustered-eigenvalues", "settling",
            "step-consistency",
        "eigenfunction-overlap", "joint-solo-gap", "close-residual"};

    private static Finding finding(String check, double value, boolean passed) {
        return new Finding(1, check, value, 0.1, passed, check + " says so.");
    }

    /** Findings on mode 1, all passed but the named ones. */
    private static List<Finding> failing(String... checks) {
        List<Finding> out = new ArrayList<>();
        for (String check : AGAINST) {
            out.add(finding(check, 0.5, !List.of(checks).contains(check)));
        }
        out.add(new Finding(0, "captured-share", 0.3, 0.5, !List.of(checks).contains("captured-share"),
                "Too little is held."));
        return out;
    }

    private static Evidence evidence(boolean heldOut) {
        return evidence(heldOut, List.of());
    }

    private static Evidence evidence(boolean heldOut, List<LadderRow> ladder) {
        return evidence(heldOut, ladder, new LinearEstimator());
    }

    private static Evidence evidence(boolean heldOut, List<LadderRow> ladder, Estimator estimator) {
        Run run = Motions.run("a", 20, 1, t -> new double[] {Math.exp(-t)});
        FittedOperator operator = Motions.fit(Motions.snapshots(1, 1, List.of(run), List.of()), estimator, 1);
        Spectrum spectrum = SpectrumExtractor.extract(operator, org.modestead.engine.Progress.NONE);
        return new Evidence(operator, spectrum, List.of(1), ladder, ModalExpansion.of(operator.chosen()), List.of(1.0),
                List.of(1.0), List.of(1.0), List.of(0.0), List.of(0.0), List.of(0), List.of(false), List.of(HalfRates.UNKNOWN), 0.01, heldOut, 10, JudgeSettings.DEFAULT);
    }

    private static Mode mode(double share, boolean constant) {
        return new Mode(1, List.of(0), new Complex(-1, 0), 1, share, 0, List.of(), constant, 0);
    }

    private static ModeVerdict grade(String... failing) {
        return Grading.grade(mode(1, false), evidence(true), failing(failing));
    }

    @Test
    void whereNeitherResidualNorSettlingCouldBeSeenNothingIsReported() {
        Finding unseen = new Finding(1, "close-residual", Double.NaN, 0.05, false, "On no rung.");
        Finding excused = new Finding(1, "settling", 1, 0.1, true, "Noise makes as much of it.");
        Finding settled = new Finding(1, "settling", 0.02, 0.1, true, "It settles.");
        assertEquals(Grade.UNDECIDED, Grading.grade(mode(1, false), evidence(true), List.of(unseen, excused)).grade());
        assertEquals(List.of("close-residual"), Grading.grade(mode(1, false), evidence(true), List.of(unseen, excused)).decidedBy());
        assertEquals(Grade.SETTLES, Grading.grade(mode(1, false), evidence(true), List.of(unseen, settled)).grade());
    }

    @Test
    void nothingAgainstAModeMakesItStandByTheChecksThatDecided() {
        ModeVerdict verdict = grade();
        assertEquals(Grade.STANDS, verdict.grade());
        assertEquals(List.of(AGAINST), verdict.decidedBy());
    }

    @Test
    void overlapOrAGapOfWeightsMakesItSettle() {
        assertEquals(Grade.SETTLES, grade("eigenfunction-overlap").grade());
        assertEquals(Grade.SETTLES, grade("joint-solo-gap").grade());
    }

    @Test
    void lackOfEvidenceMakesItUndecided() {
        assertEquals(Grade.UNDECIDED, grade("captured-share", "joint-solo-gap").grade());
        assertEquals(Grade.UNDECIDED, grade("step-consistency").grade());
        assertEquals(Grade.UNDECIDED, Grading.grade(mode(1, false), evidence(false), failing()).grade());
    }

    @Test
    void whatCouldNotBeMeasuredIsLackOfEvidenceAndNotEvidenceAgainst() {
        for (String check : List.of("settling", "holdout-residual")) {
            List<Finding> findings = failing();
            findings.removeIf(f -> f.check().equals(check));
            findings.add(finding(check, Double.NaN, false));
            assertEquals(Grade.UNDECIDED, Grading.grade(mode(1, false), evidence(true), findings).grade(), check);
        }
    }

    @Test
    void changeOnTheLadderOrAClusterMakesItDriftBeforeLackOfEvidenceIsAsked() {
        assertEquals(Grade.DRIFTS, grade("settling", "captured-share").grade());
        assertEquals(Grade.DRIFTS, grade("clustered-eigenvalues").grade());
    }

    @Test
    void aResidualOrAGrowingNormMakesItAbsentBeforeAllElse() {
        assertEquals(Grade.ABSENT, grade("holdout-residual", "settling").grade());
        ModeVerdict verdict = grade("space-norm-growth", "joint-solo-gap", "settling");
        assertEquals(Grade.ABSENT, verdict.grade());
        assertEquals(List.of("space-norm-growth"), verdict.decidedBy());
        assertTrue(verdict.sentence().contains("space-norm-growth says so."));
    }

    @Test
    void inAKernelSpaceWhatNeitherSettlesNorKeepsItsRuleCloselyIsAbsent() {
        Evidence space = evidence(true, List.of(), new KernelStepEstimator(Motions.kernel("linear"), 20));
        assertEquals(Grade.ABSENT, Grading.grade(mode(1, false), space, failing("settling", "close-residual")).grade());
        assertEquals(Grade.DRIFTS, Grading.grade(mode(1, false), space, failing("settling")).grade(), "what keeps its rule drifts");
        assertEquals(Grade.SETTLES, Grading.grade(mode(1, false), space, failing("close-residual")).grade());
        assertEquals(Grade.DRIFTS, grade("settling", "close-residual").grade(), "averages over the data have no norm to leave");
    }

    @Test
    void aResidualThatNoiseExplainsIsLackOfEvidence() {
        // 0.5 seen, of which noise makes 0.3: what is left, 0.4, is less than √5 times that; of 0.41 seen it is more than √5 times 0.09
        for (double seen : new double[] {0.5, 0.41}) {
            LadderRow row = new LadderRow(1, 1, new Complex(-1, 0), 1, 1, 1, 0.4, seen, 0, 0, NoiseEffect.NONE);
            assertEquals(seen == 0.5 ? Grade.UNDECIDED : Grade.ABSENT,
                    Grading.grade(mode(1, false), evidence(true, List.of(row)), failing("holdout-residual")).grade(), "seen " + seen);
        }
    }

    @Test
    void theConstantFunctionStandsButCountsForNothing() {
        ModeVerdict verdict = Grading.grade(mode(1, true), evidence(true), failing("holdout-residual"));
        assertEquals(Grade.STANDS, verdict.grade());
        assertFalse(verdict.counts());
    }

    @Test
    void theWorstGradeAmongThoseThatCountDecidesOverall() {
        ModeVerdict stands = new ModeVerdict(1, Grade.STANDS, List.of(), true, "Mode 1.");
        ModeVerdict drifts = new ModeVerdict(2, Grade.DRIFTS, List.of("settling"), true, "Mode 2.");
        ModeVerdict faint = new ModeVerdict(3, Grade.ABSENT, List.of("holdout-residual"), false, "Mode 3.");
        ModeVerdict overall = Grading.overall(List.of(stands, drifts, faint));
        assertEquals(Grade.DRIFTS, overall.grade());
        assertEquals(List.of("settling"), overall.decidedBy());
        assertEquals(0, overall.mode());
    }

    @Test
    void withoutAModeThatCountsNothingIsDecided() {
        assertEquals(Grade.UNDECIDED, Grading.overall(List.of(new ModeVerdict(1, Grade.STANDS, List.of(), false,
                ""))).grade());
        assertEquals(Grade.UNDECIDED, Grading.overall(List.of()).grade());
    }

    @Test
    void gradesAreOrderedFromBestToWorst() {
        assertEquals(List.of(Grade.STANDS, Grade.SETTLES, Grade.UNDECIDED, Grade.DRIFTS, Grade.ABSENT),
                List.of(Grade.values()));
    }
}
