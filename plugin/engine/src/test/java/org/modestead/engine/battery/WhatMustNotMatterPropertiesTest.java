package org.modestead.engine.battery;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.Set;
import java.util.TreeMap;
import java.util.function.UnaryOperator;
import java.util.stream.IntStream;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.Assume;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.LongRange;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Detrend;
import org.modestead.engine.recording.Recording;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Scaling;
import org.modestead.engine.recording.SnapshotBuilder;
import org.modestead.engine.recording.SnapshotPlan;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.Split;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.wellposed.Grade;

/**
 * Rates and verdicts on the systems of the battery, without noise and with 1 %, when nothing but the description of the
 * recording changes. How far each change leaves a fit alone follows from what the functions are:
 *
 * <ul>
 * <li>order of runs, unit of time, unit of every channel where each is divided by its spread: everything
 * <li>rotation and reflection of the channels: linear delays, monomials of total degree, and every kernel of x·y or
 * ‖x - y‖ — their Gram matrices do not change, or turn
 * <li>one common unit: delays; kernels whose scale is changed along
 * <li>any invertible mixing: delays and monomials where the rank takes in all that the data hold, since then the span
 * is the same: rates, and without noise whether a mode may be reported. What depends on lengths in the space of channels does change:
 * a kernel's norm, the leading directions at a smaller rank, on which the ladder stands where noise keeps the span from
 * being closed, the share of a mode in the signal, and the gap between its weights that tells stands from settles
 * </ul>
 *
 * Where several functions share a rate, rounding picks the mixtures that are called modes; those are compared by their
 * rates alone.
 */
class WhatMustNotMatterPropertiesTest {

    private static final String SEED = "20261201";
    private static final int RUNS = 12;
    private static final int TRAINED = 9;
    /** Of the mixing of channels: the largest factor between directions. */
    private static final double CONDITION = 3;
    private static final Set<Grade> REPORTABLE = Set.of(Grade.STANDS, Grade.SETTLES);

    /** Nobody but the battery looks at the reporting part. */
    private static final List<Case> CASES = Battery.calibrating();

    @Provide
    Arbitrary<Case> any() {
        return Arbitraries.of(CASES);
    }

    @Provide
    Arbitrary<Case> turnable() {
        return Arbitraries.of(CASES.stream().filter(known -> !isFourier(known)).toList());
    }

    @Provide
    Arbitrary<Case> ofKernelsAndDelays() {
        return Arbitraries.of(CASES.stream().filter(known -> !known.look().estimator().id().equals("dictionary")).toList());
    }

    @Provide
    Arbitrary<Case> ofDelaysAndMonomials() {
        return Arbitraries.of(CASES.stream().filter(known -> known.look().estimator().kernel().isEmpty() && !isFourier(known))
                .toList());
    }

    @Provide
    Arbitrary<Double> noise() {
        return Arbitraries.of(0.0, 0.01);
    }

    private static boolean isFourier(Case known) {
        return known.look().name().startsWith("fourier");
    }

    private static Judged judged(Case known, List<Run> runs, double step, Estimator estimator) {
        return Judged.of(Motions.snapshots(step, known.look().depth(), runs.subList(0, TRAINED), runs.subList(TRAINED, RUNS)),
                estimator, known.look().rank());
    }

    private static void assertSame(Case known, double noise, long seed, double timeUnit, UnaryOperator<List<Run>> change,
            UnaryOperator<Estimator> estimator) {
        List<Run> runs = known.system().runs(RUNS, noise, seed);
        double step = known.system().step();
        Judged before = judged(known, runs, step, known.look().estimator());
        Judged after = judged(known, change.apply(runs), step * timeUnit, estimator.apply(known.look().estimator()));
        assertEquals(List.of(), before.differences(after, timeUnit), () -> known.id() + ", noise " + noise + ", seed " + seed);
    }

    @Property(tries = 8, seed = SEED)
    void orderOfRuns(@ForAll("any") Case known, @ForAll("noise") double noise, @ForAll @LongRange(min = 1, max = 1000) long seed) {
        assertSame(known, noise, seed, 1, runs -> {
            List<Run> training = new ArrayList<>(runs.subList(0, TRAINED));
            List<Run> holdout = new ArrayList<>(runs.subList(TRAINED, RUNS));
            Collections.shuffle(training, new Random(seed));
            Collections.reverse(holdout);
            training.addAll(holdout);
            return training;
        }, UnaryOperator.identity());
    }

    @Property(tries = 8, seed = SEED)
    void unitOfTime(@ForAll("any") Case known, @ForAll("noise") double noise, @ForAll @LongRange(min = 1, max = 1000) long seed,
            @ForAll @DoubleRange(min = -4, max = 4) double magnitude) {
        double unit = Math.pow(10, magnitude);
        assertSame(known, noise, seed, unit, runs -> runs.stream().map(run -> new Run(run.id(),
                Arrays.stream(run.times()).map(t -> t * unit).toArray(), run.values())).toList(), UnaryOperator.identity());
    }

    @Property(tries = 8, seed = SEED)
    void orderAndSignOfChannels(@ForAll("turnable") Case known, @ForAll("noise") double noise,
            @ForAll @LongRange(min = 1, max = 1000) long seed) {
        assertSame(known, noise, seed, 1, runs -> {
            int n = runs.get(0).values().numCols;
            Random random = new Random(seed);
            List<Integer> order = new ArrayList<>(IntStream.range(0, n).boxed().toList());
            Collections.shuffle(order, random);
            DMatrixRMaj mixing = new DMatrixRMaj(n, n);
            order.forEach(k -> mixing.set(k, order.get(k), random.nextBoolean() ? 1 : -1));
            return mixed(runs, mixing);
        }, UnaryOperator.identity());
    }

