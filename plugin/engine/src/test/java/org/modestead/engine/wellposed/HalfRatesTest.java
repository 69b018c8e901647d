package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.spectrum.ModalExpansion;

/** The rate of a mode in both halves of the runs: the same, or told with its error. */
class HalfRatesTest {

    private static final double STEP = 0.1;
    private static final int SAMPLES = 101;

    private static FittedOperator decay(double late, double noise, Random random) {
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < 12; i++) {
            double start = 1 + i / 4.0;
            runs.add(Motions.run("r" + i, Motions.grid(SAMPLES, STEP),
                    t -> new double[] {start * Math.exp(-0.2 * Math.min(t, 5) - late * Math.max(0, t - 5))}, noise, random));
        }
        return Motions.fit(Motions.snapshots(STEP, 1, runs.subList(0, 8), runs.subList(8, 12)), new LinearEstimator(), 1);
    }

    private static HalfRates halves(FittedOperator operator) {
        ModalExpansion expansion = ModalExpansion.of(operator.chosen());
        JudgingRuns judging = JudgingRuns.of(operator);
        return HalfRates.of(expansion, judging, judging.eigenfunctions(expansion), List.of(0)).get(0);
    }

    private static Finding steady(FittedOperator operator) {
        return Motions.judge(operator, JudgeSettings.DEFAULT).findings().stream().filter(f -> f.check().equals("steady-rate")).findFirst()
                .orElseThrow();
    }

    @Test
    void aPlantThatChangesAtHalfTimeIsToldWithBothRates() {
        HalfRates changed = halves(decay(0.5, 0, new Random(1)));
        // each half holds one exponential only, so that least squares gives its rate exactly
        assertEquals(0.3, changed.change(), 1e-12);
        assertEquals(0, changed.error(), 1e-6);
        Finding finding = steady(decay(0.5, 0.002, new Random(1)));
        assertFalse(finding.passed());
        // 0.3 over half of 10
        assertEquals(1.5, finding.value(), 0.15);
    }

    @Test
    void aSteadyDecayPasses() {
        assertEquals(0, halves(decay(0.2, 0, new Random(1))).change(), 1e-12);
        assertTrue(steady(decay(0.2, 0.002, new Random(1))).passed());
    }

    /** t sin(t + phase), a defective pair at ±i: the pair that noise leaves to be seen grows faster at first than later. */
    @Test
    void aToneThatGrowsLikeTimeIsNotReportedUnderNoise() {
        Random random = new Random(3);
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < 20; i++) {
            double phase = 2 * Math.PI * random.nextDouble();
            runs.add(Motions.run("r" + i, Motions.grid(120, 0.2), t -> new double[] {t * Math.sin(t + phase)}, 0.1, random));
        }
        FittedOperator operator = Motions.fit(Motions.snapshots(0.2, 8, runs.subList(0, 15), runs.subList(15, 20)), new LinearEstimator(), 2);
        Verdict verdict = Motions.judge(operator, JudgeSettings.DEFAULT);
        assertEquals(Grade.DRIFTS, verdict.overall().grade(), verdict.overall().sentence());
        assertEquals(List.of("steady-rate", "close-residual"), verdict.overall().decidedBy());
    }

    @Test
    void theErrorIsTheSizeOfTheChangesThatNoiseMakes() {
        Random random = new Random(5);
        double within = 0;
        double errors = 0;
        int draws = 60;
        for (int k = 0; k < draws; k++) {
            HalfRates one = halves(decay(0.2, 0.01, random));
            within += one.change() * one.change();
            errors += one.error() * one.error();
        }
        // lags that overlap are counted as one, which overrates the error of white noise; it must not underrate it
        double ratio = Math.sqrt(errors / within);
        assertTrue(ratio > 0.9 && ratio < 6, "ratio " + ratio);
    }
}
