package org.modestead.engine.basis;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.linalg.Matrices;

/** The factor that makes monomials of one degree turn into one another by a rotation. */
class MonomialDictionaryTest {

    @Test
    void productsOfMonomialsAddUpToPowersOfTheDotProduct() {
        // multinomial theorem: Σ_k (x·y)^k; the factors of degree 2 and 3 in three components are 1, √2, √3 and √6
        DMatrixRMaj states = new DMatrixRMaj(new double[][] {{0.7, -1.2, 0.4}, {1.1, 0.3, -0.6}});
        DMatrixRMaj values = Dictionary.monomials(4).on(3).evaluate(states);
        double dot = 0.7 * 1.1 - 1.2 * 0.3 - 0.4 * 0.6;
        double expected = 1 + dot + Math.pow(dot, 2) + Math.pow(dot, 3) + Math.pow(dot, 4);
        assertEquals(expected, Matrices.productTranspose(values, values).get(0, 1), 1e-14);
    }

    @Test
    void aLoneProductOfTwoComponentsCarriesTheRootOfTwo() {
        DMatrixRMaj values = Dictionary.monomials(2).on(2).evaluate(new DMatrixRMaj(new double[][] {{3, 5}}));
        double[] expected = {1, 3, 5, 9, Math.sqrt(2) * 15, 25};
        for (int j = 0; j < expected.length; j++) {
            assertEquals(expected[j], values.data[j], 1e-14);
        }
    }
}
