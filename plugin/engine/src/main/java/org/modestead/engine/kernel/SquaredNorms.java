package org.modestead.engine.kernel;

import org.ejml.data.DMatrixRMaj;

/** Squared Euclidean lengths of points held as rows. */
final class SquaredNorms {

    private SquaredNorms() {}

    static double[] ofRows(DMatrixRMaj x) {
        double[] out = new double[x.numRows];
        for (int i = 0; i < x.numRows; i++) {
            double sum = 0;
            for (int k = i * x.numCols; k < (i + 1) * x.numCols; k++) {
                sum += x.data[k] * x.data[k];
            }
            out[i] = sum;
        }
        return out;
    }
}
