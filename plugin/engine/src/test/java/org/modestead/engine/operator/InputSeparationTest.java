package org.modestead.engine.operator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.stream.DoubleStream;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.RandomMatrices_DDRM;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.fixtures.Driven;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Finding;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.JudgeSettings;
import org.modestead.engine.wellposed.Verdict;

class InputSeparationTest {

    private static final Map<String, Driven.Force> FORCES = Map.of("step", Driven.step(), "sine", Driven.sine(), "random", Driven.random(3));
    private static final LinearEstimator LEFT_IN = new LinearEstimator(1, NoiseCorrection.NONE, InputUse.LEFT_IN);
    private static final LinearEstimator STRAIGHT = new LinearEstimator(1, NoiseCorrection.NONE, InputUse.STRAIGHT);

    private static List<Run> runs(Driven.Force force, boolean straight) {
        return List.of(Driven.run("a", 200, 1, 0, force, straight), Driven.run("b", 150, -0.5, 1, force, straight));
    }

    private static void assertFreeRates(Spectrum spectrum, String what) {
        Mode mode = Motions.nearest(spectrum, Driven.GROWTH, Driven.ANGULAR);
        // rounding of the samples over the step, times the condition of the delays
        assertEquals(Driven.GROWTH, mode.rate().re(), 1e-8, what);
        assertEquals(Driven.ANGULAR, mode.rate().im(), 1e-8, what);
    }

    @Test
    void freeRatesAreFoundUnderEveryHeldForce() {
        FORCES.forEach((name, force) -> {
            Snapshots snapshots = Driven.snapshots(1, runs(force, false), List.of());
            assertFreeRates(Motions.spectrum(snapshots, new LinearEstimator(), 2), name);
        });
    }

    @Test
    void freeRatesAreFoundInDelaysOfOneChannelAndTheForceAddsNoRank() {
        FORCES.forEach((name, force) -> {
            List<Run> runs = runs(force, false).stream().map(Driven::position).toList();
            for (int depth : new int[] {2, 5, 12}) {
                Snapshots snapshots = Driven.snapshots(depth, runs, List.of());
                OrthonormalCompression white = new LinearEstimator().compress(snapshots, Progress.NONE).whiten(depth);
                assertEquals(2, white.rank(), name + " in " + depth + " delays: the motion has two free directions");
                assertFreeRates(Motions.spectrum(snapshots, new LinearEstimator(), 2), name + " in " + depth + " delays");
            }
        });
    }

    @Test
    void aForceThatRunsStraightNeedsBothEndsOfTheStep() {
        Snapshots snapshots = Driven.snapshots(1, runs(Driven.random(5), true), List.of());
        assertFreeRates(Motions.spectrum(snapshots, STRAIGHT, 2), "straight");
        Mode held = Motions.nearest(Motions.spectrum(snapshots, new LinearEstimator(), 2), Driven.GROWTH, Driven.ANGULAR);
        assertTrue(Math.abs(held.rate().re() - Driven.GROWTH) > 1e-4, "taken as held it is off: " + held.rate());
    }

    @Test
    void anAnalogueSineIsToldByTwoSamplesOfIt() {
        // closed form: the response to e^(iνt) is e^(iνt) / (ω² - ν² + 2iζων), beside the free motion
        Driven.Force force = Driven.sine();
        double re = 4 - Driven.INPUT_ANGULAR * Driven.INPUT_ANGULAR;
        double im = 0.2 * Driven.INPUT_ANGULAR;
        double size = 1.5 / Math.hypot(re, im);
        double lag = Math.atan2(im, re);
        Run plain = Motions.run("a", 200, Driven.STEP, t -> new double[] {size * Math.sin(Driven.INPUT_ANGULAR * t + 0.4 - lag)
                + Math.exp(Driven.GROWTH * t) * Math.cos(Driven.ANGULAR * t)});
        DMatrixRMaj inputs = new DMatrixRMaj(200, 1);
        for (int k = 0; k < 200; k++) {
            inputs.set(k, 0, force.at(plain.times()[k]));
        }
        Run run = new Run("a", plain.times(), plain.values(), inputs, 0);
        Snapshots snapshots = Driven.snapshots(4, List.of(run), List.of());
        assertFreeRates(Motions.spectrum(snapshots, new LinearEstimator(), 2), "held, in delays");
        assertFreeRates(Motions.spectrum(snapshots, STRAIGHT, 2), "straight, in delays");
    }

