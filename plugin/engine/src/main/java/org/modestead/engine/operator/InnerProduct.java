package org.modestead.engine.operator;

/** In which inner product the compression is orthonormal. */
public enum InnerProduct {
    /** That of the kernel's space H. */
    SPACE,
    /** The average over the data, {@code <f, g> = Σ w f(x)* g(x)}. */
    DATA
}
