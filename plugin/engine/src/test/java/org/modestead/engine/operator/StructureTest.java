package org.modestead.engine.operator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.ejml.dense.row.RandomMatrices_DDRM;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.fixtures.Driven;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.MatrixExponential;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.wellposed.Finding;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.JudgeSettings;
import org.modestead.engine.wellposed.Verdict;

class StructureTest {

    private static final double STEP = 0.1;

    private static Snapshots rotation(double noise, Random random) {
        Run run = Motions.run("a", Motions.grid(200, STEP), t -> new double[] {Math.cos(2 * t), Math.sin(2 * t)}, noise, random);
        Run other = Motions.run("b", Motions.grid(60, STEP), t -> new double[] {0.5 * Math.cos(2 * t + 1), 0.5 * Math.sin(2 * t + 1)}, noise, random);
        return Motions.snapshots(STEP, 1, List.of(run), List.of(other));
    }

    private static FactoredCompression random(long seed, int size, InnerProduct product, Evolution evolution) {
        Random random = new Random(seed);
        DMatrixRMaj now = RandomMatrices_DDRM.rectangle(30, size, -1, 1, random);
        DMatrixRMaj next = RandomMatrices_DDRM.rectangle(30, size, -1, 1, random);
        return new FactoredCompression(new Coordinates(size), now, next, now, product, evolution);
    }

    /** ‖Y - X A‖² over the snapshots, in the inner product of the fit; computed from the data, not from the formulas. */
    private static double misfit(FactoredCompression data, OrthonormalCompression white, DMatrixRMaj action) {
        DMatrixRMaj moved = Matrices.product(data.next(), white.map());
        CommonOps_DDRM.subtractEquals(moved, Matrices.product(Matrices.product(data.now(), white.map()), action));
        return NormOps_DDRM.normF(moved);
    }

    @Property(tries = 40, seed = "20261201")
    void noOperatorWithTheStructureFitsTheDataBetter(@ForAll long seed, @ForAll @IntRange(min = 1, max = 6) int size,
            @ForAll boolean inSpace) {
        InnerProduct product = inSpace ? InnerProduct.SPACE : InnerProduct.DATA;
        for (Structure structure : List.of(Structure.SELF_ADJOINT, Structure.SKEW, Structure.UNITARY)) {
            Evolution evolution = structure == Structure.SKEW ? new Evolution.Generator(1) : new Evolution.StepMap(1);
            FactoredCompression data = random(seed, size, product, evolution);
            OrthonormalCompression white = new CorrectedCompression(data, free -> free.constrained(structure)).whiten(size);
            assertStructure(structure, white.action());
            double least = misfit(data, white, white.action());
            Random random = new Random(seed + 1);
            for (int k = 0; k < 1000; k++) {
                DMatrixRMaj other = perturbed(structure, white.action(), Math.pow(10, -k % 5), random);
                assertTrue(misfit(data, white, other) >= least - 1e-12 * least, structure + " fits better");
            }
        }
    }

    private static DMatrixRMaj perturbed(Structure structure, DMatrixRMaj action, double size, Random random) {
        DMatrixRMaj e = RandomMatrices_DDRM.rectangle(action.numRows, action.numRows, -size, size, random);
        DMatrixRMaj half = CommonOps_DDRM.transpose(e, null);
        if (structure == Structure.SELF_ADJOINT) {
            CommonOps_DDRM.addEquals(e, half);
        } else {
            CommonOps_DDRM.subtractEquals(e, half);
        }
        if (structure == Structure.UNITARY) {
            return Matrices.product(action, MatrixExponential.of(e));
        }
        CommonOps_DDRM.addEquals(e, action);
        return e;
    }

    private static void assertStructure(Structure structure, DMatrixRMaj action) {
        DMatrixRMaj left = CommonOps_DDRM.transpose(action, null);
        switch (structure) {
            case SELF_ADJOINT -> CommonOps_DDRM.subtractEquals(left, action);
            case SKEW -> CommonOps_DDRM.addEquals(left, action);
            default -> {
                left = Matrices.transposeProduct(action, action);
                CommonOps_DDRM.subtractEquals(left, CommonOps_DDRM.identity(action.numRows));
            }
        }
        assertEquals(0, NormOps_DDRM.normF(left), 1e-13 * (1 + NormOps_DDRM.normF(action)), structure.words());
    }

