package org.modestead.accelerator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.function.Function;
import java.util.stream.IntStream;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.modestead.engine.linalg.AwkwardMatrices;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.EjmlAlgebra;
import org.modestead.engine.linalg.GeneralEigen;
import org.modestead.engine.linalg.LinearAlgebra;

/**
 * EJML and OpenBLAS agree. Products: each of k terms of size one rounds once, so {@code 4 ε k} is allowed. Decompositions: values to
 * {@code 40 ε n ‖A‖}, as good as one rounding error in each entry of the input allows.
 */
class AgreementTest {

    private static final double ULP = Math.ulp(1.0);

    private final LinearAlgebra ejml = new EjmlAlgebra();
    private final LinearAlgebra library = Library.get().orElseThrow();

    private static void assertClose(DMatrixRMaj expected, DMatrixRMaj found, double tolerance) {
        assertEquals(expected.numRows, found.numRows);
        assertEquals(expected.numCols, found.numCols);
        assertArrayEquals(expected.data, found.data, tolerance);
    }

    @Property(tries = 60, seed = "20261201")
    void productsOfAnyShape(@ForAll long seed, @ForAll @IntRange(min = 1, max = 90) int m, @ForAll @IntRange(min = 1, max = 90) int k,
            @ForAll @IntRange(min = 1, max = 90) int n) {
        DMatrixRMaj a = AwkwardMatrices.random(m, k, seed);
        DMatrixRMaj b = AwkwardMatrices.random(k, n, seed + 1);
        DMatrixRMaj at = CommonOps_DDRM.transpose(a, null);
        DMatrixRMaj bt = CommonOps_DDRM.transpose(b, null);
        // entries of normal random numbers reach 5, their products 25
        double tolerance = 100 * ULP * k;
        assertClose(ejml.multiply(a, b), library.multiply(a, b), tolerance);
        assertClose(ejml.multiplyTransA(at, b), library.multiplyTransA(at, b), tolerance);
        assertClose(ejml.multiplyTransB(a, bt), library.multiplyTransB(a, bt), tolerance);
        assertClose(ejml.gram(a), library.gram(a), 100 * ULP * m);
    }

    /** Shapes at which work is cut: long rows of blocks, sums in parts, results too large to be kept once a part. */
    @Test
    void productsThatAreCutIntoBlocks() {
        for (int[] shape : new int[][] {{20_000, 30, 40}, {70, 9_000, 12}, {600, 30, 1300}, {1100, 70, 1200}, {40, 40_000, 30},
            {300, 20, 9_000}}) {
            DMatrixRMaj a = AwkwardMatrices.random(shape[0], shape[1], 3);
            DMatrixRMaj b = AwkwardMatrices.random(shape[1], shape[2], 4);
            DMatrixRMaj c = AwkwardMatrices.random(shape[0], shape[2], 5);
            assertClose(ejml.multiply(a, b), library.multiply(a, b), 100 * ULP * shape[1]);
            assertClose(ejml.multiplyTransB(a, CommonOps_DDRM.transpose(b, null)), library.multiplyTransB(a, CommonOps_DDRM.transpose(b, null)),
                    100 * ULP * shape[1]);
            assertClose(ejml.multiplyTransA(a, c), library.multiplyTransA(a, c), 100 * ULP * shape[0]);
            assertClose(ejml.gram(b), library.gram(b), 100 * ULP * shape[1]);
        }
    }

    @Property(tries = 25, seed = "20261201")
    void decompositions(@ForAll long seed, @ForAll @IntRange(min = 1, max = 70) int n, @ForAll @IntRange(min = 0, max = 60) int more) {
        DMatrixRMaj a = AwkwardMatrices.random(n + more, n, seed);
        double tolerance = 40 * ULP * (n + more) * 2 * Math.sqrt(n + more);
        assertArrayEquals(ejml.svd(a).values(), library.svd(a).values(), tolerance);
        DMatrixRMaj gram = ejml.gram(a);
        assertArrayEquals(ejml.symmetricEigen(gram).values(), library.symmetricEigen(gram).values(), tolerance * 2 * Math.sqrt(n + more));
        DMatrixRMaj r = library.qr(a).r();
        // the triangle is unique up to signs of its rows
        assertClose(gram, library.multiplyTransA(r, r), tolerance * 2 * Math.sqrt(n + more));
    }

    /** A normal matrix: the eigenvalues move by no more than the rounding of its entries. */
    @Property(tries = 25, seed = "20261201")
    void eigenvaluesOfANormalMatrix(@ForAll long seed, @ForAll @IntRange(min = 2, max = 60) int n) {
        DMatrixRMaj turned = ejml.qr(AwkwardMatrices.random(n, n, seed)).q();
        List<Complex> expected = sorted(ejml.eigen(turned));
        List<Complex> found = sorted(library.eigen(turned));
        for (int j = 0; j < n; j++) {
            assertEquals(0, expected.get(j).minus(found.get(j)).abs(), 40 * ULP * n);
        }
    }

    /** By angle: eigenvalues of a rotation lie on the unit circle. */
    private static List<Complex> sorted(GeneralEigen eigen) {
        return eigen.values().stream().sorted(Comparator.comparingDouble((Complex z) -> Math.rint(z.arg() * 1e9)).thenComparingDouble(Complex::re))
                .toList();
    }

    /** Whatever else runs: nothing of a result depends on which core did what when. */
    @Test
    void theSameWorkGivesTheSameBytesBesideOtherWork() {
        DMatrixRMaj tall = AwkwardMatrices.random(9000, 60, 6);
        DMatrixRMaj square = AwkwardMatrices.random(150, 150, 7);
        DMatrixRMaj symmetric = AwkwardMatrices.symmetrised(square);
        List<Function<LinearAlgebra, double[]>> works = List.of(algebra -> algebra.gram(tall).data, algebra -> algebra.multiply(tall,
                Block.of(square, 60)).data, algebra -> algebra.multiplyTransA(tall, tall).data, algebra -> algebra.eigen(square).vectors().data,
                algebra -> algebra.svd(square).u().data, algebra -> algebra.symmetricEigen(symmetric).vectors().data,
                algebra -> algebra.qr(tall).q().data, algebra -> algebra.cholesky(algebra.gram(tall)).orElseThrow().data);
        List<double[]> first = works.stream().map(work -> work.apply(library)).toList();
        boolean same = IntStream.range(0, 4 * works.size()).parallel()
                .allMatch(k -> Arrays.equals(first.get(k % works.size()), works.get(k % works.size()).apply(library)));
        assertTrue(same);
    }

    /** The leading square block. */
    private static final class Block {
        static DMatrixRMaj of(DMatrixRMaj a, int n) {
            return CommonOps_DDRM.extract(a, 0, n, 0, n);
        }
    }
}
