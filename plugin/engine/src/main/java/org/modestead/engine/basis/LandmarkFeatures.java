package org.modestead.engine.basis;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.Triangular;

/**
 * Orthonormal functions of a kernel's space that span the sections at a few landmarks,
 * {@code q(x) = C⁻¹ k(x)} with {@code k_i(x) = K(x, z_i)} and {@code K(z, z) = C Cᵀ}.
 *
 * <p>Landmarks are chosen greedily: always the point whose section is farthest from the span so far (partial Cholesky
 * with diagonal pivoting), until the farthest is at rounding distance. Touches {@code m r} kernel values and never forms
 * an m x m matrix. Harbrecht, Peters and Schneider, Appl. Numer. Math. 62:428, 2012.
 *
 * @param kernel K
 * @param landmarks z, r x N
 * @param inverseTransposed C⁻ᵀ, r x r, upper triangular
 */
public record LandmarkFeatures(Kernel kernel, DMatrixRMaj landmarks, DMatrixRMaj inverseTransposed) implements FunctionBasis {

    private static final double STOP = 1e-13;

    /**
     * Chooses landmarks among points.
     *
     * @param kernel K
     * @param points m x N
     * @param largest most landmarks, at least 1
     * @param progress polled once a landmark
     */
    public static LandmarkFeatures choose(Kernel kernel, DMatrixRMaj points, int largest, Progress progress) {
        int m = points.numRows;
        double[] distance = kernel.diagonal(points);
        double first = Arrays.stream(distance).max().orElse(0);
        int most = Math.min(largest, m);
        double[][] factor = new double[most][];
        int[] chosen = new int[most];
        int rank = 0;
        while (rank < most) {
            progress.checkCancelled();
            int pivot = farthest(distance);
            if (!(distance[pivot] > STOP * first)) {
                break;
            }
            chosen[rank] = pivot;
            factor[rank] = nextColumn(kernel, points, pivot, distance, factor, rank);
            rank++;
        }
        return from(kernel, points, factor, Arrays.copyOf(chosen, rank));
    }

    private static int farthest(double[] distance) {
        int best = 0;
        for (int i = 1; i < distance.length; i++) {
            best = distance[i] > distance[best] ? i : best;
        }
        return best;
    }

    private static double[] nextColumn(Kernel kernel, DMatrixRMaj points, int pivot, double[] distance, double[][] factor, int rank) {
        DMatrixRMaj centre = Matrices.block(points, pivot, pivot + 1, 0, points.numCols);
        double[] column = kernel.matrix(points, centre).data;
        for (int k = 0; k < rank; k++) {
            double weight = factor[k][pivot];
            double[] earlier = factor[k];
            for (int i = 0; i < column.length; i++) {
                column[i] -= weight * earlier[i];
            }
        }
        double root = Math.sqrt(distance[pivot]);
        for (int i = 0; i < column.length; i++) {
            column[i] /= root;
            distance[i] = Math.max(0, distance[i] - column[i] * column[i]);
        }
        distance[pivot] = 0;
        return column;
    }

    private static LandmarkFeatures from(Kernel kernel, DMatrixRMaj points, double[][] factor, int[] chosen) {
        int r = chosen.length;
        DMatrixRMaj landmarks = new DMatrixRMaj(r, points.numCols);
        DMatrixRMaj lower = new DMatrixRMaj(r, r);
        for (int i = 0; i < r; i++) {
            System.arraycopy(points.data, chosen[i] * points.numCols, landmarks.data, i * points.numCols, points.numCols);
            for (int j = 0; j <= i; j++) {
                lower.set(i, j, factor[j][chosen[i]]);
            }
        }
        DMatrixRMaj inverse = Triangular.inverseOfLower(lower);
        CommonOps_DDRM.transpose(inverse);
        return new LandmarkFeatures(kernel, landmarks, inverse);
    }

    @Override
    public int size() {
        return landmarks.numRows;
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        return Matrices.product(kernel.matrix(states, landmarks), inverseTransposed);
    }

    @Override
    public String describe() {
        return size() + " landmark functions, " + kernel.spec().label();
    }
}
