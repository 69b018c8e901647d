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
    void theFactorIsThatOfTheLastThirdOverTheFirst() {
        assertEquals(50, NormTrend.of(List.of(1.0, 2.0, 10.0, 50.0), 3).factor(), 1e-12);
        assertEquals(2, NormTrend.of(List.of(1.0, 4.0, 7.0, 7.0, 2.0, 8.0), 3).factor(), 1e-12, "geometric means 2 and 4");
    }

    @Test
    void jaggedGrowthOverTheWholeLadderIsGrowth() {
        // the Hopf flow off its cycle in the space of exp(x·y), where no eigenfunction is entire
        assertTrue(growing(2.97, 2.82, 6.6, 5.0, 9.0, 21.0, 16.6, 24.5, 67.0, 227.0, 390.0, 244.0));
        // x' of a sheared flow: two modes cross on the way and the norm returns
        assertFalse(growing(4.46, 4.88, 4.74, 4.74, 7.98, 10.7, 10.7, 8.6, 8.1, 7.2, 5.1, 4.55));
    }

    @Test
    void whatHasComeToRestNoLongerRises() {
        assertFalse(NormTrend.of(List.of(3.0, 4.0, 4.19, 4.195, 4.2), 3).rising());
        assertTrue(NormTrend.of(List.of(3.8, 4.22, 4.22, 4.59), 3).rising());
    }
}
