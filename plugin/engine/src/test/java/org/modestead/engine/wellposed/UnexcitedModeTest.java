package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

/** Two channels, two modes in closed form: a decay in every run and a growth that only some runs excite. */
class UnexcitedModeTest {

    private static final double STEP = 0.1;
    private static final double DECAY = -0.4;
    private static final double GROWTH = 0.3;
    private static final double NOISE = 1e-3;

    @Test
    void aGrowthThatNoHeldOutRunExcitesIsUndecidedAndNotAbsent() {
        ModeVerdict growth = verdictOnGrowth(0);
        assertEquals(Grade.UNDECIDED, growth.grade());
        assertTrue(growth.sentence().contains("hold out a run that excites it"), growth.sentence());
    }

    @Test
    void aGrowthThatAHeldOutRunExcitesIsJudgedOnIt() {
        Grade grade = verdictOnGrowth(0.1).grade();
        assertTrue(grade == Grade.STANDS || grade == Grade.SETTLES, grade.word());
    }

    private static ModeVerdict verdictOnGrowth(double heldOutExcitation) {
        Random random = new Random(3);
        List<Run> training = new ArrayList<>();
        for (int i = 0; i < 6; i++) {
            training.add(run("training " + i, 1 + 0.2 * i, i == 2 ? 0.1 : 0, random));
        }
        Snapshots snapshots = new Snapshots(List.of(new Channel("a", ""), new Channel("b", "")), List.of(),
                new TimeAxis(TimeAxis.Kind.NUMBER, "s"), training, List.of(),
                        List.of(run("held out", 1.1, heldOutExcitation, random)),
                OptionalDouble.of(STEP), new DelayEmbedding(6, 1), Preparation.identity(2), List.of(), List.of());
        FittedOperator operator = OperatorFitter.fit(snapshots, new LinearEstimator(), new RankRule.Fixed(2), 0,
                Progress.NONE);
        Spectrum spectrum = SpectrumExtractor.extract(operator, Progress.NONE);
        Mode growth = spectrum.modes().stream().filter(mode -> mode.rate().re() > 0).findFirst().orElseThrow();
        // closed form; noise of 1e-3 over 600 states leaves well under a hundredth
        assertEquals(GROWTH, growth.rate().re(), 0.01);
        Verdict verdict = WellPosedness.judge(snapshots, operator, spectrum, JudgeSettings.DEFAULT.withLadder(2, 5),
                Progress.NONE);
        return verdict.of(growth.number()).orElseThrow();
    }

    private static Run run(String id, double decaying, double growing, Random random) {
        int samples = 100;
        double[] times = new double[samples];
        DMatrixRMaj values = new DMatrixRMaj(samples, 2);
        for (int k = 0; k < samples; k++) {
            times[k] = k * STEP;
            double slow = decaying * Math.exp(DECAY * times[k]);
            double fast = growing * Math.exp(GROWTH * times[k]);
            values.set(k, 0, slow + 0.2 * fast + NOISE * random.nextGaussian());
            values.set(k, 1, 0.3 * slow - fast + NOISE * random.nextGaussian());
        }
        return new Run(id, times, values);
    }
}
