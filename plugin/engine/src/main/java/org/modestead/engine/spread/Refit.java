package org.modestead.engine.spread;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.CommonOps_ZDRM;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.GeneralEigen;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.operator.OrthonormalCompression;

/**
 * The eigenpairs of one replicate.
 *
 * @param eigenvalues r, of the compressed operator
 * @param rates r
 * @param functions R' x r, eigenfunctions as combinations of the functions p of the {@link Frame}, columns of length 1
 * @param weights r x c, of the observable on them; NaN where the eigenvectors are dependent
 */
record Refit(List<Complex> eigenvalues, List<Complex> rates, ZMatrixRMaj functions, ZMatrixRMaj weights) {

    static Refit of(OrthonormalCompression white, double[] scale) {
        GeneralEigen eigen = LinearAlgebra.installed().eigen(white.action());
        List<Complex> rates = new ArrayList<>();
        eigen.values().forEach(value -> rates.add(white.evolution().rate(value)));
        DMatrixRMaj map = white.map().copy();
        CommonOps_DDRM.multRows(scale, map);
        ZMatrixRMaj functions = ComplexMatrices.product(map, eigen.vectors());
        ZMatrixRMaj weights = weights(eigen.vectors(), white.observable());
        for (int j = 0; j < functions.numCols; j++) {
            double length = normalise(functions, j);
            scaleRow(weights, j, length);
        }
        return new Refit(eigen.values(), List.copyOf(rates), functions, weights);
    }

    private static ZMatrixRMaj weights(ZMatrixRMaj vectors, DMatrixRMaj observable) {
        ZMatrixRMaj out = new ZMatrixRMaj(vectors.numCols, observable.numCols);
        if (!CommonOps_ZDRM.solve(vectors, ComplexMatrices.of(observable), out)) {
            Arrays.fill(out.data, Double.NaN);
        }
        return out;
    }

    /** Divides a column by its length, which is returned. */
    static double normalise(ZMatrixRMaj a, int column) {
        double sum = 0;
        for (int i = 0; i < a.numRows; i++) {
            sum += Math.pow(a.getReal(i, column), 2) + Math.pow(a.getImag(i, column), 2);
        }
        double length = Math.sqrt(sum);
        scaleColumn(a, column, 1 / length);
        return length;
    }

    private static void scaleColumn(ZMatrixRMaj a, int column, double factor) {
        for (int i = 0; i < a.numRows; i++) {
            a.set(i, column, a.getReal(i, column) * factor, a.getImag(i, column) * factor);
        }
    }

    private static void scaleRow(ZMatrixRMaj a, int row, double factor) {
        for (int k = 0; k < a.numCols; k++) {
            a.set(row, k, a.getReal(row, k) * factor, a.getImag(row, k) * factor);
        }
    }

    /** Returns |<a_i, b_j>| of two sets of unit eigenfunctions. */
    static double overlap(ZMatrixRMaj a, int i, ZMatrixRMaj b, int j) {
        double re = 0;
        double im = 0;
        for (int k = 0; k < a.numRows; k++) {
            re += a.getReal(k, i) * b.getReal(k, j) + a.getImag(k, i) * b.getImag(k, j);
            im += a.getReal(k, i) * b.getImag(k, j) - a.getImag(k, i) * b.getReal(k, j);
        }
        return Math.hypot(re, im);
    }
}
