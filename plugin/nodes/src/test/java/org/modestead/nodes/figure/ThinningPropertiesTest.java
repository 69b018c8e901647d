package org.modestead.nodes.figure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class ThinningPropertiesTest {

    @Property(tries = 200, seed = "20261201")
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
}
