package org.modestead.engine.kernel;

import java.util.List;
import java.util.OptionalDouble;

/**
 * {@code K(x, y) = exp(-|x-y|/s)}, the Matérn kernel of smoothness 1/2. Rasmussen and Williams, <i>Gaussian Processes for Machine
 * Learning</i>, MIT Press 2006, section 4.2.1.
 */
public final class LaplacianKernels implements KernelFamily {

    @Override
    public String id() {
        return "laplacian";
    }

    @Override
    public String title() {
        return "Laplacian";
    }

    @Override
    public String formula() {
        return "exp(-|x-y|/scale)";
    }

    @Override
    public List<Parameter> parameters() {
        return List.of(ScaleHeuristic.PARAMETER);
    }

    @Override
    public Kernel create(KernelSpec spec) {
        double scale = Parameters.read(spec, this, ScaleHeuristic.PARAMETER.name());
        return new RadialKernel(spec, new SpaceFacts(false, false, OptionalDouble.empty(),
                "The space holds functions with one weak derivative and no constant: a mode in it cannot be as smooth as smooth motion asks."),
                squared -> Math.exp(-Math.sqrt(squared) / scale));
    }
}
