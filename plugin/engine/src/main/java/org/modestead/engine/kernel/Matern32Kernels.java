package org.modestead.engine.kernel;

import java.util.List;
import java.util.OptionalDouble;

/**
 * {@code K(x, y) = (1 + a) e^-a} with {@code a = √3 |x-y|/s}. Rasmussen and Williams 2006, equation 4.17.
 */
public final class Matern32Kernels implements KernelFamily {

    @Override
    public String id() {
        return "matern32";
    }

    @Override
    public String title() {
        return "Matérn 3/2";
    }

    @Override
    public String formula() {
        return "(1 + a) exp(-a), a = √3 |x-y|/scale";
    }

    @Override
    public List<Parameter> parameters() {
        return List.of(ScaleHeuristic.PARAMETER);
    }

    @Override
    public Kernel create(KernelSpec spec) {
        double scale = Parameters.read(spec, this, ScaleHeuristic.PARAMETER.name());
        return new RadialKernel(spec, new SpaceFacts(false, false, OptionalDouble.empty(),
                "The space holds functions of finite smoothness that fade far from the data, and no constant."),
                squared -> matern(Math.sqrt(3 * squared) / scale));
    }

    private static double matern(double a) {
        return (1 + a) * Math.exp(-a);
    }
}
