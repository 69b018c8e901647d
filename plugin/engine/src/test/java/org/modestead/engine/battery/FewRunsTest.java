package org.modestead.engine.battery;

import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.wellposed.JudgeSettings;

/** With five runs one is held out: which one it happens to be must not decide. */
class FewRunsTest {

    private static final int RUNS = 5;

    @ParameterizedTest
    @CsvSource({"diffusion in a stream / linear-kernel-step, 0", "heat at 5 points / linear-kernel-step, 0",
        "x'=1 / exponential, 0.01", "train that speeds up 3d / linear-kernel-step, 0.01", "light spiral 2d / exponential, 0.05"})
    void otherRunsHeldOutInItsPlacePutAWrongVerdictRight(String id, double noise) {
        Case known = Battery.calibrating().stream().filter(one -> one.id().equals(id)).findFirst().orElseThrow();
        Trial trial = new Trial(known, noise, RUNS, 1);
        assertFalse(trial.judge(JudgeSettings.DEFAULT.withSplits(1)).right(), "the run at hand misleads");
        Trial.Outcome outcome = trial.judge();
        assertTrue(outcome.right(), outcome.toString());
    }
}
