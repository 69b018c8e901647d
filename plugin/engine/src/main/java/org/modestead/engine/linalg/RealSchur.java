package org.modestead.engine.linalg;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.FitFault;

/**
 * Real Schur form {@code A = Z T Zᵀ} by Householder reduction to Hessenberg form and the implicit double-shift QR
 * iteration, and from it all eigenvectors by back substitution.
 *
 * <p>Written here because EJML gives eigenvectors of real eigenvalues only. Back substitution through the blocks of T
 * returns independent vectors for a repeated eigenvalue of a diagonalisable matrix, which inverse iteration does not.
 * O(n³) time; backward stable, so eigenvalue errors are about machine precision times the eigenvalue's condition.
 *
 * <p>Golub and Van Loan, <i>Matrix Computations</i>, 4th ed., algorithms 7.4.2, 7.5.1, 7.5.2 and section 7.6.4;
 * deflation and exceptional shifts as in EISPACK's hqr2 (Smith et al., 1976). Works on A divided by a power of two near its
 * largest entry, which is exact and keeps squares and determinants from overflow and underflow.
 */
final class RealSchur {

    private static final double EPS = Math.ulp(1.0);
    private static final int MAX_SWEEPS = 300;
    private static final int PATIENCE = 20;

    private final int n;
    private final int exponent;
    private final double[][] h;
    private final double[][] z;
    private final double[] re;
    private final double[] im;

