package org.modestead.engine.basis;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.fixtures.Motions;

class QuadratureTest {

    private static double integral(double[] times, DoubleUnaryOperator h) {
        double[] weights = Quadrature.weights(times);
        double sum = 0;
        for (int k = 0; k < times.length; k++) {
            sum += weights[k] * h.applyAsDouble(times[k]);
        }
        return sum;
    }

    @Test
    void theErrorFallsWithTheSixthPowerOfTheStep() {
        // closed form of ∫_0^2 e^t cos 3t dt
        double exact = (Math.exp(2) * (3 * Math.sin(6) + Math.cos(6)) - 1) / 10;
        double coarse = Math.abs(integral(Motions.grid(41, 0.05), t -> Math.exp(t) * Math.cos(3 * t)) - exact);
        double fine = Math.abs(integral(Motions.grid(81, 0.025), t -> Math.exp(t) * Math.cos(3 * t)) - exact);
        double order = Math.log(coarse / fine) / Math.log(2);
        assertTrue(order > 5.7 && order < 7.3, "measured order " + order);
    }

    @Test
    void fewSamplesLowerTheDegree() {
        assertEquals(0.5, integral(new double[] {0, 1}, t -> t), 1e-15);
        assertEquals(1.0 / 3, integral(new double[] {0, 0.3, 1}, t -> t * t), 1e-15);
    }

    @Test
    void oneSampleIsAFault() {
        assertThrows(RecordingFault.class, () -> Quadrature.weights(new double[] {1}));
    }

    @Test
    void timesThatNearlyCoincideDoNotBlowUpTheWeights() {
        double[] times = {0, 1, 2, 2.000001, 3, 4, 5, 6, 6.0000001, 7};
        double size = 0;
        for (double weight : Quadrature.weights(times)) {
            size += Math.abs(weight);
        }
        // noise of a sample must not enter the integral by more than a few times the duration of 7
        assertTrue(size < 70, "sum of magnitudes " + size);
        assertEquals(24.5, integral(times, t -> t), 1e-9);
    }

    @Test
    void timesFarFromZeroLoseNothing() {
        double[] late = Motions.grid(20, 0.5);
        for (int k = 0; k < late.length; k++) {
            late[k] += 1.7e9;
        }
        assertEquals(9.5, integral(late, t -> 1), 1e-9);
    }
}
