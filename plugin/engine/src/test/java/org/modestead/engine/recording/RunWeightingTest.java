package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;

class RunWeightingTest {

    /** A slow wave in two channels of very different size, with white noise, at times that jitter. */
    private static Run wave(String id, int samples, double noise, double weight, long seed) {
        Random random = new Random(seed);
        double[] times = new double[samples];
        DMatrixRMaj values = new DMatrixRMaj(samples, 2);
        for (int k = 0; k < samples; k++) {
            times[k] = 0.1 * k + 0.02 * random.nextDouble();
            values.set(k, 0, Math.sin(0.5 * times[k]) + noise * random.nextGaussian());
            values.set(k, 1, 1000 * (Math.cos(0.5 * times[k]) + noise * random.nextGaussian()));
        }
        return new Run(id, times, values, new DMatrixRMaj(samples, 0), 0, weight);
    }

    private static Snapshots build(RunWeighting rule, Run... runs) {
        return SnapshotBuilder.build(new Recording(List.of(new Channel("a", ""), new Channel("b", "")), List.of(), List.of(runs),
                new TimeAxis(TimeAxis.Kind.NUMBER, "s")), SnapshotPlan.DEFAULT.withWeighting(rule), Progress.NONE);
    }

    private static double[] weights(Snapshots snapshots) {
        return snapshots.training().stream().mapToDouble(Run::weight).toArray();
    }

    @Test
    void samplesCountAlikeUnlessAskedOtherwise() {
        assertArrayEquals(new double[] {1, 1}, weights(build(RunWeighting.EQUAL_SAMPLES, wave("a", 40, 0, 5, 1), wave("b", 400, 0, 1, 2))));
    }

    @Test
    void runsCountAlikeHoweverLong() {
        double[] found = weights(build(RunWeighting.EQUAL_RUNS, wave("a", 40, 0, 1, 1), wave("b", 360, 0, 1, 2)));
        // mean 1 over 400 samples: 200 for each run
        assertArrayEquals(new double[] {200.0 / 40, 200.0 / 360}, found, 1e-14);
    }

    @Test
    void noiseVariancesAreToldAtUnevenTimes() {
        double[] found = weights(build(RunWeighting.NOISE, wave("a", 2000, 0.1, 1, 1), wave("b", 2000, 0.3, 1, 2)));
        // two variances from some 4000 deviations each, neighbours correlated: known to about 4 %
        assertEquals(9, found[0] / found[1], 0.9);
        assertEquals(1, (found[0] + found[1]) / 2, 1e-12);
    }

    @Test
    void aRunWithoutNoiseDoesNotTakeAllTheWeight() {
        double[] found = weights(build(RunWeighting.NOISE, wave("a", 100, 0, 1, 1), wave("b", 100, 0.3, 1, 2)));
        assertTrue(found[0] / found[1] < 1e5, "bounded: " + found[0] / found[1]);
    }

    @Test
    void theVarianceIsThatOfTheNoise() {
        Run run = wave("a", 4000, 0.2, 1, 5);
        Piece piece = new Piece("a", "a", 1, run.times(), run.values(), run.inputs(), new int[] {4000, 4000, 4000}, 0, new long[2]);
        NoiseLevel level = NoiseLevel.none(2).and(piece);
        // 4000 deviations; four times their spread
        assertEquals(0.04, level.sums()[0] / level.count(), 0.04 * 0.12);
        assertEquals(0.04 * 1e6, level.sums()[1] / level.count(), 0.04 * 1e6 * 0.12);
    }

    @Test
    void givenWeightsAreTakenAndZeroLeavesARunOutAltogether() {
        Snapshots with = build(RunWeighting.GIVEN, wave("a", 100, 0.1, 1, 1), wave("b", 100, 0.1, 3, 2), wave("c", 50, 0.1, 0, 3));
        assertArrayEquals(new double[] {0.5, 1.5}, weights(with), 1e-14);
        assertEquals(List.of("a", "b"), with.training().stream().map(Run::id).toList());
        assertTrue(with.doubts().stream().anyMatch(doubt -> doubt.sentence().contains("weight 0")), with.doubts().toString());
        assertEquals("as given, a sample counts from 0.5 to 1.5", fact(with, "run weights"));
        // trend and scales do not see it either
        SnapshotPlan plan = SnapshotPlan.DEFAULT.withWeighting(RunWeighting.GIVEN).withPreparation(Detrend.MEAN, Scaling.STD);
        List<Run> runs = List.of(wave("a", 100, 0.1, 1, 1), wave("b", 100, 0.1, 1, 2), wave("c", 50, 9, 0, 3));
        List<Preparation> prepared = new ArrayList<>();
        for (int count = 2; count <= 3; count++) {
            prepared.add(SnapshotBuilder.build(new Recording(List.of(new Channel("a", ""), new Channel("b", "")), List.of(), runs.subList(0, count),
                    new TimeAxis(TimeAxis.Kind.NUMBER, "s")), plan, Progress.NONE).preparation());
        }
        assertArrayEquals(prepared.get(0).scale(), prepared.get(1).scale());
        assertArrayEquals(prepared.get(0).offset(), prepared.get(1).offset());
    }

    @Test
    void piecesOfARunHaveItsWeight() {
        Run run = wave("a", 60, 0, 1, 1);
        double[] times = run.times().clone();
        for (int k = 30; k < 60; k++) {
            times[k] += 10;
        }
        double[] found = weights(build(RunWeighting.EQUAL_RUNS, new Run("a", times, run.values()), wave("b", 60, 0, 1, 2)));
        assertArrayEquals(new double[] {1, 1, 1}, found, 1e-14);
    }

    @Test
    void allWeightsZeroAreRefused() {
        assertThrows(RecordingFault.class, () -> build(RunWeighting.GIVEN, wave("a", 60, 0, 0, 1)));
    }

    private static String fact(Snapshots snapshots, String item) {
        return snapshots.facts().stream().filter(fact -> fact.item().equals(item)).findFirst().orElseThrow().value();
    }
}
