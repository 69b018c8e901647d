package org.modestead.engine.kernel;

import java.util.List;
import java.util.OptionalDouble;

/**
 * {@code K(x, y) = exp(-|x-y|²/(2 s²))}. Its space holds no non-zero polynomial and no constant (Steinwart, Hush and Scovel, IEEE
 * Trans. Inf. Theory 52:4635, 2006; Minh, Constr. Approx. 32:307, 2010), hence no eigenfunction of a polynomial flow.
 */
public final class GaussianKernels implements KernelFamily {

    @Override
    public String id() {
        return "gaussian";
    }

    @Override
    public String title() {
        return "Gaussian";
    }

    @Override
    public String formula() {
        return "exp(-|x-y|²/(2 scale²))";
    }

    @Override
    public List<Parameter> parameters() {
        return List.of(ScaleHeuristic.PARAMETER);
    }

    @Override
    public Kernel create(KernelSpec spec) {
        double scale = Parameters.read(spec, this, ScaleHeuristic.PARAMETER.name());
        return new RadialKernel(spec, new SpaceFacts(false, false, OptionalDouble.empty(),
                "The space holds no constant, no polynomial and no exponential: polynomial motion has no mode in it, although forecasts through it may be good."),
                squared -> Math.exp(-squared / (2 * scale * scale)));
    }
}
