package org.modestead.engine.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import org.junit.jupiter.api.Test;

/** The absolute value is that of the platform's slower function, over the whole range of numbers. */
class ComplexTest {

    @Test
    void theAbsoluteValueIsRightToTwoUnitsInTheLastPlaceWhateverTheSizes() {
        Random random = new Random(1);
        for (int k = 0; k < 20_000; k++) {
            double re = random.nextGaussian() * Math.pow(10, random.nextInt(600) - 300);
            double im = random.nextGaussian() * Math.pow(10, random.nextInt(600) - 300);
            double exact = Math.hypot(re, im);
            // each is within one unit of the true value
            assertEquals(exact, new Complex(re, im).abs(), 2 * Math.ulp(exact));
            assertEquals(Math.abs(re), new Complex(re, 0).abs(), "a real number has its own size, to the last bit");
        }
        assertEquals(Double.POSITIVE_INFINITY, new Complex(Double.NEGATIVE_INFINITY, Double.NaN).abs());
        assertEquals(0, Complex.ZERO.abs());
    }
}
