package org.modestead.engine.basis;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.fixtures.Motions;

class EndStateTest {

    private static final double[] TIMES = {0, 0.1, 0.25, 0.3, 0.45, 0.5, 0.7, 0.75, 0.9, 1};

    private static DMatrixRMaj cubic() {
        DMatrixRMaj out = new DMatrixRMaj(TIMES.length, 2);
        for (int k = 0; k < TIMES.length; k++) {
            double t = TIMES[k];
            out.set(k, 0, 1 + t - 2 * t * t + 3 * t * t * t);
            out.set(k, 1, -t * t * t);
        }
        return out;
    }

    @Test
    void aCubicIsReadOffExactlyAtUnevenTimes() {
        for (int samples : new int[] {5, 8, 10, 50}) {
            assertArrayEquals(new double[] {1, 0}, EndState.of(TIMES, cubic(), 0, samples), 1e-12);
            assertArrayEquals(new double[] {3, -1}, EndState.of(TIMES, cubic(), TIMES.length - 1, samples), 1e-12);
        }
    }

    @Test
    void inTheMiddleOfARunACubicReachesToBothSides() {
        // t = 0.45 lies at index 4: 1 + t - 2t² + 3t³
        assertEquals(1 + 0.45 - 2 * 0.2025 + 3 * 0.091125, EndState.of(TIMES, cubic(), 4, 7)[0], 1e-12);
        Random random = new Random(5);
        double sum = 0;
        for (int trial = 0; trial < 500; trial++) {
            DMatrixRMaj noise = new DMatrixRMaj(21, 1);
            for (int k = 0; k < 21; k++) {
                noise.data[k] = random.nextGaussian();
            }
            sum += Math.pow(EndState.of(Motions.grid(21, 1), noise, 10, 21)[0], 2);
        }
        // middle value of a cubic fit: 9/(4 m) for m even samples to leading order, 0.108 for 21; four standard errors of 500 draws
        assertEquals(0.108, sum / 500, 0.028);
    }

    @Test
    void withoutSmoothingTheSampleItselfIsTaken() {
        DMatrixRMaj noisy = cubic();
        noisy.set(0, 0, 7);
        for (int samples : new int[] {0, 1, 4}) {
            assertArrayEquals(new double[] {7, 0}, EndState.of(TIMES, noisy, 0, samples), 0);
        }
    }

    @Test
    void noiseOfTheEndIsDampedByTwentySamples() {
        Random random = new Random(5);
        double sum = 0;
        for (int trial = 0; trial < 500; trial++) {
            DMatrixRMaj noise = new DMatrixRMaj(20, 1);
            for (int k = 0; k < 20; k++) {
                noise.data[k] = random.nextGaussian();
            }
            sum += Math.pow(EndState.of(Motions.grid(20, 1), noise, 0, 20)[0], 2);
        }
        // variance of the end value of a cubic fit: first diagonal entry of the hat matrix, 0.562 for 20 even samples
        assertEquals(0.562, sum / 500, 0.12);
    }
}
