package org.modestead.engine.linalg;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.function.BinaryOperator;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Cancelled;

/** Work that a host has given up ends at its next matrix product. */
class InterruptedProductTest {

    private static final List<BinaryOperator<DMatrixRMaj>> PRODUCTS = List.of(Matrices::product, Matrices::transposeProduct, Matrices::productTranspose);

    @Test
    void anInterruptedThreadComputesNoProductAndStaysInterrupted() {
        DMatrixRMaj one = CommonOps_DDRM.identity(2);
        for (BinaryOperator<DMatrixRMaj> product : PRODUCTS) {
            assertEquals(1, product.apply(one, one).get(0, 0));
            Thread.currentThread().interrupt();
            try {
                assertThrows(Cancelled.class, () -> product.apply(one, one));
            } finally {
                assertTrue(Thread.interrupted(), "whoever waits next is to hear of it too");
            }
        }
    }
}
