package org.modestead.engine.linalg;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Collections;
import java.util.Deque;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.QRDecomposition;

/**
 * A matrix near to a given one, in the Frobenius norm, with all eigenvalues in a region: a local minimum of the distance. Every real
 * matrix is block upper triangular in some orthonormal frame Q, with blocks of size 2. For given Q the nearest one with eigenvalues
 * in the region keeps what of {@code Qᵀ A Q} lies above the blocks, drops what lies below, and takes the nearest stable block on
 * the diagonal ({@link StableBlock}); the distance is then a smooth function of Q, made smaller step by step along its slope from
 * the frame of the eigenvectors, where it is the distance to the matrix whose eigenvalues alone are moved.
 *
 * <p>The set of stable matrices is not convex: there may be nearer ones elsewhere. A matrix that is stable already is returned
 * as it is. Where more than one pair of eigenvalues lay outside, they may meet on the border with parallel eigenvectors.
 *
 * <p>Noferini and Poloni, Numer. Math. 148:817, 2021; steps after Barzilai and Borwein, IMA J. Numer. Anal. 8:141, 1988, accepted
 * as by Grippo, Lampariello and Lucidi, SIAM J. Numer. Anal. 23:707, 1986.
 */
public final class NearestStable {

    private static final double STABLE_TO_ROUNDING = 1e-13;
    private static final double FLAT = 1e-10;
    private static final int MOST_STEPS = 400;
    private static final int MEMORY = 5;
    private static final int ROUNDS = 10;
    private static final double SUFFICIENT = 1e-4;

    private NearestStable() {}

    /**
     * @param a square, finite; not modified
     * @param region of the eigenvalues
     * @return new matrix
     */
    public static DMatrixRMaj of(DMatrixRMaj a, StableRegion region) {
        GeneralEigen eigen = LinearAlgebra.installed().eigen(a);
        double size = NormOps_DDRM.normF(a);
        if (eigen.values().stream().allMatch(value -> region.excess(value) <= STABLE_TO_ROUNDING * size)) {
            return a.copy();
        }
        Frame one = descend(Frame.of(a, frame(eigen, false), region), a, region, size);
        Frame other = descend(Frame.of(a, frame(eigen, true), region), a, region, size);
        return contained((other.squared < one.squared ? other : one).matrix(), region);
    }

    /** Where several eigenvalues meet on the border, rounding alone spreads them across it: all are then drawn in by as much. */
    private static DMatrixRMaj contained(DMatrixRMaj a, StableRegion region) {
        DMatrixRMaj out = a;
        for (int round = 0; round < ROUNDS; round++) {
            double excess = LinearAlgebra.installed().eigen(out).values().stream().mapToDouble(region::excess).max().orElse(0);
            if (excess == 0) {
                return out;
            }
            out = region.drawnIn(out, excess);
        }
        return out;
    }

    /** Orthonormal frame in which A is block triangular: conjugate pairs lead, so that they meet the blocks. */
    private static DMatrixRMaj frame(GeneralEigen eigen, boolean backwards) {
        List<double[]> pairs = new ArrayList<>();
        List<double[]> singles = new ArrayList<>();
        for (int j = 0; j < eigen.values().size(); j++) {
            double im = eigen.values().get(j).im();
            if (im > 0) {
                pairs.add(part(eigen.vectors(), j, 0));
                pairs.add(part(eigen.vectors(), j, 1));
            } else if (im == 0) {
                singles.add(part(eigen.vectors(), j, 0));
            }
        }
        if (backwards) {
            Collections.reverse(pairs);
            Collections.reverse(singles);
        }
        pairs.addAll(singles);
        int n = pairs.size();
        DMatrixRMaj columns = new DMatrixRMaj(n, n);
        for (int j = 0; j < n; j++) {
            for (int i = 0; i < n; i++) {
                columns.set(i, j, pairs.get(j)[i]);
            }
        }
        QRDecomposition<DMatrixRMaj> qr = DecompositionFactory_DDRM.qr(n, n);
        qr.decompose(columns);
        return qr.getQ(null, false);
    }

    private static double[] part(ZMatrixRMaj vectors, int column, int imaginary) {
        double[] out = new double[vectors.numRows];
        for (int i = 0; i < out.length; i++) {
            out[i] = imaginary == 0 ? vectors.getReal(i, column) : vectors.getImag(i, column);
        }
        return out;
    }

