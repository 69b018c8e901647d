package org.modestead.engine.linalg;

import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_ZDRM;

/** New complex matrices from old ones, in the notation of the formulas. No argument is modified. */
public final class ComplexMatrices {

    private ComplexMatrices() {}

    /** Returns A Z for a real A. */
    public static ZMatrixRMaj product(DMatrixRMaj a, ZMatrixRMaj z) {
        DMatrixRMaj real = new DMatrixRMaj(z.numRows, z.numCols);
        DMatrixRMaj imaginary = new DMatrixRMaj(z.numRows, z.numCols);
        for (int i = 0; i < real.getNumElements(); i++) {
            real.data[i] = z.data[2 * i];
            imaginary.data[i] = z.data[2 * i + 1];
        }
        return joined(Matrices.product(a, real), Matrices.product(a, imaginary));
    }

    /** Returns Re + i Im. */
    public static ZMatrixRMaj joined(DMatrixRMaj real, DMatrixRMaj imaginary) {
        ZMatrixRMaj out = new ZMatrixRMaj(real.numRows, real.numCols);
        for (int i = 0; i < real.getNumElements(); i++) {
            out.data[2 * i] = real.data[i];
            out.data[2 * i + 1] = imaginary.data[i];
        }
        return out;
    }

    /** Returns A* B (conjugate transpose of A) for a real B, which is never held as a complex matrix. */
    public static ZMatrixRMaj conjugateTransposeProduct(ZMatrixRMaj a, DMatrixRMaj b) {
        DMatrixRMaj real = new DMatrixRMaj(a.numRows, a.numCols);
        DMatrixRMaj opposite = new DMatrixRMaj(a.numRows, a.numCols);
        for (int i = 0; i < real.getNumElements(); i++) {
            real.data[i] = a.data[2 * i];
            opposite.data[i] = 0 - a.data[2 * i + 1];
        }
        return joined(Matrices.transposeProduct(real, b), Matrices.transposeProduct(opposite, b));
    }

    /** Returns A* B (conjugate transpose of A). */
    public static ZMatrixRMaj conjugateTransposeProduct(ZMatrixRMaj a, ZMatrixRMaj b) {
        ZMatrixRMaj out = new ZMatrixRMaj(a.numCols, b.numCols);
        CommonOps_ZDRM.multTransA(a, b, out);
        return out;
    }

    /** Returns a real matrix as a complex one. */
    public static ZMatrixRMaj of(DMatrixRMaj a) {
        return joined(a, new DMatrixRMaj(a.numRows, a.numCols));
    }

    /** Returns one entry. */
    public static Complex entry(ZMatrixRMaj a, int i, int j) {
        return new Complex(a.getReal(i, j), a.getImag(i, j));
    }
}
