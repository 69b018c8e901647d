package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;

/** Two rates, or one that noise has split. */
class TwinRatesTest {

    private static boolean resolved(Motions.Flow first, Motions.Flow second, double noise) {
        Random random = new Random(7);
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < 16; i++) {
            double a = 2 * random.nextDouble() - 1;
            double b = 2 * random.nextDouble() - 1;
            runs.add(Motions.run("r" + i, Motions.grid(60, 0.1), t -> new double[] {first.at(a, t) + second.at(b, t)}, noise, random));
        }
        Verdict verdict = Motions.judge(Motions.fit(Motions.snapshots(0.1, 4, runs.subList(0, 12), runs.subList(12, 16)), new LinearEstimator(), 2),
                JudgeSettings.DEFAULT);
        return verdict.findings().stream().filter(f -> f.check().equals("resolved-rates") && f.mode() == 1).findFirst().orElseThrow().passed();
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, 0.001, 0.003})
    void twoRatesThatLieApartAreResolved(double noise) {
        assertTrue(resolved((a, t) -> a * Math.exp(-0.3 * t), (b, t) -> b * Math.exp(-2.5 * t), noise));
    }

    @ParameterizedTest
    @ValueSource(doubles = {0.001, 0.003})
    void halvesOfACriticallyDampedMotionAreNot(double noise) {
        assertFalse(resolved((a, t) -> a * Math.exp(-t), (b, t) -> 3 * b * t * Math.exp(-t), noise));
    }

    @ParameterizedTest
    @ValueSource(doubles = {0.0003, 0.001})
    void rampsAreOneDefectiveMotionHoweverNoiseSplitsThem(double noise) {
        assertFalse(resolved((a, t) -> a, (b, t) -> b * t, noise));
    }

    @ParameterizedTest
    @ValueSource(doubles = {0.001, 0.003})
    void aModeIsNotBlamedForAWeakNeighbourThatNoiseMoves(double noise) {
        // a tenth of the weight: halves of one defective motion carry weights of one size
        assertTrue(resolved((a, t) -> (a + Math.signum(a)) * Math.exp(-0.5 * t), (b, t) -> 0.1 * b * Math.exp(-1.2 * t), noise));
    }
}
