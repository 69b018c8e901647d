package org.modestead.engine.kernel;

import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Matrices;

/** Squared distances of many points by one matrix product, {@code |x|² - 2 x·y + |y|²} with both taken from the mean of y. */
final class SquaredDistances {

    private SquaredDistances() {}

    /**
     * @param x p x N
     * @param y q x N, at least one
     * @param allowed largest error of a square that may come from cancellation
     * @return p x q, none negative; empty when points lie so far out that more would be lost
     */
    static Optional<DMatrixRMaj> byProducts(DMatrixRMaj x, DMatrixRMaj y, double allowed) {
        double[] mean = mean(y);
        DMatrixRMaj a = less(x, mean);
        DMatrixRMaj b = less(y, mean);
        double[] ofA = SquaredNorms.ofRows(a);
        double[] ofB = SquaredNorms.ofRows(b);
        if (!(Math.ulp(1.0) * (largest(ofA) + largest(ofB)) <= allowed)) {
            return Optional.empty();
        }
        DMatrixRMaj out = Matrices.productTranspose(a, b);
        for (int i = 0; i < out.numRows; i++) {
            for (int j = 0; j < out.numCols; j++) {
                int at = i * out.numCols + j;
                out.data[at] = Math.max(0, ofA[i] + ofB[j] - 2 * out.data[at]);
            }
        }
        return Optional.of(out);
    }

    private static double[] mean(DMatrixRMaj y) {
        double[] mean = new double[y.numCols];
        for (int i = 0; i < y.numRows; i++) {
            for (int k = 0; k < mean.length; k++) {
                mean[k] += y.data[i * mean.length + k] / y.numRows;
            }
        }
        return mean;
    }

    private static DMatrixRMaj less(DMatrixRMaj points, double[] mean) {
        DMatrixRMaj out = points.copy();
        for (int at = 0; at < out.getNumElements(); at++) {
            out.data[at] -= mean[at % mean.length];
        }
        return out;
    }

    private static double largest(double[] values) {
        double largest = 0;
        for (double value : values) {
            largest = Math.max(largest, value);
        }
        return largest;
    }
}