    @Test
    void theFrequencyOfTheInputIsAModeOnlyWhereInputsAreLeftIn() {
        List<Run> runs = runs(Driven.sine(), false).stream().map(Driven::position).toList();
        Snapshots snapshots = Driven.snapshots(4, runs, List.of());
        Mode forced = Motions.nearest(Motions.spectrum(snapshots, LEFT_IN, 4), 0, Driven.INPUT_ANGULAR);
        assertEquals(Driven.INPUT_ANGULAR, forced.rate().im(), 1e-6);
        assertTrue(forced.energyShare() > 0.1, "it carries much of the signal: " + forced.energyShare());
        Spectrum separated = Motions.spectrum(snapshots, new LinearEstimator(), 2);
        assertEquals(1, separated.modes().size());
        assertEquals(1, separated.modes().get(0).energyShare(), 1e-12);
    }

    @Test
    void leftInAForceSpoilsTheFreeRates() {
        Snapshots snapshots = Driven.snapshots(1, runs(Driven.random(3), false), List.of());
        Mode mode = Motions.spectrum(snapshots, LEFT_IN, 2).modes().get(0);
        assertTrue(Math.abs(mode.rate().re() - Driven.GROWTH) > 1e-3, "damping is off: " + mode.rate());
    }

    @Test
    void anOffsetOfForceOrRestingPointDoesNotMatter() {
        List<Run> shifted = runs(Driven.random(3), false).stream().map(run -> {
            DMatrixRMaj values = run.values().copy();
            DMatrixRMaj inputs = run.inputs().copy();
            for (int k = 0; k < run.samples(); k++) {
                values.add(k, 0, 20);
                inputs.add(k, 0, 100);
            }
            return new Run(run.id(), run.times(), values, inputs, 0);
        }).toList();
        assertFreeRates(Motions.spectrum(Driven.snapshots(1, shifted, List.of()), new LinearEstimator(), 2), "shifted");
    }

    @Test
    void monomialsSeeSumsOfTheFreeRates() {
        Snapshots snapshots = Driven.snapshots(1, runs(Driven.random(3), false), List.of());
        Spectrum spectrum = Motions.spectrum(snapshots, new DictionaryEstimator(Dictionary.monomials(2)), 5);
        assertFreeRates(spectrum, "monomials");
        Mode twice = Motions.nearest(spectrum, 2 * Driven.GROWTH, 2 * Driven.ANGULAR);
        assertEquals(2 * Driven.ANGULAR, twice.rate().im(), 1e-7);
        assertEquals(2 * Driven.GROWTH, twice.rate().re(), 1e-7);
        Mode square = Motions.nearest(spectrum, 2 * Driven.GROWTH, 0);
        assertEquals(2 * Driven.GROWTH, square.rate().re(), 1e-7);
    }

