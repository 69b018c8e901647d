package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeIntervals;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

class SpreadOfRatesTest {

    private static final Random RANDOM = new Random(2);

    private static FittedOperator fit() {
        Snapshots snapshots = Motions.snapshots(0.1, 1, List.of(
                Motions.run("r", Motions.grid(60, 0.1), t -> new double[] {3 * Math.exp(-0.3 * t) * Math.cos(2 * t),
                    3 * Math.exp(-0.3 * t) * Math.sin(2 * t)}, 0, RANDOM)), List.of());
        return Motions.fit(snapshots, new LinearEstimator(), 2);
    }

    private static List<Finding> findings(Spectrum spectrum, FittedOperator operator) {
        return WellPosedness.judge(operator.snapshots(), operator, spectrum, JudgeSettings.DEFAULT, Progress.NONE).findings().stream()
                .filter(finding -> finding.check().equals("sampling-spread")).toList();
    }

    @Test
    void halfTheIntervalsAreHeldAgainstTheRate() {
        FittedOperator operator = fit();
        Spectrum plain = SpectrumExtractor.extract(operator, Progress.NONE);
        Mode mode = plain.modes().get(0);
        ModeIntervals intervals = new ModeIntervals(0.9, new Interval(-0.6, 0), new Interval(1.6, 2.4), Interval.UNKNOWN, Interval.UNKNOWN);
        List<Finding> found = findings(plain.with(List.of(mode.with(intervals)), List.of()), operator);
        assertEquals(1, found.size());
        // half widths 0.3 and 0.4: 0.5 of |-0.3 + 2i|
        assertEquals(0.5 / Math.hypot(0.3, 2), found.get(0).value(), 1e-9);
        assertTrue(found.get(0).passed() && Double.isNaN(found.get(0).threshold()), "it informs");
    }

    @Test
    void withoutIntervalsThereIsNothingToSay() {
        FittedOperator operator = fit();
        assertEquals(List.of(), findings(SpectrumExtractor.extract(operator, Progress.NONE), operator));
    }
}