    private RealSchur(DMatrixRMaj a) {
        n = a.numRows;
        h = new double[n][n];
        z = new double[n][n];
        re = new double[n];
        im = new double[n];
        double largest = CommonOps_DDRM.elementMaxAbs(a);
        exponent = largest == 0 ? 0 : Math.getExponent(largest);
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                h[i][j] = Math.scalb(a.data[i * n + j], -exponent);
            }
            z[i][i] = 1;
        }
    }

    /**
     * Decomposes a square matrix.
     *
     * @throws FitFault if an entry is not finite or the iteration does not converge
     */
    static RealSchur of(DMatrixRMaj a) {
        if (a.numRows != a.numCols) {
            throw new IllegalArgumentException("eigenvalues need a square matrix, not " + a.numRows + " x " + a.numCols);
        }
        for (int i = 0; i < a.getNumElements(); i++) {
            if (!Double.isFinite(a.data[i])) {
                throw new FitFault("eigenvalues", "the operator's matrix holds " + a.data[i], "lower the rank or add a ridge");
            }
        }
        RealSchur schur = new RealSchur(a);
        schur.reduceToHessenberg();
        schur.iterate();
        return schur;
    }

    /** Householder reflections from the left and right make H zero below the first subdiagonal. */
    private void reduceToHessenberg() {
        double[] v = new double[n];
        for (int m = 1; m < n - 1; m++) {
            double scale = 0;
            for (int i = m; i < n; i++) {
                scale += Math.abs(h[i][m - 1]);
            }
            if (scale == 0) {
                continue;
            }
            double norm2 = 0;
            for (int i = m; i < n; i++) {
                v[i] = h[i][m - 1] / scale;
                norm2 += v[i] * v[i];
            }
            double alpha = v[m] > 0 ? -Math.sqrt(norm2) : Math.sqrt(norm2);
            double beta = norm2 - v[m] * alpha;
            v[m] -= alpha;
            reflect(v, m, beta);
            h[m][m - 1] = scale * alpha;
            for (int i = m + 1; i < n; i++) {
                h[i][m - 1] = 0;
            }
        }
    }

    /** Applies {@code I - v vᵀ / beta} (v from index m on) to H from both sides and to Z from the right. */
    private void reflect(double[] v, int m, double beta) {
        for (int j = m; j < n; j++) {
            double f = 0;
            for (int i = m; i < n; i++) {
                f += v[i] * h[i][j];
            }
            f /= beta;
            for (int i = m; i < n; i++) {
                h[i][j] -= f * v[i];
            }
        }
        reflectColumns(h, v, m, beta);
        reflectColumns(z, v, m, beta);
    }

    private void reflectColumns(double[][] a, double[] v, int m, double beta) {
        for (double[] row : a) {
            double f = 0;
            for (int j = m; j < n; j++) {
                f += v[j] * row[j];
            }
            f /= beta;
            for (int j = m; j < n; j++) {
                row[j] -= f * v[j];
            }
        }
    }

    private void iterate() {
        double norm = hessenbergNorm();
        int high = n - 1;
        int sweeps = 0;
        double shiftSum = 0;
        while (high >= 0) {
            int low = deflationStart(high, norm, sweeps);
            if (low == high) {
                h[high][high] += shiftSum;
                re[high] = h[high][high];
                im[high] = 0;
                high--;
                sweeps = 0;
            } else if (low == high - 1) {
                splitBlock(high, shiftSum);
                high -= 2;
                sweeps = 0;
            } else {
                shiftSum = sweep(low, high, sweeps, shiftSum);
                sweeps++;
                if (sweeps > MAX_SWEEPS) {
                    throw new FitFault("eigenvalues", "no convergence after " + MAX_SWEEPS + " sweeps on a " + n + " x " + n
                            + " matrix", "lower the rank or add a ridge");
                }
            }
        }
    }

    private double hessenbergNorm() {
        double norm = 0;
        for (int i = 0; i < n; i++) {
            for (int j = Math.max(i - 1, 0); j < n; j++) {
                norm += Math.abs(h[i][j]);
            }
        }
        return norm;
    }

    /** Small against its neighbours; against the whole matrix where a zero eigenvalue leaves neighbours that are rounding too. */
    private int deflationStart(int high, double norm, int sweeps) {
        int low = high;
        while (low > 0) {
            double s = Math.abs(h[low - 1][low - 1]) + Math.abs(h[low][low]);
            if (Math.abs(h[low][low - 1]) <= EPS * (s == 0 || sweeps > PATIENCE ? norm : s)) {
                h[low][low - 1] = 0;
                break;
            }
            low--;
        }
        return low;
    }

    /** A 2 x 2 block has converged: read its eigenvalues, and make it triangular when they are real. */
    private void splitBlock(int k, double shiftSum) {
        double w = h[k][k - 1] * h[k - 1][k];
        double p = (h[k - 1][k - 1] - h[k][k]) / 2;
        double q = p * p + w;
        double root = Math.sqrt(Math.abs(q));
        h[k][k] += shiftSum;
        h[k - 1][k - 1] += shiftSum;
        double x = h[k][k];
        if (q < 0) {
            re[k - 1] = x + p;
            re[k] = x + p;
            im[k - 1] = root;
            im[k] = -root;
            return;
        }
        double shift = p >= 0 ? p + root : p - root;
        re[k - 1] = x + shift;
        re[k] = shift == 0 ? re[k - 1] : x - w / shift;
        im[k - 1] = 0;
        im[k] = 0;
        double a = h[k][k - 1];
        double length = Math.hypot(a, shift);
        if (length > 0) {
            rotate(k, shift / length, a / length);
        }
    }

    private void rotate(int k, double c, double s) {
        for (int j = k - 1; j < n; j++) {
            double upper = h[k - 1][j];
            h[k - 1][j] = c * upper + s * h[k][j];
            h[k][j] = c * h[k][j] - s * upper;
        }
        for (int i = 0; i <= k; i++) {
            rotateRow(h[i], k, c, s);
        }
        for (double[] row : z) {
            rotateRow(row, k, c, s);
        }
    }

    private static void rotateRow(double[] row, int k, double c, double s) {
        double left = row[k - 1];
        row[k - 1] = c * left + s * row[k];
        row[k] = c * row[k] - s * left;
    }

    /** One implicit double-shift sweep on the active block [low, high]; returns the sum of exceptional shifts so far. */
    private double sweep(int low, int high, int sweeps, double shiftSum) {
        double x = h[high][high];
        double y = h[high - 1][high - 1];
        double w = h[high][high - 1] * h[high - 1][high];
        double sum = shiftSum;
        if (sweeps > 0 && sweeps % 10 == 0) {
            for (int i = 0; i <= high; i++) {
                h[i][i] -= x;
            }
            sum += x;
            double s = Math.abs(h[high][high - 1]) + Math.abs(h[high - 1][high - 2]);
            x = 0.75 * s;
            y = x;
            w = -0.4375 * s * s;
        }
        double[] first = new double[3];
        int start = bulgeStart(low, high, x, y, w, first);
        for (int i = start + 2; i <= high; i++) {
            h[i][i - 2] = 0;
            if (i > start + 2) {
                h[i][i - 3] = 0;
            }
        }
        chase(low, high, start, first);
        return sum;
    }

    /** Looks for two consecutive small subdiagonal entries; leaves the first column of the shifted product in {@code f}. */
    private int bulgeStart(int low, int high, double x, double y, double w, double[] f) {
        int m = high - 2;
        while (true) {
            double d = h[m][m];
            double r = x - d;
            double s = y - d;
            f[0] = (r * s - w) / h[m + 1][m] + h[m][m + 1];
            f[1] = h[m + 1][m + 1] - d - r - s;
            f[2] = h[m + 2][m + 1];
            double scale = Math.abs(f[0]) + Math.abs(f[1]) + Math.abs(f[2]);
            for (int i = 0; i < 3; i++) {
                f[i] /= scale;
            }
            if (m == low || Math.abs(h[m][m - 1]) * (Math.abs(f[1]) + Math.abs(f[2]))
                    < EPS * Math.abs(f[0]) * (Math.abs(h[m - 1][m - 1]) + Math.abs(d) + Math.abs(h[m + 1][m + 1]))) {
                return m;
            }
            m--;
        }
    }

    private void chase(int low, int high, int start, double[] first) {
        double p = first[0];
        double q = first[1];
        double r = first[2];
        for (int k = start; k <= high - 1; k++) {
            boolean last = k == high - 1;
            double scale = 1;
            if (k != start) {
                p = h[k][k - 1];
                q = h[k + 1][k - 1];
                r = last ? 0 : h[k + 2][k - 1];
                scale = Math.abs(p) + Math.abs(q) + Math.abs(r);
                if (scale == 0) {
                    continue;
                }
                p /= scale;
                q /= scale;
                r /= scale;
            }
            double s = Math.copySign(Math.sqrt(p * p + q * q + r * r), p);
            if (s == 0) {
                continue;
            }
            if (k != start) {
                h[k][k - 1] = -s * scale;
            } else if (low != start) {
                h[k][k - 1] = -h[k][k - 1];
            }
            p += s;
            reflectBulge(k, high, last, new double[] {p / s, q / s, last ? 0 : r / s, q / p, last ? 0 : r / p});
        }
    }

    /** Reflection {@code I - x yᵀ} on rows and columns k..k+2, x = f[0..2], y = (1, f[3], f[4]). */
    private void reflectBulge(int k, int high, boolean last, double[] f) {
        for (int j = k; j < n; j++) {
            double t = h[k][j] + f[3] * h[k + 1][j];
            if (!last) {
                t += f[4] * h[k + 2][j];
                h[k + 2][j] -= t * f[2];
            }
            h[k][j] -= t * f[0];
            h[k + 1][j] -= t * f[1];
        }
        for (int i = 0; i <= Math.min(high, k + 3); i++) {
            reflectRow(h[i], k, last, f);
        }
        for (double[] row : z) {
            reflectRow(row, k, last, f);
        }
    }

    private static void reflectRow(double[] row, int k, boolean last, double[] f) {
        double t = f[0] * row[k] + f[1] * row[k + 1];
        if (!last) {
            t += f[2] * row[k + 2];
            row[k + 2] -= t * f[4];
        }
        row[k] -= t;
        row[k + 1] -= t * f[3];
    }

    /** Returns the size of T without its eigenvalues; see {@link NormalityDeparture}. */
    double departure() {
        double size = 0;
        for (int i = 0; i < n; i++) {
            boolean pair = im[i] > 0;
            if (pair) {
                size = Math.hypot(size, Math.hypot(h[i][i] - h[i + 1][i + 1], h[i][i + 1] + h[i + 1][i]));
            }
            for (int j = i + (pair ? 2 : 1); j < n; j++) {
                size = Math.hypot(size, h[i][j]);
            }
        }
        return Math.scalb(size, exponent);
    }

    /** Returns the eigenvalues and unit right eigenvectors. */
    GeneralEigen eigen() {
        double norm = Math.max(hessenbergNorm(), 1);
        ZMatrixRMaj vectors = new ZMatrixRMaj(n, n);
        List<Complex> values = new ArrayList<>(n);
        for (int k = 0; k < n; k++) {
            values.add(new Complex(Math.scalb(re[k], exponent), Math.scalb(im[k], exponent)));
            if (im[k] >= 0) {
                setColumn(vectors, k, im[k] == 0 ? realVector(k, norm) : complexVector(k, norm));
            }
        }
        return new GeneralEigen(values, vectors);
    }

    /** Solves {@code (T - λ I) x = 0} upwards from row k with x_k = 1; entries alternate real, imaginary. */
    private double[] realVector(int k, double norm) {
        return backSubstitute(k, new Complex(re[k], 0), norm, vector -> vector[2 * k] = 1);
    }

    /** The same for the pair in rows k, k+1, starting from the block's own eigenvector. */
    private double[] complexVector(int k, double norm) {
        return backSubstitute(k + 1, new Complex(re[k], im[k]), norm, vector -> {
            // block eigenvector: (t_kk - λ) x_k + t_k,k+1 x_k+1 = 0 or its second row, whichever has the larger pivot
            if (Math.abs(h[k][k + 1]) > Math.abs(h[k + 1][k])) {
                vector[2 * k] = 1;
                Complex rest = divide(new Complex(re[k] - h[k][k], im[k]), new Complex(h[k][k + 1], 0));
                vector[2 * k + 2] = rest.re();
                vector[2 * k + 3] = rest.im();
            } else {
                vector[2 * k + 2] = 1;
                Complex rest = divide(new Complex(re[k] - h[k + 1][k + 1], im[k]), new Complex(h[k + 1][k], 0));
                vector[2 * k] = rest.re();
                vector[2 * k + 1] = rest.im();
            }
        });
    }

    private double[] backSubstitute(int last, Complex lambda, double norm, java.util.function.Consumer<double[]> start) {
        double[] x = new double[2 * n];
        start.accept(x);
        int i = last - (lambda.im() == 0 ? 1 : 2);
        double tiny = EPS * norm;
        while (i >= 0) {
            if (i > 0 && h[i][i - 1] != 0) {
                solvePair(x, i - 1, last, lambda, tiny);
                i -= 2;
            } else {
                Complex pivot = floored(new Complex(h[i][i] - lambda.re(), -lambda.im()), tiny);
                Complex value = divide(rowSum(x, i, i + 1, last).times(-1), pivot);
                x[2 * i] = value.re();
                x[2 * i + 1] = value.im();
                i--;
            }
            rescale(x, last);
        }
        return x;
    }

    /** Solves the 2 x 2 system of the diagonal block in rows i, i+1, whose off-diagonal entries are not 0. */
    private void solvePair(double[] x, int i, int last, Complex lambda, double tiny) {
        Complex[] top = {new Complex(h[i][i] - lambda.re(), -lambda.im()), new Complex(h[i][i + 1], 0), rowSum(x, i, i + 2, last).times(-1)};
        Complex[] bottom = {new Complex(h[i + 1][i], 0), new Complex(h[i + 1][i + 1] - lambda.re(), -lambda.im()),
            rowSum(x, i + 1, i + 2, last).times(-1)};
        boolean swapped = bottom[0].abs() > top[0].abs();
        Complex[] pivotRow = swapped ? bottom : top;
        Complex[] other = swapped ? top : bottom;
        Complex factor = divide(other[0], pivotRow[0]);
        Complex rest = floored(other[1].minus(factor.times(pivotRow[1])), tiny);
        Complex second = divide(other[2].minus(factor.times(pivotRow[2])), rest);
        Complex first = divide(pivotRow[2].minus(pivotRow[1].times(second)), pivotRow[0]);
        x[2 * i] = first.re();
        x[2 * i + 1] = first.im();
        x[2 * i + 2] = second.re();
        x[2 * i + 3] = second.im();
    }

    private Complex rowSum(double[] x, int row, int from, int to) {
        double real = 0;
        double imaginary = 0;
        for (int j = from; j <= to; j++) {
            real += h[row][j] * x[2 * j];
            imaginary += h[row][j] * x[2 * j + 1];
        }
        return new Complex(real, imaginary);
    }

    private static Complex floored(Complex pivot, double tiny) {
        return pivot.abs() < tiny ? new Complex(tiny, 0) : pivot;
    }

    private static void rescale(double[] x, int last) {
        double largest = 0;
        for (int j = 0; j <= 2 * last + 1; j++) {
            largest = Math.max(largest, Math.abs(x[j]));
        }
        if (largest > 1e100) {
            for (int j = 0; j <= 2 * last + 1; j++) {
                x[j] /= largest;
            }
        }
    }

    private static Complex divide(Complex a, Complex b) {
        double scale = b.abs();
        Complex unit = b.times(1 / scale);
        return a.times(1 / scale).times(unit.conj());
    }

    /** Writes Z x, normalised, into column k, and its conjugate into column k+1 when λ is complex. */
    private void setColumn(ZMatrixRMaj vectors, int k, double[] x) {
        double[] real = new double[n];
        double[] imaginary = new double[n];
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                real[i] += z[i][j] * x[2 * j];
                imaginary[i] += z[i][j] * x[2 * j + 1];
            }
        }
        GeneralEigen.put(vectors, k, real, imaginary, im[k] > 0);
    }
}