    @Property(tries = 40, seed = "20261201")
    void projectingInputsOutIsTheJointRegression(@ForAll long seed, @ForAll @IntRange(min = 1, max = 4) int n,
            @ForAll @IntRange(min = 1, max = 3) int q) {
        Random random = new Random(seed);
        int samples = 60;
        DMatrixRMaj values = RandomMatrices_DDRM.rectangle(samples, n, -1, 1, random);
        DMatrixRMaj inputs = RandomMatrices_DDRM.rectangle(samples, q, -1, 1, random);
        List<Channel> channels = new ArrayList<>();
        List<Channel> known = new ArrayList<>();
        for (int k = 0; k < n; k++) {
            channels.add(new Channel("c" + k, ""));
        }
        for (int k = 0; k < q; k++) {
            known.add(new Channel("u" + k, ""));
        }
        Snapshots snapshots = new Snapshots(channels, known, new TimeAxis(TimeAxis.Kind.NUMBER, ""),
                List.of(new Run("a", Motions.grid(samples, 1), values, inputs, 0)), List.of(), List.of(),
                java.util.OptionalDouble.of(1), DelayEmbedding.NONE, Preparation.identity(n), List.of(), List.of());
        OrthonormalCompression white = new LinearEstimator().compress(snapshots, Progress.NONE).whiten(n);
        DMatrixRMaj map = Matrices.block(white.map(), 0, n, 0, n);
        DMatrixRMaj inverse = map.copy();
        CommonOps_DDRM.invert(inverse);
        DMatrixRMaj found = Matrices.product(map, Matrices.product(white.action(), inverse));
        DMatrixRMaj ones = new DMatrixRMaj(samples - 1, 1);
        CommonOps_DDRM.fill(ones, 1);
        DMatrixRMaj regressors = CommonOps_DDRM.concatColumnsMulti(Matrices.block(values, 0, samples - 1, 0, n),
                Matrices.block(inputs, 0, samples - 1, 0, q), ones);
        DMatrixRMaj joint = new DMatrixRMaj(n + q + 1, n);
        CommonOps_DDRM.solve(regressors, Matrices.block(values, 1, samples, 0, n), joint);
        assertArrayEquals(Matrices.block(joint, 0, n, 0, n).data, found.data, 1e-11);
    }

    @Test
    void totalLeastSquaresTakesInputsAsExact() {
        double[] bias = new double[2];
        Random random = new Random(11);
        int draws = 60;
        List<Run> runs = runs(Driven.random(3), false);
        for (int draw = 0; draw < draws; draw++) {
            List<Run> noisy = runs.stream().map(run -> Driven.noisy(run, 0.1, random)).toList();
            Snapshots snapshots = Driven.snapshots(1, noisy, List.of());
            for (int k = 0; k < 2; k++) {
                NoiseCorrection correction = k == 0 ? NoiseCorrection.NONE : NoiseCorrection.TOTAL_LEAST_SQUARES;
                Mode mode = Motions.nearest(Motions.spectrum(snapshots, new LinearEstimator(correction), 2), Driven.GROWTH, Driven.ANGULAR);
                bias[k] += (mode.rate().re() - Driven.GROWTH) / draws;
            }
        }
        assertTrue(bias[0] < -0.05, "least squares reports more damping: " + bias[0]);
        assertTrue(Math.abs(bias[1]) < Math.abs(bias[0]) / 3, bias[1] + " against " + bias[0]);
    }

    @Test
    void heldOutRunsUnderAnotherForceFollowTheFreeRuleAndTheModeStands() {
        List<Run> training = new ArrayList<>();
        for (int k = 0; k < 6; k++) {
            training.add(Driven.position(Driven.run("r" + k, 120, Math.cos(k), Math.sin(k), Driven.random(k), false)));
        }
        List<Run> holdout = List.of(Driven.position(Driven.run("h", 150, 0.5, 1, Driven.random(99), false)));
        Snapshots snapshots = Driven.snapshots(4, training, holdout);
        FittedOperator operator = Motions.fit(snapshots, new LinearEstimator(), 2);
        Verdict verdict = Motions.judge(operator, JudgeSettings.DEFAULT);
        Finding residual = finding(verdict, "holdout-residual", 1);
        assertTrue(residual.value() < 1e-8, residual.sentence());
        assertTrue(finding(verdict, "step-consistency", 1).value() < 1e-6, "twice the step, twice the inputs");
        assertTrue(finding(verdict, "captured-share", 0).value() > 1 - 1e-9, finding(verdict, "captured-share", 0).sentence());
        assertTrue(verdict.overall().grade() == Grade.STANDS || verdict.overall().grade() == Grade.SETTLES, verdict.overall().sentence());
        // left in, the residual of the same mode is that of a motion pushed about
        Verdict left = Motions.judge(Motions.fit(snapshots, LEFT_IN, 2), JudgeSettings.DEFAULT);
        assertTrue(finding(left, "holdout-residual", 1).value() > 0.05, finding(left, "holdout-residual", 1).sentence());
    }