    private static Frame descend(Frame start, DMatrixRMaj a, StableRegion region, double size) {
        Frame best = start;
        Frame now = start;
        Deque<Double> recent = new ArrayDeque<>(List.of(now.squared));
        double step = 1 / (size * size);
        for (int k = 0; k < MOST_STEPS && now.slope() > FLAT * size * size; k++) {
            double limit = recent.stream().mapToDouble(Double::doubleValue).max().orElseThrow();
            Frame next = now.moved(step, a, region);
            while (next.squared > limit - SUFFICIENT * step * now.slope() * now.slope() && step * now.slope() > Math.ulp(1.0)) {
                step /= 2;
                next = now.moved(step, a, region);
            }
            if (step * now.slope() <= Math.ulp(1.0)) {
                return best;
            }
            step = length(now, next, step, size);
            now = next;
            best = now.squared < best.squared ? now : best;
            recent.addLast(now.squared);
            if (recent.size() > MEMORY) {
                recent.removeFirst();
            }
        }
        return best;
    }

    /** {@code <Δq, Δq> / <Δq, Δg>} for the move -step g and the change of slope that it brought. */
    private static double length(Frame before, Frame after, double step, double size) {
        DMatrixRMaj change = new DMatrixRMaj(after.gradient.numRows, after.gradient.numCols);
        CommonOps_DDRM.subtract(after.gradient, before.gradient, change);
        double along = -step * CommonOps_DDRM.trace(Matrices.transposeProduct(before.gradient, change));
        double moved = step * step * before.slope() * before.slope();
        return along > 0 ? moved / along : 1 / (size * size);
    }

    /**
     * @param q Q
     * @param nearest stable block triangular matrix nearest to {@code Qᵀ A Q}
     * @param squared its squared distance
     * @param gradient of that in the skew direction S of {@code Q e^S}
     */
    private record Frame(DMatrixRMaj q, DMatrixRMaj nearest, double squared, DMatrixRMaj gradient) {

        static Frame of(DMatrixRMaj a, DMatrixRMaj q, StableRegion region) {
            DMatrixRMaj turned = Matrices.transposeProduct(q, Matrices.product(a, q));
            DMatrixRMaj nearest = projected(turned, region);
            DMatrixRMaj left = new DMatrixRMaj(a.numRows, a.numRows);
            CommonOps_DDRM.subtract(turned, nearest, left);
            DMatrixRMaj half = Matrices.transposeProduct(turned, left);
            CommonOps_DDRM.subtractEquals(half, Matrices.productTranspose(left, turned));
            DMatrixRMaj gradient = new DMatrixRMaj(a.numRows, a.numRows);
            CommonOps_DDRM.subtract(half, CommonOps_DDRM.transpose(half, null), gradient);
            return new Frame(q, nearest, Math.pow(NormOps_DDRM.normF(left), 2), gradient);
        }

        private static DMatrixRMaj projected(DMatrixRMaj turned, StableRegion region) {
            int n = turned.numRows;
            DMatrixRMaj out = turned.copy();
            for (int k = 0; k < n; k += 2) {
                int end = Math.min(k + 2, n);
                for (int i = end; i < n; i++) {
                    for (int j = k; j < end; j++) {
                        out.set(i, j, 0);
                    }
                }
                if (end == k + 2) {
                    CommonOps_DDRM.insert(StableBlock.nearest(Matrices.block(turned, k, end, k, end), region), out, k, k);
                } else {
                    out.set(k, k, region.nearest(turned.get(k, k)));
                }
            }
            return out;
        }

        double slope() {
            return NormOps_DDRM.normF(gradient);
        }

        /** Turned against the gradient g: {@code Q (I + t g/2)⁻¹ (I - t g/2)}. */
        Frame moved(double step, DMatrixRMaj a, StableRegion region) {
            int n = q.numRows;
            DMatrixRMaj plus = CommonOps_DDRM.identity(n);
            DMatrixRMaj minus = CommonOps_DDRM.identity(n);
            CommonOps_DDRM.addEquals(plus, step / 2, gradient);
            CommonOps_DDRM.addEquals(minus, -step / 2, gradient);
            DMatrixRMaj turn = new DMatrixRMaj(n, n);
            CommonOps_DDRM.solve(plus, minus, turn);
            return of(a, Matrices.product(q, turn), region);
        }

        DMatrixRMaj matrix() {
            return Matrices.product(q, Matrices.productTranspose(nearest, q));
        }
    }
}
