package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Snapshots;

class ForwardCompletenessTest {

    private static Finding finding(Motions.Flow flow, double noise, double low, double high, double duration) {
        Snapshots snapshots = Motions.snapshots(duration / 19, 1, Motions.spread(flow, 10, low, high, 20, duration, noise,
                3), List.of());
        return Motions.judge(Motions.fit(snapshots, new LinearEstimator(), 1), JudgeSettings.DEFAULT).findings().stream()
                .filter(f -> f.check().equals("forward-completeness")).findFirst().orElseThrow();
    }

    @Test
    void aFlowThatEscapesInFiniteTimeIsFound() {
        // x' = x² from x0 escapes at 1/x0: here at 1/2 to 1, the runs end at 0.4
        Finding finding = finding((a, t) -> a / (1 - a * t), 0, 1, 2, 0.4);
        assertEquals(10, finding.value());
        assertTrue(!finding.passed() && finding.sentence().contains("10 of 10 runs"), finding.sentence());
    }

    @Test
    void aLittleNoiseDoesNotHideTheEscape() {
        assertTrue(finding((a, t) -> a / (1 - a * t), 0.01, 1, 2, 0.4).value() >= 8);
    }

    @Test
    void exponentialGrowthIsNoEscape() {
        for (double duration : new double[] {0.4, 2, 5}) {
            assertTrue(finding((a, t) -> a * Math.exp(t), 0, 0.5, 2, duration).passed(), "duration " + duration);
        }
    }

    @Test
    void noisyExponentialGrowthIsNoEscape() {
        assertEquals(0, finding((a, t) -> a * Math.exp(t), 0.01, 0.5, 2, 2).value());
        assertEquals(0, finding((a, t) -> a * Math.exp(t), 0.02, 0.5, 2, 0.4).value());
    }

    @Test
    void decayAndRestAreNoEscape() {
        assertTrue(finding((a, t) -> a * Math.exp(-t), 0.01, 0.5, 2, 2).passed());
        assertTrue(finding((a, t) -> a, 0, 0.5, 2, 2).passed());
        assertTrue(finding((a, t) -> a / Math.sqrt(1 + 2 * a * a * t), 0, 0.5, 2, 2).passed());
    }

    @Test
    void aStateAtTheOriginIsNoEscape() {
        assertTrue(finding((a, t) -> a * Math.exp(t), 0, -1, 1.25, 1).passed());
    }
}
