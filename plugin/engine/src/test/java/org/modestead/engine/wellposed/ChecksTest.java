package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.ServiceLoader;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/** Every check on evidence made by hand, once passing and once failing. */
class ChecksTest {

    private static final List<Integer> RUNGS = List.of(2, 3, 4, 5);

    private static OrthonormalCompression compression(DMatrixRMaj action, InnerProduct product, Evolution evolution) {
        int r = action.numRows;
        DMatrixRMaj second = new DMatrixRMaj(r, r);
        CommonOps_DDRM.multTransA(action, action, second);
        double[] ones = new double[r];
        java.util.Arrays.fill(ones, 1);
        return new OrthonormalCompression(new Coordinates(r), CommonOps_DDRM.identity(r), action, second,
                CommonOps_DDRM.identity(r), ones, 50,
                product, evolution);
    }

    private static Mode mode(int number, List<Integer> indices, Complex rate, double share, double gap, int cluster) {
        return new Mode(number, indices, rate, 1, share, gap, List.of(new Complex(1, 0)), false, cluster);
    }

    /** Evidence on a step map of the given matrix; one mode for every index unless told. */
    private static Evidence evidence(DMatrixRMaj action, List<Mode> modes, List<LadderRow> ladder) {
        return evidence(action, modes, ladder, InnerProduct.SPACE, new Evolution.StepMap(1), List.of(0.9, 0.9, 0.9, 0.9));
    }

    private static Evidence evidence(DMatrixRMaj action, List<Mode> modes, List<LadderRow> ladder, InnerProduct product,
            Evolution evolution,
            List<Double> captured) {
        OrthonormalCompression compression = compression(action, product, evolution);
        Run run = Motions.run("a", 20, 1, t -> new double[action.numRows]);
        Snapshots snapshots = Motions.snapshots(1, 1, List.of(run), List.of());
        FittedOperator operator = new FittedOperator(compression, compression.rank(), new RankRule.Fixed(compression.rank()), "fixed", 0, new LinearEstimator(),
                "by hand", Optional.empty(),
                snapshots, List.of());
        ModalExpansion expansion = ModalExpansion.of(compression);
        Spectrum spectrum = new Spectrum(expansion.eigenvalues(), expansion.rates(), expansion.vectors(), expansion.joint(),
                expansion.solo(),
                modes, List.of(new Channel("a", "")), DelayEmbedding.NONE, Preparation.identity(1), "s", List.of());
        List<Integer> rungs = captured.size() == RUNGS.size() ? RUNGS : List.of(compression.rank());
        return new Evidence(operator, spectrum, rungs, ladder, expansion, captured, List.of(1.0, 1.0, 1.0, 1.0), List.of(1.0, 1.0, 1.0, 1.0),
                List.of(0.1, 0.1, 0.1, 0.1), List.of(0.1, 0.1, 0.1, 0.1), List.of(0, 0, 0, 0), modes.stream().map(mode -> false).toList(),
                modes.stream().map(mode -> HalfRates.UNKNOWN).toList(), 0.01, true, 10, JudgeSettings.DEFAULT);
    }

    private static List<LadderRow> ladder(double[] rates, double[] weights, double[] norms, double residual) {
        List<LadderRow> rows = new ArrayList<>();
        for (int k = 0; k < rates.length; k++) {
            rows.add(new LadderRow(RUNGS.get(k), 1, new Complex(rates[k], 0), weights[k], 1, norms[k], residual,
                    residual, 0, 0, NoiseEffect.NONE));
        }
        return rows;
    }

    private static final double[] SAME = {1, 1, 1, 1};

    private static Finding only(Check check, Evidence evidence, int mode) {
        return check.examine(evidence, Progress.NONE).stream().filter(f -> f.mode() == mode
                && f.check().equals(check.id())).findFirst().orElseThrow();
    }

    private static final Mode SINGLE = mode(1, List.of(0), new Complex(-1, 0), 1, 0, 0);
    private static final DMatrixRMaj DIAGONAL = CommonOps_DDRM.diag(0.9, 0.5);
    private static final DMatrixRMaj SKEW = new DMatrixRMaj(new double[][] {{0, -1}, {1, 0}});
    private static final DMatrixRMaj NILPOTENT = new DMatrixRMaj(new double[][] {{0, 1}, {0, 0}});

