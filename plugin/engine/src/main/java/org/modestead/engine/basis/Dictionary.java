package org.modestead.engine.basis;

import java.util.Optional;

/** An explicit list of functions, known before the number of state components is. Immutable. */
public interface Dictionary {

    /**
     * Returns the functions on states of N components.
     *
     * @throws org.modestead.engine.FitFault if there would be too many, or if the dictionary does not suit N
     */
    FunctionBasis on(int stateSize);

    /**
     * Returns the functions through which inputs act on these functions, evaluated at {@code [x, u]}: by default the constant,
     * the inputs, and their products with every function, which is exact to first order in the inputs.
     *
     * @param stateSize N
     * @param inputs columns of inputs
     * @throws org.modestead.engine.FitFault if there would be too many
     */
    default FunctionBasis inputTerms(int stateSize, int inputs) {
        return new InputTerms(stateSize, inputs, Optional.of(on(stateSize)));
    }

    /** Returns what it is, for the report. */
    String describe();

    /** Monomials {@code √(|α|!/α!) x^α} with {@code |α| <= degree}, the constant first. */
    static Dictionary monomials(int degree) {
        return new MonomialDictionary(degree);
    }

    /**
     * The constant and {@code cos(2π n x_k/period_k), sin(2π n x_k/period_k)}, n = 1..order, for every component.
     *
     * @param periods one a component, or a single one for all
     */
    static Dictionary fourier(int order, double... periods) {
        return new FourierDictionary(order, periods.clone());
    }
}
