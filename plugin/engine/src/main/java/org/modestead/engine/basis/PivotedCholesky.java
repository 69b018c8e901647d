package org.modestead.engine.basis;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.PriorityQueue;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.linalg.Matrices;

/**
 * Partial Cholesky factorisation {@code K(x, x) ≈ F Fᵀ} with diagonal pivoting: the next pivot is always the point whose section is farthest
 * from the span of those before, the first of them where several are.
 *
 * <p>Distances only fall as pivots join, so what a distance was some pivots ago bounds what it is. Points are held in blocks of neighbours;
 * a block is brought up to date only when its bound says that the farthest point may lie in it, and then for all pivots it missed at once, in
 * the processor's cache. The pivots are those of the plain algorithm to the last bit; on smooth motion most of its work is never done.
 * Cost at most {@code O(m r² + m r N)}, memory at most {@code m r} numbers.
 *
 * <p>Harbrecht, Peters and Schneider, Appl. Numer. Math. 62:428, 2012; the bounds as in Minoux, Lect. Notes Control Inf. Sci. 7:234, 1978.
 */
final class PivotedCholesky {

    private static final double STOP = 1e-13;

    private final Kernel kernel;
    private final DMatrixRMaj points;
    private final DMatrixRMaj pivots;
    private final double[][] rows;
    private final double[] roots;
    private final int[] chosen;
    private int rank;

    private PivotedCholesky(Kernel kernel, DMatrixRMaj points, int most) {
        this.kernel = kernel;
        this.points = points;
        pivots = new DMatrixRMaj(most, points.numCols);
        rows = new double[most][];
        roots = new double[most];
        chosen = new int[most];
    }

    /**
     * What was chosen.
     *
     * @param points chosen, r x N, in the order of the choice
     * @param lower C, r x r, lower triangular: {@code K(z, z) = C Cᵀ}
     */
    record Pivots(DMatrixRMaj points, DMatrixRMaj lower) {}

    /**
     * @param kernel K
     * @param points m x N
     * @param largest most pivots, at least 1
     * @param progress polled once a pivot
     */
    static Pivots choose(Kernel kernel, DMatrixRMaj points, int largest, Progress progress) {
        PivotedCholesky cholesky = new PivotedCholesky(kernel, points, Math.min(largest, points.numRows));
        cholesky.run(progress);
        return cholesky.pivots();
    }

    private void run(Progress progress) {
        double[] distance = kernel.diagonal(points);
        double first = Arrays.stream(distance).max().orElse(0);
        PriorityQueue<Block> queue = new PriorityQueue<>(Comparator.comparingDouble((Block block) -> -block.bound).thenComparingInt(block -> block.from));
        for (int from = 0; from < points.numRows; from += Block.SIZE) {
            queue.add(new Block(from, Arrays.copyOfRange(distance, from, Math.min(points.numRows, from + Block.SIZE))));
        }
        while (rank < chosen.length) {
            progress.checkCancelled();
            Block farthest = farthest(queue);
            if (!(farthest.bound > STOP * first)) {
                break;
            }
            take(farthest);
        }
    }

    /** Brings blocks up to date until the one of the largest distance is. */
    private Block farthest(PriorityQueue<Block> queue) {
        while (queue.peek().columns() < rank) {
            List<Block> stale = new ArrayList<>();
            // as many as there are cores for: what is brought up to date early need not be so later
            for (int k = 0; k < Runtime.getRuntime().availableProcessors() && !queue.isEmpty() && queue.peek().columns() < rank; k++) {
                stale.add(queue.poll());
            }
            if (stale.size() == 1) {
                update(stale.get(0));
            } else {
                stale.parallelStream().forEach(this::update);
            }
            queue.addAll(stale);
        }
        return queue.peek();
    }

    private void take(Block block) {
        int at = block.farthest();
        chosen[rank] = block.from + at;
        System.arraycopy(points.data, chosen[rank] * points.numCols, pivots.data, rank * points.numCols, points.numCols);
        roots[rank] = Math.sqrt(block.distance[at]);
        double[] row = block.row(at, rank + 1);
        DMatrixRMaj pivot = Matrices.block(pivots, rank, rank + 1, 0, points.numCols);
        row[rank] = kernel.matrix(pivot, pivot).data[0];
        for (int k = 0; k < rank; k++) {
            row[rank] -= row[k] * row[k];
        }
        row[rank] /= roots[rank];
        rows[rank] = row;
        rank++;
    }

    private void update(Block block) {
        DMatrixRMaj own = Matrices.block(points, block.from, block.from + block.distance.length, 0, points.numCols);
        for (int k = block.columns(); k < rank; k++) {
            block.add(kernel.matrix(own, Matrices.block(pivots, k, k + 1, 0, points.numCols)).data, rows[k], roots[k], chosen[k]);
        }
        block.measure();
    }

    private Pivots pivots() {
        DMatrixRMaj lower = new DMatrixRMaj(rank, rank);
        for (int i = 0; i < rank; i++) {
            System.arraycopy(rows[i], 0, lower.data, i * rank, i + 1);
        }
        return new Pivots(Matrices.block(pivots, 0, rank, 0, points.numCols), lower);
    }

    /** Neighbouring points with their columns of the factor, as far as they were needed. */
    private static final class Block {

        /** So that some hundred columns stay in a core's own cache. */
        static final int SIZE = 128;

        private final int from;
        private final double[] distance;
        private final List<double[]> factor = new ArrayList<>();
        private double bound;

        Block(int from, double[] distance) {
            this.from = from;
            this.distance = distance;
            measure();
        }

        int columns() {
            return factor.size();
        }

        void measure() {
            bound = distance[farthest()];
        }

        int farthest() {
            int best = 0;
            for (int i = 1; i < distance.length; i++) {
                best = distance[i] > distance[best] ? i : best;
            }
            return best;
        }

        double[] row(int at, int length) {
            double[] row = new double[length];
            for (int k = 0; k < factor.size(); k++) {
                row[k] = factor.get(k)[at];
            }
            return row;
        }

        /** Adds the next column, from kernel values and the pivot's row of the factor. */
        void add(double[] column, double[] pivotRow, double root, int pivot) {
            int k = factor.size();
            int l = 0;
            for (; l + 4 <= k; l += 4) {
                subtract(column, pivotRow, l, factor.get(l), factor.get(l + 1), factor.get(l + 2), factor.get(l + 3));
            }
            for (; l < k; l++) {
                subtract(column, pivotRow[l], factor.get(l));
            }
            for (int i = 0; i < column.length; i++) {
                column[i] /= root;
                distance[i] = Math.max(0, distance[i] - column[i] * column[i]);
            }
            if (pivot >= from && pivot < from + distance.length) {
                distance[pivot - from] = 0;
            }
            factor.add(column);
        }

        /** Four one after the other in the order in which they would be alone, so that each entry is read and written once for all. */
        private static void subtract(double[] column, double[] weights, int l, double[] a, double[] b, double[] c, double[] d) {
            double wa = weights[l];
            double wb = weights[l + 1];
            double wc = weights[l + 2];
            double wd = weights[l + 3];
            for (int i = 0; i < column.length; i++) {
                column[i] = column[i] - wa * a[i] - wb * b[i] - wc * c[i] - wd * d[i];
            }
        }

        private static void subtract(double[] column, double weight, double[] earlier) {
            for (int i = 0; i < column.length; i++) {
                column[i] -= weight * earlier[i];
            }
        }
    }
}