    @Test
    void idsAreUniqueAndEveryCheckIsFoundByTheServiceLoader() {
        List<String> ids = ServiceLoader.load(Check.class).stream().map(p -> p.get().id()).toList();
        assertEquals(23, ids.size());
        assertEquals(ids.size(), ids.stream().distinct().count());
        assertTrue(ids.stream().allMatch(id -> id.matches("[a-z]+(-[a-z]+)*")), ids.toString());
    }

    @Test
    void symmetryDefectIsZeroForSymmetricAndTwoForSkew() {
        assertEquals(0, SymmetryDefect.of(DIAGONAL));
        assertEquals(2, SymmetryDefect.of(SKEW), 1e-15);
        assertEquals(0, SymmetryDefect.of(new DMatrixRMaj(2, 2)));
        assertEquals(Math.sqrt(2), only(new SymmetryDefect(), evidence(NILPOTENT, List.of(SINGLE), List.of()), 0).value(),
                1e-15);
    }

    @Test
    void normalityDefectIsZeroForNormalMatricesOnly() {
        assertEquals(0, NormalityDefect.of(DIAGONAL));
        assertEquals(0, NormalityDefect.of(SKEW), 1e-15);
        // [[1,0],[0,-1]] over the squared size 1
        assertEquals(Math.sqrt(2), only(new NormalityDefect(), evidence(NILPOTENT, List.of(SINGLE), List.of()), 0).value(),
                1e-15);
    }

    @Test
    void unitarityDefectIsZeroForARotationAndNotAskedOfAGenerator() {
        assertEquals(0, only(new UnitarityDefect(), evidence(SKEW, List.of(SINGLE), List.of()), 0).value(), 1e-15);
        // half the identity: |1/4 - 1| in every direction
        assertEquals(0.75, only(new UnitarityDefect(), evidence(CommonOps_DDRM.diag(0.5, 0.5), List.of(SINGLE), List.of()),
                0).value(), 1e-15);
        assertTrue(new UnitarityDefect().examine(evidence(SKEW, List.of(SINGLE), List.of(), InnerProduct.SPACE,
                new Evolution.Generator(1),
                List.of(1.0, 1.0, 1.0, 1.0)), Progress.NONE).isEmpty());
    }

    private static LadderRow row(int rank, double gap, double overlap, double norm) {
        return new LadderRow(rank, 1, Complex.ZERO, 1, 1, 1, 0.01, 0.01, gap, overlap, new NoiseEffect(0, 0, norm));
    }

    @Test
    void overlapAndGapAreReadOnTheHighestRungThatNoiseLeavesAlone() {
        List<LadderRow> rows = List.of(row(2, 0.5, 0.4, 1), row(3, 0.05, 0.06, 1), row(4, 0.9, 0.8, 1.5));
        Finding overlap = only(new EigenfunctionOverlap(), evidence(DIAGONAL, List.of(SINGLE), rows), 1);
        assertEquals(0.06, overlap.value());
        assertTrue(overlap.passed() && overlap.sentence().contains("rank 3"), overlap.sentence());
        Finding gap = only(new JointSoloGap(), evidence(DIAGONAL, List.of(SINGLE), rows), 1);
        assertEquals(0.05, gap.value());
        assertTrue(gap.passed());
    }

    @Test
    void overlapAndGapAreHeldAgainstTheirThresholds() {
        for (double value : new double[] {0.09, 0.11}) {
            List<LadderRow> rows = List.of(row(2, value, value, 1), row(3, value, value, 1), row(4, value, value, 1));
            assertEquals(value < 0.1, only(new EigenfunctionOverlap(), evidence(DIAGONAL, List.of(SINGLE), rows), 1).passed());
            assertEquals(value < 0.1, only(new JointSoloGap(), evidence(DIAGONAL, List.of(SINGLE), rows), 1).passed());
        }
    }

