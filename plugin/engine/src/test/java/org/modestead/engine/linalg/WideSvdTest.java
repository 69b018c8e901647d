package org.modestead.engine.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.modestead.engine.linalg.LinearAlgebra.Svd;

/** A wide matrix that is not turned over has the triples of the one that is. */
class WideSvdTest {

    @Test
    void aWideMatrixIsPutTogetherFromItsTriples() {
        DMatrixRMaj a = AwkwardMatrices.random(20, 3000, 1);
        for (int i = 0; i < 20; i++) {
            for (int j = 0; j < 3000; j++) {
                a.data[i * 3000 + j] *= Math.pow(0.6, i);
            }
        }
        Svd svd = WideSvd.of(a, a.numRows).orElseThrow();
        assertTrue(AwkwardMatrices.orthogonalityRatio(svd.u()) < 30);
        assertTrue(AwkwardMatrices.orthogonalityRatio(svd.v()) < 30);
        DMatrixRMaj scaled = svd.u().copy();
        CommonOps_DDRM.multCols(scaled, svd.values());
        DMatrixRMaj again = Matrices.productTranspose(scaled, svd.v());
        double[] turned = ThinSvd.of(CommonOps_DDRM.transpose(a, null), 20).values();
        for (int k = 0; k < 20; k++) {
            // two rounds of Cholesky leave every value to rounding of the largest
            assertEquals(turned[k], svd.values()[k], 1e-13 * turned[0]);
        }
        for (int at = 0; at < a.getNumElements(); at++) {
            assertEquals(a.data[at], again.data[at], 1e-13 * turned[0]);
        }
    }

    @Test
    void rowsThatDependOnEachOtherAreNotTakenThatWay() {
        DMatrixRMaj a = Matrices.product(AwkwardMatrices.random(20, 5, 2), AwkwardMatrices.random(5, 2000, 3));
        assertTrue(WideSvd.of(a, a.numRows).isEmpty());
    }
}
