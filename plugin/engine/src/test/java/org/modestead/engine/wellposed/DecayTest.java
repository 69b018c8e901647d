package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.modestead.engine.linalg.Complex;

class DecayTest {

    /** A few units in the last place: one product more than the exponential itself. */
    private static final double ROUNDING = 1e-15;

    @Test
    void isTheExponentialForTimesThatDifferByRoundingByALittleOrByMuch() {
        Random random = new Random(5);
        Complex rate = new Complex(-0.3, 17);
        for (double jitter : new double[] {0, 1e-16, 1e-12, 1e-9, 1e-3, 1}) {
            Decay decay = new Decay(rate);
            for (int k = 0; k < 200; k++) {
                double tau = 0.02 * (k / 100 + 1) + jitter * random.nextDouble();
                decay.over(tau);
                Complex exact = rate.times(tau).exp();
                assertEquals(0, exact.minus(new Complex(decay.re(), decay.im())).abs(), ROUNDING * (1 + rate.abs() * tau),
                        "jitter " + jitter + ", pair " + k);
            }
        }
    }

    @Test
    void isZeroForTheRateOfTheMultiplierZero() {
        Decay decay = new Decay(Complex.ZERO.log());
        for (double tau : new double[] {0.1, 0.1 + 1e-17, 0.2, 0.2 + 1e-16}) {
            decay.over(tau);
            assertEquals(0, decay.re());
            assertEquals(0, decay.im());
        }
    }
}
