package org.modestead.engine.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class TallQrTest {

    /** 400 x 12 with singular values falling evenly on a logarithmic scale from 1 to 1/condition. */
    private static DMatrixRMaj ofCondition(double condition) {
        DMatrixRMaj u = LinearAlgebra.installed().svd(AwkwardMatrices.random(400, 12, 61)).u();
        DMatrixRMaj v = LinearAlgebra.installed().svd(AwkwardMatrices.random(12, 12, 62)).u();
        for (int i = 0; i < 400; i++) {
            for (int k = 0; k < 12; k++) {
                u.set(i, k, u.get(i, k) * Math.pow(condition, -k / 11.0));
            }
        }
        return Matrices.productTranspose(u, v);
    }

    @ParameterizedTest
    @ValueSource(doubles = {1, 1e3, 1e5})
    void factorsMultiplyBackAndQIsOrthonormalToRounding(double condition) {
        DMatrixRMaj a = ofCondition(condition);
        TallQr qr = TallQr.of(a).orElseThrow();
        assertTrue(AwkwardMatrices.orthogonalityRatio(qr.q()) < 30);
        DMatrixRMaj back = Matrices.product(qr.q(), qr.r());
        for (int i = 0; i < a.getNumElements(); i++) {
            // backward stable: a few roundings of the norm, which is 1
            assertEquals(a.data[i], back.data[i], 1e-14);
        }
        for (int i = 0; i < 12; i++) {
            for (int j = 0; j < i; j++) {
                assertEquals(0, qr.r().get(i, j));
            }
        }
    }

    @Test
    void itIsNotOfferedWhereTheColumnsDepend() {
        assertTrue(TallQr.of(ofCondition(1e12)).isEmpty());
        assertTrue(TallQr.of(new DMatrixRMaj(20, 3)).isEmpty());
    }

    @Test
    void itIsNotOfferedForValuesThatAreNotFinite() {
        DMatrixRMaj a = ofCondition(10);
        a.set(3, 3, Double.NaN);
        assertTrue(TallQr.of(a).isEmpty());
    }
}
