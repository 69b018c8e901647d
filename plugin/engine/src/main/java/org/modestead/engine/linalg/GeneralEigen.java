package org.modestead.engine.linalg;

import java.util.List;
import org.ejml.data.ZMatrixRMaj;

/**
 * Eigenvalues and right eigenvectors of a real square matrix, {@code A v_j = λ_j v_j}.
 *
 * <p>Complex eigenvalues come in neighbouring conjugate pairs, positive imaginary part first, with conjugate vectors.
 * The vectors may be nearly dependent when A is nearly defective: look at their condition before trusting
 * {@code A = V Λ V⁻¹}.
 *
 * @param values length n, in no particular order otherwise
 * @param vectors n x n, columns of Euclidean length 1 whose largest entry is real and positive
 */
public record GeneralEigen(List<Complex> values, ZMatrixRMaj vectors) {

    private static final double CLEARLY = 1 + 1e-9;

    /** Takes an immutable copy. */
    public GeneralEigen {
        values = List.copyOf(values);
    }

    /**
     * Writes a vector into a column, brought to length 1 with its largest entry real and positive, and its conjugate into the next.
     *
     * @param vectors n x n, changed in place
     * @param k column
     * @param re real parts, length n
     * @param im imaginary parts, length n; not read for a real vector
     * @param complex whether the vector is complex
     */
    public static void put(ZMatrixRMaj vectors, int k, double[] re, double[] im, boolean complex) {
        double norm = 0;
        double largest = 0;
        int at = 0;
        for (int i = 0; i < re.length; i++) {
            double size = complex ? Math.hypot(re[i], im[i]) : Math.abs(re[i]);
            norm = Math.hypot(norm, size);
            if (size > largest * CLEARLY) {
                largest = size;
                at = i;
            }
        }
        Complex turn = new Complex(re[at], complex ? -im[at] : 0).times(1 / (largest * norm));
        for (int i = 0; i < re.length; i++) {
            Complex entry = new Complex(re[i], complex ? im[i] : 0).times(turn);
            vectors.set(i, k, entry.re(), complex ? entry.im() : 0);
            if (complex) {
                vectors.set(i, k + 1, entry.re(), -entry.im());
            }
        }
    }
}
