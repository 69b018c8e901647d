package org.modestead.engine.kernel;

import java.util.Arrays;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Blocks;

/**
 * A kernel that depends on the distance only, {@code K(x, y) = f(|x - y|)} with {@code f(0) = 1}.
 *
 * <p>Distances are summed coordinate by coordinate rather than as {@code |x|² - 2x·y + |y|²}, whose cancellation would
 * spoil the kinked families (Laplacian, Matérn) near zero distance.
 *
 * <p>Where f is smooth at zero, large matrices take the products all the same, about the mean of y: what cancellation leaves,
 * {@code ε (|x|² + |y|²)}, is then looked at first, and must be below {@value #LOST} of the square over which f falls.
 *
 * @param spec family and parameters
 * @param space facts about the space
 * @param profile f of the squared distance
 * @param smooth square of the length over which f falls, where f is smooth at zero; 0 where it is kinked
 */
record RadialKernel(KernelSpec spec, SpaceFacts space, DoubleUnaryOperator profile, double smooth) implements Kernel {

    /** Multiplications from which a product is worth it. */
    private static final long LARGE = 4_000_000;

    private static final double LOST = 4e-15;
    private static final int LEAST_WIDTH = 8;

    /** Differences of a block, worth handing to another core. */
    private static final int BLOCK = 1 << 18;

    @Override
    public DMatrixRMaj matrix(DMatrixRMaj x, DMatrixRMaj y) {
        if (smooth > 0 && x != y && (long) x.numRows * y.numRows * x.numCols >= LARGE && x.numCols >= LEAST_WIDTH) {
            Optional<DMatrixRMaj> squares = SquaredDistances.byProducts(x, y, LOST * smooth);
            if (squares.isPresent()) {
                return profiled(squares.get());
            }
        }
        DMatrixRMaj out = new DMatrixRMaj(x.numRows, y.numRows);
        int pairs = Math.max(1, y.numRows * Math.max(1, x.numCols));
        Blocks.of(x.numRows, Math.max(1, BLOCK / pairs), (from, to) -> {
            for (int i = from; i < to; i++) {
                row(x, i, y, out);
            }
        });
        return out;
    }

    private DMatrixRMaj profiled(DMatrixRMaj squares) {
        int q = squares.numCols;
        Blocks.of(squares.numRows, Math.max(1, BLOCK / Math.max(1, q)), (from, to) -> {
            for (int at = from * q; at < to * q; at++) {
                squares.data[at] = profile.applyAsDouble(squares.data[at]);
            }
        });
        return squares;
    }

    /** Four points of y beside each other, so that sums do not wait for each other; each is summed as it would be alone. */
    private void row(DMatrixRMaj x, int i, DMatrixRMaj y, DMatrixRMaj out) {
        int q = y.numRows;
        int j = 0;
        for (; j + 4 <= q; j += 4) {
            four(x.data, i * x.numCols, y.data, j * x.numCols, x.numCols, out.data, i * q + j);
        }
        for (; j < q; j++) {
            double sum = 0;
            for (int k = 0; k < x.numCols; k++) {
                double d = x.data[i * x.numCols + k] - y.data[j * x.numCols + k];
                sum += d * d;
            }
            out.data[i * q + j] = sum;
        }
        for (int at = i * q; at < (i + 1) * q; at++) {
            out.data[at] = profile.applyAsDouble(out.data[at]);
        }
    }

    private static void four(double[] x, int xAt, double[] y, int yAt, int n, double[] out, int outAt) {
        double a = 0;
        double b = 0;
        double c = 0;
        double d = 0;
        for (int k = 0; k < n; k++) {
            double value = x[xAt + k];
            double da = value - y[yAt + k];
            double db = value - y[yAt + n + k];
            double dc = value - y[yAt + 2 * n + k];
            double dd = value - y[yAt + 3 * n + k];
            a += da * da;
            b += db * db;
            c += dc * dc;
            d += dd * dd;
        }
        out[outAt] = a;
        out[outAt + 1] = b;
        out[outAt + 2] = c;
        out[outAt + 3] = d;
    }

    @Override
    public double[] diagonal(DMatrixRMaj x) {
        double[] out = new double[x.numRows];
        Arrays.fill(out, 1);
        return out;
    }
}
