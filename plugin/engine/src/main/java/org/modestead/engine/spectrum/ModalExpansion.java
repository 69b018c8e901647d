package org.modestead.engine.spectrum;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.ComplexSystem;
import org.modestead.engine.linalg.GeneralEigen;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.operator.OrthonormalCompression;

/**
 * Eigenpairs of one compression and the weights of the observable on them.
 *
 * <pre>
 *   Ã v_j = λ_j v_j,  |v_j| = 1,        φ_j = Σ_i v_ij q_i
 *   joint weights:  V ξ = &lt;g, q&gt; by least squares (the smallest ξ where V is rank deficient)
 *   solo weights:   v_j* &lt;g, q&gt;
 * </pre>
 *
 * @param compression at rank r
 * @param eigenvalues r, of the compressed operator
 * @param rates r, in continuous time
 * @param vectors V, r x r
 * @param joint ξ, r x N
 * @param solo r x N
 * @param condition 2-norm condition of V, which is that of the unit eigenfunctions
 */
public record ModalExpansion(
        OrthonormalCompression compression,
        List<Complex> eigenvalues,
        List<Complex> rates,
        ZMatrixRMaj vectors,
        ZMatrixRMaj joint,
        ZMatrixRMaj solo,
        double condition) {

    /** Takes immutable copies. */
    public ModalExpansion {
        eigenvalues = List.copyOf(eigenvalues);
        rates = List.copyOf(rates);
    }

    /** Solves the eigenproblem of a compression. */
    public static ModalExpansion of(OrthonormalCompression compression) {
        GeneralEigen eigen = LinearAlgebra.installed().eigen(compression.action());
        List<Complex> rates = new ArrayList<>();
        for (Complex value : eigen.values()) {
            rates.add(compression.evolution().rate(value));
        }
        ComplexSystem system = ComplexSystem.of(eigen.vectors());
        return new ModalExpansion(compression, eigen.values(), rates, eigen.vectors(), system.solve(compression.observable()),
                ComplexMatrices.conjugateTransposeProduct(eigen.vectors(), compression.observable()),
                system.condition());
    }

    /** Returns r. */
    public int rank() {
        return rates.size();
    }

    /**
     * Evaluates the eigenfunctions.
     *
     * @param states p x N
     * @return p x r with entry (i, j) = φ_j(x_i)
     */
    public ZMatrixRMaj eigenfunctions(DMatrixRMaj states) {
        return ComplexMatrices.product(compression.evaluate(states), vectors);
    }
}
