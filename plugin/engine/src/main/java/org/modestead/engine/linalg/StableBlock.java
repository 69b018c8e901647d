package org.modestead.engine.linalg;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;

/**
 * The real 2 x 2 matrix nearest to a given one, in the Frobenius norm, among those with both eigenvalues in a region. The
 * candidates are the nearest points on each piece of the region's border and on the corners where pieces meet; the nearest of
 * those that are inside is the answer.
 *
 * <p>Noferini and Poloni, "Nearest Ω-stable matrix via Riemannian optimization", Numer. Math. 148:817, 2021, section 7.
 */
final class StableBlock {

    private static final double ROUNDING = 1e-12;

    private StableBlock() {}

    static DMatrixRMaj nearest(DMatrixRMaj a, StableRegion region) {
        if (inside(a, region, 0)) {
            return a.copy();
        }
        List<DMatrixRMaj> candidates = region == StableRegion.DISC ? disc(a) : halfPlane(a);
        DMatrixRMaj best = new DMatrixRMaj(2, 2);
        double distance = NormOps_DDRM.normF(a);
        double slack = ROUNDING * (1 + distance);
        for (DMatrixRMaj candidate : candidates) {
            DMatrixRMaj difference = new DMatrixRMaj(2, 2);
            CommonOps_DDRM.subtract(candidate, a, difference);
            if (NormOps_DDRM.normF(difference) < distance && inside(candidate, region, slack)) {
                distance = NormOps_DDRM.normF(difference);
                best = candidate;
            }
        }
        return best;
    }

    /** By the trace t and the determinant d: {@code t <= 0, d >= 0}, or {@code |d| <= 1, |t| <= 1 + d}. */
    private static boolean inside(DMatrixRMaj a, StableRegion region, double slack) {
        double trace = a.get(0, 0) + a.get(1, 1);
        double determinant = CommonOps_DDRM.det(a);
        return region == StableRegion.DISC ? determinant <= 1 + slack && Math.abs(trace) <= 1 + determinant + slack
                : trace <= slack && determinant >= -slack;
    }

    private static List<DMatrixRMaj> halfPlane(DMatrixRMaj a) {
        double trace = a.get(0, 0) + a.get(1, 1);
        return List.of(shifted(a, -trace / 2), singular(a), nilpotent(a));
    }

    private static List<DMatrixRMaj> disc(DMatrixRMaj a) {
        List<DMatrixRMaj> candidates = new ArrayList<>(unitDeterminant(a));
        for (int edge = -1; edge <= 1; edge += 2) {
            candidates.add(shifted(singular(shifted(a, -edge)), edge));
            candidates.add(shifted(nilpotent(shifted(a, -edge)), edge));
        }
        candidates.addAll(opposite(a));
        return candidates;
    }

    private static DMatrixRMaj shifted(DMatrixRMaj a, double by) {
        DMatrixRMaj out = a.copy();
        out.add(0, 0, by);
        out.add(1, 1, by);
        return out;
    }

    /** The nearest matrix with an eigenvalue 0. */
    private static DMatrixRMaj singular(DMatrixRMaj a) {
        LinearAlgebra.Svd svd = LinearAlgebra.installed().svd(a);
        return built(svd, svd.values()[0], 0);
    }

    private static DMatrixRMaj built(LinearAlgebra.Svd svd, double first, double second) {
        DMatrixRMaj scaled = svd.u().copy();
        CommonOps_DDRM.multCols(scaled, new double[] {first, second});
        return Matrices.productTranspose(scaled, svd.v());
    }

    /** The nearest matrix with the eigenvalue 0 twice: {@code t p qᵀ} with q at right angles to p. */
    private static DMatrixRMaj nilpotent(DMatrixRMaj a) {
        double turn = (a.get(0, 1) - a.get(1, 0)) / 2;
        double cosine = (a.get(0, 1) + a.get(1, 0)) / 2;
        double sine = (a.get(1, 1) - a.get(0, 0)) / 2;
        double angle = (Math.atan2(sine, cosine) + (turn < 0 ? Math.PI : 0)) / 2;
        double size = turn < 0 ? turn - Math.hypot(cosine, sine) : turn + Math.hypot(cosine, sine);
        double c = Math.cos(angle);
        double s = Math.sin(angle);
        return new DMatrixRMaj(new double[][] {{-size * c * s, size * c * c}, {-size * s * s, size * s * c}});
    }

    /** The nearest matrices with determinant 1: the same singular vectors, singular values with product 1. */
    private static List<DMatrixRMaj> unitDeterminant(DMatrixRMaj a) {
        LinearAlgebra.Svd svd = LinearAlgebra.installed().svd(a);
        double sign = Math.signum(CommonOps_DDRM.det(svd.u()) * CommonOps_DDRM.det(svd.v()));
        List<DMatrixRMaj> out = new ArrayList<>();
        for (double root : positiveRoots(svd.values()[0], sign * svd.values()[1])) {
            out.add(built(svd, root, sign / root));
        }
        return out;
    }

    /**
     * The nearest matrices with eigenvalues 1 and -1: {@code [[x, y + z], [y - z, -x]]} with {@code x² + y² - z² = 1}, where
     * {@code √(x² + y²) = cosh t}, {@code z = sinh t} and e^t is a root.
     */
    private static List<DMatrixRMaj> opposite(DMatrixRMaj a) {
        double x = (a.get(0, 0) - a.get(1, 1)) / 2;
        double y = (a.get(0, 1) + a.get(1, 0)) / 2;
        double z = (a.get(0, 1) - a.get(1, 0)) / 2;
        double length = Math.hypot(x, y);
        List<DMatrixRMaj> out = new ArrayList<>();
        for (double root : positiveRoots(length + z, length - z)) {
            double cosh = (root + 1 / root) / 2;
            double sinh = (root - 1 / root) / 2;
            double cosine = length > 0 ? x / length : 1;
            double sine = length > 0 ? y / length : 0;
            out.add(new DMatrixRMaj(new double[][] {{cosh * cosine, cosh * sine + sinh}, {cosh * sine - sinh, -cosh * cosine}}));
        }
        return out;
    }

    /** Returns the positive roots of {@code w⁴ - f w³ + g w - 1}, where {@code (w - f)² + (1/w - g)²} is stationary. */
    private static List<Double> positiveRoots(double f, double g) {
        DMatrixRMaj companion = new DMatrixRMaj(new double[][] {{f, 0, -g, 1}, {1, 0, 0, 0}, {0, 1, 0, 0}, {0, 0, 1, 0}});
        return LinearAlgebra.installed().eigen(companion).values().stream()
                .filter(root -> root.re() > 0 && Math.abs(root.im()) <= 1e-7 * root.abs()).map(root -> polished(root.re(), f, g)).toList();
    }

    /** Newton steps; a companion matrix gives a double root to half the digits only. */
    private static double polished(double start, double f, double g) {
        double w = start;
        for (int k = 0; k < 3; k++) {
            double value = ((w - f) * w * w + g) * w - 1;
            double slope = (4 * w - 3 * f) * w * w + g;
            double next = w - value / slope;
            w = slope != 0 && next > 0 && Double.isFinite(next) ? next : w;
        }
        return w;
    }
}