    @Test
    void anOverlapThatNoiseAloneMayShowIsNotHeldAgainstAMode() {
        // a part of size 0.5 beside a function of size 1 lengthens it by √1.25 and turns it by asin(0.5/√1.25) = 0.447
        double norm = Math.sqrt(1.25);
        assertEquals(0.5 / norm, new NoiseEffect(0, 0, norm).blur(), 1e-15);
        List<LadderRow> rows = List.of(row(2, 0.4, 0.4, norm), row(3, 0.4, 0.4, norm), row(4, 0.4, 0.4, norm));
        assertTrue(only(new JointSoloGap(), evidence(DIAGONAL, List.of(SINGLE), rows), 1).passed());
    }

    @Test
    void settlingTakesTheDistanceFromTheLastRungAndForgivesOneOfThree() {
        assertTrue(only(new Settling(), evidence(DIAGONAL, List.of(SINGLE),
                ladder(new double[] {-1, -1.01, -1, -1}, SAME, SAME, 0.2)), 1).passed());
        assertTrue(only(new Settling(), evidence(DIAGONAL, List.of(SINGLE),
                ladder(new double[] {-1, -3, -1, -1}, SAME, SAME, 0.2)), 1).passed(), "two modes may cross on one rung");
        Finding rate = only(new Settling(), evidence(DIAGONAL, List.of(SINGLE),
                ladder(new double[] {-1, -1, -1, -1.25}, SAME, SAME, 0.2)), 1);
        assertEquals(0.2, rate.value(), 1e-14);
        assertFalse(rate.passed());
        Finding weight = only(new Settling(), evidence(DIAGONAL, List.of(SINGLE),
                ladder(SAME, new double[] {1, 1, 2, 2}, SAME, 0.2)), 1);
        assertEquals(0.5, weight.value(), 1e-14);
        assertFalse(weight.passed());
    }

    @Test
    void twiceWhatNoiseChangesIsTakenOffAChange() {
        for (double noise : new double[] {0.05, 0.1}) {
            List<LadderRow> rows = new ArrayList<>();
            for (LadderRow row : ladder(new double[] {-1, -1, -1, -1.25}, SAME, SAME, 0.2)) {
                rows.add(new LadderRow(row.rank(), 1, row.rate(), 1, 1, 1, 0.2, 0.2, 0, 0, new NoiseEffect(noise, 0, 1)));
            }
            // the rates differ by 0.2 of the larger
            assertEquals(0.2 - 2 * noise, only(new Settling(), evidence(DIAGONAL, List.of(SINGLE), rows), 1).value(), 1e-14);
        }
    }

    @Test
    void rungsThatNoiseSpoilsTellNothing() {
        List<LadderRow> rows = new ArrayList<>();
        for (LadderRow row : ladder(SAME, SAME, SAME, 0.2)) {
            rows.add(new LadderRow(row.rank(), 1, row.rate(), 1, 1, 1, 0.2, 0.2, 0, 0, new NoiseEffect(0, 0.3, 1)));
        }
        Finding finding = only(new Settling(), evidence(DIAGONAL, List.of(SINGLE), rows), 1);
        assertTrue(Double.isNaN(finding.value()) && !finding.passed());
    }

    @Test
    void aRateThatALittleNoiseUpsetsOnEveryRungIsNotDetermined() {
        // noise of 1 % of the signal changes the rate by half: more than ten times 1 % of a mode that carries all
        List<LadderRow> rows = new ArrayList<>();
        for (LadderRow row : ladder(SAME, SAME, SAME, 0.2)) {
            rows.add(new LadderRow(row.rank(), 1, row.rate(), 1, 1, 1, 0.2, 0.2, 0, 0, new NoiseEffect(0.5, 0, 1)));
        }
        Evidence evidence = evidence(DIAGONAL, List.of(SINGLE), rows);
        Finding finding = only(new DeterminedRate(), evidence, 1);
        assertEquals(0.5, finding.value());
        assertFalse(finding.passed());
        assertTrue(Double.isNaN(only(new Settling(), evidence, 1).value()), "no rung tells whether it settles");
    }

