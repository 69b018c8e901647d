package org.modestead.engine.kernel;

import java.util.List;

/** Kernel families brought by one provider, found by {@link java.util.ServiceLoader}; others may add theirs. */
public interface KernelLibrary {

    /** Returns the families in the order in which they are offered, ids unique. */
    List<KernelFamily> families();
}
