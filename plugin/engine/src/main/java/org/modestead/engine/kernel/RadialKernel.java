package org.modestead.engine.kernel;

import java.util.Arrays;
import java.util.function.DoubleUnaryOperator;
import org.ejml.data.DMatrixRMaj;

/**
 * A kernel that depends on the distance only, {@code K(x, y) = f(|x - y|)} with {@code f(0) = 1}.
 *
 * <p>Distances are summed coordinate by coordinate rather than as {@code |x|² - 2x·y + |y|²}, whose cancellation would
 * spoil the kinked families (Laplacian, Matérn) near zero distance.
 *
 * @param spec family and parameters
 * @param space facts about the space
 * @param profile f of the squared distance
 */
record RadialKernel(KernelSpec spec, SpaceFacts space, DoubleUnaryOperator profile) implements Kernel {

    @Override
    public DMatrixRMaj matrix(DMatrixRMaj x, DMatrixRMaj y) {
        DMatrixRMaj out = new DMatrixRMaj(x.numRows, y.numRows);
        int n = x.numCols;
        for (int i = 0; i < x.numRows; i++) {
            for (int j = 0; j < y.numRows; j++) {
                double sum = 0;
                for (int k = 0; k < n; k++) {
                    double d = x.data[i * n + k] - y.data[j * n + k];
                    sum += d * d;
                }
                out.data[i * y.numRows + j] = profile.applyAsDouble(sum);
            }
        }
        return out;
    }

    @Override
    public double[] diagonal(DMatrixRMaj x) {
        double[] out = new double[x.numRows];
        Arrays.fill(out, 1);
        return out;
    }
}
