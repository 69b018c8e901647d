package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
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
    @CsvSource({"0, true", "0.003, true"})
    void twoRatesThatLieApartAreResolved(double noise, boolean expected) {
        assertEquals(expected, resolved((a, t) -> a * Math.exp(-0.3 * t), (b, t) -> b * Math.exp(-2.5 * t), noise));
    }

    @ParameterizedTest
    @CsvSource({"0.003, false", "0.01, false"})
    void halvesOfACriticallyDampedMotionAreNot(double noise, boolean expected) {
        assertEquals(expected, resolved((a, t) -> a * Math.exp(-t), (b, t) -> 3 * b * t * Math.exp(-t), noise));
    }
}
