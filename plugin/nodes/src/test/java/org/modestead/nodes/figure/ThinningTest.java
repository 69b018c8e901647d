package org.modestead.nodes.figure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.junit.jupiter.api.Test;

class ThinningTest {

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
