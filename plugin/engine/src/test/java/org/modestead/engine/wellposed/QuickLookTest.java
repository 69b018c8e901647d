package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Doubt;
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
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

/** A fading rhythm and a decay in two noisy channels, two delays. */
class QuickLookTest {

    private static final double STEP = 0.1;

    @Test
    void residualsAreThoseOfTheWholeCheckBeforeNoiseIsTakenOff() {
        Snapshots snapshots = snapshots(List.of(run("held out", 9)));
        FittedOperator operator = OperatorFitter.fit(snapshots, new LinearEstimator(), new RankRule.Fixed(3), 0, Progress.NONE);
        Spectrum spectrum = SpectrumExtractor.extract(operator, Progress.NONE);
        Verdict whole = WellPosedness.judge(snapshots, operator, spectrum, JudgeSettings.DEFAULT, Progress.NONE);
        Verdict quick = WellPosedness.residuals(snapshots, operator, spectrum, JudgeSettings.DEFAULT);
        assertEquals(spectrum.modes().size(), quick.findings().size());
        for (Finding finding : quick.findings()) {
            double raw = whole.ladder().stream().filter(row -> row.rank() == 3 && row.mode() == finding.mode()).findFirst().orElseThrow().rawResidual();
            assertTrue(raw > 0, "noise leaves something");
            assertEquals(raw, finding.value(), 0, finding.sentence());
        }
    }

    @Test
    void nothingIsDecidedAndTheReaderIsTold() {
        Snapshots snapshots = snapshots(List.of());
        FittedOperator operator = OperatorFitter.fit(snapshots, new LinearEstimator(), new RankRule.Fixed(3), 0, Progress.NONE);
        Verdict quick = WellPosedness.residuals(snapshots, operator, SpectrumExtractor.extract(operator, Progress.NONE), JudgeSettings.DEFAULT);
        assertEquals(Grade.UNDECIDED, quick.overall().grade());
        assertTrue(quick.modes().stream().allMatch(mode -> mode.grade() == Grade.UNDECIDED), quick.modes().toString());
        assertEquals(List.of(), quick.ladder());
        assertEquals(List.of("residuals-only", "nothing-held-out"), quick.doubts().stream().map(Doubt::code).toList());
    }

    private static Snapshots snapshots(List<Run> holdout) {
        List<Run> training = new ArrayList<>();
        for (int i = 0; i < 4; i++) {
            training.add(run("training " + i, i));
        }
        return new Snapshots(List.of(new Channel("a", ""), new Channel("b", "")), List.of(), new TimeAxis(TimeAxis.Kind.NUMBER, "s"), training, List.of(),
                holdout, OptionalDouble.of(STEP), new DelayEmbedding(2, 1), Preparation.identity(2), List.of(), List.of());
    }

    private static Run run(String id, int seed) {
        Random random = new Random(seed);
        int samples = 80;
        double[] times = new double[samples];
        DMatrixRMaj values = new DMatrixRMaj(samples, 2);
        double phase = random.nextDouble();
        for (int k = 0; k < samples; k++) {
            times[k] = k * STEP;
            double rhythm = Math.exp(-0.05 * times[k]) * Math.cos(2 * times[k] + phase);
            double decay = Math.exp(-0.4 * times[k]);
            values.set(k, 0, rhythm + 0.5 * decay + 0.01 * random.nextGaussian());
            values.set(k, 1, 0.3 * rhythm - decay + 0.01 * random.nextGaussian());
        }
        return new Run(id, times, values);
    }
}