    @Property(tries = 20, seed = "20261201")
    void everyRankIsGivenTheStructureForItself(@ForAll long seed, @ForAll @IntRange(min = 2, max = 6) int size, @ForAll boolean inSpace) {
        InnerProduct product = inSpace ? InnerProduct.SPACE : InnerProduct.DATA;
        for (Structure structure : Structure.values()) {
            Evolution evolution = structure == Structure.SKEW ? new Evolution.Generator(1) : new Evolution.StepMap(1);
            Compression data = new CorrectedCompression(random(seed, size, product, evolution), free -> free.constrained(structure));
            OrthonormalCompression full = data.whiten(size);
            for (int r = 1; r < size; r++) {
                assertArrayEquals(data.whiten(r).action().data, full.leading(r).action().data, 1e-7, structure + " at rank " + r);
                if (structure.orthogonal()) {
                    assertStructure(structure, full.leading(r).action());
                }
            }
            // what the data gave is kept for the residuals
            assertArrayEquals(random(seed, size, product, evolution).whiten(size).leading(size - 1).action().data,
                    full.leading(size - 1).measured().data, 1e-12);
        }
    }

    @Test
    void whatHasTheStructureAlreadyIsLeftAlone() {
        Snapshots circle = Motions.snapshots(Math.PI / 50, 1, List.of(Motions.run("a", 101, Math.PI / 50,
                t -> new double[] {Math.cos(t), Math.sin(t)})), List.of());
        Complex turn = new Complex(0, Math.PI / 50).exp();
        for (Estimator free : List.of(new LinearEstimator(), new KernelStepEstimator(Motions.kernel("linear"), 10))) {
            OrthonormalCompression white = new StructuredEstimator(free, Structure.UNITARY).compress(circle, Progress.NONE).whiten(2);
            assertEquals(0, white.imposed().orElseThrow().change(white.action()), 1e-12, free.id());
            assertEquals(0, turn.minus(LinearAlgebra.installed().eigen(white.action()).values().get(0)).abs(), 1e-12);
        }
        // the generator of the rotation is skew on linear functions
        OrthonormalCompression skew = new StructuredEstimator(new OccupationEstimator(Motions.kernel("linear"), new SegmentPlan(20, 0), 1),
                Structure.SKEW).compress(circle, Progress.NONE).whiten(2);
        // quadrature of the occupation functions: fourth order in the step
        assertEquals(0, skew.imposed().orElseThrow().change(skew.action()), 1e-5);
        assertEquals(1, LinearAlgebra.installed().eigen(skew.action()).values().get(0).im(), 1e-5);
        // two decays from all corners of a square, uncorrelated: self-adjoint
        List<Run> corners = new ArrayList<>();
        for (int k = 0; k < 4; k++) {
            int x = k / 2 * 2 - 1;
            int y = k % 2 * 2 - 1;
            corners.add(Motions.run("r" + k, 30, 0.1, t -> new double[] {x * Math.exp(-t), y * Math.exp(-0.3 * t)}));
        }
        OrthonormalCompression symmetric = new StructuredEstimator(new LinearEstimator(), Structure.SELF_ADJOINT)
                .compress(Motions.snapshots(0.1, 1, corners, List.of()), Progress.NONE).whiten(2);
        assertEquals(0, symmetric.imposed().orElseThrow().change(symmetric.action()), 1e-13);
        // and all of them are stable
        OrthonormalCompression stable = new StructuredEstimator(new LinearEstimator(), Structure.STABLE)
                .compress(Motions.snapshots(0.1, 1, corners, List.of()), Progress.NONE).whiten(2);
        assertEquals(0, stable.imposed().orElseThrow().change(stable.action()));
    }

