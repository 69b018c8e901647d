package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.Ridge;
import org.modestead.engine.spectrum.Mode;

/**
 * In the data inner product, the residual of an eigenpair with nothing left out:
 *
 * <pre>    res² = v*(N - μ M* - conj(μ) M + |μ|² G)v / v*Gv,    in orthonormal functions G = I, M = Ã</pre>
 *
 * <p>Colbrook and Townsend, Comm. Pure Appl. Math. 77:221, 2024. Informs: it is measured on the training data.
 */
public final class ExactResidual implements Check {

    @Override
    public String id() {
        return "exact-residual";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        OrthonormalCompression compression = evidence.operator().chosen();
        List<Finding> findings = new ArrayList<>();
        if (compression.innerProduct() != InnerProduct.DATA) {
            return findings;
        }
        DMatrixRMaj action = Ridge.removed(compression, evidence.operator().ridge());
        for (Mode mode : evidence.spectrum().modes()) {
            int j = mode.indices().get(0);
            double residual = of(action, compression.second(), evidence.spectrum().vectors(), j,
                    evidence.spectrum().eigenvalues().get(j));
            findings.add(new Finding(mode.number(), id(), residual, Double.NaN, true, String.format(Locale.ROOT,
                    "Over the training data one application of the operator misses the eigenvalue by %.3g.", residual)));
        }
        return findings;
    }

    /**
     * Returns the residual of one eigenpair in orthonormal functions.
     *
     * @param action Ã, r x r
     * @param second Ñ, r x r
     * @param vectors r x r
     * @param j column, of unit length
     * @param value μ
     * @return at least 0
     */
    public static double of(DMatrixRMaj action, DMatrixRMaj second, ZMatrixRMaj vectors, int j, Complex value) {
        double squares = form(second, vectors, j).re() - 2 * value.conj().times(form(action, vectors, j)).re() + value.abs() * value.abs();
        return Math.sqrt(Math.max(0, squares));
    }

    private static Complex form(DMatrixRMaj a, ZMatrixRMaj vectors, int j) {
        Complex sum = Complex.ZERO;
        for (int i = 0; i < a.numRows; i++) {
            Complex row = Complex.ZERO;
            for (int k = 0; k < a.numCols; k++) {
                row = row.plus(ComplexMatrices.entry(vectors, k, j).times(a.get(i, k)));
            }
            sum = sum.plus(ComplexMatrices.entry(vectors, i, j).conj().times(row));
        }
        return sum;
    }
}
