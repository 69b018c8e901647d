package org.modestead.nodes.prepare;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class GrowingDoublesTest {

    @Test
    void holdWhatWasAddedInItsOrderHoweverItCame() {
        Random random = new Random(8);
        GrowingDoubles numbers = new GrowingDoubles();
        double[] expected = new double[0];
        for (int turn = 0; turn < 300; turn++) {
            double[] more = random.doubles(random.nextInt(4) == 0 ? 700 : random.nextInt(40)).toArray();
            int before = expected.length;
            expected = Arrays.copyOf(expected, before + more.length);
            System.arraycopy(more, 0, expected, before, more.length);
            if (random.nextBoolean()) {
                numbers.add(more);
            } else {
                Arrays.stream(more).forEach(numbers::add);
            }
            assertEquals(expected.length, numbers.size());
            if (expected.length > 0) {
                assertEquals(expected[expected.length - 1], numbers.last());
            }
        }
        assertArrayEquals(expected, numbers.toArray());
    }
}
