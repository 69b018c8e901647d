package org.modestead.engine.kernel;

import java.util.List;
import java.util.OptionalDouble;

/**
 * {@code K(x, y) = (c + x·y)^d}: polynomials up to degree d, all of them for c &gt; 0. For one coordinate and c = 1,
 * {@code ‖x^n‖² = 1/binom(d, n)}; in general {@code ‖x_k‖² = 1/(d c^(d-1))}.
 */
final class PolynomialKernels implements KernelFamily {

    @Override
    public String id() {
        return "polynomial";
    }

    @Override
    public String title() {
        return "Polynomial";
    }

    @Override
    public String formula() {
        return "(offset + x·y)^degree";
    }

    @Override
    public List<Parameter> parameters() {
        return List.of(new Parameter("degree", "Degree", "Largest total degree of the polynomials in the space.", 1, 3),
                new Parameter("offset", "Offset", "Positive: all degrees up to the largest; zero: the largest degree alone.", 0, 1));
    }

    @Override
    public Kernel create(KernelSpec spec) {
        double degree = Parameters.read(spec, this, "degree");
        double offset = Parameters.read(spec, this, "offset");
        if (degree % 1 != 0) {
            throw new org.modestead.engine.FitFault("kernel polynomial", "degree is " + degree, "give a whole number");
        }
        boolean coordinates = degree == 1 || offset > 0;
        OptionalDouble norm = coordinates ? OptionalDouble.of(1 / (degree * Math.pow(offset, degree - 1))) : OptionalDouble.empty();
        return new DotProductKernel(spec, new SpaceFacts(offset > 0, coordinates, norm, room(offset > 0, coordinates),
                sentence((int) degree, offset > 0)), t -> Math.pow(offset + t, degree),
                n -> coefficient((int) degree, offset, n));
    }

    /** Only linear and affine motion leads from polynomials up to a degree into the same: f·∇ raises the degree by that of f less one. */
    private static String sentence(int degree, boolean constants) {
        return "The space holds polynomials " + (constants ? "up to" : "of") + " degree " + degree + (constants ? "" : " and no others")
                + ": motion that leads out of them (a term of higher degree) has no mode in it.";
    }

    private static ModeRoom room(boolean constants, boolean coordinates) {
        if (constants) {
            return ModeRoom.AFFINE;
        }
        return coordinates ? ModeRoom.LINEAR : ModeRoom.PRODUCTS;
    }

    private static double coefficient(int degree, double offset, int n) {
        if (n > degree) {
            return 0;
        }
        double out = Math.pow(offset, degree - n);
        for (int k = 1; k <= n; k++) {
            out *= (double) (degree - n + k) / k;
        }
        return out;
    }
}
