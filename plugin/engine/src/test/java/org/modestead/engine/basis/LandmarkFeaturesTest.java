package org.modestead.engine.basis;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.linalg.Matrices;

class LandmarkFeaturesTest {

    private static DMatrixRMaj points(int count, long seed) {
        Random random = new Random(seed);
        DMatrixRMaj x = new DMatrixRMaj(count, 2);
        for (int i = 0; i < x.getNumElements(); i++) {
            x.data[i] = 2 * random.nextDouble() - 1;
        }
        return x;
    }

    private static Kernel kernel(String family) {
        return switch (family) {
            case "polynomial" -> Motions.kernel(family, "degree", 3, "offset", 1);
            case "exponential" -> Motions.kernel(family, "rate", 1);
            default -> Motions.kernel(family, "scale", 1);
        };
    }

    @ParameterizedTest
    @CsvSource({"gaussian", "exponential", "polynomial"})
    void productsOfTheFeaturesGiveTheKernelBackToTheStopTolerance(String family) {
        DMatrixRMaj x = points(300, 1);
        LandmarkFeatures features = LandmarkFeatures.choose(kernel(family), x, 300, Progress.NONE);
        assertTrue(features.size() < 200, "stopped by itself at " + features.size());
        DMatrixRMaj q = features.evaluate(x);
        DMatrixRMaj again = Matrices.productTranspose(q, q);
        DMatrixRMaj full = kernel(family).matrix(x, x);
        double largest = 0;
        for (double d : kernel(family).diagonal(x)) {
            largest = Math.max(largest, d);
        }
        for (int i = 0; i < full.getNumElements(); i++) {
            // the farthest section is at 1e-13 of the largest, squared; solving with the factor (condition 3e6) leaves 1e-9
            assertEquals(full.data[i], again.data[i], 1e-9 * largest);
        }
    }

    @Test
    void aPolynomialSpaceNeedsAsManyLandmarksAsItHasDimensions() {
        // total degree 3 in two variables: 10 monomials
        assertEquals(10, LandmarkFeatures.choose(kernel("polynomial"), points(200, 2), 100, Progress.NONE).size());
    }

    @Test
    void theCapOnLandmarksIsKeptAndTheErrorFallsAsItRises() {
        DMatrixRMaj x = points(200, 3);
        double before = Double.POSITIVE_INFINITY;
        for (int largest : new int[] {3, 6, 12, 24}) {
            LandmarkFeatures features = LandmarkFeatures.choose(kernel("gaussian"), x, largest, Progress.NONE);
            assertEquals(largest, features.size());
            DMatrixRMaj q = features.evaluate(x);
            double worst = 0;
            for (int i = 0; i < 200; i++) {
                double held = 0;
                for (int j = 0; j < largest; j++) {
                    held += q.get(i, j) * q.get(i, j);
                }
                worst = Math.max(worst, 1 - held);
            }
            assertTrue(worst < before);
            before = worst;
        }
    }

    @Test
    void repeatedPointsAreTakenOnce() {
        assertEquals(2, LandmarkFeatures.choose(kernel("gaussian"), Motions.column(1, 1, 1, 2, 2), 5, Progress.NONE).size());
    }
}
