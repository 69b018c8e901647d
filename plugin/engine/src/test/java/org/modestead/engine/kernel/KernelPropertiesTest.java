package org.modestead.engine.kernel;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.LinearAlgebra;

class KernelPropertiesTest {

    @Provide
    Arbitrary<Kernel> kernels() {
        return Arbitraries.of(KernelFamilies.all()).map(family -> {
            java.util.TreeMap<String, Double> initial = new java.util.TreeMap<>();
            family.parameters().forEach(parameter -> initial.put(parameter.name(), parameter.initial()));
            return family.create(new KernelSpec(family.id(), initial));
        });
    }

    private static DMatrixRMaj points(int count, int size, double spread, long seed) {
        Random random = new Random(seed);
        DMatrixRMaj x = new DMatrixRMaj(count, size);
        for (int i = 0; i < x.getNumElements(); i++) {
            x.data[i] = spread * random.nextGaussian();
        }
        return x;
    }

    @Property(tries = 150, seed = "20261201")
    void theMatrixIsSymmetricInItsArguments(@ForAll("kernels") Kernel kernel, @ForAll long seed,
            @ForAll @IntRange(min = 1, max = 5) int size) {
        DMatrixRMaj x = points(7, size, 1, seed);
        DMatrixRMaj y = points(4, size, 1, seed + 1);
        DMatrixRMaj forward = kernel.matrix(x, y);
        DMatrixRMaj backward = kernel.matrix(y, x);
        for (int i = 0; i < 7; i++) {
            for (int j = 0; j < 4; j++) {
                assertEquals(forward.get(i, j), backward.get(j, i), 1e-14 * (1 + Math.abs(forward.get(i, j))));
            }
        }
    }

    @Property(tries = 150, seed = "20261201")
    void theDiagonalIsThatOfTheMatrix(@ForAll("kernels") Kernel kernel, @ForAll long seed,
            @ForAll @IntRange(min = 1, max = 5) int size) {
        DMatrixRMaj x = points(9, size, 1, seed);
        DMatrixRMaj full = kernel.matrix(x, x);
        double[] diagonal = new double[9];
        for (int i = 0; i < 9; i++) {
            diagonal[i] = full.get(i, i);
        }
        assertArrayEquals(diagonal, kernel.diagonal(x), 1e-12 * (1 + java.util.Arrays.stream(diagonal).max().orElse(0)));
    }

    @Property(tries = 150, seed = "20261201")
    void gramMatricesHaveNoNegativeEigenvalue(@ForAll("kernels") Kernel kernel, @ForAll long seed,
            @ForAll @IntRange(min = 1, max = 4) int size, @ForAll @DoubleRange(min = 0.01, max = 1.5) double spread) {
        DMatrixRMaj x = points(25, size, spread, seed);
        double[] values = LinearAlgebra.installed().symmetricEigen(kernel.matrix(x, x)).values();
        // rounding of 25 values of size s_1
        assertTrue(values[24] > -1e-13 * values[0], values[24] + " against " + values[0]);
    }

    @Property(tries = 60, seed = "20261201")
    void aKernelIsMadeAgainFromItsSpec(@ForAll("kernels") Kernel kernel, @ForAll long seed) {
        DMatrixRMaj x = points(5, 2, 1, seed);
        assertArrayEquals(kernel.matrix(x, x).data, KernelFamilies.create(kernel.spec()).matrix(x, x).data);
    }
}
