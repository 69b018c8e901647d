package org.modestead.accelerator;

import static org.bytedeco.openblas.global.openblas.CblasNoTrans;
import static org.bytedeco.openblas.global.openblas.CblasNonUnit;
import static org.bytedeco.openblas.global.openblas.CblasRight;
import static org.bytedeco.openblas.global.openblas.CblasRowMajor;
import static org.bytedeco.openblas.global.openblas.CblasTrans;
import static org.bytedeco.openblas.global.openblas.CblasUpper;
import static org.bytedeco.openblas.global.openblas.LAPACK_COL_MAJOR;

import java.nio.DoubleBuffer;
import java.nio.IntBuffer;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.bytedeco.openblas.global.openblas;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.accelerator.Scratch.Loan;
import org.modestead.engine.FitFault;
import org.modestead.engine.linalg.Blocks;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.Entries;
import org.modestead.engine.linalg.GeneralEigen;
import org.modestead.engine.linalg.LinearAlgebra;

/**
 * The dense operations by OpenBLAS and the LAPACK in it. OpenBLAS runs on the calling thread alone; products are cut here into blocks that
 * depend on the shapes only and are spread over the cores, and sums of blocks are added in order: the same bytes on every machine with the
 * same kind of processor, however many cores it has and however busy it is.
 *
 * <p>LAPACK stores by columns and EJML by rows, so a matrix of ours is the transposed one there; the decompositions are put accordingly.
 */
final class OpenBlas implements LinearAlgebra {

    /** Entries of a block of rows that goes to native memory and back: 4 MB. */
    private static final int BLOCK = 1 << 19;
    private static final int LEAST_ROWS = 32;
    /** Rows of a block, where there are as many, however long they are: the other factor is laid out anew for every block. */
    private static final int WORTH_LAYING_OUT = 128;
    /** Parts of a long sum that are worked on beside each other. */
    private static final int PARTS = 4;
    /** Up to this many entries a long sum is kept once a part. */
    private static final int SMALL_SUM = 1 << 20;
    /** A side is long that is so many times another. */
    private static final int LONG = 4;

    private final Scratch scratch = new Scratch();

    @Override
    public String name() {
        return openblas.OPENBLAS_VERSION.trim();
    }

