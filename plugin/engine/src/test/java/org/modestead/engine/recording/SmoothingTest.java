package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.function.IntToDoubleFunction;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;

class SmoothingTest {

    private static final double[] UNEVEN = {0, 0.7, 1.1, 2.4, 3, 3.9, 4.2, 5.5, 6.1};

    @Test
    void weightsInsideAreThePublishedOnesOfSavitzkyAndGolay() {
        // Savitzky and Golay 1964, table I: 5 points (-3, 12, 17, 12, -3)/35, 7 points (-2, 3, 6, 7, 6, 3, -2)/21
        double[] even = Motions.grid(9, 0.25);
        assertArrayEquals(new double[] {-3 / 35.0, 12 / 35.0, 17 / 35.0, 12 / 35.0, -3 / 35.0}, LocalParabola.at(even, 4, 2).weights(), 1e-14);
        assertArrayEquals(new double[] {-2 / 21.0, 3 / 21.0, 6 / 21.0, 7 / 21.0, 6 / 21.0, 3 / 21.0, -2 / 21.0},
                LocalParabola.at(even, 4, 3).weights(), 1e-14);
        assertArrayEquals(new double[] {1 / 3.0, 1 / 3.0, 1 / 3.0}, LocalParabola.at(even, 4, 1).weights(), 1e-15);
    }

    @Test
    void aParabolaComesOutAsItWentInAtUnevenTimesAndAtTheEnds() {
        double[] samples = Arrays.stream(UNEVEN).map(t -> 3 - 2 * t + 0.5 * t * t).toArray();
        for (int k = 0; k < UNEVEN.length; k++) {
            assertEquals(samples[k], LocalParabola.at(UNEVEN, k, 3).value(samples, 1, 0), 1e-12, "sample " + k);
        }
    }

    @Test
    void anExponentialKeepsItsRateInsideARun() {
        double[] times = Motions.grid(40, 0.1);
        DMatrixRMaj values = column(40, k -> Math.exp(-1.3 * times[k]));
        DMatrixRMaj out = new Smoothing(List.of(5), List.of(0.1)).apply(times, values);
        for (int k = 5; k < 34; k++) {
            // the filter multiplies it by one number everywhere; rounding only
            assertEquals(Math.exp(-0.13), out.get(k + 1, 0) / out.get(k, 0), 1e-12);
        }
    }

    @Test
    void theNoiseOfASlowMotionIsMeasuredAndMostOfItGoes() {
        List<Run> clean = runs(10, 120, (run, k) -> Math.sin(0.08 * k + run));
        List<Run> noisy = noisy(clean, 0.05, 4);
        Smoothing smoothing = SmoothingRule.AUTOMATIC.of(noisy, 1);
        // 1200 samples tell a standard deviation to 2 %; four of those
        assertEquals(0.05, smoothing.noise().get(0), 0.004);
        double before = 0;
        double after = 0;
        for (int i = 0; i < clean.size(); i++) {
            before += distance(noisy.get(i).values(), clean.get(i).values());
            after += distance(smoothing.apply(noisy.get(i)).values(), clean.get(i).values());
        }
        // a window of 2h + 1 leaves 9/(4(2h + 1)) of the variance; h of 5 and more leaves less than a quarter
        assertTrue(after < 0.25 * before, "squares of " + after + " left of " + before);
    }

    @Test
    void whatMovesTooFastOrIsMostlyNoiseIsLeftAlone() {
        Random random = new Random(8);
        assertFalse(SmoothingRule.AUTOMATIC.of(runs(10, 100, (run, k) -> random.nextGaussian()), 1).active(), "white noise");
        assertFalse(SmoothingRule.AUTOMATIC.of(walks(random), 1).active(), "random walk");
        assertFalse(SmoothingRule.AUTOMATIC.of(runs(10, 100, (run, k) -> Math.sin(1.5 * k + run)), 1).active(), "four samples a period");
        assertFalse(SmoothingRule.AUTOMATIC.of(runs(10, 100, (run, k) -> Math.sin(0.1 * k + run)), 1).active(), "no noise");
        assertFalse(SmoothingRule.NONE.of(noisy(runs(10, 100, (run, k) -> Math.sin(0.05 * k)), 0.1, 1), 1).active(), "not asked for");
    }

    @Test
    void longRecordingsTellTheirWindowByAPartOfTheirSamples() {
        List<Run> long1 = noisy(runs(1, 50_000, (run, k) -> Math.sin(0.02 * k)), 0.1, 3);
        // 25 000 samples looked at: 0.5 %; four of those
        assertEquals(0.1, SmoothingRule.AUTOMATIC.of(long1, 1).noise().get(0), 0.002);
    }

