package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.modestead.engine.recording.Curves.evaluate;
import static org.modestead.engine.recording.Curves.fine;
import static org.modestead.engine.recording.Curves.uneven;
import static org.modestead.engine.recording.Curves.worstError;

import java.util.Arrays;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;

class MonotoneCubicPropertiesTest {

    @Property(tries = 200, seed = "20261201")
    void straightLinesAndParabolasAreExactAtUnevenTimes(
            @ForAll @IntRange(min = 3, max = 40) int count, @ForAll @DoubleRange(min = -5, max = 5) double slope,
            @ForAll @DoubleRange(min = -5, max = 5) double bend, @ForAll long seed) {
        double[] times = uneven(count, 10, new Random(seed));
        // values reach 600; divided differences lose about 3 digits to steps of 0.1
        assertTrue(worstError(times, t -> 1 + slope * t + bend * t * t, 0, 10) < 1e-10);
        assertTrue(worstError(times, t -> 1 + slope * t, 0, 10) < 1e-11);
    }

    @Property(tries = 300, seed = "20261201")
    void risingSamplesGiveARisingCurveAwayFromTheEnds(@ForAll long seed, @ForAll @IntRange(min = 8, max = 40) int count) {
        Random random = new Random(seed);
        double[] times = uneven(count, 10, random);
        double[] values = new double[count];
        for (int k = 1; k < count; k++) {
            double u = random.nextDouble();
            values[k] = values[k - 1] + (u < 0.3 ? 0 : Math.pow(10, 4 * u - 4));
        }
        double[] found = evaluate(times, values, fine(times[2], times[count - 3], 2000));
        for (int k = 1; k < found.length; k++) {
            assertTrue(found[k] >= found[k - 1] - 1e-14 * values[count - 1], "falls at " + k);
        }
    }

    @Property(tries = 300, seed = "20261201")
    void noiseAtEvenTimesIsNeverOvershotByMoreThanAFifthOfItsRange(
            @ForAll long seed, @ForAll @IntRange(min = 3, max = 60) int count) {
        double[] values = new Random(seed).doubles(count).toArray();
        double[] found = evaluate(fine(0, 10, count), values, fine(0, 10, 3000));
        assertTrue(Arrays.stream(found).allMatch(y -> y > -0.2 && y < 1.2), "0.187 is the worst of a million tried");
    }
}
