package org.modestead.nodes.figure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;

class ThinningTest {

    @Property(tries = 200)
    void extremesStayTimesRiseAndThePointsAreFew(@ForAll @IntRange(min = 1, max = 5000) int length,
            @ForAll @IntRange(min = 4, max = 300) int most, @ForAll long seed) {
        double[] y = new Random(seed).doubles(length).toArray();
        double[] x = new double[length];
        Arrays.setAll(x, i -> i);
        Thinning.Curve curve = Thinning.thin(x, y, most);
        assertTrue(curve.x().length <= most);
        assertEquals(Arrays.stream(y).max(), Arrays.stream(curve.y()).max());
        assertEquals(Arrays.stream(y).min(), Arrays.stream(curve.y()).min());
        for (int i = 0; i < curve.x().length; i++) {
            assertTrue(i == 0 || curve.x()[i] > curve.x()[i - 1]);
            assertEquals(y[(int) curve.x()[i]], curve.y()[i]);
        }
    }

    @Test
    void shortLinesStayAsTheyAre() {
        double[] x = {0, 1, 2};
        assertSame(x, Thinning.thin(x, x, 4).x());
    }

    @Test
    void aGapStaysAGap() {
        double[] x = new double[1000];
        double[] y = new double[1000];
        Arrays.setAll(x, i -> i);
        Arrays.setAll(y, i -> i >= 400 && i < 600 ? Double.NaN : i);
        Thinning.Curve curve = Thinning.thin(x, y, 100);
        assertTrue(Arrays.stream(curve.y()).anyMatch(Double::isNaN));
        assertEquals(999, Arrays.stream(curve.y()).filter(v -> !Double.isNaN(v)).max().orElseThrow());
    }
}
