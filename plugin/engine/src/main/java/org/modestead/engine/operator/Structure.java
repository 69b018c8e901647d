package org.modestead.engine.operator;

import org.modestead.engine.linalg.StableRegion;

/**
 * What is known of a motion beforehand and imposed on the fitted operator. Adjoint and norm are those of the inner product of the
 * fit: the average over the data, or that of the kernel's space.
 */
public enum Structure {

    /** {@code A = A*}: reversible motion, real rates and orthogonal eigenfunctions. Step maps and generators. */
    SELF_ADJOINT("self-adjoint"),

    /** {@code A = -A*}: a generator of motion that keeps the inner product; rates on the imaginary axis. Generators only. */
    SKEW("skew-adjoint"),

    /** {@code A*A = I}: a step that keeps the inner product, as measure-preserving motion does; multipliers on the unit circle. Step maps only. */
    UNITARY("unitary"),

    /** No eigenvalue grows: multipliers in the closed unit disc, rates in the closed left half plane. */
    STABLE("stable");

    private final String words;

    Structure(String words) {
        this.words = words;
    }

    /** Returns the name, for the report. */
    public String words() {
        return words;
    }

    /** Returns whether eigenfunctions of an operator that has it are orthogonal. */
    public boolean orthogonal() {
        return this != STABLE;
    }

    /** Returns whether an operator of a kind can have it for what it means. */
    boolean suits(Evolution evolution) {
        return switch (this) {
            case SKEW -> evolution instanceof Evolution.Generator generator && generator.contraction() == 1;
            case UNITARY -> evolution instanceof Evolution.StepMap;
            case SELF_ADJOINT, STABLE -> true;
        };
    }

    static StableRegion region(Evolution evolution) {
        return evolution instanceof Evolution.StepMap ? StableRegion.DISC : StableRegion.HALF_PLANE;
    }
}
