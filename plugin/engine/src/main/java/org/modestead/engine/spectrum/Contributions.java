package org.modestead.engine.spectrum;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;

/**
 * What a group of eigenpairs adds to n neighbouring state components, {@code Re Σ_{j in group} ξ_jk φ_j(x)}: from component 0
 * on that is the newest sample. For a conjugate
 * pair this is twice the real part of one of them; for a cluster the huge opposite weights of its members cancel.
 */
public final class Contributions {

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
        for (int i = 0; i < out.numRows; i++) {
            for (int j : group) {
                double re = eigenfunctions.getReal(i, j);
                double im = eigenfunctions.getImag(i, j);
                for (int k = 0; k < channels; k++) {
                    out.data[i * channels + k] += re * joint.getReal(j, first + k) - im * joint.getImag(j, first + k);
                }
            }
        }
        return out;
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
