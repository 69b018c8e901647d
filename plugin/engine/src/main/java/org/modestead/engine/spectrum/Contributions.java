package org.modestead.engine.spectrum;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Matrices;

/**
 * What a group of eigenpairs adds to n neighbouring state components, {@code Re Σ_{j in group} ξ_jk φ_j(x)}: from component 0
 * on that is the newest sample. For a conjugate
 * pair this is twice the real part of one of them; for a cluster the huge opposite weights of its members cancel.
 */
public final class Contributions {

    private static final int MANY = 1000;

    private Contributions() {}

    /**
     * @param eigenfunctions φ_j(x_i), p x r
     * @param joint ξ, r x N
     * @param group column indices
     * @param first first component
     * @param channels n, number of components
     * @return p x n
     */
    public static DMatrixRMaj of(ZMatrixRMaj eigenfunctions, ZMatrixRMaj joint, List<Integer> group, int first, int channels) {
        DMatrixRMaj out = new DMatrixRMaj(eigenfunctions.numRows, channels);
        for (int j : group) {
            double[] re = new double[channels];
            double[] im = new double[channels];
            for (int k = 0; k < channels; k++) {
                re[k] = joint.getReal(j, first + k);
                im[k] = joint.getImag(j, first + k);
            }
            for (int i = 0; i < out.numRows; i++) {
                add(eigenfunctions.getReal(i, j), re, eigenfunctions.getImag(i, j), im, out.data, i * channels);
            }
        }
        return out;
    }

    /** Adds {@code Re (a + ib)(re + i im)} to what begins at a place. */
    private static void add(double a, double[] re, double b, double[] im, double[] out, int from) {
        for (int k = 0; k < re.length; k++) {
            out[from + k] += a * re[k] - b * im[k];
        }
    }

    /**
     * Returns the mean over rows of the squared norms of what {@link #of} returns. Of many components it is summed by products of weights and
     * products of functions, {@code Σ_ab (PᵀP)_ab (QQᵀ)_ab} with {@code P = [Re φ, -Im φ]} and {@code Q = [Re ξ; Im ξ]}, so that the
     * contributions are never held; not for more than two members, whose weights may cancel.
     */
    public static double meanSquare(ZMatrixRMaj eigenfunctions, ZMatrixRMaj joint, List<Integer> group, int first, int channels) {
        if (group.size() > 2 || channels < MANY) {
            return meanSquare(of(eigenfunctions, joint, group, first, channels));
        }
        int g = group.size();
        DMatrixRMaj functions = new DMatrixRMaj(eigenfunctions.numRows, 2 * g);
        DMatrixRMaj weights = new DMatrixRMaj(2 * g, channels);
        for (int a = 0; a < g; a++) {
            int j = group.get(a);
            for (int i = 0; i < functions.numRows; i++) {
                functions.set(i, a, eigenfunctions.getReal(i, j));
                functions.set(i, g + a, -eigenfunctions.getImag(i, j));
            }
            for (int k = 0; k < channels; k++) {
                weights.set(a, k, joint.getReal(j, first + k));
                weights.set(g + a, k, joint.getImag(j, first + k));
            }
        }
        DMatrixRMaj left = Matrices.gram(functions);
        DMatrixRMaj right = Matrices.productTranspose(weights, weights);
        double sum = 0;
        for (int i = 0; i < left.getNumElements(); i++) {
            sum += left.data[i] * right.data[i];
        }
        return Math.max(0, sum) / functions.numRows;
    }

    /** Returns the mean over rows of the squared row norms. */
    public static double meanSquare(DMatrixRMaj values) {
        double sum = 0;
        for (int i = 0; i < values.getNumElements(); i++) {
            sum += values.data[i] * values.data[i];
        }
        return sum / values.numRows;
    }
}
