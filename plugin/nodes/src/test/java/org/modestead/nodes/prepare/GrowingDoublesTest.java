package org.modestead.nodes.prepare;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class GrowingDoublesTest {

    @Test
    void holdWhatWasAddedInItsOrderHoweverItCame() {
        held(new GrowingDoubles(), new Random(8));
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 1, 1000, 100_000})
    void holdThemWhateverWasExpected(int expected) {
        held(new GrowingDoubles(expected), new Random(8));
    }

    @Test
    void asManyAsExpectedAreHeldOnce() {
        GrowingDoubles numbers = new GrowingDoubles(3);
        numbers.add(new double[] {1, 2});
        numbers.add(3);
        assertSame(numbers.toArray(), numbers.toArray());
    }

    private static void held(GrowingDoubles numbers, Random random) {
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
