package org.modestead.engine.kernel;

import org.modestead.engine.FitFault;

/** Reads the parameters of a kernel with their ranges checked. */
final class Parameters {

    private Parameters() {}

    static double read(KernelSpec spec, KernelFamily family, String name) {
        KernelFamily.Parameter declared = family.parameters().stream().filter(p -> p.name().equals(name)).findFirst().orElseThrow();
        Double value = spec.parameters().get(name);
        if (value == null) {
            throw new FitFault("kernel " + spec.family(), "the parameter " + name + " is missing", "give " + name);
        }
        if (!(value >= declared.min()) || Double.isInfinite(value)) {
            throw new FitFault("kernel " + spec.family(), name + " is " + value, "give a finite value of at least " + declared.min());
        }
        return value;
    }
}