    @Test
    void underNoiseARotationKeepsItsSizeAndItsFrequencyIsFoundAsWell() {
        Random random = new Random(20);
        int draws = 200;
        double[] frequency = new double[2];
        double[] multiplier = new double[2];
        for (int draw = 0; draw < draws; draw++) {
            Snapshots snapshots = rotation(0.05, random);
            Mode plain = Motions.nearest(Motions.spectrum(snapshots, new LinearEstimator(), 2), 0, 2);
            Mode kept = Motions.nearest(Motions.spectrum(snapshots, new StructuredEstimator(new LinearEstimator(), Structure.UNITARY), 2), 0, 2);
            assertEquals(0, kept.rate().re(), 1e-12, "|z| = 1");
            assertTrue(plain.rate().re() < 0, "least squares feigns damping: " + plain.rate());
            for (int k = 0; k < 2; k++) {
                Complex rate = (k == 0 ? plain : kept).rate();
                frequency[k] += Math.abs(rate.im() - 2) / draws;
                multiplier[k] += rate.times(STEP).exp().minus(new Complex(0, 2 * STEP).exp()).abs() / draws;
            }
        }
        // the angle of the polar factor is that of the free fit to first order: the structure takes away damping, and neither helps
        // nor harms the frequency (2 % on these draws; the runs hold no whole number of periods)
        assertTrue(frequency[1] <= 1.02 * frequency[0], frequency[1] + " against " + frequency[0]);
        assertTrue(multiplier[1] < multiplier[0] / 3, multiplier[1] + " against " + multiplier[0]);
    }

    @Test
    void aStableFitDoesNotGrowWhereNoiseMakesTheFreeOneGrow() {
        Random random = new Random(5);
        int grown = 0;
        for (int draw = 0; draw < 40; draw++) {
            Run run = Motions.run("a", Motions.grid(60, STEP), t -> new double[] {Math.exp(-0.005 * t) * Math.cos(2 * t)}, 0.1, random);
            Snapshots snapshots = Motions.snapshots(STEP, 8, List.of(run), List.of());
            for (NoiseCorrection correction : List.of(NoiseCorrection.NONE, NoiseCorrection.TOTAL_LEAST_SQUARES)) {
                LinearEstimator plain = new LinearEstimator(correction);
                double before = largestMultiplier(plain, snapshots);
                double after = largestMultiplier(new StructuredEstimator(plain, Structure.STABLE), snapshots);
                grown += before > 1 + 1e-9 ? 1 : 0;
                assertTrue(after <= 1 + 1e-7, correction + ": " + after);
            }
        }
        assertTrue(grown > 20, "the case arises: " + grown);
    }

    private static double largestMultiplier(Estimator estimator, Snapshots snapshots) {
        return LinearAlgebra.installed().eigen(Motions.fit(snapshots, estimator, 4).chosen().action()).values().stream()
                .mapToDouble(Complex::abs).max().orElseThrow();
    }

    @Test
    void aGeneratorMadeStableHasNoGrowingRate() {
        List<Run> runs = Motions.spread((start, t) -> start * Math.exp(0.4 * t), 10, -1, 1, 20, 1, 0, 3);
        Snapshots snapshots = Motions.snapshots(1.0 / 19, 1, runs, List.of());
        OccupationEstimator plain = new OccupationEstimator(Motions.kernel("exponential", "rate", 1), SegmentPlan.WHOLE_RUNS, 1);
        FittedOperator operator = Motions.fit(snapshots, new StructuredEstimator(plain, Structure.STABLE), 4);
        assertTrue(LinearAlgebra.installed().eigen(operator.chosen().action()).values().stream().allMatch(value -> value.re() < 1e-7));
        assertTrue(operator.doubts().stream().anyMatch(doubt -> doubt.code().equals("structure-strained")), "the motion grows");
    }

