package org.modestead.engine.moments;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.modelfile.FieldsReader;
import org.modestead.engine.modelfile.StoredMoments;
import org.modestead.engine.modelfile.StoredOperator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.GapPolicy;
import org.modestead.engine.recording.MissingPolicy;
import org.modestead.engine.recording.Recording;
import org.modestead.engine.recording.Scaling;
import org.modestead.engine.recording.Snapshots.Part;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

/** What a pass refuses, what it keeps, and what comes back from a file. */
class StreamPassTest {

    private static final Features LINEAR = new Features.Coordinates(NoiseCorrection.NONE);

    private static StreamPlan plan(Apart apart, int stretch, int training, int judging) {
        return new StreamPlan(List.of(new Channel("a", "")), Streams.TIME, OptionalDouble.of(1), 1.5, GapPolicy.SPLIT, MissingPolicy.REFUSE, false,
                Scaling.NONE, DelayEmbedding.NONE, 1, LINEAR, new Keeping(11, apart, stretch, training, judging));
    }

    private static StreamPass survey(Apart apart) {
        StreamPass pass = StreamPass.survey(plan(apart, 50, 200, 100), 1);
        pass.begin("r", 0, true);
        return pass;
    }

    private static void refused(String part, StreamPass pass, double time, double value) {
        Fault fault = assertThrows(RecordingFault.class, () -> pass.row(time, new double[] {value}, true));
        assertTrue(fault.getMessage().contains(part), fault.getMessage());
    }

    @Test
    void refusesWhatCannotBePaired() {
        StreamPass pass = survey(new Apart.None());
        pass.row(0, new double[] {1}, true);
        refused("in order of run and time", pass, 0, 1);
        refused("finite time", pass, Double.NaN, 1);
        refused("even step", pass, 0.5, 1);
        refused("channel a", pass, 1, Double.POSITIVE_INFINITY);
        refused("has no number", pass, 1, Double.NaN);
    }

    /** Shares by hash come out within four standard deviations of a binomial, and whole runs stay together. */
    @Test
    void sharesAreDrawnEvenly() {
        Apart shares = new Apart.Shares(0.2, 0.1, false);
        long held = IntStream.range(0, 4000).filter(i -> shares.of(1, "run", i) == Part.HOLDOUT).count();
        long calibrating = IntStream.range(0, 4000).filter(i -> shares.of(1, "run", i) == Part.CALIBRATION).count();
        assertEquals(800, held, 4 * Math.sqrt(4000 * 0.2 * 0.8));
        assertEquals(400, calibrating, 4 * Math.sqrt(4000 * 0.1 * 0.9));
        Apart whole = new Apart.Shares(0.5, 0, true);
        assertEquals(1, IntStream.range(0, 50).mapToObj(i -> whole.of(1, "run", i)).distinct().count());
    }

    /** However stretches are dealt to passes and in whatever order the passes merge, the same ones stay, and never more than asked for. */
    @Test
    void whatIsKeptDoesNotDependOnOrder() {
        Random random = new Random(4);
        List<KeptStretch> offered = new ArrayList<>();
        for (int i = 0; i < 300; i++) {
            int samples = 2 + random.nextInt(30);
            long draw = SeededDraw.of(7, "r", i / 2);
            offered.add(new KeptStretch(draw, Part.TRAINING, "r", IntStream.range(0, samples).mapToDouble(k -> 100.0 * k).map(t -> t + 1).toArray(),
                    new DMatrixRMaj(samples, 1)));
        }
        List<Long> expected = kept(offered, 1, random);
        for (int trial = 0; trial < 50; trial++) {
            Collections.shuffle(offered, random);
            assertEquals(expected, kept(offered, 1 + random.nextInt(9), random));
        }
    }

    private static List<Long> kept(List<KeptStretch> offered, int passes, Random random) {
        List<KeptStretches> parts = new ArrayList<>(Collections.nCopies(passes, KeptStretches.none(Part.TRAINING, 400)));
        offered.forEach(stretch -> {
            int pass = random.nextInt(passes);
            KeptStretches before = parts.get(pass);
            parts.set(pass, before.wants(stretch.draw()) ? before.with(stretch) : before.passed(stretch.samples()));
        });
        Collections.shuffle(parts, random);
        KeptStretches all = parts.stream().reduce(KeptStretches::plus).orElseThrow();
        int samples = all.kept().stream().mapToInt(KeptStretch::samples).sum();
        assertTrue(samples <= 400 && samples > 300, "kept " + samples);
        assertEquals(offered.stream().mapToLong(KeptStretch::samples).sum(), all.samples());
        return all.kept().stream().map(KeptStretch::draw).toList();
    }

