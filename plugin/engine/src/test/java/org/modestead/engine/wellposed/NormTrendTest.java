package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;

class NormTrendTest {

    private static boolean growing(Double... norms) {
        return NormTrend.of(List.of(norms), 3).growing();
    }

    @Test
    void theNormsOfTheRiccatiFlowGrow() {
        // worked figures at ranks 4, 6, 8, 10
        assertTrue(growing(2.5, 8.0, 60.0, 750.0));
    }

    @Test
    void repeatedRungsOfASymmetricMotionDoNotHideTheGrowth() {
        assertTrue(growing(2.5, 2.5, 8.0, 8.0, 60.0, 60.0));
    }

    @Test
    void steadyGrowthBelowTheFactorIsStillGrowth() {
        assertTrue(growing(1.0, 1.5, 2.0));
    }

    @Test
    void aConvergentRiseIsBounded() {
        assertFalse(growing(1.0, 1.5, 1.7, 1.78));
        assertFalse(growing(1.0, 1.4, 1.5));
    }

    @Test
    void aSmallLateRiseIsNoise() {
        // x' = x with 1 % of noise, ranks 4 to 7
        assertFalse(growing(1.3664, 1.3664, 1.3873, 1.5165));
    }

    @Test
    void constantFallingOrShortSequencesAreBounded() {
        assertFalse(growing(2.0, 2.0, 2.0, 2.0));
        assertFalse(growing(60.0, 8.0, 2.5));
        assertFalse(growing(1.0, 100.0));
        assertFalse(growing(5.0));
    }

    @Test
    void theFactorIsTheLastOverTheFirstOfTheLastThree() {
        assertEquals(25, NormTrend.of(List.of(1.0, 2.0, 10.0, 50.0), 3).factor(), 1e-12);
    }
}
