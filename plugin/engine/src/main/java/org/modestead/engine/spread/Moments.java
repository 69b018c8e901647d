package org.modestead.engine.spread;

import java.util.List;
import java.util.function.Function;
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

    private static final List<Function<Moments, DMatrixRMaj>> PARTS = List.of(Moments::gram, Moments::cross, Moments::second, Moments::observable);

    /** Sums that are added up at once: the copy of the cells stays small. */
    private static final int STRIP = 4096;

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

    /**
     * Adds up cells for several draws: a product of the counts with the cells, strip by strip of the sums, instead of one pass over the cells
     * for every draw.
     *
     * @param cells at least one
     * @param times for each draw a count or weight for every cell
     * @return one for each draw
     */
    static List<Moments> sums(List<Moments> cells, List<double[]> times) {
        DMatrixRMaj counts = new DMatrixRMaj(times.toArray(double[][]::new));
        Moments first = cells.get(0);
        List<Moments> out = times.stream().map(draw -> new Moments(first.gram.createLike(), first.cross.createLike(), first.second.createLike(),
                first.observable.createLike())).toList();
        for (Function<Moments, DMatrixRMaj> part : PARTS) {
            sum(counts, cells.stream().map(cell -> part.apply(cell).data).toList(), out.stream().map(sums -> part.apply(sums).data).toList());
        }
        return out;
    }

    private static void sum(DMatrixRMaj counts, List<double[]> cells, List<double[]> out) {
        int size = cells.get(0).length;
        for (int from = 0; from < size; from += STRIP) {
            int width = Math.min(STRIP, size - from);
            DMatrixRMaj strip = new DMatrixRMaj(cells.size(), width);
            for (int k = 0; k < cells.size(); k++) {
                System.arraycopy(cells.get(k), from, strip.data, k * width, width);
            }
            double[] sums = Matrices.product(counts, strip).data;
            for (int b = 0; b < out.size(); b++) {
                System.arraycopy(sums, b * width, out.get(b), from, width);
            }
        }
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
