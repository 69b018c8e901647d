package org.modestead.engine.operator;

import java.util.Arrays;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.basis.ScaledFunctions;

/**
 * Square roots of the weights of snapshot pairs or occupation functions, with mean square 1. In the data inner product a row enters
 * sums with its weight; in a kernel's space the function of a row is multiplied by the root, which gives its row the same weight in
 * {@code FᵀF} and {@code FᵀF'}: a run of weight 2 counts as one that is there twice.
 *
 * @param roots one a row; empty where all weights are equal
 */
record RowWeights(Optional<double[]> roots) {

    /** @param weights positive, one a row */
    static RowWeights of(double[] weights) {
        if (Arrays.stream(weights).allMatch(weight -> weight == weights[0])) {
            return new RowWeights(Optional.empty());
        }
        double mean = Arrays.stream(weights).average().orElseThrow();
        return new RowWeights(Optional.of(Arrays.stream(weights).map(weight -> Math.sqrt(weight / mean)).toArray()));
    }

    /** Returns the rows times their roots and a constant. */
    DMatrixRMaj rows(DMatrixRMaj a, double constant) {
        DMatrixRMaj out = new DMatrixRMaj(a.numRows, a.numCols);
        CommonOps_DDRM.scale(constant, a, out);
        roots.ifPresent(factors -> CommonOps_DDRM.multRows(factors, out));
        return out;
    }

    /** Returns the rows times their roots. */
    DMatrixRMaj rows(DMatrixRMaj a) {
        return roots.isEmpty() ? a : rows(a, 1);
    }

    /** Returns the same compression with every function times its root. */
    GramCompression functions(GramCompression c) {
        return roots.map(factors -> new GramCompression(new ScaledFunctions(c.basis(), factors), both(c.gram(), factors),
                both(c.action(), factors), both(c.second(), factors), rows(c.observable(), 1), c.innerProduct(), c.evolution())).orElse(c);
    }

    private static DMatrixRMaj both(DMatrixRMaj a, double[] factors) {
        DMatrixRMaj out = a.copy();
        CommonOps_DDRM.multRows(factors, out);
        CommonOps_DDRM.multCols(out, factors);
        return out;
    }
}
