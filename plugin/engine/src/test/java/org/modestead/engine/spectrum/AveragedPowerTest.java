package org.modestead.engine.spectrum;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Fourier;
import org.modestead.engine.recording.DelayEmbedding;

/** The power over frequency of known signals. */
class AveragedPowerTest {

    @Test
    void theTransformIsTheSumThatDefinesIt() {
        Random random = new Random(3);
        double[] x = random.doubles(32, -1, 1).toArray();
        double[] direct = new double[17];
        for (int k = 0; k < direct.length; k++) {
            double re = 0;
            double im = 0;
            for (int n = 0; n < x.length; n++) {
                re += x[n] * Math.cos(2 * Math.PI * k * n / 32);
                im -= x[n] * Math.sin(2 * Math.PI * k * n / 32);
            }
            direct[k] = re * re + im * im;
        }
        assertArrayEquals(direct, Fourier.squaredMagnitudes(x), 1e-12);
        assertThrows(IllegalArgumentException.class, () -> Fourier.squaredMagnitudes(new double[12]));
    }

    @Test
    void whiteNoiseHasItsVarianceSpreadEvenlyAndASineItsPeakInPlace() {
        var noise = Motions.snapshots(OptionalDouble.of(0.1), DelayEmbedding.NONE,
                List.of(Motions.run("a", Motions.grid(40_000, 0.1), t -> new double[] {5}, 0.7, new Random(5))), List.of());
        AveragedPower power = AveragedPower.of(noise).orElseThrow();
        double width = power.frequency()[1];
        assertEquals(5, power.frequency()[power.frequency().length - 1], 1e-12, "half of ten samples a second");
        // 0.49 over the band; 40 000 samples: variance to 1 %, of which each mean of a piece takes a thousandth
        assertEquals(0.49, Arrays.stream(power.density()).sum() * width, 0.01);
        var sine = Motions.snapshots(0.1, 1, List.of(Motions.run("a", 3000, 0.1, t -> new double[] {3 * Math.sin(2 * Math.PI * 1.3 * t)})),
                List.of());
        AveragedPower peaked = AveragedPower.of(sine).orElseThrow();
        int top = 0;
        for (int k = 0; k < peaked.density().length; k++) {
            top = peaked.density()[k] > peaked.density()[top] ? k : top;
        }
        assertEquals(1.3, peaked.frequency()[top], width);
        // mean square of a sine of size 3; the window spreads it over three lines
        assertEquals(4.5, Arrays.stream(peaked.density()).sum() * width, 0.02);
    }

    @Test
    void unevenTimesAndShortRunsHaveNone() {
        var shortRun = Motions.snapshots(0.1, 1, List.of(Motions.run("a", 10, 0.1, t -> new double[] {t})), List.of());
        assertTrue(AveragedPower.of(shortRun).isEmpty());
        var uneven = Motions.snapshots(OptionalDouble.empty(), DelayEmbedding.NONE,
                List.of(Motions.run("a", 100, 0.1, t -> new double[] {t})), List.of());
        assertTrue(AveragedPower.of(uneven).isEmpty());
    }
}
