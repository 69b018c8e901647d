package org.modestead.engine.linalg;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/** Square matrices that break naive decompositions, by name, and how far a decomposition is from what it should be. */
public final class AwkwardMatrices {

    private static final double ULP = Math.ulp(1.0);

    private AwkwardMatrices() {}

    /** Finite square matrices in a fixed order. */
    public static Map<String, DMatrixRMaj> square() {
        Map<String, DMatrixRMaj> all = new LinkedHashMap<>();
        all.put("1 x 1", new DMatrixRMaj(new double[][] {{-3}}));
        all.put("1 x 1 zero", new DMatrixRMaj(1, 1));
        all.put("zero", new DMatrixRMaj(5, 5));
        all.put("identity", CommonOps_DDRM.identity(6));
        all.put("repeated eigenvalue, diagonalisable", repeated());
        all.put("Jordan block", jordan(5, 2));
        all.put("nilpotent", jordan(4, 0));
        all.put("cyclic shift", shift(7));
        all.put("even cyclic shift", shift(8));
        all.put("sparse with zero eigenvalues", sparse());
        all.put("companion of 1..8", companion(8));
        all.put("companion of z^6 + 1", companionOfUnity(6));
        all.put("rotation", new DMatrixRMaj(new double[][] {{0, -1}, {1, 0}}));
        all.put("two equal rotations", twoRotations());
        all.put("zero row and column", bordered());
        all.put("graded", graded(8));
        all.put("constant column", constantColumn(6));
        for (int n : new int[] {2, 3, 10, 33, 120}) {
            all.put("random " + n, random(n, n, n));
        }
        all.put("tiny random", scaled(random(9, 9, 1), 1e-150));
        all.put("huge random", scaled(random(9, 9, 1), 1e150));
        all.put("tiny rotations", scaled(twoRotations(), 1e-150));
        all.put("huge rotations", scaled(twoRotations(), 1e150));
        all.put("huge companion", scaled(companion(8), 1e146));
        return all;
    }

    /** Symmetric parts of the square ones. */
    public static Map<String, DMatrixRMaj> symmetric() {
        Map<String, DMatrixRMaj> all = new LinkedHashMap<>();
        square().forEach((name, a) -> all.put(name, symmetrised(a)));
        return all;
    }

    /** Square, tall, wide and rank-deficient ones. */
    public static Map<String, DMatrixRMaj> anyShape() {
        Map<String, DMatrixRMaj> all = square();
        all.put("tall", random(40, 7, 2));
        all.put("wide", random(7, 40, 3));
        all.put("one row", random(1, 9, 4));
        all.put("one column", random(9, 1, 5));
        DMatrixRMaj deficient = new DMatrixRMaj(20, 12);
        CommonOps_DDRM.mult(random(20, 3, 6), random(3, 12, 7), deficient);
        all.put("rank 3 of 12", deficient);
        return all;
    }

    public static DMatrixRMaj random(int rows, int columns, long seed) {
        Random random = new Random(seed);
        DMatrixRMaj a = new DMatrixRMaj(rows, columns);
        for (int i = 0; i < a.getNumElements(); i++) {
            a.data[i] = random.nextGaussian();
        }
        return a;
    }

    public static DMatrixRMaj scaled(DMatrixRMaj a, double c) {
        DMatrixRMaj out = a.copy();
        CommonOps_DDRM.scale(c, out);
        return out;
    }

    public static DMatrixRMaj shift(int n) {
        DMatrixRMaj a = new DMatrixRMaj(n, n);
        for (int i = 0; i < n; i++) {
            a.set((i + 1) % n, i, 1);
        }
        return a;
    }

    public static DMatrixRMaj jordan(int n, double value) {
        DMatrixRMaj a = CommonOps_DDRM.identity(n);
        CommonOps_DDRM.scale(value, a);
        for (int i = 0; i + 1 < n; i++) {
            a.set(i, i + 1, 1);
        }
        return a;
    }

    /** Companion matrix of (z-1)(z-2)...(z-n). */
    public static DMatrixRMaj companion(int n) {
        double[] coefficients = new double[n + 1];
        coefficients[0] = 1;
        for (int root = 1; root <= n; root++) {
            for (int k = root; k >= 0; k--) {
                coefficients[k] = (k == 0 ? 0 : coefficients[k - 1]) - root * coefficients[k];
            }
        }
        DMatrixRMaj a = new DMatrixRMaj(n, n);
        for (int k = 0; k < n; k++) {
            a.set(k, n - 1, -coefficients[k]);
            if (k > 0) {
                a.set(k, k - 1, 1);
            }
        }
        return a;
    }

    private static DMatrixRMaj companionOfUnity(int n) {
        DMatrixRMaj a = shift(n);
        a.set(0, n - 1, -1);
        return a;
    }

    private static DMatrixRMaj repeated() {
        DMatrixRMaj p = random(5, 5, 11);
        DMatrixRMaj inverse = new DMatrixRMaj(5, 5);
        CommonOps_DDRM.invert(p, inverse);
        DMatrixRMaj d = CommonOps_DDRM.diag(2, 2, 2, -1, -1);
        DMatrixRMaj pd = new DMatrixRMaj(5, 5);
        DMatrixRMaj out = new DMatrixRMaj(5, 5);
        CommonOps_DDRM.mult(p, d, pd);
        CommonOps_DDRM.mult(pd, inverse, out);
        return out;
    }

