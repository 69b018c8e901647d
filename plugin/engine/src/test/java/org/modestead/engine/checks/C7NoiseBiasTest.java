package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/** CHECKS C7.4: the damping that white noise feigns, and its removal. */
class C7NoiseBiasTest {

    private static final double ANGLE = 0.3;
    private static final int SAMPLES = 40_000;
    /** Ratio of signal to noise power, R; the signal turns on the unit circle. */
    private static final double RATIO = 10;
    /**
     * One value of |z| is the mean of m products of signal and noise, standard error √(2/R + 1/R²)/√m; four of them. The
     * mean of the noise power itself adds less.
     */
    private static final double TOLERANCE = 4 * Math.sqrt(2 / RATIO + 1 / (RATIO * RATIO)) / Math.sqrt(SAMPLES);

    /** cos and sin of a rotation: one complex oscillation, with noise of variance 1/(2R) in each part. */
    private static Snapshots noisyRotation(long seed) {
        Random random = new Random(seed);
        double size = Math.sqrt(1 / (2 * RATIO));
        Run run = Fits.run("rotation", SAMPLES, 1, t -> new double[] {Math.cos(ANGLE * t) + size * random.nextGaussian(),
                Math.sin(ANGLE * t) + size * random.nextGaussian()});
        return Fits.snapshots(1, 1, List.of(run));
    }

    private static Complex multiplier(long seed, NoiseCorrection correction) {
        return Fits.spectrum(noisyRotation(seed), new LinearEstimator(correction), 2).modes().get(0).rate().exp();
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5})
    void leastSquaresFeignsDampingByTheRatioOfNoiseToSignal(long seed) {
        Complex z = multiplier(seed, NoiseCorrection.NONE);
        assertEquals(1 / (1 + 1 / RATIO), z.abs(), TOLERANCE, "closed form 1/(1 + 1/R)");
        assertEquals(ANGLE, z.arg(), TOLERANCE);
        assertTrue(1 - z.abs() > 5 * TOLERANCE,
                "the bias is far above the sampling error, so the next test tells something");
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5})
    void bothCorrectionsRemoveTheFeignedDamping(long seed) {
        for (NoiseCorrection correction : List.of(NoiseCorrection.TOTAL_LEAST_SQUARES, NoiseCorrection.FORWARD_BACKWARD)) {
            Complex z = multiplier(seed, correction);
            assertEquals(1, z.abs(), TOLERANCE, correction.words());
            assertEquals(ANGLE, z.arg(), TOLERANCE, correction.words());
        }
    }
}
