package org.modestead.engine.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Map;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.RandomMatrices_DDRM;
import org.junit.jupiter.api.Test;
import org.modestead.engine.linalg.Matrices;

/** Large Gaussian matrices by products are the small ones to rounding, and points too far out are not taken that way. */
class SquaredDistancesTest {

    @Test
    void aLargeMatrixHoldsTheValuesOfItsPairs() {
        DMatrixRMaj x = RandomMatrices_DDRM.rectangle(600, 16, -1, 1, new Random(1));
        DMatrixRMaj y = RandomMatrices_DDRM.rectangle(500, 16, -1, 1, new Random(2));
        Kernel kernel = KernelFamilies.create(new KernelSpec("gaussian", Map.of("scale", 3.0)));
        DMatrixRMaj all = kernel.matrix(x, y);
        for (int i = 0; i < 600; i += 37) {
            DMatrixRMaj alone = kernel.matrix(Matrices.block(x, i, i + 1, 0, 16), y);
            for (int j = 0; j < 500; j++) {
                // squared norms of at most 16 about the mean, over 2 scale² = 18: a few units in the last place of 1
                assertEquals(alone.get(0, j), all.get(i, j), 2e-15);
            }
        }
    }

    @Test
    void pointsFarOutAreLeftToSumsOfDifferences() {
        DMatrixRMaj x = RandomMatrices_DDRM.rectangle(3, 8, -1, 1, new Random(3));
        x.set(2, 7, 1e9);
        DMatrixRMaj y = RandomMatrices_DDRM.rectangle(4, 8, -1, 1, new Random(4));
        assertTrue(SquaredDistances.byProducts(x, y, 1e-9).isEmpty());
    }
}
