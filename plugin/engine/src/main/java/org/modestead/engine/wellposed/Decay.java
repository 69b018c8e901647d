package org.modestead.engine.wellposed;

import org.modestead.engine.linalg.Complex;

/**
 * {@code e^(λτ)} for one τ after the other. On even times the τ differ by rounding only, so that the exponential is worked out once and
 * corrected by {@code 1 + λ Δτ}, which is exact to rounding while {@code |λ Δτ| < 1e-8}.
 */
final class Decay {

    private static final double NEAR = 1e-8;

    private final Complex rate;
    private final double speed;
    private double known = Double.NaN;
    private double knownRe;
    private double knownIm;
    private double re;
    private double im;

    /** @param rate λ, whose real part may be -∞ */
    Decay(Complex rate) {
        this.rate = rate;
        this.speed = rate.abs();
    }

    /** Goes to another τ. */
    void over(double tau) {
        double off = tau - known;
        if (off != 0 && Math.abs(off) * speed < NEAR) {
            double turnedRe = rate.re() * off;
            double turnedIm = rate.im() * off;
            re = knownRe + (turnedRe * knownRe - turnedIm * knownIm);
            im = knownIm + (turnedRe * knownIm + turnedIm * knownRe);
        } else {
            if (off != 0) {
                Complex factor = rate.times(tau).exp();
                knownRe = factor.re();
                knownIm = factor.im();
                known = tau;
            }
            re = knownRe;
            im = knownIm;
        }
    }

    /** Returns e^(λτ). */
    Complex factor() {
        return new Complex(re, im);
    }

    double re() {
        return re;
    }

    double im() {
        return im;
    }
}
