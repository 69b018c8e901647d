package org.modestead.engine.linalg;

import java.util.Arrays;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.linalg.LinearAlgebra.Svd;
import org.modestead.engine.linalg.LinearAlgebra.SymmetricEigen;

/**
 * The leading singular triples of a matrix.
 *
 * <p>A tall (or wide) matrix of good condition is reduced to its triangle first, {@code A = Q R}. Small matrices go to the
 * full decomposition. Larger ones go through the smaller Gram matrix, which costs
 * {@code O(mn min(m,n))} in fast products but blurs singular values below {@code √ε s_1}; the decomposition of the
 * matrix restricted to the directions found so then restores accuracy for those that are kept. Directions whose
 * singular value lies below {@code 1e-7 s_1} are dropped on that path.
 */
public final class ThinSvd {

    private static final int FULL_UP_TO = 300;
    private static final int TALL = 4;
    private static final int WORTH_IT = 16;
    /** Entries from which a wide matrix is not turned over. */
    private static final int LARGE = 1 << 22;
    private static final double GRAM_FLOOR = 1e-14;

    private ThinSvd() {}

    /**
     * @param a m x n, finite; not modified
     * @param largest most triples wanted, at least 1
     * @return k = min(m, n, largest) triples or fewer on the Gram path, values falling
     */
    public static Svd of(DMatrixRMaj a, int largest) {
        if (a.numCols >= TALL * a.numRows && a.numRows >= WORTH_IT && a.getNumElements() >= LARGE) {
            Optional<Svd> found = WideSvd.of(a, largest);
            if (found.isPresent()) {
                return found.get();
            }
        }
        if (a.numCols >= TALL * a.numRows) {
            return swapped(of(CommonOps_DDRM.transpose(a, null), largest));
        }
        if (a.numRows >= TALL * a.numCols && a.numCols >= WORTH_IT) {
            Optional<TallQr> qr = TallQr.of(a);
            if (qr.isPresent()) {
                return leading(throughTriangle(qr.get()), largest);
            }
        }
        if (Math.min(a.numRows, a.numCols) <= FULL_UP_TO) {
            return leading(LinearAlgebra.installed().svd(a), largest);
        }
        return a.numRows >= a.numCols ? throughGram(a, largest) : swapped(throughGram(CommonOps_DDRM.transpose(a, null), largest));
    }

    private static Svd throughTriangle(TallQr qr) {
        Svd small = LinearAlgebra.installed().svd(qr.r());
        return new Svd(Matrices.product(qr.q(), small.u()), small.values(), small.v());
    }

    private static Svd throughGram(DMatrixRMaj a, int largest) {
        LinearAlgebra algebra = LinearAlgebra.installed();
        SymmetricEigen eigen = algebra.symmetricEigen(algebra.gram(a));
        int k = 0;
        while (k < Math.min(a.numCols, largest) && eigen.values()[k] > GRAM_FLOOR * eigen.values()[0]) {
            k++;
        }
        DMatrixRMaj directions = Matrices.block(eigen.vectors(), 0, a.numCols, 0, Math.max(k, 1));
        Svd inner = algebra.svd(algebra.multiply(a, directions));
        return new Svd(inner.u(), inner.values(), algebra.multiply(directions, inner.v()));
    }

    private static Svd swapped(Svd svd) {
        return new Svd(svd.v(), svd.values(), svd.u());
    }

    private static Svd leading(Svd svd, int largest) {
        int k = Math.min(svd.values().length, largest);
        if (k == svd.values().length) {
            return svd;
        }
        return new Svd(Matrices.block(svd.u(), 0, svd.u().numRows, 0, k), Arrays.copyOf(svd.values(), k),
                Matrices.block(svd.v(), 0, svd.v().numRows, 0, k));
    }
}
