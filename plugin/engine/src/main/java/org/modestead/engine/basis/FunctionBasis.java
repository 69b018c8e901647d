package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;

/** Finitely many real functions of a state that can be evaluated anywhere. */
public interface FunctionBasis {

    /** Returns the number of functions. */
    int size();

    /**
     * Evaluates every function at every state.
     *
     * @param states p x N; not modified
     * @return new p x size matrix with entry (i, j) = b_j(x_i)
     */
    DMatrixRMaj evaluate(DMatrixRMaj states);

    /**
     * As {@link #evaluate}, for a caller that does not write.
     *
     * @param states p x N; not modified
     * @return p x size; may be the states themselves
     */
    default DMatrixRMaj values(DMatrixRMaj states) {
        return evaluate(states);
    }

    /** Returns what the functions are, for the report, for example {@code 40 occupation functions}. */
    String describe();
}
