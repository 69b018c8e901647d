package org.modestead.engine.basis;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.linalg.Matrices;

class PivotedCholeskyTest {

    /** A walk through three dimensions, smooth or with every point somewhere else, some points twice. */
    private static DMatrixRMaj points(int count, boolean smooth) {
        Random random = new Random(5);
        DMatrixRMaj x = new DMatrixRMaj(count, 3);
        for (int i = 0; i < count; i++) {
            for (int k = 0; k < 3; k++) {
                x.set(i, k, smooth ? Math.sin(0.02 * (k + 1) * i + k) + 0.001 * random.nextGaussian() : random.nextGaussian());
            }
        }
        System.arraycopy(x.data, 0, x.data, 3 * (count / 2), 30);
        return x;
    }

    private static Kernel kernel(String family) {
        return switch (family) {
            case "polynomial" -> Motions.kernel(family, "degree", 4, "offset", 1);
            case "exponential" -> Motions.kernel(family, "rate", 0.3);
            default -> Motions.kernel(family, "scale", 1.2);
        };
    }

    /** The algorithm as its paper has it: every distance is brought up to date at every step. */
    private static PivotedCholesky.Pivots plainly(Kernel kernel, DMatrixRMaj x, int most) {
        double[] distance = kernel.diagonal(x);
        double first = Arrays.stream(distance).max().orElseThrow();
        double[][] factor = new double[most][];
        int[] chosen = new int[most];
        int rank = 0;
        for (; rank < most; rank++) {
            int pivot = 0;
            for (int i = 1; i < distance.length; i++) {
                pivot = distance[i] > distance[pivot] ? i : pivot;
            }
            if (!(distance[pivot] > 1e-13 * first)) {
                break;
            }
            chosen[rank] = pivot;
            factor[rank] = kernel.matrix(x, Matrices.block(x, pivot, pivot + 1, 0, x.numCols)).data;
            double root = Math.sqrt(distance[pivot]);
            for (int i = 0; i < distance.length; i++) {
                for (int k = 0; k < rank; k++) {
                    factor[rank][i] -= factor[k][pivot] * factor[k][i];
                }
                factor[rank][i] /= root;
                distance[i] = Math.max(0, distance[i] - factor[rank][i] * factor[rank][i]);
            }
            distance[pivot] = 0;
        }
        DMatrixRMaj z = new DMatrixRMaj(rank, x.numCols);
        DMatrixRMaj lower = new DMatrixRMaj(rank, rank);
        for (int i = 0; i < rank; i++) {
            System.arraycopy(x.data, chosen[i] * x.numCols, z.data, i * x.numCols, x.numCols);
            for (int k = 0; k <= i; k++) {
                lower.set(i, k, factor[k][chosen[i]]);
            }
        }
        return new PivotedCholesky.Pivots(z, lower);
    }

    @ParameterizedTest
    @CsvSource({"gaussian,true,900,120", "gaussian,false,900,120", "exponential,true,1000,80", "exponential,false,1000,80",
        "polynomial,true,700,100", "matern32,false,500,150", "laplacian,true,300,300", "gaussian,false,90,90"})
    void pivotsAndFactorAreThoseOfThePlainAlgorithmToTheLastBit(String family, boolean smooth, int count, int most) {
        DMatrixRMaj x = points(count, smooth);
        PivotedCholesky.Pivots expected = plainly(kernel(family), x, most);
        PivotedCholesky.Pivots found = PivotedCholesky.choose(kernel(family), x, most, Progress.NONE);
        assertEquals(expected.points().numRows, found.points().numRows);
        assertArrayEquals(expected.points().data, found.points().data);
        assertArrayEquals(expected.lower().data, found.lower().data);
    }
}
