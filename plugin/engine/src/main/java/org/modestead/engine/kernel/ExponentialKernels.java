package org.modestead.engine.kernel;

import java.util.List;
import java.util.OptionalDouble;

/**
 * The exponential dot product kernel {@code K(x, y) = exp(ρ x·y)}: the real Fock (Bargmann) space, in which monomials
 * are orthogonal with {@code ‖x^α‖² = α!/ρ^|α|}. Bargmann, Comm. Pure Appl. Math. 14:187, 1961.
 */
final class ExponentialKernels implements KernelFamily {

    @Override
    public String id() {
        return "exponential";
    }

    @Override
    public String title() {
        return "Exponential dot product";
    }

    @Override
    public String formula() {
        return "exp(rate x·y)";
    }

    @Override
    public List<Parameter> parameters() {
        return List.of(new Parameter("rate", "Rate", "Factor of the dot product; 1 suits states of size about one.", 1e-12, 1));
    }

    @Override
    public Kernel create(KernelSpec spec) {
        double rate = Parameters.read(spec, this, "rate");
        return new DotProductKernel(spec, new SpaceFacts(true, true, OptionalDouble.of(1 / rate), ModeRoom.AFFINE,
                "The space holds all polynomials. With one coordinate only motion x' = a x + b has modes in it; orthogonal ones need b = 0."),
                t -> Math.exp(rate * t), n -> coefficient(rate, n));
    }

    private static double coefficient(double rate, int n) {
        double out = 1;
        for (int k = 1; k <= n; k++) {
            out *= rate / k;
        }
        return out;
    }
}
