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
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.recording.Run;

/**
 * The coordinates belong to a Gaussian space on a circle and not on an interval or a disc. On a circle of radius R the kernel is {@code
 * e^(-R²(1 - cos θ)/s²)}, whose Fourier coefficients are {@code e^(-R²/s²) I_n(R²/s²)}, I_n the modified Bessel function, so that
 * {@code ‖R cos θ‖² = R² / (2 e^(-R²/s²) I_1(R²/s²))}.
 */
class RestingSignalTest {

    private static final double ANGLE = 0.37;

    /** Rotation by a fixed angle from starts at given radii. */
    private static FittedOperator rotation(double least, double most, double noise) {
        List<Run> runs = new ArrayList<>();
        Random random = new Random(5);
        for (int i = 0; i < 12; i++) {
            double radius = least + (most - least) * i / 11;
            double phase = 2 * Math.PI * random.nextDouble();
            runs.add(Motions.run("r" + i, Motions.grid(30, 1),
                    t -> new double[] {radius * Math.cos(phase + ANGLE * t), radius * Math.sin(phase + ANGLE * t)}, noise, random));
        }
        return Motions.fit(Motions.snapshots(1, 1, runs.subList(0, 9), runs.subList(9, 12)),
                new KernelStepEstimator(Motions.kernel("gaussian", "scale", 1), 200), 5);
    }

    private static Verdict judged(FittedOperator operator) {
        return Motions.judge(operator, JudgeSettings.DEFAULT);
    }

    private static Finding signal(Verdict verdict) {
        return verdict.findings().stream().filter(f -> f.check().equals("signal-in-space")).findFirst().orElseThrow();
    }

    @Test
    void onACircleTheGaussianSpaceHoldsTheSignalAndARotationStands() {
        Verdict verdict = judged(rotation(1, 1, 0));
        assertTrue(signal(verdict).passed(), signal(verdict).sentence());
        assertEquals(Grade.STANDS, verdict.overall().grade(), verdict.overall().sentence());
    }

    @Test
    void onADiscItDoesNot() {
        Verdict verdict = judged(rotation(0.2, 1, 0));
        assertFalse(signal(verdict).passed(), signal(verdict).sentence());
        assertTrue(verdict.overall().grade() != Grade.STANDS, verdict.overall().sentence());
    }

    @Test
    void noiseOffTheCircleDoesNotHideThatTheSignalRestsOnIt() {
        Verdict verdict = judged(rotation(1, 1, 0.005));
        assertTrue(signal(verdict).passed(), signal(verdict).sentence());
    }

    @Test
    void theSumRestsAtTheNormThatTheFourierSeriesGives() {
        double bessel = 0;
        double term = 0.5;
        for (int k = 1; k < 12; k++) {
            bessel += term;
            term *= 0.25 / (k * (k + 1));
        }
        RestingSignal rest = RestingSignal.of(rotation(1, 1, 0).compression(), rank -> 1).orElseThrow();
        assertEquals(2 / (2 * Math.exp(-1) * bessel), rest.squaredNorm(), 1e-6, "cosine and sine, R = s = 1; rounding");
        assertEquals(3, rest.from(), "the constant's share of them is nothing, and two functions hold them");
    }
}
