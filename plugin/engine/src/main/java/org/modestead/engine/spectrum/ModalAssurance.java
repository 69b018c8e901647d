package org.modestead.engine.spectrum;

import java.util.List;
import org.modestead.engine.linalg.Complex;

/**
 * Likeness of two mode shapes, the modal assurance criterion
 *
 * <pre>    MAC(a, b) = |a* b|² / ((a* a)(b* b))</pre>
 *
 * <p>In [0, 1], 1 exactly when the shapes are proportional; a complex factor on either does not matter. The conjugate
 * matters: without it a travelling wave would equal its reflection. Allemang and Brown, Proc. 1st IMAC, 1982.
 */
public final class ModalAssurance {

    private ModalAssurance() {}

    /**
     * @param a shape, at least one component not 0
     * @param b shape of the same length, at least one component not 0
     * @return in [0, 1]
     * @throws IllegalArgumentException if the lengths differ or a shape is zero
     */
    public static double of(List<Complex> a, List<Complex> b) {
        if (a.size() != b.size()) {
            throw new IllegalArgumentException("shapes of " + a.size() + " and " + b.size()
                    + " components cannot be compared");
        }
        double sizes = squared(a) * squared(b);
        if (!(sizes > 0)) {
            throw new IllegalArgumentException("a shape without any component that is not zero resembles nothing");
        }
        Complex product = Complex.ZERO;
        for (int k = 0; k < a.size(); k++) {
            product = product.plus(a.get(k).conj().times(b.get(k)));
        }
        return Math.min(1, (product.re() * product.re() + product.im() * product.im()) / sizes);
    }

    /** Returns {@link #of}, or 0 where a shape has no component that is not zero: it resembles nothing. */
    static double orNone(List<Complex> a, List<Complex> b) {
        return squared(a) > 0 && squared(b) > 0 ? of(a, b) : 0;
    }

    private static double squared(List<Complex> shape) {
        return shape.stream().mapToDouble(z -> z.re() * z.re() + z.im() * z.im()).sum();
    }
}