    private static Finding finding(Verdict verdict, String check, int mode) {
        return verdict.findings().stream().filter(f -> f.check().equals(check) && f.mode() == mode).findFirst().orElseThrow();
    }

    @Test
    void inputsThatExplainTheStateAltogetherAreRefusedOrDoubted() {
        Run still = Driven.run("a", 80, 0, 0, t -> 0, false);
        DMatrixRMaj followed = new DMatrixRMaj(80, 2);
        DMatrixRMaj inputs = new DMatrixRMaj(80, 1);
        Random random = new Random(4);
        for (int k = 0; k < 80; k++) {
            inputs.set(k, 0, random.nextGaussian());
            followed.set(k, 0, 2 * inputs.get(k, 0));
            followed.set(k, 1, -inputs.get(k, 0));
        }
        Snapshots tied = Driven.snapshots(1, List.of(new Run("a", still.times(), followed, inputs, 0)), List.of());
        assertEquals("they explain all that the states do", assertThrows(FitFault.class, () -> Motions.fit(tied,
                new LinearEstimator(), 1)).seen());
        for (int i = 0; i < followed.getNumElements(); i++) {
            followed.data[i] += 0.01 * random.nextGaussian();
        }
        assertTrue(codes(Motions.fit(tied, new LinearEstimator(), 2)).contains("inputs-explain-states"));
    }

    @Test
    void operatorsThatDoNotSeparateInputsSaySo() {
        Snapshots snapshots = Driven.snapshots(1, runs(Driven.random(3), false), List.of());
        assertTrue(codes(Motions.fit(snapshots, LEFT_IN, 2)).contains("inputs-not-separated"));
        assertTrue(codes(Motions.fit(snapshots, new KernelStepEstimator(Motions.kernel("linear"), 10), 2)).contains("inputs-not-separated"));
        assertFalse(codes(Motions.fit(snapshots, new LinearEstimator(), 2)).contains("inputs-not-separated"));
    }

    private static List<String> codes(FittedOperator operator) {
        return operator.doubts().stream().map(doubt -> doubt.code()).toList();
    }

    @Test
    void moreInputTermsThanPairsAreRefused() {
        Run run = Driven.position(Driven.run("a", 30, 1, 0, Driven.random(1), false));
        FitFault fault = assertThrows(FitFault.class, () -> Motions.fit(Driven.snapshots(16, List.of(run), List.of()), new LinearEstimator(), 2));
        assertEquals("17 input terms on 14 snapshot pairs", fault.seen());
    }

    @Test
    void aDictionaryWithoutInputsOfItsOwnTakesProductsWithThem() {
        // a rotation by 0.3 + u radians a step: the angle's harmonics turn by e^(i(0.3 + u)), to first order 1 + iu
        Random random = new Random(8);
        double[] times = Motions.grid(400, 1);
        DMatrixRMaj values = new DMatrixRMaj(400, 1);
        DMatrixRMaj inputs = new DMatrixRMaj(400, 1);
        double angle = 0.2;
        for (int k = 0; k < 400; k++) {
            values.set(k, 0, angle);
            inputs.set(k, 0, 0.02 * random.nextGaussian());
            angle += 0.3 + inputs.get(k, 0);
        }
        Snapshots snapshots = new Snapshots(List.of(new Channel("angle", "")), List.of(new Channel("push", "")),
                new TimeAxis(TimeAxis.Kind.NUMBER, ""), List.of(new Run("a", times, values, inputs, 0)), List.of(), List.of(),
                java.util.OptionalDouble.of(1), DelayEmbedding.NONE, Preparation.identity(1), List.of(), List.of());
        DictionaryEstimator estimator = new DictionaryEstimator(Dictionary.fourier(1, 2 * Math.PI));
        // free motion is that under the mean input
        double mean = CommonOps_DDRM.elementSum(inputs) / 400;
        Mode mode = Motions.nearest(Motions.spectrum(snapshots, estimator, 2), 0, 0.3);
        // second order in the input: 0.02² / 2
        assertEquals(0.3 + mean, mode.rate().im(), 5e-4);
        assertEquals(0, mode.rate().re(), 5e-4);
    }

