package org.modestead.engine.kernel;

import java.util.List;
import java.util.OptionalDouble;
import java.util.function.DoubleFunction;
import java.util.function.DoubleUnaryOperator;

/**
 * A family of kernels of the distance with one parameter, the length scale.
 *
 * @param id stable
 * @param title for people
 * @param formula in plain text
 * @param space what follows for modes from what the space holds; no space of this kind holds constants or coordinates
 * @param profile kernel as a function of the squared distance, for a scale
 * @param smooth whether that function is smooth at zero
 */
record RadialFamily(String id, String title, String formula, String space, DoubleFunction<DoubleUnaryOperator> profile, boolean smooth)
        implements KernelFamily {

    @Override
    public List<Parameter> parameters() {
        return List.of(ScaleHeuristic.PARAMETER);
    }

    @Override
    public Kernel create(KernelSpec spec) {
        double scale = Parameters.read(spec, this, ScaleHeuristic.PARAMETER.name());
        return new RadialKernel(spec, new SpaceFacts(false, false, OptionalDouble.empty(), ModeRoom.STEADY, space), profile.apply(scale),
                smooth ? scale * scale : 0);
    }
}