    /** Held-out stretches of one long run: nothing of them is summed up, no pair spans a border, and both sides are kept for later steps. */
    @Test
    void heldOutStretchesOfALongRunStayOut() {
        StreamPlan plan = plan(new Apart.Shares(0.3, 0.1, false), 50, 200, 100);
        StreamPass first = StreamPass.survey(plan, 1);
        first.begin("r", 0, true);
        IntStream.range(0, 400).forEach(k -> first.row(k, new double[] {Math.sin(0.3 * k)}, true));
        StreamPass pass = StreamPass.summing(plan, Pilot.of(plan, first.finish(), Progress.NONE));
        pass.begin("r", 0, true);
        // held-out samples are huge: one pair with them would show
        IntStream.range(0, 5000).forEach(k -> pass.row(k, new double[] {Math.sin(0.3 * k)
                * (plan.keeping().apart().of(11, "r", k / 50) == Part.TRAINING ? 1 : 1e6)}, true));
        Moments moments = pass.finish();
        long trains = IntStream.range(0, 5000).filter(k -> plan.keeping().apart().of(11, "r", k / 50) == Part.TRAINING).count();
        long pieces = IntStream.range(0, 100).filter(i -> plan.keeping().apart().of(11, "r", i) == Part.TRAINING
                && (i == 0 || plan.keeping().apart().of(11, "r", i - 1) != Part.TRAINING)).count();
        assertEquals(trains, moments.counts().training());
        assertEquals(trains - pieces, moments.pairs().pairs());
        assertTrue(moments.channels().high()[0] <= 1);
        assertTrue(moments.training().kept().stream().allMatch(stretch -> stretch.samples() <= 50));
        assertEquals(4, moments.training().kept().size());
        assertEquals(2, moments.holdout().kept().size());
        assertEquals(2, moments.calibration().kept().size());
    }

    @Test
    void momentsComeBackFromTheirTree() {
        for (Features features : List.of(LINEAR, new Features.Monomials(2))) {
            StreamPlan plan = Streams.plan(features, new DelayEmbedding(2, 1), true, Scaling.STD);
            Moments moments = Streams.moments(plan, Streams.recording());
            Moments back = StoredMoments.read(new FieldsReader("test", StoredMoments.of(moments)));
            FittedOperator a = MomentFit.fit(moments, new RankRule.Fixed(4), 0, Progress.NONE);
            FittedOperator b = MomentFit.fit(back.plus(StoredMoments.read(new FieldsReader("test", StoredMoments.of(none(moments))))),
                    new RankRule.Fixed(4), 0, Progress.NONE);
            assertEquals(plan.toString(), back.plan().toString());
            assertEquals(0, maxDifference(a.compression().action(), b.compression().action()), 0, "bit for bit");
            assertEquals(a.snapshots().holdout().get(0).id(), b.snapshots().holdout().get(0).id());
        }
    }

    /** A model of random waves or landmarks is kept like any other, with all it needs to be evaluated and fitted again. */
    @Test
    void operatorsComeBackFromTheirTree() {
        KernelSpec kernel = new KernelSpec("matern32", Map.of("scale", 2.0));
        for (Features features : List.of(new Features.RandomFourier(kernel, 12, 3), new Features.Landmarks(kernel, 15))) {
            StreamPlan plan = Streams.plan(features, DelayEmbedding.NONE, true, Scaling.STD);
            FittedOperator operator = MomentFit.fit(Streams.moments(plan, Streams.recording()), new RankRule.Fixed(6), 0, Progress.NONE);
            FittedOperator back = StoredOperator.read(new FieldsReader("test", StoredOperator.of(operator)));
            DMatrixRMaj states = operator.snapshots().states(Part.HOLDOUT).get(0).states();
            assertEquals(0, maxDifference(operator.chosen().evaluate(states), back.chosen().evaluate(states)), 0, "bit for bit");
            assertEquals(operator.estimator().describe(), back.estimator().describe());
            assertEquals(operator.method(), back.method());
        }
    }

    private static Moments none(Moments like) {
        return StreamPass.summing(like.plan(), like.pilot().orElseThrow()).finish();
    }

    private static double maxDifference(DMatrixRMaj a, DMatrixRMaj b) {
        return IntStream.range(0, a.getNumElements()).mapToDouble(i -> Math.abs(a.data[i] - b.data[i])).max().orElse(0);
    }

    /** The modes of the two pushed oscillations, from what one pass left: 0.31 and 0.83 rad a step of 0.1 s. */
    @Test
    void laterStepsTakeItLikeAnyOther() {
        Recording recording = Streams.recording();
        StreamPlan plan = Streams.plan(new Features.Coordinates(NoiseCorrection.NONE), new DelayEmbedding(12, 1), true, Scaling.STD);
        FittedOperator operator = MomentFit.fit(Streams.moments(plan, recording), new RankRule.Holdout(30), 0, Progress.NONE);
        Spectrum spectrum = SpectrumExtractor.extract(operator, Progress.NONE);
        double[] turns = spectrum.modes().stream().mapToDouble(mode -> Math.abs(mode.rate().im()) * Streams.STEP).toArray();
        // a few thousand samples of pushed motion tell a frequency to about a per cent
        assertTrue(IntStream.range(0, turns.length).anyMatch(i -> Math.abs(turns[i] - 0.31) < 0.006));
        assertTrue(IntStream.range(0, turns.length).anyMatch(i -> Math.abs(turns[i] - 0.83) < 0.016));
    }
}
