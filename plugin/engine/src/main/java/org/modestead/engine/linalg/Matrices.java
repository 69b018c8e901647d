package org.modestead.engine.linalg;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.Cancelled;

/**
 * New matrices from old ones, in the notation of the formulas. No argument is modified. Nearly all long work goes through the
 * products, so that they end where their thread is interrupted.
 */
public final class Matrices {

    private Matrices() {}

    /** Returns rows [r0, r1) and columns [c0, c1), either of which may be none. */
    public static DMatrixRMaj block(DMatrixRMaj a, int r0, int r1, int c0, int c1) {
        return r0 == r1 || c0 == c1 ? new DMatrixRMaj(r1 - r0, c1 - c0) : CommonOps_DDRM.extract(a, r0, r1, c0, c1);
    }

    /**
     * Returns chosen rows.
     *
     * @param a m x n
     * @param chosen each in [0, m), in the order wanted
     */
    public static DMatrixRMaj rows(DMatrixRMaj a, int[] chosen) {
        DMatrixRMaj out = new DMatrixRMaj(chosen.length, a.numCols);
        for (int i = 0; i < chosen.length; i++) {
            System.arraycopy(a.data, chosen[i] * a.numCols, out.data, i * a.numCols, a.numCols);
        }
        return out;
    }

    /** Returns c · A. */
    public static DMatrixRMaj scaled(DMatrixRMaj a, double c) {
        DMatrixRMaj out = a.copy();
        CommonOps_DDRM.scale(c, out);
        return out;
    }

    /** Returns A B. */
    public static DMatrixRMaj product(DMatrixRMaj a, DMatrixRMaj b) {
        Cancelled.ifInterrupted();
        return LinearAlgebra.installed().multiply(a, b);
    }

    /** Returns Aᵀ B. */
    public static DMatrixRMaj transposeProduct(DMatrixRMaj a, DMatrixRMaj b) {
        Cancelled.ifInterrupted();
        return LinearAlgebra.installed().multiplyTransA(a, b);
    }

    /** Returns A Bᵀ. */
    public static DMatrixRMaj productTranspose(DMatrixRMaj a, DMatrixRMaj b) {
        Cancelled.ifInterrupted();
        return LinearAlgebra.installed().multiplyTransB(a, b);
    }

    /** Returns Aᵀ A, exactly symmetric. */
    public static DMatrixRMaj gram(DMatrixRMaj a) {
        Cancelled.ifInterrupted();
        return LinearAlgebra.installed().gram(a);
    }

    /**
     * Returns A^k by repeated squaring.
     *
     * @param a square
     * @param k at least 0
     */
    public static DMatrixRMaj power(DMatrixRMaj a, int k) {
        DMatrixRMaj out = CommonOps_DDRM.identity(a.numRows);
        DMatrixRMaj square = a;
        for (int rest = k; rest > 0; rest >>= 1) {
            if ((rest & 1) == 1) {
                out = product(out, square);
            }
            if (rest > 1) {
                square = product(square, square);
            }
        }
        return out;
    }
}
