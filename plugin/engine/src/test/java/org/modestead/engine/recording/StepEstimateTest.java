package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;

class StepEstimateTest {

    @Test
    void oneGapLeavesTheMedianAlone() {
        StepEstimate step = StepEstimate.of(new double[] {0, 1, 2, 50, 51, 52});
        assertEquals(1, step.typical());
        assertEquals(48, step.longest());
        assertFalse(step.uniform());
    }

    @Test
    void stepsThatDifferByLessThanAMillionthAreUniform() {
        assertTrue(StepEstimate.of(new double[] {0, 1, 2 + 9e-7}).uniform());
        assertFalse(StepEstimate.of(new double[] {0, 1, 2, 3 + 1.1e-6}).uniform());
    }

    @Test
    void secondsSince1970AtAHundredHertzAreUniformAndTheRoundingOfTimesAveragesOut() {
        double[] times = new double[10_001];
        for (int k = 0; k < times.length; k++) {
            times[k] = 1.7e9 + k * 0.01;
        }
        StepEstimate step = StepEstimate.of(times);
        assertTrue(step.uniform());
        // both ends rounded to 2.4e-7 s over 100 s
        assertEquals(0.01, step.typical(), 0.01 * 5e-9);
    }

    @Test
    void pausesBetweenRunsAreNoSteps() {
        StepEstimate step = StepEstimate.of(List.of(new double[] {0, 1, 2}, new double[] {100, 101}, new double[] {7}));
        assertTrue(step.uniform());
        assertEquals(1, step.typical());
    }

    @Test
    void runsWithDifferentStepsAreNotUniformTogether() {
        assertFalse(StepEstimate.of(List.of(new double[] {0, 1, 2}, new double[] {0, 2, 4})).uniform());
    }

    @Test
    void aSingleSampleAgreesWithEveryStep() {
        assertTrue(StepEstimate.of(new double[] {3}).agreesWith(0.1));
    }
}