    @Test
    void twoRungsThatAgreeAreToldButAreTooFew() {
        List<LadderRow> rows = new ArrayList<>();
        for (LadderRow row : ladder(SAME, SAME, SAME, 0.2)) {
            double noise = rows.size() < 2 ? 0.1 : 0.9;
            rows.add(new LadderRow(row.rank(), 1, row.rate(), 1, 1, 1, 0.2, 0.2, 0, 0, new NoiseEffect(0, noise, 1)));
        }
        Finding finding = only(new Settling(), evidence(DIAGONAL, List.of(SINGLE), rows), 1);
        assertEquals(0, finding.value());
        assertFalse(finding.passed());
        assertTrue(finding.sentence().endsWith("and these agree to 0.00."), finding.sentence());
    }

    @Test
    void aFittedRankThatNoiseSpoilsIsNamedWithTheOneThatPredicts() {
        List<LadderRow> rows = new ArrayList<>();
        for (int rank : new int[] {2, 3, 4, 5}) {
            boolean fitted = rank == 2;
            rows.add(new LadderRow(rank, 1, new Complex(fitted ? -1.3 : -1, 0), 1, 1, 1, fitted ? 0.9 : 0.01, fitted ? 0.9 : 0.01, 0, 0,
                    NoiseEffect.NONE));
        }
        Finding finding = only(new FittedRank(), evidence(DIAGONAL, List.of(SINGLE), rows), 1);
        assertEquals(0.3 / 1.3, finding.value(), 1e-12);
        assertTrue(!finding.passed() && finding.sentence().contains("fit with rank 5"), finding.sentence());
    }

    @Test
    void aModeFoundOnTooFewRungsHasChangedAltogether() {
        Finding finding = only(new Settling(), evidence(DIAGONAL, List.of(SINGLE),
                ladder(SAME, SAME, SAME, 0).subList(2, 4)), 1);
        assertEquals(1, finding.value());
        assertFalse(finding.passed());
    }

    @Test
    void aLadderOfTwoRungsCannotTellWhetherAModeSettles() {
        Evidence evidence = evidence(DIAGONAL, List.of(SINGLE), List.of(), InnerProduct.SPACE, new Evolution.StepMap(1),
                List.of(0.9));
        Finding finding = only(new Settling(), evidence, 1);
        assertTrue(Double.isNaN(finding.value()) && !finding.passed());
    }

    @Test
    void spaceNormGrowthFollowsTheLadderOfTheMode() {
        assertTrue(only(new SpaceNormGrowth(), evidence(DIAGONAL, List.of(SINGLE),
                ladder(SAME, SAME, new double[] {1.4, 1.4, 1.4, 1.4}, 0)), 1).passed());
        Finding finding = only(new SpaceNormGrowth(), evidence(DIAGONAL, List.of(SINGLE),
                ladder(SAME, SAME, new double[] {2.5, 8, 60, 750}, 0.2)), 1);
        assertFalse(finding.passed());
        assertEquals(750.0 / 2.5, finding.value(), 1e-12, "last third of the ladder over the first");
    }

    @Test
    void inTheDataInnerProductTheSpaceNormInforms() {
        Evidence evidence = evidence(DIAGONAL, List.of(SINGLE), ladder(SAME, SAME, new double[] {2.5, 8, 60, 750}, 0),
                InnerProduct.DATA,
                new Evolution.StepMap(1), List.of(1.0, 1.0, 1.0, 1.0));
        List<Finding> findings = new SpaceNormGrowth().examine(evidence, Progress.NONE);
        assertEquals(1, findings.size());
        assertTrue(findings.get(0).passed() && findings.get(0).mode() == 0);
    }

