package org.modestead.engine.kernel;

import java.util.List;
import java.util.OptionalDouble;

/**
 * {@code K(x, y) = (1 + a + a²/3) e^-a} with {@code a = √5 |x-y|/s}. Rasmussen and Williams 2006, equation 4.17.
 */
public final class Matern52Kernels implements KernelFamily {

    @Override
    public String id() {
        return "matern52";
    }

    @Override
    public String title() {
        return "Matérn 5/2";
    }

    @Override
    public String formula() {
        return "(1 + a + a²/3) exp(-a), a = √5 |x-y|/scale";
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
                squared -> matern(Math.sqrt(5 * squared) / scale));
    }

    private static double matern(double a) {
        return (1 + a + a * a / 3) * Math.exp(-a);
    }
}
