package org.modestead.engine.moments;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.FitFault;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebra.SymmetricEigen;
import org.modestead.engine.linalg.Matrices;

/**
 * A few rows with the same products as all snapshot pairs. With the sums {@code G = V Λ Vᵀ, M, N, B} of conditioned functions
 * f = F W (see {@link Conditioner}, R the way back) the functions themselves are {@code F = U Λ^½ Vᵀ R}, hence
 *
 * <pre>
 *   now    = [ Λ^½ Vᵀ R   ]    next = [ Λ^-½ Vᵀ M R            ]    target = [ Λ^-½ Vᵀ B ]
 *            [ 0          ]           [ (N - Mᵀ G⁻¹ M)^½ R     ]             [ 0         ]
 * </pre>
 *
 * @param now 2P x P
 * @param next 2P x P
 * @param target 2P x columns of B
 * @param condition of G: how far the conditioner was from the whole recording; digits are lost as it nears 1e16
 */
record Folding(DMatrixRMaj now, DMatrixRMaj next, DMatrixRMaj target, double condition) {

    private static final double NOISE = 64 * Math.ulp(1.0);

    static Folding of(PairMoments moments, Conditioner conditioner) {
        DMatrixRMaj gram = moments.gram().value();
        int size = gram.numRows;
        SymmetricEigen eigen = LinearAlgebra.installed().symmetricEigen(gram);
        double first = eigen.values()[0];
        if (!(first > 0) || Double.isInfinite(first)) {
            throw new FitFault("Gram matrix", "its largest eigenvalue is " + first, "the functions must be finite and not all vanish on the data");
        }
        double[] roots = new double[size];
        double[] inverse = new double[size];
        double least = first;
        for (int j = 0; j < size; j++) {
            boolean there = eigen.values()[j] > NOISE * first;
            roots[j] = there ? Math.sqrt(eigen.values()[j]) : 0;
            inverse[j] = there ? 1 / roots[j] : 0;
            least = there ? eigen.values()[j] : least;
        }
        DMatrixRMaj vectors = CommonOps_DDRM.transpose(eigen.vectors(), null);
        DMatrixRMaj forward = scaledRows(vectors, roots);
        DMatrixRMaj back = scaledRows(vectors, inverse);
        DMatrixRMaj moved = Matrices.product(back, moments.action().value());
        DMatrixRMaj rest = moments.second().value();
        CommonOps_DDRM.subtractEquals(rest, Matrices.transposeProduct(moved, moved));
        DMatrixRMaj none = new DMatrixRMaj(size, size);
        DMatrixRMaj seen = Matrices.product(back, moments.observable().value());
        return new Folding(CommonOps_DDRM.concatRowsMulti(Matrices.product(forward, conditioner.back()), none),
                CommonOps_DDRM.concatRowsMulti(Matrices.product(moved, conditioner.back()), Matrices.product(root(rest), conditioner.back())),
                CommonOps_DDRM.concatRowsMulti(seen, new DMatrixRMaj(size, seen.numCols)), first / least);
    }

    /** The same for functions that are combined from these. */
    Folding combined(DMatrixRMaj map) {
        return new Folding(Matrices.product(now, map), Matrices.product(next, map), target, condition);
    }

    /** The same with every row divided by a number. */
    Folding dividedBy(double number) {
        return new Folding(Matrices.scaled(now, 1 / number), Matrices.scaled(next, 1 / number), Matrices.scaled(target, 1 / number), condition);
    }

    /** Rows whose products are a symmetric matrix; what rounding made negative counts as nothing. */
    private static DMatrixRMaj root(DMatrixRMaj a) {
        DMatrixRMaj even = a.copy();
        CommonOps_DDRM.transpose(even);
        CommonOps_DDRM.addEquals(even, a);
        CommonOps_DDRM.scale(0.5, even);
        SymmetricEigen eigen = LinearAlgebra.installed().symmetricEigen(even);
        double[] roots = new double[even.numRows];
        for (int j = 0; j < roots.length; j++) {
            roots[j] = Math.sqrt(Math.max(0, eigen.values()[j]));
        }
        return scaledRows(CommonOps_DDRM.transpose(eigen.vectors(), null), roots);
    }

    private static DMatrixRMaj scaledRows(DMatrixRMaj a, double[] factors) {
        DMatrixRMaj out = a.copy();
        CommonOps_DDRM.multRows(factors, out);
        return out;
    }
}
