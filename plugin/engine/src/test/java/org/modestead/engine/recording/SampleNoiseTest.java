package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.fixtures.Motions;

class SampleNoiseTest {

    private static double level(int samples, double step, Motions.Motion motion, double noise) {
        Random random = new Random(11);
        double[] times = new double[samples];
        for (int k = 0; k < samples; k++) {
            times[k] = step * (k + 0.3 * random.nextDouble());
        }
        Run run = Motions.run("a", times, motion, noise, random);
        return SampleNoise.rough(Motions.snapshots(java.util.OptionalDouble.empty(), DelayEmbedding.NONE, List.of(run), List.of()))
                .deviations()[0];
    }

    @Test
    void noiseOnSmoothMotionAtUnevenTimesIsMeasured() {
        double level = level(3000, 0.1, t -> new double[] {Math.sin(t) + 3}, 0.05);
        // the median of 3000 correlated normal deviations is known to about 2 %; four of these
        assertEquals(0.05, level, 0.004);
    }

    @Test
    void smoothMotionAloneLeavesNextToNothing() {
        // the cubic misses at most the fourth derivative times the product of the four distances over 4!: (0.13)²(0.23)²/24 = 4e-5
        assertTrue(level(3000, 0.1, t -> new double[] {Math.sin(t)}, 0) < 4e-5);
    }

    @Test
    void aCoarselySampledRotationIsNotTakenForNoise() {
        double turn = 2 * Math.PI * 0.618033988749895;
        Run run = Motions.run("a", 900, 1, t -> new double[] {Math.cos(turn * t), Math.sin(turn * t)});
        double[] level = SampleNoise.rough(Motions.snapshots(1, 1, List.of(run), List.of())).deviations();
        // the golden rotation fills the circle evenly: among 900 samples the nearest lies within 2π/900 of each
        assertTrue(level[0] < 2 * Math.PI / 900 && level[1] < 2 * Math.PI / 900, level[0] + " " + level[1]);
    }

    @Test
    void aCopyCountsAsMuchAsItsRun() {
        Run run = Motions.run("a", 50, 0.1, t -> new double[] {t, -t}).weighted(0.25);
        Snapshots snapshots = Motions.snapshots(0.1, 1, List.of(run), List.of());
        for (Snapshots copy : new SampleNoise(new double[] {0.5, 0}, Smoothing.none(2)).disturbed(snapshots, 1, 1)) {
            assertEquals(0.25, copy.training().get(0).weight());
        }
    }

    @Test
    void copiesComeInPairsWhoseMeanIsTheRun() {
        Run run = Motions.run("a", 50, 0.1, t -> new double[] {t, -t});
        Snapshots snapshots = Motions.snapshots(0.1, 1, List.of(run), List.of());
        List<Snapshots> copies = new SampleNoise(new double[] {0.5, 0}, Smoothing.none(2)).disturbed(snapshots, 2, 1);
        assertEquals(4, copies.size());
        DMatrixRMaj first = copies.get(0).training().get(0).values();
        DMatrixRMaj second = copies.get(1).training().get(0).values();
        double largest = 0;
        for (int k = 0; k < first.getNumElements(); k++) {
            assertEquals(run.values().data[k], (first.data[k] + second.data[k]) / 2, 1e-14);
            largest = Math.max(largest, Math.abs(first.data[k] - second.data[k]));
        }
        assertTrue(largest > 0.5, "they differ");
    }

    @Test
    void noiseFollowsAChannelWhereverItStandsWhicheverSignAndUnitItHas() {
        Run run = Motions.run("a", 40, 0.1, t -> new double[] {Math.exp(t), Math.sin(3 * t), t * t * t});
        Run turned = Motions.run("a", 40, 0.1, t -> new double[] {-1000 * t * t * t, Math.exp(t), 2 * Math.sin(3 * t)});
        DMatrixRMaj noise = new SampleNoise(new double[] {0.1, 0.2, 0.3}, Smoothing.none(3)).doses(List.of(run), new Random(5)).get(0);
        DMatrixRMaj its = new SampleNoise(new double[] {300, 0.1, 0.4}, Smoothing.none(3)).doses(List.of(turned), new Random(5)).get(0);
        for (int k = 0; k < 40; k++) {
            // products of a few doubles: a few times the rounding of their size
            assertEquals(noise.get(k, 0), its.get(k, 1), 1e-14);
            assertEquals(2 * noise.get(k, 1), its.get(k, 2), 1e-14);
            assertEquals(-1000 * noise.get(k, 2), its.get(k, 0), 1e-10);
        }
        assertTrue(Math.abs(noise.get(0, 0)) > 0, "there is noise");
    }
}