    @Test
    void ranksOfTheLadderAreThoseFittedAlone() {
        List<Run> runs = runs(Driven.random(3), false).stream().map(run -> Driven.noisy(run, 0.02, new Random(2))).toList();
        Snapshots snapshots = Driven.snapshots(6, runs, List.of());
        OrthonormalCompression full = new LinearEstimator().compress(snapshots, Progress.NONE).whiten(8);
        OrthonormalCompression alone = new LinearEstimator().compress(snapshots, Progress.NONE).whiten(4);
        assertArrayEquals(alone.action().data, full.leading(4).action().data, 1e-11);
        assertArrayEquals(alone.inputs().orElseThrow().next().data, full.leading(4).inputs().orElseThrow().next().data, 1e-11);
    }

    @Property(tries = 30, seed = "20261201")
    void unitAndZeroOfAnInputDoNotMatter(@ForAll long seed, @ForAll @DoubleRange(min = -4, max = 4) double exponent,
            @ForAll @DoubleRange(min = -100, max = 100) double offset, @ForAll boolean monomials) {
        Random random = new Random(seed);
        List<Run> runs = List.of(Driven.noisy(Driven.run("a", 80, 1, 0, Driven.random(seed), false), 0.05, random),
                Driven.noisy(Driven.run("b", 80, 0, 1, Driven.random(seed + 1), false), 0.05, random));
        List<Run> others = runs.stream().map(run -> {
            DMatrixRMaj inputs = Matrices.scaled(run.inputs(), Math.pow(10, exponent));
            CommonOps_DDRM.add(inputs, offset * Math.pow(10, exponent), inputs);
            return new Run(run.id(), run.times(), run.values(), inputs, 0);
        }).toList();
        Estimator estimator = monomials ? new DictionaryEstimator(Dictionary.monomials(2)) : new LinearEstimator();
        double[] plain = multipliers(estimator, runs);
        double[] other = multipliers(estimator, others);
        // inputs are counted from their mean: rounding of the offset, up to a hundred times the swing
        assertArrayEquals(plain, other, 1e-6);
    }

    private static double[] multipliers(Estimator estimator, List<Run> runs) {
        return LinearAlgebra.installed().eigen(estimator.compress(Driven.snapshots(1, runs, List.of()), Progress.NONE).whiten(2).action())
                .values().stream().flatMapToDouble(value -> DoubleStream.of(value.re(), Math.abs(value.im()))).sorted().toArray();
    }

    @Test
    void aForceIsNotTakenForARateThatChanges() {
        // the free motion has one rate throughout; the force on top of it does not
        FORCES.forEach((name, force) -> {
            Snapshots snapshots = Driven.snapshots(1, runs(force, false), List.of(Driven.run("c", 180, 0.7, 0.4, force, false)));
            Finding steady = Motions.judge(Motions.fit(snapshots, new LinearEstimator(), 2), JudgeSettings.DEFAULT).findings().stream()
                    .filter(f -> f.check().equals("steady-rate")).findFirst().orElseThrow();
            assertEquals(0, steady.value(), 1e-6, name);
        });
    }
}
