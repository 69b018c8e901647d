package org.modestead.engine.checks;

import java.util.function.IntToDoubleFunction;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.kernel.Kernel;

/**
 * Functions of one coordinate by their power series, and operators by their matrix in the orthonormal monomials of a
 * kernel's space, with the norms that the engine states for that kernel.
 *
 * @param kernel whose space
 */
record MonomialSpace(Kernel kernel) {

    /** An operator told by what it makes of x^n, as coefficients. */
    interface Operator {
        double[] image(int n);
    }

    double norm(int n) {
        return Math.sqrt(kernel.monomialNormSquared(n).orElseThrow());
    }

    /** Σ f_n g_n ‖x^n‖². */
    double inner(double[] f, double[] g) {
        double sum = 0;
        for (int n = 0; n < Math.min(f.length, g.length); n++) {
            sum += f[n] * g[n] * kernel.monomialNormSquared(n).orElseThrow();
        }
        return sum;
    }

    /** Matrix of an operator from this space on the first {@code size} orthonormal monomials. */
    DMatrixRMaj matrix(Operator operator, int size) {
        return matrix(operator, size, this);
    }

    /** The same into another space. */
    DMatrixRMaj matrix(Operator operator, int size, MonomialSpace target) {
        DMatrixRMaj out = new DMatrixRMaj(size, size);
        for (int j = 0; j < size; j++) {
            double[] image = operator.image(j);
            for (int i = 0; i < Math.min(size, image.length); i++) {
                out.set(i, j, image[i] * target.norm(i) / norm(j));
            }
        }
        return out;
    }

    /** g -> g(ax + b). */
    static Operator composition(double a, double b) {
        return n -> {
            double[] out = {1};
            for (int k = 0; k < n; k++) {
                out = product(out, b, a);
            }
            return out;
        };
    }

    /** g -> a g'(ax) f(x) for a polynomial f. */
    static Operator liouville(double a, double... f) {
        return n -> n == 0 ? new double[1] : product(monomial(n - 1, n * Math.pow(a, n)), f);
    }

    /** g -> x g. */
    static Operator multiplication() {
        return n -> monomial(n + 1, 1);
    }

    static double[] monomial(int degree, double factor) {
        double[] out = new double[degree + 1];
        out[degree] = factor;
        return out;
    }

    static double[] product(double[] f, double... g) {
        double[] out = new double[f.length + g.length - 1];
        for (int i = 0; i < f.length; i++) {
            for (int j = 0; j < g.length; j++) {
                out[i + j] += f[i] * g[j];
            }
        }
        return out;
    }

    /** Coefficients f^(n)(0)/n! of a function by its derivatives at 0. */
    static double[] series(int terms, IntToDoubleFunction derivative) {
        double[] out = new double[terms];
        double factorial = 1;
        for (int n = 0; n < terms; n++) {
            factorial *= Math.max(n, 1);
            out[n] = derivative.applyAsDouble(n) / factorial;
        }
        return out;
    }
}
