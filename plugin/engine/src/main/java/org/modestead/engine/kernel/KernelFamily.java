package org.modestead.engine.kernel;

import java.util.List;

/** A family of kernels with named parameters, brought by a {@link KernelLibrary}. */
public interface KernelFamily {

    /** Returns the stable id, lower case with dashes. */
    String id();

    /** Returns the name for people. */
    String title();

    /** Returns the formula in plain text, for example {@code exp(-|x-y|²/(2 s²))}. */
    String formula();

    /** Returns the parameters in order; the length scale, where the family has one, is named {@code scale}. */
    List<Parameter> parameters();

    /**
     * Makes a kernel.
     *
     * @param spec of this family, with every parameter
     * @return never null
     * @throws org.modestead.engine.FitFault if a parameter is missing or out of range
     */
    Kernel create(KernelSpec spec);

    /** Returns whether the family has a length scale that a median distance can set. */
    default boolean hasScale() {
        return parameters().stream().anyMatch(p -> p.name().equals("scale"));
    }

    /**
     * @param name in a {@link KernelSpec}
     * @param label for people
     * @param help one sentence
     * @param min smallest allowed
     * @param initial default
     */
    record Parameter(String name, String label, String help, double min, double initial) {}
}