    @Test
    void noSampleOfALaterPartReachesAnEarlierOne() {
        SnapshotPlan plan = SnapshotPlan.DEFAULT.withSmoothing(SmoothingRule.AUTOMATIC).withHoldout(new Split.Tail(0.3))
                .withCalibration(new Split.Tail(0.3));
        List<Run> one = noisy(runs(3, 200, (run, k) -> Math.sin(0.05 * k + run)), 0.05, 6);
        List<Run> other = one.stream().map(run -> new Run(run.id(), run.times(), column(200, k -> k < 140 ? run.values().get(k, 0) : 9.0 - k))).toList();
        Snapshots a = SnapshotBuilder.build(recording(one), plan, Progress.NONE);
        Snapshots b = SnapshotBuilder.build(recording(other), plan, Progress.NONE);
        assertTrue(a.smoothing().active());
        for (int i = 0; i < 3; i++) {
            assertArrayEquals(a.training().get(i).values().data, b.training().get(i).values().data, 0);
            assertArrayEquals(a.calibration().get(i).values().data, b.calibration().get(i).values().data, 0);
        }
    }

    @Test
    void smoothingIsToldInTheSummaryAndAsADoubt() {
        SnapshotPlan plan = SnapshotPlan.DEFAULT.withSmoothing(SmoothingRule.AUTOMATIC);
        Snapshots snapshots = SnapshotBuilder.build(recording(noisy(runs(3, 200, (run, k) -> Math.sin(0.05 * k + run)), 0.05, 6)), plan, Progress.NONE);
        String fact = snapshots.facts().stream().filter(f -> f.item().equals("smoothing")).findFirst().orElseThrow().value();
        assertTrue(fact.matches("level: \\d+ samples either side, noise 0\\.0[45]\\d* m"), fact);
        assertTrue(snapshots.doubts().stream().anyMatch(d -> d.code().equals("smoothed") && d.sentence().contains(fact)), snapshots.doubts().toString());
        Snapshots plain = SnapshotBuilder.build(recording(runs(3, 200, (run, k) -> Math.sin(0.05 * k + run))), plan, Progress.NONE);
        assertEquals("none", plain.facts().stream().filter(f -> f.item().equals("smoothing")).findFirst().orElseThrow().value());
        assertEquals(List.of(), plain.doubts());
    }

    @Test
    void noiseAddedLaterGoesThroughTheSameWindow() {
        Smoothing smoothing = new Smoothing(List.of(6), List.of(0.2));
        Run run = runs(1, 5000, (r, k) -> 0).get(0);
        DMatrixRMaj dose = new SampleNoise(new double[] {0.2}, smoothing).doses(List.of(run), new Random(2)).get(0);
        double left = 0.2 * Math.sqrt(LocalParabola.at(run.times(), 2500, 6).gain());
        // 5000 samples, about 5 of them independent of each other in 13: 2 %; four of those
        assertEquals(left, Math.sqrt(distance(dose, new DMatrixRMaj(5000, 1)) / 5000), 0.08 * left);
    }

    private interface Motion {
        double at(int run, int sample);
    }

    private static List<Run> runs(int count, int samples, Motion motion) {
        List<Run> out = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            int run = i;
            out.add(new Run("r" + i, Motions.grid(samples, 1), column(samples, k -> motion.at(run, k))));
        }
        return out;
    }

    private static List<Run> walks(Random random) {
        double[] at = {0};
        return runs(10, 100, (run, k) -> at[0] = k == 0 ? 0 : at[0] + random.nextGaussian());
    }

    private static List<Run> noisy(List<Run> runs, double noise, long seed) {
        Random random = new Random(seed);
        return runs.stream().map(run -> new Run(run.id(), run.times(),
                column(run.samples(), k -> run.values().get(k, 0) + noise * random.nextGaussian()))).toList();
    }

    private static Recording recording(List<Run> runs) {
        return new Recording(List.of(new Channel("level", "m")), List.of(), runs, new TimeAxis(TimeAxis.Kind.NUMBER, "s"));
    }

    private static DMatrixRMaj column(int rows, IntToDoubleFunction value) {
        DMatrixRMaj out = new DMatrixRMaj(rows, 1);
        out.data = java.util.stream.IntStream.range(0, rows).mapToDouble(value).toArray();
        return out;
    }

    private static double distance(DMatrixRMaj a, DMatrixRMaj b) {
        double sum = 0;
        for (int k = 0; k < a.getNumElements(); k++) {
            sum += (a.data[k] - b.data[k]) * (a.data[k] - b.data[k]);
        }
        return sum;
    }
}
