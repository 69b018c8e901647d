package org.modestead.engine.wellposed;

import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.spectrum.ModalExpansion;

/**
 * Values of the eigenfunctions of a rung at given states, each eigenfunction's in a row so that it is read from one end to the other. Real and imaginary
 * parts are rows of one real product; an eigenfunction that is real has no imaginary row, and of a conjugate pair only the first is worked out.
 *
 * @param values one real or imaginary part a row
 * @param real length r, row of the real part; conjugates share it
 * @param imaginary length r, row of the imaginary part, -1 where it is 0 throughout; conjugates share it
 * @param first length r, the eigenfunction whose values these are: j itself, or j - 1 where j is its conjugate
 */
record Tracks(DMatrixRMaj values, int[] real, int[] imaginary, int[] first) {

    /**
     * @param expansion on one rung, rank r
     * @param sideways R x P, R at least r: values of the orthonormal functions, one function a row
     * @return of P values each
     */
    static Tracks of(ModalExpansion expansion, DMatrixRMaj sideways) {
        int r = expansion.rank();
        ZMatrixRMaj vectors = expansion.vectors();
        int[] real = new int[r];
        int[] imaginary = new int[r];
        int[] first = new int[r];
        DMatrixRMaj parts = new DMatrixRMaj(2 * r, r);
        int rows = 0;
        for (int j = 0; j < r; j++) {
            boolean conjugate = j > 0 && first[j - 1] == j - 1 && conjugates(expansion, j - 1, j);
            first[j] = conjugate ? j - 1 : j;
            real[j] = conjugate ? real[j - 1] : rows++;
            boolean complex = !conjugate && isComplex(vectors, j);
            imaginary[j] = conjugate ? imaginary[j - 1] : complex ? rows++ : -1;
            for (int i = 0; i < r && !conjugate; i++) {
                parts.set(real[j], i, vectors.getReal(i, j));
                if (complex) {
                    parts.set(imaginary[j], i, vectors.getImag(i, j));
                }
            }
        }
        DMatrixRMaj leading = DMatrixRMaj.wrap(r, sideways.numCols, sideways.data);
        return new Tracks(Matrices.product(DMatrixRMaj.wrap(rows, r, parts.data), leading), real, imaginary, first);
    }

    private static boolean conjugates(ModalExpansion expansion, int a, int b) {
        ZMatrixRMaj vectors = expansion.vectors();
        boolean out = expansion.rates().get(a).conj().equals(expansion.rates().get(b)) && isComplex(vectors, a);
        for (int i = 0; i < vectors.numRows && out; i++) {
            out = ComplexMatrices.entry(vectors, i, a).conj().equals(ComplexMatrices.entry(vectors, i, b));
        }
        return out;
    }

    private static boolean isComplex(ZMatrixRMaj vectors, int j) {
        for (int i = 0; i < vectors.numRows; i++) {
            if (vectors.getImag(i, j) != 0) {
                return true;
            }
        }
        return false;
    }

    /**
     * Values of one eigenfunction along a run; the conjugate's of the second of a pair.
     *
     * @param j which
     * @param from its first value
     * @param count how many
     * @param driven what inputs have added, to be taken off; no entries where none are separated
     */
    Track track(int j, int from, int count, Complex[] driven) {
        double[] re = new double[count];
        double[] im = new double[count];
        System.arraycopy(values.data, real[j] * values.numCols + from, re, 0, count);
        if (imaginary[j] >= 0) {
            System.arraycopy(values.data, imaginary[j] * values.numCols + from, im, 0, count);
        }
        double[] squares = new double[count];
        for (int k = 0; k < count; k++) {
            im[k] = first[j] == j ? im[k] : -im[k];
            squares[k] = re[k] * re[k] + im[k] * im[k];
        }
        for (int k = 0; k < driven.length; k++) {
            re[k] -= driven[k].re();
            im[k] -= driven[k].im();
        }
        return new Track(re, im, squares);
    }

    /**
     * Returns the root mean square of each eigenfunction over all its values.
     *
     * @return length r
     */
    double[] sizes() {
        double[] out = new double[real.length];
        for (int j = 0; j < out.length; j++) {
            double squares = squares(real[j]) + (imaginary[j] < 0 ? 0 : squares(imaginary[j]));
            out[j] = first[j] == j ? Math.sqrt(squares / values.numCols) : out[first[j]];
        }
        return out;
    }

    private double squares(int row) {
        double sum = 0;
        for (int k = row * values.numCols; k < (row + 1) * values.numCols; k++) {
            sum += values.data[k] * values.data[k];
        }
        return sum;
    }

    /**
     * One eigenfunction along one run.
     *
     * @param re real parts, less what inputs have added
     * @param im imaginary parts, likewise
     * @param squares squared absolute values, with what inputs have added
     */
    record Track(double[] re, double[] im, double[] squares) {}
}
