package org.modestead.engine.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

class EigenPropertiesTest {

    @Property(tries = 150, seed = "20261201")
    void residualsAreAFewRoundingErrorsAtAnySizeAndScale(
            @ForAll long seed, @ForAll @IntRange(min = 1, max = 60) int n,
                    @ForAll @DoubleRange(min = -150, max = 150) double exponent) {
        DMatrixRMaj a = AwkwardMatrices.scaled(AwkwardMatrices.random(n, n, seed), Math.pow(10, exponent));
        assertTrue(AwkwardMatrices.eigenRatio(a, LinearAlgebra.installed().eigen(a)) < 30);
    }

    @Property(tries = 100, seed = "20261201")
    void traceIsTheSumOfTheEigenvalues(@ForAll long seed, @ForAll @IntRange(min = 1, max = 60) int n) {
        DMatrixRMaj a = AwkwardMatrices.random(n, n, seed);
        double sum = LinearAlgebra.installed().eigen(a).values().stream().mapToDouble(Complex::re).sum();
        // backward error of a few roundings of the norm, summed over n
        assertEquals(CommonOps_DDRM.trace(a), sum, 1e-13 * n * Math.sqrt(n) + 1e-14);
    }

    @Property(tries = 100, seed = "20261201")
    void blockwiseRepeatedSparseIntegersNeverBreakTheIteration(@ForAll long seed,
            @ForAll @IntRange(min = 2, max = 12) int n) {
        java.util.Random random = new java.util.Random(seed);
        DMatrixRMaj a = new DMatrixRMaj(n, n);
        for (int i = 0; i < n * n; i++) {
            a.data[i] = random.nextInt(3) == 0 ? random.nextInt(3) - 1 : 0;
        }
        assertTrue(AwkwardMatrices.eigenRatio(a, LinearAlgebra.installed().eigen(a)) < 30);
    }
}