    @Property(tries = 8, seed = SEED)
    void rotationOfChannels(@ForAll("turnable") Case known, @ForAll("noise") double noise,
            @ForAll @LongRange(min = 1, max = 1000) long seed) {
        assertSame(known, noise, seed, 1, runs -> mixed(runs, mixing(runs, 1, seed)), UnaryOperator.identity());
    }

    @Property(tries = 8, seed = SEED)
    void commonUnitOfChannelsWithTheScaleOfTheKernelAlong(@ForAll("ofKernelsAndDelays") Case known,
            @ForAll("noise") double noise, @ForAll @LongRange(min = 1, max = 1000) long seed,
            @ForAll @DoubleRange(min = -3, max = 3) double magnitude) {
        double unit = Math.pow(10, magnitude);
        assertSame(known, noise, seed, 1, runs -> {
            DMatrixRMaj scaling = CommonOps_DDRM.identity(runs.get(0).values().numCols);
            CommonOps_DDRM.scale(unit, scaling);
            return mixed(runs, scaling);
        }, estimator -> inUnit(estimator, unit));
    }

    /** The estimator whose kernel has the same values on states that are larger by a factor, up to a factor of its own. */
    private static Estimator inUnit(Estimator estimator, double unit) {
        if (estimator instanceof KernelStepEstimator step) {
            return new KernelStepEstimator(inUnit(step.space(), unit), step.landmarks(), step.stride());
        }
        return estimator instanceof OccupationEstimator generator
                ? new OccupationEstimator(inUnit(generator.space(), unit), generator.plan(), generator.contraction()) : estimator;
    }

    private static Kernel inUnit(Kernel kernel, double unit) {
        Map<String, Double> parameters = new TreeMap<>(kernel.spec().parameters());
        parameters.computeIfPresent("scale", (name, value) -> value * unit);
        parameters.computeIfPresent("rate", (name, value) -> value / (unit * unit));
        parameters.computeIfPresent("offset", (name, value) -> value * unit * unit);
        return KernelFamilies.create(new KernelSpec(kernel.spec().family(), parameters));
    }

    @Property(tries = 8, seed = SEED)
    void unitsOfChannelsThatAreDividedByTheirSpread(@ForAll("turnable") Case known, @ForAll("noise") double noise,
            @ForAll @LongRange(min = 1, max = 1000) long seed) {
        List<Run> runs = known.system().runs(RUNS, noise, seed);
        int n = runs.get(0).values().numCols;
        Random random = new Random(seed);
        DMatrixRMaj units = CommonOps_DDRM.diag(random.doubles(n, -4, 4).map(m -> Math.pow(10, m)).toArray());
        Judged before = Judged.of(standardised(known, runs), known.look().estimator(), known.look().rank());
        Judged after = Judged.of(standardised(known, mixed(runs, units)), known.look().estimator(), known.look().rank());
        assertEquals(List.of(), before.differences(after, 1), () -> known.id() + ", noise " + noise + ", seed " + seed);
    }

    private static Snapshots standardised(Case known, List<Run> runs) {
        List<Channel> channels = IntStream.range(0, runs.get(0).values().numCols).mapToObj(k -> new Channel("c" + k, "")).toList();
        SnapshotPlan plan = SnapshotPlan.DEFAULT.withUniformStep(known.system().step()).withDelay(known.look().depth(), 1)
                .withPreparation(Detrend.NONE, Scaling.STD)
                .withHoldout(new Split.Runs(runs.subList(TRAINED, RUNS).stream().map(Run::id).toList()));
        return SnapshotBuilder.build(new Recording(channels, List.of(), runs, new TimeAxis(TimeAxis.Kind.NUMBER, "s")), plan,
                Progress.NONE);
    }

    @Property(tries = 8, seed = SEED)
    void anyMixingOfChannelsWhereTheRankTakesInAllTheDataHold(@ForAll("ofDelaysAndMonomials") Case known,
            @ForAll("noise") double noise, @ForAll @LongRange(min = 1, max = 1000) long seed) {
        List<Run> runs = known.system().runs(RUNS, noise, seed);
        double step = known.system().step();
        Judged before = judged(known, runs, step, known.look().estimator());
        Assume.that(before.fit().map(fit -> fit.operator().rank() == fit.operator().compression().rank()).orElse(false));
        Judged after = judged(known, mixed(runs, mixing(runs, CONDITION, seed)), step, known.look().estimator());
        Set<Grade> alike = noise == 0 ? REPORTABLE : Set.of(Grade.values());
        assertEquals(List.of(), before.modeDifferences(after, 1, alike),
                () -> known.id() + ", noise " + noise + ", seed " + seed);
    }

    private static List<Run> mixed(List<Run> runs, DMatrixRMaj mixing) {
        return runs.stream().map(run -> new Run(run.id(), run.times(), Matrices.productTranspose(run.values(), mixing))).toList();
    }

    /** A random matrix with singular values from 1/√condition to √condition. */
    private static DMatrixRMaj mixing(List<Run> runs, double condition, long seed) {
        int n = runs.get(0).values().numCols;
        Random random = new Random(seed);
        DMatrixRMaj any = new DMatrixRMaj(n, n, true, IntStream.range(0, n * n).mapToDouble(k -> random.nextGaussian()).toArray());
        LinearAlgebra.Svd svd = LinearAlgebra.installed().svd(any);
        DMatrixRMaj left = svd.u().copy();
        CommonOps_DDRM.multCols(left, IntStream.range(0, n)
                .mapToDouble(k -> n == 1 ? 1 : Math.pow(condition, (double) k / (n - 1) - 0.5)).toArray());
        return Matrices.productTranspose(left, svd.v());
    }
}
