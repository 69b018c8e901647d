package org.modestead.engine.kernel;

import java.util.List;
import java.util.OptionalDouble;

/** {@code K(x, y) = x·y}: its space holds the linear functions, {@code ‖x_k‖ = 1}, and nothing else. */
final class LinearKernels implements KernelFamily {

    @Override
    public String id() {
        return "linear";
    }

    @Override
    public String title() {
        return "Linear";
    }

    @Override
    public String formula() {
        return "x·y";
    }

    @Override
    public List<Parameter> parameters() {
        return List.of();
    }

    @Override
    public Kernel create(KernelSpec spec) {
        return new DotProductKernel(spec, new SpaceFacts(false, true, OptionalDouble.of(1), ModeRoom.LINEAR,
                "The space holds linear functions only: it can hold the modes of linear motion about zero and no others."), t -> t, n -> n == 1 ? 1 : 0);
    }
}
