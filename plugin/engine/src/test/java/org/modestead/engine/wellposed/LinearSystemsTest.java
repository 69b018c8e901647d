package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

/**
 * What any tool must get right: lightly damped oscillations in a few channels, several runs, a little noise; and noise
 * alone.
 */
class LinearSystemsTest {

    private static final double STEP = 0.1;
    private static final double W1 = 2 * Math.PI * 0.62;
    private static final double W2 = 2 * Math.PI * 1.7;
    private static final double ZETA = 0.02;
    private static final double[][] SHAPE = {
        {1, 0.3, -0.4, 0.1}, {0.2, 1, 0.5, -0.6}, {0.7, -0.2, 0.3, 0.8}, {0.1, 0.4, 0.9, -0.3}, {0.5, 0.5, -0.1, 0.2},
                {-0.3, 0.8, 0.2, 0.4}
    };

    /** Two fading oscillations and a slow decay, each run from another start. */
    private static List<Run> ringing(int runs, int channels, double noise, Random random) {
        List<Run> out = new ArrayList<>();
        for (int i = 0; i < runs; i++) {
            double a = 0.5 + random.nextDouble();
            double turn = 2 * Math.PI * random.nextDouble();
            double b = 1 + random.nextDouble();
            double d = 0.4 + 0.3 * random.nextDouble();
            double turn2 = 2 * Math.PI * random.nextDouble();
            out.add(Motions.run("r" + i, Motions.grid(400, STEP), t -> {
                double fade = Math.exp(-ZETA * W1 * t);
                double[] q = {a * fade * Math.cos(W1 * t + turn), a * fade * Math.sin(W1 * t + turn), b * Math.exp(-t / 40),
                    d * Math.exp(-0.03 * W2 * t) * Math.cos(W2 * t + turn2)};
                double[] row = new double[channels];
                for (int c = 0; c < channels; c++) {
                    for (int m = 0; m < 4; m++) {
                        row[c] += SHAPE[c][m] * q[m];
                    }
                }
                return row;
            }, noise, random));
        }
        return out;
    }

    private static Snapshots ringing(int channels, int depth, double noise, long seed) {
        Random random = new Random(seed);
        return Motions.snapshots(STEP, depth, ringing(8, channels, noise, random), ringing(3, channels, noise, random));
    }

    @ParameterizedTest
    @CsvSource({"2, 6, 0.001", "2, 10, 0.01", "3, 6, 0.001", "3, 6, 0.01", "4, 5, 0.001", "6, 4, 0.001", "6, 4, 0.01",
            "6, 8, 0.005"})
    void aLightlyDampedOscillationIsThereAndSaidToBe(int channels, int depth, double noise) {
        for (long seed : new long[] {1, 2, 3}) {
            FittedOperator operator = Motions.fit(ringing(channels, depth, noise, seed), new LinearEstimator(), 5);
            Spectrum spectrum = SpectrumExtractor.extract(operator, org.modestead.engine.Progress.NONE);
            Mode ring = Motions.nearest(spectrum, -ZETA * W1, W1);
            // closed form; least squares under this noise adds damping, at most a third of it here
            assertEquals(W1, ring.rate().im(), 0.02 * W1);
            assertEquals(ZETA, ring.dampingRatio(), 0.01);
            Grade grade = Motions.judge(operator, JudgeSettings.DEFAULT).of(ring.number()).orElseThrow().grade();
            assertTrue(grade.compareTo(Grade.SETTLES) <= 0, "seed " + seed + " " + grade.word());
        }
    }

    @ParameterizedTest
    @CsvSource({"2, 8", "3, 6", "6, 4"})
    void noiseFreeRingingIsNeverWorseThanSettled(int channels, int depth) {
        Grade grade = Motions.judge(Motions.fit(ringing(channels, depth, 0, 4), new LinearEstimator(), 5),
                JudgeSettings.DEFAULT).overall().grade();
        assertTrue(grade.compareTo(Grade.SETTLES) <= 0, grade.word());
    }

    private static List<Run> noise(int runs, int channels, boolean walk, Random random) {
        List<Run> out = new ArrayList<>();
        for (int i = 0; i < runs; i++) {
            DMatrixRMaj values = new DMatrixRMaj(300, channels);
            for (int k = 0; k < 300; k++) {
                for (int c = 0; c < channels; c++) {
                    values.set(k, c, random.nextGaussian() + (walk && k > 0 ? values.get(k - 1, c) : 0));
                }
            }
            out.add(new Run("r" + i, Motions.grid(300, STEP), values));
        }
        return out;
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
    void whiteNoiseNeverStands(long seed) {
        assertNoEvidence(false, seed);
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
    void aRandomWalkNeverStands(long seed) {
        assertNoEvidence(true, seed);
    }

    private static void assertNoEvidence(boolean walk, long seed) {
        for (int[] choice : new int[][] {{1, 8, 4}, {2, 6, 6}, {3, 1, 3}, {2, 10, 12}}) {
            Random random = new Random(seed);
            Snapshots snapshots = Motions.snapshots(STEP, choice[1], noise(6, choice[0], walk, random),
                    noise(3, choice[0], walk, random));
            Grade grade = Motions.judge(Motions.fit(snapshots, new LinearEstimator(), choice[2]),
                    JudgeSettings.DEFAULT).overall().grade();
            assertNotEquals(Grade.STANDS, grade);
            assertNotEquals(Grade.SETTLES, grade, choice[0] + " channels, depth " + choice[1] + ", rank " + choice[2]);
        }
    }
}
