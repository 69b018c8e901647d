package org.modestead.engine.linalg;

/**
 * A complex number.
 *
 * @param re real part
 * @param im imaginary part
 */
public record Complex(double re, double im) {

    /** 0. */
    public static final Complex ZERO = new Complex(0, 0);

    private static final double SMALL = 1e-140;
    private static final double LARGE = 1e150;

    /** Returns |z|, to one unit in the last place; where squares neither overflow nor vanish by a root, which is many times faster. */
    public double abs() {
        double larger = Math.max(Math.abs(re), Math.abs(im));
        return larger > SMALL && larger < LARGE ? Math.sqrt(re * re + im * im) : Math.hypot(re, im);
    }

    /** Returns arg z in (-π, π]. */
    public double arg() {
        return Math.atan2(im, re);
    }

    /** Returns the conjugate. */
    public Complex conj() {
        return new Complex(re, -im);
    }

    /** Returns z + w. */
    public Complex plus(Complex w) {
        return new Complex(re + w.re, im + w.im);
    }

    /** Returns z - w. */
    public Complex minus(Complex w) {
        return new Complex(re - w.re, im - w.im);
    }

    /** Returns z · w. */
    public Complex times(Complex w) {
        return new Complex(re * w.re - im * w.im, re * w.im + im * w.re);
    }

    /** Returns c · z. */
    public Complex times(double c) {
        return new Complex(c * re, c * im);
    }

    /** Returns exp z. */
    public Complex exp() {
        double magnitude = Math.exp(re);
        return im == 0 ? new Complex(magnitude, 0) : new Complex(magnitude * Math.cos(im), magnitude * Math.sin(im));
    }

    /** Returns the principal logarithm, imaginary part in (-π, π]; for 0 the real part is -∞. */
    public Complex log() {
        return new Complex(Math.log(abs()), arg());
    }
}
