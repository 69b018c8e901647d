package org.modestead.engine.basis;

import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Matrices;

/**
 * Functions through which inputs act on functions ψ of the state: 1, every input u_l, and, where they act in proportion to
 * them, the products {@code u_l ψ_j(x)}. Evaluated at {@code [x, u]}, columns of the state first. The constant stands for a
 * resting point that is not zero, as a constant input would move it.
 *
 * @param stateSize N
 * @param inputs c, columns of inputs
 * @param factors functions ψ whose products with the inputs are among them; none where size 0
 */
public record InputTerms(int stateSize, int inputs, Optional<FunctionBasis> factors) implements FunctionBasis {

    /** The constant and the inputs alone. */
    public InputTerms(int stateSize, int inputs) {
        this(stateSize, inputs, Optional.empty());
    }

    @Override
    public int size() {
        return 1 + inputs * (1 + factors.map(FunctionBasis::size).orElse(0));
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj arguments) {
        int p = arguments.numRows;
        DMatrixRMaj out = new DMatrixRMaj(p, size());
        DMatrixRMaj values = factors.map(f -> f.evaluate(Matrices.block(arguments, 0, p, 0, stateSize)))
                .orElseGet(() -> new DMatrixRMaj(p, 0));
        for (int i = 0; i < p; i++) {
            int at = i * out.numCols;
            out.data[at++] = 1;
            for (int l = 0; l < inputs; l++) {
                double u = arguments.get(i, stateSize + l);
                out.data[at++] = u;
                for (int j = 0; j < values.numCols; j++) {
                    out.data[at++] = u * values.get(i, j);
                }
            }
        }
        return out;
    }

    @Override
    public String describe() {
        return size() + " input terms";
    }
}