    @Test
    void holdoutResidualIsThatOfTheFittedRank() {
        List<LadderRow> rows = List.of(new LadderRow(2, 1, Complex.ZERO, 1, 1, 1, 0.2, 0.2, 0, 0, NoiseEffect.NONE),
                new LadderRow(3, 1, Complex.ZERO, 1, 1, 1, 0.9, 0.9, 0, 0, NoiseEffect.NONE));
        Finding passed = only(new HoldoutResidual(), evidence(DIAGONAL, List.of(SINGLE), rows), 1);
        assertEquals(0.2, passed.value());
        assertTrue(passed.passed());
        assertFalse(only(new HoldoutResidual(), evidence(DIAGONAL, List.of(SINGLE), ladder(SAME, SAME, SAME, 0.26)),
                1).passed());
        Finding unjudged = only(new HoldoutResidual(), evidence(DIAGONAL, List.of(SINGLE),
                ladder(SAME, SAME, SAME, Double.NaN)), 1);
        assertTrue(Double.isNaN(unjudged.value()) && !unjudged.passed());
    }

    @Test
    void exactResidualVanishesForAnExactEigenpair() {
        Evidence exact = evidence(DIAGONAL, List.of(SINGLE), List.of(), InnerProduct.DATA, new Evolution.StepMap(1),
                List.of(1.0, 1.0, 1.0, 1.0));
        // a difference of squares near 1 leaves the square root of rounding
        assertEquals(0, only(new ExactResidual(), exact, 1).value(), 3e-8);
        // N = 1 instead of |μ|² = 0.81: what is left is √0.19
        double left = ExactResidual.of(CommonOps_DDRM.diag(0.9), CommonOps_DDRM.identity(1), exact.spectrum().vectors(), 0,
                new Complex(0.9, 0));
        assertEquals(Math.sqrt(0.19), left, 1e-14);
    }

    @Test
    void capturedShareIsHeldAgainstItsThreshold() {
        assertTrue(only(new CapturedShare(), evidence(DIAGONAL, List.of(SINGLE), List.of()), 0).passed());
        assertFalse(only(new CapturedShare(), evidence(DIAGONAL, List.of(SINGLE), List.of(), InnerProduct.SPACE,
                new Evolution.StepMap(1),
                List.of(0.4, 0.6, 0.7, 0.8)), 0).passed());
    }

    @Test
    void onlyClusteredModesFailTheClusterCheck() {
        assertTrue(new ClusteredEigenvalues().examine(evidence(DIAGONAL, List.of(SINGLE), List.of()),
                Progress.NONE).isEmpty());
        Mode clustered = mode(1, List.of(0, 1), Complex.ZERO, 1, 0, 1);
        Finding finding = only(new ClusteredEigenvalues(), evidence(NILPOTENT, List.of(clustered), List.of(sighting(2, 1, 1, 0))), 1);
        assertFalse(finding.passed());
        assertEquals(2, finding.value());
    }

    @Test
    void aClusterIsExcusedWhereOneFunctionOfALowerRungCarriesAllOfItAloneAndExactly() {
        assertTrue(clusterWith(sighting(1, 1, 1, 1e-4)).passed());
        assertFalse(clusterWith(sighting(1, 0.9, 0.9, 1e-4)).passed(), "a tenth is carried by the rest");
        assertFalse(clusterWith(sighting(1, 1, 1, 0.01)).passed(), "it misses its own rule");
        assertFalse(clusterWith(sighting(1, 1, 100, 1e-4)).passed(), "a second function takes most of it away again");
    }

    private static Finding clusterWith(LadderRow lower) {
        Mode clustered = mode(1, List.of(0, 1), Complex.ZERO, 1, 0, 1);
        return only(new ClusteredEigenvalues(), evidence(NILPOTENT, List.of(clustered), List.of(lower, sighting(2, 1, 1, 0))), 1);
    }

    private static LadderRow sighting(int rank, double weight, double weightNorm, double residual) {
        return new LadderRow(rank, 1, Complex.ZERO, weight, weightNorm, 1, residual, residual, 0, 0, NoiseEffect.NONE);
    }

