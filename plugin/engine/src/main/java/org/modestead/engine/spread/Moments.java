package org.modestead.engine.spread;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.ObservedRun;

/**
 * Sums over observations, which are all that a fit needs of them:
 *
 * <pre>    gram = Σ now nowᵀ,  cross = Σ now nextᵀ,  second = Σ next nextᵀ,  observable = Σ now targetᵀ</pre>
 *
 * @param gram (p + k) x (p + k), k functions of the inputs last
 * @param cross (p + k) x p
 * @param second p x p
 * @param observable (p + k) x c
 */
record Moments(DMatrixRMaj gram, DMatrixRMaj cross, DMatrixRMaj second, DMatrixRMaj observable) {

    static Moments of(ObservedRun rows) {
        return new Moments(Matrices.transposeProduct(rows.now(), rows.now()), Matrices.transposeProduct(rows.now(), rows.next()),
                Matrices.transposeProduct(rows.next(), rows.next()), Matrices.transposeProduct(rows.now(), rows.target()));
    }

    /**
     * Adds up cells, each as often as it was drawn.
     *
     * @param cells at least one
     * @param times a count or weight for every cell
     */
    static Moments sum(List<Moments> cells, double[] times) {
        Moments first = cells.get(0);
        Moments out = new Moments(first.gram.createLike(), first.cross.createLike(), first.second.createLike(),
                first.observable.createLike());
        for (int k = 0; k < times.length; k++) {
            if (times[k] != 0) {
                out.add(cells.get(k), times[k]);
            }
        }
        return out;
    }

    private void add(Moments other, double weight) {
        CommonOps_DDRM.addEquals(gram, weight, other.gram);
        CommonOps_DDRM.addEquals(cross, weight, other.cross);
        CommonOps_DDRM.addEquals(second, weight, other.second);
        CommonOps_DDRM.addEquals(observable, weight, other.observable);
    }

    /**
     * Returns the sums of what the last functions do not explain, {@code A_ij - A_ik A_kk⁻¹ A_kj} for each of them.
     *
     * @param known k, how many
     */
    Moments without(int known) {
        if (known == 0) {
            return this;
        }
        int p = gram.numCols - known;
        DMatrixRMaj inverse = Matrices.block(gram, p, p + known, p, p + known);
        CommonOps_DDRM.pinv(inverse.copy(), inverse);
        DMatrixRMaj onNow = Matrices.block(gram, p, p + known, 0, p);
        DMatrixRMaj onNext = Matrices.block(cross, p, p + known, 0, cross.numCols);
        DMatrixRMaj onTarget = Matrices.block(observable, p, p + known, 0, observable.numCols);
        DMatrixRMaj explains = Matrices.product(inverse, onNow);
        return new Moments(less(Matrices.block(gram, 0, p, 0, p), explains, onNow),
                less(Matrices.block(cross, 0, p, 0, cross.numCols), explains, onNext),
                less(second, Matrices.product(inverse, onNext), onNext),
                less(Matrices.block(observable, 0, p, 0, observable.numCols), explains, onTarget));
    }

    private static DMatrixRMaj less(DMatrixRMaj a, DMatrixRMaj explained, DMatrixRMaj other) {
        DMatrixRMaj out = a.copy();
        CommonOps_DDRM.subtractEquals(out, Matrices.transposeProduct(explained, other));
        return out;
    }
}