    @Test
    void whatIsImposedIsNoEvidence() {
        for (Structure structure : List.of(Structure.UNITARY, Structure.SELF_ADJOINT)) {
            Verdict verdict = Motions.judge(Motions.fit(tone(), new StructuredEstimator(new LinearEstimator(), structure), 2), JudgeSettings.DEFAULT);
            for (String check : List.of("symmetry-defect", "normality-defect", "unitarity-defect")) {
                String sentence = verdict.findings().stream().filter(f -> f.check().equals(check)).map(Finding::sentence).findFirst().orElseThrow();
                assertTrue(sentence.contains("The fit was made " + structure.words() + ", so this is no evidence"), sentence);
            }
            assertTrue(verdict.modes().stream().noneMatch(mode -> mode.counts() && mode.grade() == Grade.STANDS));
        }
        assertEquals(Grade.SETTLES, Motions.judge(Motions.fit(tone(), new StructuredEstimator(new LinearEstimator(), Structure.UNITARY), 2),
                JudgeSettings.DEFAULT.withLadder(2, 5)).overall().grade());
        // without the structure the same mode stands; stability says nothing of overlap
        Verdict free = Motions.judge(Motions.fit(tone(), new LinearEstimator(), 2), JudgeSettings.DEFAULT);
        assertEquals(Grade.STANDS, free.overall().grade(), free.overall().sentence());
        assertEquals(Grade.STANDS, Motions.judge(Motions.fit(tone(), new StructuredEstimator(new LinearEstimator(), Structure.STABLE), 2),
                JudgeSettings.DEFAULT).overall().grade());
    }

    /** A steady tone in twelve delays with a little noise, two runs held out. */
    private static Snapshots tone() {
        Random random = new Random(1);
        List<Run> runs = new ArrayList<>();
        for (int k = 0; k < 5; k++) {
            double phase = k;
            runs.add(Motions.run("r" + k, Motions.grid(200, STEP), t -> new double[] {Math.cos(2 * t + phase)}, 0.01, random));
        }
        return Motions.snapshots(STEP, 12, runs.subList(0, 3), runs.subList(3, 5));
    }

    @Test
    void structuresThatAnOperatorCannotHaveAreRefused() {
        Snapshots snapshots = rotation(0, new Random(1));
        assertEquals("a step map to be made skew-adjoint", refused(new LinearEstimator(), Structure.SKEW, 0).seen());
        OccupationEstimator generator = new OccupationEstimator(Motions.kernel("linear"), new SegmentPlan(20, 0), 1);
        assertEquals("a generator to be made unitary", refused(generator, Structure.UNITARY, 0).seen());
        assertEquals("a scaled generator to be made skew-adjoint", refused(new OccupationEstimator(Motions.kernel("linear"),
                new SegmentPlan(20, 0), 0.9), Structure.SKEW, 0).seen());
        assertEquals("a noise correction beside an operator made unitary", refused(new LinearEstimator(NoiseCorrection.TOTAL_LEAST_SQUARES),
                Structure.UNITARY, 0).seen());
        assertEquals("a ridge of 0.1 beside an operator made stable", refused(new LinearEstimator(), Structure.STABLE, 0.1).seen());
        assertEquals(2, snapshots.stateSize());
    }

    private static FitFault refused(Estimator estimator, Structure structure, double ridge) {
        return assertThrows(FitFault.class, () -> OperatorFitter.fit(rotation(0, new Random(1)), new StructuredEstimator(estimator, structure),
                new RankRule.Fixed(2), ridge, Progress.NONE));
    }

    @Test
    void structureAndInputsGoTogether() {
        Snapshots snapshots = Driven.snapshots(1, List.of(Driven.run("a", 200, 1, 0, Driven.random(3), false)), List.of());
        FittedOperator operator = Motions.fit(snapshots, new StructuredEstimator(new LinearEstimator(), Structure.STABLE), 2);
        Mode mode = Motions.nearest(Motions.spectrum(snapshots, new StructuredEstimator(new LinearEstimator(), Structure.STABLE), 2),
                Driven.GROWTH, Driven.ANGULAR);
        assertEquals(Driven.GROWTH, mode.rate().re(), 1e-8, "the free motion is stable already");
        assertTrue(operator.chosen().inputs().isPresent());
        assertEquals("linear least squares in delay coordinates, made stable, inputs separated, held from sample to sample", operator.method());
    }

    @Test
    void theOtherStepHasTheStructureToo() {
        Estimator twice = new StructuredEstimator(new LinearEstimator(), Structure.UNITARY).otherStep(rotation(0, new Random(1))).orElseThrow();
        assertEquals(new StructuredEstimator(new LinearEstimator(2, NoiseCorrection.NONE, InputUse.HELD), Structure.UNITARY), twice);
    }
}