    @Test
    void undampedOscillationsThatFillTheAxisWhileResidualsStayAreSuspect() {
        Evidence base = evidence(DIAGONAL, List.of(SINGLE), List.of());
        assertTrue(only(new ContinuousSpectrum(), base, 0).passed());
        Evidence filling = new Evidence(base.operator(), base.spectrum(), List.of(10, 20, 30), List.of(), base.fitted(),
                List.of(1.0, 1.0, 1.0),
                List.of(1.0, 1.0, 1.0), List.of(1.0, 1.0, 1.0), List.of(0.5, 0.5, 0.5), List.of(0.1, 0.1, 0.1), List.of(4, 8, 14),
                List.of(false), List.of(HalfRates.UNKNOWN), 0.01, true, 10, JudgeSettings.DEFAULT);
        assertFalse(only(new ContinuousSpectrum(), filling, 0).passed());
        Evidence falling = new Evidence(base.operator(), base.spectrum(), List.of(10, 20, 30), List.of(), base.fitted(),
                List.of(1.0, 1.0, 1.0),
                List.of(1.0, 1.0, 1.0), List.of(1.0, 1.0, 1.0), List.of(0.5, 0.3, 0.1), List.of(0.1, 0.1, 0.1), List.of(4, 8, 14),
                List.of(false), List.of(HalfRates.UNKNOWN), 0.01, true, 10, JudgeSettings.DEFAULT);
        assertTrue(only(new ContinuousSpectrum(), falling, 0).passed());
    }

    @Test
    void aRankThatPredictsWorseThanALowerOneTakesNoiseForMotion() {
        Finding worse = only(new PredictionLimit(), predicting(List.of(0.3, 0.2, 0.22)), 0);
        assertFalse(worse.passed());
        assertEquals(20, worse.value());
        assertTrue(worse.sentence().contains("lower it"), worse.sentence());
        assertTrue(only(new PredictionLimit(), predicting(List.of(0.3, 0.2, 0.205)), 0).passed(), "2.5 % worse is chance");
    }

    /** Evidence whose fitted rank is the last of three rungs. */
    private static Evidence predicting(List<Double> errors) {
        Evidence base = evidence(DIAGONAL, List.of(SINGLE), List.of());
        int fitted = base.operator().rank();
        return new Evidence(base.operator(), base.spectrum(), List.of(10, 20, fitted), List.of(), base.fitted(), List.of(1.0, 1.0, 1.0),
                List.of(1.0, 1.0, 1.0), List.of(1.0, 1.0, 1.0), List.of(0.1, 0.1, 0.1), errors, List.of(0, 0, 0), List.of(false), List.of(HalfRates.UNKNOWN), 0.01, true, 10, JudgeSettings.DEFAULT);
    }

    @Test
    void ratesThatDependOnTheStepDisagree() {
        // a chirp-free oscillation agrees; one just below the sampling limit of the double step is folded there and not
        // compared
        Verdict good = Motions.judge(Motions.fit(oscillation(1.5), new LinearEstimator(), 2), JudgeSettings.DEFAULT);
        Finding finding = good.findings().stream().filter(f -> f.check().equals("step-consistency")
                && f.mode() == 1).findFirst().orElseThrow();
        assertTrue(finding.passed() && finding.value() < 1e-8);
        Verdict fast = Motions.judge(Motions.fit(oscillation(0.8 * Math.PI / 0.1), new LinearEstimator(), 2),
                JudgeSettings.DEFAULT);
        assertTrue(fast.findings().stream().noneMatch(f -> f.check().equals("step-consistency") && f.mode() == 1));
    }

    @Test
    void aStepThatTheDataCannotSupportIsNotHeldAgainstTheMode() {
        Snapshots three = Motions.snapshots(OptionalDouble.of(1), DelayEmbedding.NONE,
                List.of(Motions.run("a", 3, 1, t -> new double[] {Math.exp(-t), Math.exp(-2 * t)})), List.of());
        Verdict verdict = Motions.judge(Motions.fit(three, new LinearEstimator(), 2), JudgeSettings.DEFAULT);
        Finding finding = verdict.findings().stream().filter(f ->
                f.check().equals("step-consistency")).findFirst().orElseThrow();
        assertTrue(finding.passed() && Double.isNaN(finding.value()), finding.sentence());
    }

    private static Snapshots oscillation(double w) {
        return Motions.snapshots(0.1, 4, List.of(Motions.run("a", 100, 0.1, t -> new double[] {Math.cos(w * t + 0.3)})),
                List.of());
    }
}
