package org.modestead.engine.linalg;

import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.LinearAlgebra.Svd;

/**
 * A complex matrix ready for least squares, with its condition: V (m x r) is written as the real matrix
 * {@code [[Re V, -Im V], [Im V, Re V]]}, whose singular values are those of V, each twice.
 *
 * <p>Directions with singular values below {@code ε max(m, r) s_1} are left out, so a nearly defective set of
 * eigenvectors gives the smallest weights that reproduce the signal instead of a failure.
 */
public final class ComplexSystem {

    private final ZMatrixRMaj matrix;
    private final Svd svd;

    private ComplexSystem(ZMatrixRMaj matrix, Svd svd) {
        this.matrix = matrix;
        this.svd = svd;
    }

    /** @param matrix V, m x r, finite; not modified */
    public static ComplexSystem of(ZMatrixRMaj matrix) {
        int m = matrix.numRows;
        int r = matrix.numCols;
        DMatrixRMaj real = new DMatrixRMaj(2 * m, 2 * r);
        for (int i = 0; i < m; i++) {
            for (int j = 0; j < r; j++) {
                real.set(i, j, matrix.getReal(i, j));
                real.set(m + i, r + j, matrix.getReal(i, j));
                real.set(m + i, j, matrix.getImag(i, j));
                real.set(i, r + j, -matrix.getImag(i, j));
            }
        }
        return new ComplexSystem(matrix, LinearAlgebra.installed().svd(real));
    }

    /** Returns the 2-norm condition number, infinite for a singular matrix. */
    public double condition() {
        double last = svd.values()[svd.values().length - 1];
        return last == 0 ? Double.POSITIVE_INFINITY : svd.values()[0] / last;
    }

    /**
     * Solves {@code min ‖V ξ - B‖} with the smallest ξ.
     *
     * @param b m x N, real
     * @return r x N
     */
    public ZMatrixRMaj solve(DMatrixRMaj b) {
        int m = matrix.numRows;
        int r = matrix.numCols;
        // below the real B stand zeros only
        DMatrixRMaj coefficients = Matrices.transposeProduct(Matrices.block(svd.u(), 0, m, 0, svd.u().numCols), b);
        double floor = Math.ulp(1.0) * 2 * Math.max(m, r) * svd.values()[0];
        for (int i = 0; i < coefficients.numRows; i++) {
            double factor = svd.values()[i] > floor ? 1 / svd.values()[i] : 0;
            for (int k = 0; k < b.numCols; k++) {
                coefficients.data[i * b.numCols + k] *= factor;
            }
        }
        DMatrixRMaj solution = Matrices.product(svd.v(), coefficients);
        ZMatrixRMaj out = new ZMatrixRMaj(r, b.numCols);
        for (int j = 0; j < r; j++) {
            for (int k = 0; k < b.numCols; k++) {
                out.set(j, k, solution.get(j, k), solution.get(r + j, k));
            }
        }
        return out;
    }
}
