package org.modestead.engine.moments;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Recording;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Scaling;
import org.modestead.engine.recording.Snapshots;

/** A fit in one pass gives the figures of the fit in memory. */
class MomentFitTest {

    /** Both ways round on about 5000 pairs: products of a thousand rows at a time round to about 1e-13. */
    private static final double SAME = 1e-10;
    private static final KernelSpec GAUSSIAN = new KernelSpec("gaussian", Map.of("scale", 2.5));
    private static final DelayEmbedding DELAYS = new DelayEmbedding(8, 2);

    static Stream<Arguments> fits() {
        Features linear = new Features.Coordinates(NoiseCorrection.NONE);
        return Stream.of(
                Arguments.of("linear, recorded units", Streams.plan(linear, DelayEmbedding.NONE, false, Scaling.NONE), 3),
                Arguments.of("linear in delays, centred and scaled", Streams.plan(linear, DELAYS, true, Scaling.STD), 24),
                Arguments.of("linear in delays, centred only", Streams.plan(linear, DELAYS, true, Scaling.NONE), 17),
                Arguments.of("linear in delays, two steps", Streams.plan(linear, DELAYS, true, Scaling.UNIT_GROUP, 2), 11),
                Arguments.of("total least squares", Streams.plan(new Features.Coordinates(NoiseCorrection.TOTAL_LEAST_SQUARES), DELAYS, true,
                        Scaling.STD), 9),
                Arguments.of("forward and backward", Streams.plan(new Features.Coordinates(NoiseCorrection.FORWARD_BACKWARD), DELAYS, true,
                        Scaling.STD), 9),
                Arguments.of("monomials", Streams.plan(new Features.Monomials(3), DelayEmbedding.NONE, true, Scaling.STD), 20),
                Arguments.of("monomials of delays", Streams.plan(new Features.Monomials(2), new DelayEmbedding(2, 3), true, Scaling.STD), 12),
                Arguments.of("random waves", Streams.plan(new Features.RandomFourier(GAUSSIAN, 20, 4), new DelayEmbedding(2, 3), true,
                        Scaling.STD), 20),
                Arguments.of("landmarks", Streams.plan(new Features.Landmarks(GAUSSIAN, 25), new DelayEmbedding(2, 3), true, Scaling.STD), 15));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("fits")
    void sameFiguresAsInMemory(String name, StreamPlan plan, int rank) {
        Recording recording = Streams.recording();
        Snapshots snapshots = Streams.inMemory(plan, recording);
        FittedOperator there = OperatorFitter.fit(snapshots, plan.features().estimator(plan.stride()), new RankRule.Fixed(rank), 0, Progress.NONE);
        FittedOperator here = MomentFit.fit(Streams.moments(plan, recording), new RankRule.Fixed(rank), 0, Progress.NONE);
        requireSame(there, here);
        for (int c = 0; c < 3; c++) {
            assertEquals(snapshots.preparation().offset()[c], here.snapshots().preparation().offset()[c], SAME);
            assertEquals(1, here.snapshots().preparation().scale()[c] / snapshots.preparation().scale()[c], SAME);
        }
        assertEquals(snapshots.states(Snapshots.Part.HOLDOUT).get(0).count(), here.snapshots().states(Snapshots.Part.HOLDOUT).get(0).count());
    }

    /** Functions have a sign, and equal singular values a rotation, that are nobody's business: what is compared does not depend on them. */
    static void requireSame(FittedOperator there, FittedOperator here) {
        assertEquals(there.compression().snapshots(), here.compression().snapshots(), "pairs");
        for (int j = 0; j < there.rank(); j++) {
            assertEquals(1, here.compression().singular()[j] / there.compression().singular()[j], SAME, "singular value " + j);
        }
        OrthonormalCompression a = there.chosen();
        OrthonormalCompression b = here.chosen();
        requireNear("next state from functions", Matrices.product(a.map(), Matrices.product(a.action(), a.observable())),
                Matrices.product(b.map(), Matrices.product(b.action(), b.observable())));
        requireNear("action on functions", Matrices.product(a.map(), Matrices.productTranspose(a.action(), a.map())),
                Matrices.product(b.map(), Matrices.productTranspose(b.action(), b.map())));
        requireNear("second moment", Matrices.product(a.map(), Matrices.productTranspose(a.second(), a.map())),
                Matrices.product(b.map(), Matrices.productTranspose(b.second(), b.map())));
        assertEquals(there.evolution().aliasingLimit(), here.evolution().aliasingLimit(), SAME * there.evolution().aliasingLimit());
    }

    private static void requireNear(String what, DMatrixRMaj expected, DMatrixRMaj found) {
        DMatrixRMaj difference = found.copy();
        CommonOps_DDRM.subtractEquals(difference, expected);
        double relative = NormOps_DDRM.normF(difference) / NormOps_DDRM.normF(expected);
        assertTrue(relative < SAME, what + " differs by " + relative);
    }

    @Test
    void theOrderOfMergingDoesNotMatterToTheLastDigit() {
        StreamPlan plan = Streams.plan(new Features.Coordinates(NoiseCorrection.NONE), DELAYS, true, Scaling.STD);
        Recording recording = Streams.recording();
        Pilot pilot = Streams.pilot(plan, recording);
        List<Moments> parts = recording.runs().stream().map(run -> {
            StreamPass pass = StreamPass.summing(plan, pilot);
            Streams.feed(pass, run, 0, run.samples(), 0);
            return pass.finish();
        }).toList();
        Moments forward = parts.stream().reduce(Moments::plus).orElseThrow();
        Moments other = parts.get(4).plus(parts.get(1)).plus(parts.get(3).plus(parts.get(0)).plus(parts.get(2)));
        Moments whole = Streams.moments(plan, recording);
        // one block after another was added to the same sums: rounding is told to k² u², far below half a unit in the last place
        assertArraysEqual(forward.pairs().gram().value().data, other.pairs().gram().value().data);
        assertArraysEqual(whole.pairs().action().value().data, other.pairs().action().value().data);
        assertEquals(whole.counts(), other.counts());
        assertEquals(names(whole.training()), names(other.training()));
    }

    private static List<String> names(KeptStretches kept) {
        return kept.kept().stream().map(stretch -> stretch.run() + " " + stretch.start() + " " + stretch.samples()).toList();
    }

    private static void assertArraysEqual(double[] expected, double[] found) {
        for (int i = 0; i < expected.length; i++) {
            assertEquals(expected[i], found[i], Math.ulp(expected[i]));
        }
    }

    /** Slices of a run that borrow rows from their neighbours, as several machines read them, miss no pair and count none twice. */
    @Test
    void slicesOfARunMergeToTheRun() {
        StreamPlan plan = Streams.plan(new Features.Coordinates(NoiseCorrection.NONE), DELAYS, true, Scaling.STD, 2);
        Recording recording = Streams.recording();
        Pilot pilot = Streams.pilot(plan, recording);
        Moments sliced = recording.runs().stream().flatMap(run -> slices(plan, pilot, run)).reduce(Moments::plus).orElseThrow();
        Moments whole = Streams.moments(plan, recording);
        assertEquals(whole.counts(), sliced.counts());
        assertEquals(whole.pairs().pairs(), sliced.pairs().pairs());
        requireSame(MomentFit.fit(whole, new RankRule.Fixed(10), 0, Progress.NONE), MomentFit.fit(sliced, new RankRule.Fixed(10), 0, Progress.NONE));
    }

    /** 300 rows a slice: less than a block, and the gap and missing cells stand near borders. */
    private static Stream<Moments> slices(StreamPlan plan, Pilot pilot, Run run) {
        return java.util.stream.IntStream.iterate(0, from -> from < run.samples(), from -> from + 300).mapToObj(from -> {
            StreamPass pass = StreamPass.summing(plan, pilot);
            Streams.feed(pass, run, from, Math.min(run.samples(), from + 300), (int) plan.sliceReach());
            return pass.finish();
        });
    }
}
