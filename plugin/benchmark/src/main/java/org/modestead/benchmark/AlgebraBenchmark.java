package org.modestead.benchmark;

import java.util.Optional;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.RandomMatrices_DDRM;
import org.modestead.accelerator.AcceleratedAlgebra;
import org.modestead.engine.linalg.EjmlAlgebra;
import org.modestead.engine.linalg.GeneralEigen;
import org.modestead.engine.linalg.LinearAlgebra;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;

/**
 * The operations behind a fit, in the shapes of a kernel fit of rank 200: pure Java against the accelerator. Entries are independent and
 * normal, so nothing is singular.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
public class AlgebraBenchmark {

    private static final int ROWS = 20_000;
    private static final int RANK = 200;

    /** Which implementation. */
    @Param({"ejml", "accelerated"})
    public String library;

    private LinearAlgebra algebra;
    private DMatrixRMaj tall;
    private DMatrixRMaj square;
    private DMatrixRMaj symmetric;

    /** Makes the matrices. */
    @Setup
    public void fill() {
        algebra = library.equals("ejml") ? new EjmlAlgebra() : new AcceleratedAlgebra();
        Random random = new Random(1);
        tall = new DMatrixRMaj(ROWS, RANK);
        square = new DMatrixRMaj(RANK, RANK);
        RandomMatrices_DDRM.fillGaussian(tall, 0, 1, random);
        RandomMatrices_DDRM.fillGaussian(square, 0, 1, random);
        symmetric = new DMatrixRMaj(RANK, RANK);
        CommonOps_DDRM.multInner(square, symmetric);
    }

    /** A (20 000 x 200) B (200 x 200). */
    @Benchmark
    public DMatrixRMaj product() {
        return algebra.multiply(tall, square);
    }

    /** Aᵀ A of 20 000 x 200. */
    @Benchmark
    public DMatrixRMaj gram() {
        return algebra.gram(tall);
    }

    /** Cholesky factor, 200 x 200. */
    @Benchmark
    public Optional<DMatrixRMaj> cholesky() {
        return algebra.cholesky(symmetric);
    }

    /** QR of 20 000 x 200. */
    @Benchmark
    public LinearAlgebra.Qr qr() {
        return algebra.qr(tall);
    }

    /** Singular value decomposition of 20 000 x 200. */
    @Benchmark
    public LinearAlgebra.Svd svd() {
        return algebra.svd(tall);
    }

    /** Eigenvalues and vectors of a symmetric matrix, 200 x 200. */
    @Benchmark
    public LinearAlgebra.SymmetricEigen symmetricEigen() {
        return algebra.symmetricEigen(symmetric);
    }

    /** Eigenvalues and vectors of a general matrix, 200 x 200. */
    @Benchmark
    public GeneralEigen eigen() {
        return algebra.eigen(square);
    }
}