    @Override
    public DMatrixRMaj multiply(DMatrixRMaj a, DMatrixRMaj b) {
        int m = a.numRows;
        int n = b.numCols;
        if (isLong(a.numCols, m, n)) {
            return sum(a.numCols, m, n, (from, count, out) -> {
                try (Loan left = columns(a, from, count); Loan right = scratch.lend(b.data, from * n, count * n)) {
                    openblas.cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasNoTrans, m, n, count, 1, left.doubles(), count, right.doubles(), n, 1, out, n);
                }
            });
        }
        return rowsTimes(a, b, b.numCols, (from, count, rows, right, out) -> openblas.cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasNoTrans,
                count, b.numCols, a.numCols, 1, rows, a.numCols, right, b.numCols, 0, out, b.numCols));
    }

    @Override
    public DMatrixRMaj multiplyTransB(DMatrixRMaj a, DMatrixRMaj b) {
        int m = a.numRows;
        int n = b.numRows;
        if (a == b && isLong(a.numCols, m, m)) {
            return mirrored(sum(a.numCols, m, m, (from, count, out) -> {
                try (Loan rows = columns(a, from, count)) {
                    openblas.cblas_dsyrk(CblasRowMajor, CblasUpper, CblasNoTrans, m, count, 1, rows.doubles(), count, 1, out, m);
                }
            }));
        }
        if (isLong(a.numCols, m, n)) {
            return sum(a.numCols, m, n, (from, count, out) -> {
                try (Loan left = columns(a, from, count); Loan right = columns(b, from, count)) {
                    openblas.cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasTrans, m, n, count, 1, left.doubles(), count, right.doubles(), count, 1,
                            out, n);
                }
            });
        }
        return rowsTimes(a, b, b.numRows, (from, count, rows, right, out) -> openblas.cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasTrans,
                count, b.numRows, a.numCols, 1, rows, a.numCols, right, a.numCols, 0, out, b.numRows));
    }

    @Override
    public DMatrixRMaj divideByUpper(DMatrixRMaj a, DMatrixRMaj upper) {
        return rowsTimes(a, upper, a.numCols, (from, count, rows, right, out) -> {
            out.put(0, rows, 0, count * a.numCols);
            openblas.cblas_dtrsm(CblasRowMajor, CblasRight, CblasUpper, CblasNoTrans, CblasNonUnit, count, a.numCols, 1, right, a.numCols, out,
                    a.numCols);
        });
    }

    /** Whether the sums of a product are so long beside its result that they are better cut than copied whole. */
    private static boolean isLong(int length, int m, int n) {
        return m > 0 && n > 0 && (long) m * n <= SMALL_SUM && length >= LONG * (long) Math.max(m, n) && (long) length * Math.max(m, n) > SMALL_SUM;
    }

    /** Some columns of all rows in native memory, row by row. */
    private Loan columns(DMatrixRMaj a, int from, int count) {
        Loan loan = scratch.lend((long) a.numRows * count);
        for (int i = 0; i < a.numRows; i++) {
            loan.doubles().put(i * count, a.data, i * a.numCols + from, count);
        }
        return loan;
    }

    /** What is done to a block of rows in native memory. */
    private interface RowWork {
        void of(int from, int count, DoubleBuffer rows, DoubleBuffer right, DoubleBuffer out);
    }

    /** Work on every row of a with the whole of b. */
    private DMatrixRMaj rowsTimes(DMatrixRMaj a, DMatrixRMaj b, int columns, RowWork work) {
        DMatrixRMaj out = new DMatrixRMaj(a.numRows, columns);
        if (a.numRows == 0 || a.numCols == 0 || columns == 0) {
            return out;
        }
        int size = rowsOfBlock(a.numRows, Math.max(a.numCols, columns));
        try (Loan right = scratch.lend(b.data, 0, b.getNumElements())) {
            Blocks.of(a.numRows, size, (from, to) -> {
                int count = to - from;
                try (Loan rows = scratch.lend(a.data, from * a.numCols, count * a.numCols); Loan result = scratch.lend((long) count * columns)) {
                    work.of(from, count, rows.doubles(), right.doubles(), result.doubles());
                    result.doubles().get(0, out.data, from * columns, count * columns);
                }
            });
        }
        return out;
    }

    /** As many rows as fill a block, but not so few that laying out the other factor takes longer than the work, nor so many that cores idle. */
    private static int rowsOfBlock(int rows, int length) {
        int most = Math.max(LEAST_ROWS, (rows + PARTS - 1) / PARTS);
        return Math.min(Math.max(WORTH_LAYING_OUT, BLOCK / length), most);
    }

    @Override
    public DMatrixRMaj multiplyTransA(DMatrixRMaj a, DMatrixRMaj b) {
        int p = a.numCols;
        int q = b.numCols;
        if (p == 0 || q == 0 || a.numRows == 0) {
            return new DMatrixRMaj(p, q);
        }
        if ((long) p * q > SMALL_SUM) {
            return q >= LONG * (long) Math.max(p, a.numRows) ? timesColumns(a, b) : columnsTimes(a, b);
        }
        return sum(a.numRows, p, q, (from, count, out) -> {
            try (Loan left = scratch.lend(a.data, from * p, count * p); Loan right = scratch.lend(b.data, from * q, count * q)) {
                openblas.cblas_dgemm(CblasRowMajor, CblasTrans, CblasNoTrans, p, q, count, 1, left.doubles(), p, right.doubles(), q, 1, out, q);
            }
        });
    }

    @Override
    public DMatrixRMaj gram(DMatrixRMaj a) {
        int p = a.numCols;
        if (p == 0 || a.numRows == 0) {
            return new DMatrixRMaj(p, p);
        }
        if ((long) p * p > SMALL_SUM) {
            return mirrored(columnsTimes(a, a));
        }
        return mirrored(sum(a.numRows, p, p, (from, count, out) -> {
            try (Loan rows = scratch.lend(a.data, from * p, count * p)) {
                openblas.cblas_dsyrk(CblasRowMajor, CblasUpper, CblasTrans, p, count, 1, rows.doubles(), p, 1, out, p);
            }
        }));
    }

    /** What a block of rows adds to a sum in native memory. */
    private interface Summand {
        void add(int from, int count, DoubleBuffer out);
    }

    /** A sum over rows: in parts that run beside each other, each in blocks one after the other; the parts are then added in order. */
    private DMatrixRMaj sum(int rows, int p, int q, Summand summand) {
        int size = Math.max(1, BLOCK / Math.max(p, q));
        int parts = rows >= 2 * LEAST_ROWS ? PARTS : 1;
        DMatrixRMaj[] sums = new DMatrixRMaj[parts];
        Blocks.of(parts, 1, (first, last) -> {
            for (int part = first; part < last; part++) {
                sums[part] = part(rows, part, parts, size, new DMatrixRMaj(p, q), summand);
            }
        });
        for (int part = 1; part < parts; part++) {
            CommonOps_DDRM.addEquals(sums[0], sums[part]);
        }
        return sums[0];
    }

    private DMatrixRMaj part(int rows, int part, int parts, int size, DMatrixRMaj out, Summand summand) {
        int from = (int) ((long) rows * part / parts);
        int to = (int) ((long) rows * (part + 1) / parts);
        try (Loan loan = scratch.lend(out.data, 0, out.getNumElements())) {
            for (int at = from; at < to; at += size) {
                summand.add(at, Math.min(size, to - at), loan.doubles());
            }
            loan.doubles().get(0, out.data, 0, out.getNumElements());
        }
        return out;
    }

    /** Aᵀ B where the result is large: block after block of its rows. */
    private DMatrixRMaj columnsTimes(DMatrixRMaj a, DMatrixRMaj b) {
        int p = a.numCols;
        int q = b.numCols;
        DMatrixRMaj out = new DMatrixRMaj(p, q);
        try (Loan right = scratch.lend(b.data, 0, b.getNumElements())) {
            Blocks.of(p, rowsOfBlock(p, Math.max(q, a.numRows)), (from, to) -> {
                int count = to - from;
                try (Loan left = columns(a, from, count); Loan result = scratch.lend((long) count * q)) {
                    openblas.cblas_dgemm(CblasRowMajor, CblasTrans, CblasNoTrans, count, q, a.numRows, 1, left.doubles(), count, right.doubles(), q, 0,
                            result.doubles(), q);
                    result.doubles().get(0, out.data, from * q, count * q);
                }
            });
        }
        return out;
    }

    /** Aᵀ B where B is wide: block after block of its columns. */
    private DMatrixRMaj timesColumns(DMatrixRMaj a, DMatrixRMaj b) {
        int p = a.numCols;
        DMatrixRMaj out = new DMatrixRMaj(p, b.numCols);
        try (Loan left = scratch.lend(a.data, 0, a.getNumElements())) {
            Blocks.of(b.numCols, Math.max(LEAST_ROWS, BLOCK / Math.max(p, a.numRows)), (from, to) -> {
                int count = to - from;
                try (Loan right = columns(b, from, count); Loan result = scratch.lend((long) p * count)) {
                    openblas.cblas_dgemm(CblasRowMajor, CblasTrans, CblasNoTrans, p, count, a.numRows, 1, left.doubles(), p, right.doubles(), count, 0,
                            result.doubles(), count);
                    for (int i = 0; i < p; i++) {
                        result.doubles().get(i * count, out.data, i * out.numCols + from, count);
                    }
                }
            });
        }
        return out;
    }

    private static DMatrixRMaj mirrored(DMatrixRMaj upper) {
        int n = upper.numCols;
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < i; j++) {
                upper.data[i * n + j] = upper.data[j * n + i];
            }
        }
        return upper;
    }

    @Override
    public Optional<DMatrixRMaj> cholesky(DMatrixRMaj a) {
        int n = a.numRows;
        try (Loan memory = scratch.lend(a.data, 0, n * n)) {
            // Our upper triangle is their lower one, and A = L Lᵀ there is A = Rᵀ R here.
            if (openblas.LAPACKE_dpotrf(LAPACK_COL_MAJOR, (byte) 'L', n, memory.doubles(), n) != 0) {
                return Optional.empty();
            }
            return Optional.of(upper(memory.doubles(), n, n));
        }
    }

    private static DMatrixRMaj upper(DoubleBuffer from, int n, int stride) {
        DMatrixRMaj r = new DMatrixRMaj(n, n);
        for (int i = 0; i < n; i++) {
            from.get(i * stride + i, r.data, i * n + i, n - i);
        }
        return r;
    }

    /** A = Q R here is Aᵀ = L Qᵀ there. */
    @Override
    public Qr qr(DMatrixRMaj a) {
        Entries.requireFinite("orthonormal columns", a);
        int m = a.numRows;
        int n = a.numCols;
        if (m < n) {
            throw new IllegalArgumentException("orthonormal columns of " + m + " x " + n);
        }
        try (Loan memory = scratch.lend(a.data, 0, m * n); Loan tau = scratch.lend(n)) {
            done("orthonormal columns", a, openblas.LAPACKE_dgelqf(LAPACK_COL_MAJOR, n, m, memory.doubles(), n, tau.doubles()));
            DMatrixRMaj r = upper(memory.doubles(), n, n);
            done("orthonormal columns", a, openblas.LAPACKE_dorglq(LAPACK_COL_MAJOR, n, m, n, memory.doubles(), n, tau.doubles()));
            return new Qr(taken(memory.doubles(), m, n), r);
        }
    }

    @Override
    public SymmetricEigen symmetricEigen(DMatrixRMaj a) {
        Entries.requireFinite("symmetric eigenvalues", a);
        int n = a.numRows;
        try (Loan memory = scratch.lend(a.data, 0, n * n); Loan values = scratch.lend(n)) {
            done("symmetric eigenvalues", a,
                    openblas.LAPACKE_dsyevd(LAPACK_COL_MAJOR, (byte) 'V', (byte) 'L', n, memory.doubles(), n, values.doubles()));
            double[] falling = IntStream.range(0, n).mapToDouble(j -> values.doubles().get(n - 1 - j)).toArray();
            DMatrixRMaj vectors = new DMatrixRMaj(n, n);
            double[] column = new double[n];
            for (int j = 0; j < n; j++) {
                memory.doubles().get((n - 1 - j) * n, column);
                for (int i = 0; i < n; i++) {
                    vectors.data[i * n + j] = column[i];
                }
            }
            return new SymmetricEigen(falling, Entries.signed(vectors));
        }
    }

    /** A = U S Vᵀ here is Aᵀ = V S Uᵀ there. */
    @Override
    public Svd svd(DMatrixRMaj a) {
        Entries.requireFinite("singular values", a);
        int m = a.numRows;
        int n = a.numCols;
        int k = Math.min(m, n);
        try (Loan memory = scratch.lend(a.data, 0, m * n); Loan values = scratch.lend(k); Loan left = scratch.lend((long) n * k);
                Loan right = scratch.lend((long) k * m)) {
            int info = openblas.LAPACKE_dgesdd(LAPACK_COL_MAJOR, (byte) 'S', n, m, memory.doubles(), n, values.doubles(), left.doubles(), n,
                    right.doubles(), k);
            if (info > 0) {
                return bySweeps(a, memory.doubles(), values.doubles(), left.doubles(), right.doubles());
            }
            done("singular values", a, info);
            return triples(m, n, values.doubles(), left.doubles(), right.doubles());
        }
    }

    /** Divide and conquer may fail to converge where the slower iteration does not. */
    private Svd bySweeps(DMatrixRMaj a, DoubleBuffer memory, DoubleBuffer values, DoubleBuffer left, DoubleBuffer right) {
        int m = a.numRows;
        int n = a.numCols;
        int k = Math.min(m, n);
        memory.put(0, a.data, 0, m * n);
        try (Loan rest = scratch.lend(k)) {
            done("singular values", a, openblas.LAPACKE_dgesvd(LAPACK_COL_MAJOR, (byte) 'S', (byte) 'S', n, m, memory, n, values, left, n, right, k,
                    rest.doubles()));
        }
        return triples(m, n, values, left, right);
    }

    private static Svd triples(int m, int n, DoubleBuffer values, DoubleBuffer left, DoubleBuffer right) {
        int k = Math.min(m, n);
        double[] s = new double[k];
        values.get(0, s);
        DMatrixRMaj v = taken(left, k, n);
        CommonOps_DDRM.transpose(v);
        return new Svd(taken(right, m, k), s, v);
    }

    private static DMatrixRMaj taken(DoubleBuffer from, int rows, int columns) {
        DMatrixRMaj out = new DMatrixRMaj(rows, columns);
        from.get(0, out.data, 0, rows * columns);
        return out;
    }

    /** Without balancing, which would change what is small beside what. */
    @Override
    public GeneralEigen eigen(DMatrixRMaj a) {
        int n = a.numRows;
        if (n != a.numCols) {
            throw new IllegalArgumentException("eigenvalues need a square matrix, not " + n + " x " + a.numCols);
        }
        Entries.requireFinite("eigenvalues", a);
        DMatrixRMaj turned = CommonOps_DDRM.transpose(a, null);
        try (Loan memory = scratch.lend(turned.data, 0, n * n); Loan re = scratch.lend(n); Loan im = scratch.lend(n);
                Loan vectors = scratch.lend((long) n * n); Loan scale = scratch.lend(n); Loan norm = scratch.lend(1);
                Loan integers = scratch.lend(1)) {
            IntBuffer bounds = integers.memory().asIntBuffer();
            done("eigenvalues", a, openblas.LAPACKE_dgeevx(LAPACK_COL_MAJOR, (byte) 'N', (byte) 'N', (byte) 'V', (byte) 'N', n, memory.doubles(), n,
                    re.doubles(), im.doubles(), vectors.doubles(), n, vectors.doubles(), n, bounds.slice(0, 1), bounds.slice(1, 1), scale.doubles(),
                    norm.doubles(), scale.doubles(), scale.doubles()));
            return pairs(n, re.doubles(), im.doubles(), vectors.doubles());
        }
    }

    private static GeneralEigen pairs(int n, DoubleBuffer re, DoubleBuffer im, DoubleBuffer vectors) {
        List<Complex> values = new ArrayList<>(n);
        ZMatrixRMaj out = new ZMatrixRMaj(n, n);
        double[] real = new double[n];
        double[] imaginary = new double[n];
        for (int j = 0; j < n; j++) {
            values.add(new Complex(re.get(j), im.get(j)));
            if (im.get(j) >= 0) {
                vectors.get(j * n, real);
                if (im.get(j) > 0) {
                    vectors.get((j + 1) * n, imaginary);
                }
                GeneralEigen.put(out, j, real, imaginary, im.get(j) > 0);
            }
        }
        return new GeneralEigen(values, out);
    }

    private static void done(String what, DMatrixRMaj a, int info) {
        if (info != 0) {
            throw new FitFault(what, "no convergence on a " + a.numRows + " x " + a.numCols + " matrix (code " + info + ")",
                    "check the data for values that are not finite or of wildly different size");
        }
    }
}