    private static DMatrixRMaj twoRotations() {
        return new DMatrixRMaj(new double[][] {{0.6, -0.8, 0.3, 0}, {0.8, 0.6, 0, 0.3}, {0, 0, 0.6, -0.8},
                {0, 0, 0.8, 0.6}});
    }

    private static DMatrixRMaj bordered() {
        DMatrixRMaj a = random(6, 6, 12);
        for (int i = 0; i < 6; i++) {
            a.set(0, i, 0);
            a.set(i, 3, 0);
        }
        return a;
    }

    /** Nilpotent parts whose rounded diagonal is as small as the entries that should deflate. */
    private static DMatrixRMaj sparse() {
        return new DMatrixRMaj(new double[][] {
            {0, 0, 0, 0, 0, 0, 1, 0, 0, 0, 0}, {-1, 0, 0, 0, 0, 0, -1, 0, 1, 0, 0}, {0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0},
            {0, 0, 0, 0, 0, 0, 0, 0, -1, 0, 0}, {0, 0, 0, 0, 0, 0, 0, 0, 0, 1, 0}, {-1, 0, 0, 0, 0, 0, 0, 1, 0, 0, 0},
            {-1, 0, 1, 0, 0, 0, -1, 0, 0, 0, 0}, {0, 0, 0, 0, 1, 0, 1, 0, 0, 0, 0}, {0, 0, 0, 0, 0, 0, 0, -1, 1, 0, 0},
            {0, 0, 0, 0, 0, 0, 0, 0, 0, 0, -1}, {0, 0, 0, 0, 1, 0, 0, 0, 0, -1, 0}});
    }

    private static DMatrixRMaj graded(int n) {
        DMatrixRMaj a = random(n, n, 13);
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                a.set(i, j, a.get(i, j) * Math.pow(10, -(i + j)));
            }
        }
        return a;
    }

    private static DMatrixRMaj constantColumn(int n) {
        DMatrixRMaj a = random(n, n, 14);
        for (int i = 0; i < n; i++) {
            a.set(i, 2, 1);
        }
        return a;
    }

    public static DMatrixRMaj symmetrised(DMatrixRMaj a) {
        DMatrixRMaj out = a.copy();
        for (int i = 0; i < a.numRows; i++) {
            for (int j = 0; j < a.numCols; j++) {
                out.set(i, j, a.get(i, j) / 2 + a.get(j, i) / 2);
            }
        }
        return out;
    }

    /** {@code ‖A V - V D‖ / (‖A‖ ‖V‖ n ulp)} in the largest entries; 0 for an exact answer. */
    public static double eigenRatio(DMatrixRMaj a, GeneralEigen eigen) {
        int n = a.numRows;
        double norm = CommonOps_DDRM.elementMaxAbs(a);
        double worst = 0;
        double largest = 0;
        for (int j = 0; j < n; j++) {
            Complex value = eigen.values().get(j).times(1 / (norm == 0 ? 1 : norm));
            for (int i = 0; i < n; i++) {
                Complex miss = value.times(-1).times(ComplexMatrices.entry(eigen.vectors(), i, j));
                for (int k = 0; k < n; k++) {
                    miss = miss.plus(ComplexMatrices.entry(eigen.vectors(), k, j).times(norm == 0 ? 0 : a.get(i, k) / norm));
                }
                worst = Math.max(worst, miss.abs());
                largest = Math.max(largest, ComplexMatrices.entry(eigen.vectors(), i, j).abs());
            }
        }
        return worst / (largest * n * ULP);
    }

    /** {@code ‖QᵀQ - I‖ / (m ulp)} in the largest entry. */
    public static double orthogonalityRatio(DMatrixRMaj q) {
        double worst = 0;
        for (int i = 0; i < q.numCols; i++) {
            for (int j = 0; j < q.numCols; j++) {
                double sum = i == j ? -1 : 0;
                for (int k = 0; k < q.numRows; k++) {
                    sum += q.get(k, i) * q.get(k, j);
                }
                worst = Math.max(worst, Math.abs(sum));
            }
        }
        return worst / (q.numRows * ULP);
    }

    /** {@code ‖A - U diag(s) Vᵀ‖ / (‖A‖ max(m, n) ulp)} in the largest entry. */
    public static double factorRatio(DMatrixRMaj a, DMatrixRMaj u, double[] s, DMatrixRMaj v) {
        double norm = CommonOps_DDRM.elementMaxAbs(a);
        double scale = norm == 0 ? 1 : norm;
        double worst = 0;
        for (int i = 0; i < a.numRows; i++) {
            for (int j = 0; j < a.numCols; j++) {
                double sum = -a.get(i, j) / scale;
                for (int k = 0; k < s.length; k++) {
                    sum += u.get(i, k) * (s[k] / scale) * v.get(j, k);
                }
                worst = Math.max(worst, Math.abs(sum));
            }
        }
        return worst / (Math.max(a.numRows, a.numCols) * ULP);
    }
}
