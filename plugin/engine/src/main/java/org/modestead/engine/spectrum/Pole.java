package org.modestead.engine.spectrum;

import java.util.List;
import java.util.OptionalDouble;
import org.modestead.engine.linalg.Complex;

/**
 * One eigenvalue, or conjugate pair told as one, at one model order, against the pole of the order before that it was matched with.
 *
 * @param order model order: number of functions
 * @param rate λ per time unit, imaginary part at least 0
 * @param shape weights of the channels' newest sample, prepared units
 * @param stableFrequency whether the frequency stayed; false where nothing was matched
 * @param stableDamping whether the damping ratio stayed (the growth rate where nothing oscillates)
 * @param stableShape whether the shape stayed
 * @param stableOrders number of orders in a row up to this one on which all three stayed
 */
public record Pole(int order, Complex rate, List<Complex> shape, boolean stableFrequency, boolean stableDamping, boolean stableShape,
        int stableOrders) {

    private static final double TWO_PI = 2 * Math.PI;

    /** Takes an immutable copy. */
    public Pole {
        shape = List.copyOf(shape);
    }

    /** Returns |ω|/2π in cycles per time unit. */
    public double frequency() {
        return rate.im() / TWO_PI;
    }

    /** Returns -σ/|λ|, empty where nothing oscillates. */
    public OptionalDouble dampingRatio() {
        return rate.im() == 0 ? OptionalDouble.empty() : OptionalDouble.of(-rate.re() / rate.abs());
    }

    /** Returns whether frequency, damping and shape all stayed. */
    public boolean stable() {
        return stableFrequency && stableDamping && stableShape;
    }
}
