package org.modestead.engine.spread;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Cancelled;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.ModeIntervals;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

class SamplingSpreadTest {

    private static final double[][] AS_IT_IS = {};
    private static final List<Complex> ONE = List.of(new Complex(-0.2, 3));

    private static FittedOperator fit(int runs, int samples, double push) {
        return Motions.fit(new Recordings(ONE, runs, samples, 0, 2, push, AS_IT_IS, 0, 1).next(new Random(8)), new LinearEstimator(), 2);
    }

    private static SamplingSpread spread(FittedOperator operator, SpreadPlan plan) {
        return SamplingSpread.of(operator, SpectrumExtractor.extract(operator, Progress.NONE), plan, Progress.NONE);
    }

    @Test
    void theSameSeedGivesTheSameIntervalsAndAnotherOneOthers() {
        FittedOperator operator = fit(20, 50, 0.3);
        assertEquals(spread(operator, SpreadPlan.DEFAULT), spread(operator, SpreadPlan.DEFAULT));
        assertNotEquals(spread(operator, SpreadPlan.DEFAULT).modes(), spread(operator, new SpreadPlan(200, 0.9, 2)).modes());
    }

    @Test
    void spreadOfARateIsThatOverRecordings() {
        // closed form: the multiplier of a pushed plane has variance push² / Σ|x|² per component; divided by Δt|μ| it is that of λ
        FittedOperator operator = fit(60, 50, 0.3);
        double squares = 0;
        for (Run run : operator.snapshots().training()) {
            for (int k = 0; k < 2 * (run.samples() - 1); k++) {
                squares += run.values().data[k] * run.values().data[k];
            }
        }
        double expected = Math.sqrt(2) * 0.3 / Math.sqrt(squares) / (Recordings.STEP * Math.exp(-0.2 * Recordings.STEP));
        // 60 runs tell their spread to 1/√120 = 9 %, 200 replicates to 5 %
        assertEquals(expected, spread(operator, SpreadPlan.DEFAULT).of(1).orElseThrow().deviation(), 0.3 * expected);
    }

    private static ModeIntervals intervals(List<Run> runs, double step) {
        FittedOperator operator = Motions.fit(Motions.snapshots(step, 1, runs, List.of()), new LinearEstimator(), 2);
        return spread(operator, SpreadPlan.DEFAULT).of(1).flatMap(ModeSpread::intervals).orElseThrow();
    }

    private static void assertInterval(Interval expected, double factor, Interval actual) {
        // rounding of the fit, times the condition of a well excited plane
        assertEquals(expected.low() * factor, actual.low(), 1e-9);
        assertEquals(expected.high() * factor, actual.high(), 1e-9);
    }

    @Test
    void timeUnitAndOrderAndUnitsOfChannelsLeaveTheIntervalsAlone() {
        List<Run> runs = new Recordings(ONE, 12, 50, 0, 2, 0.3, AS_IT_IS, 0, 1).next(new Random(8)).training();
        ModeIntervals plain = intervals(runs, 0.1);
        List<Run> slow = runs.stream().map(run -> new Run(run.id(), Motions.grid(50, 0.2), run.values())).toList();
        assertInterval(plain.growth(), 0.5, intervals(slow, 0.2).growth());
        assertInterval(plain.frequency(), 0.5, intervals(slow, 0.2).frequency());
        assertInterval(plain.dampingRatio(), 1, intervals(slow, 0.2).dampingRatio());
        List<Run> turned = runs.stream().map(run -> {
            DMatrixRMaj values = run.values().copy();
            for (int t = 0; t < 50; t++) {
                values.set(t, 0, 1000 * run.values().get(t, 1));
                values.set(t, 1, run.values().get(t, 0));
            }
            return new Run(run.id(), run.times(), values);
        }).toList();
        assertInterval(plain.growth(), 1, intervals(turned, 0.1).growth());
        assertInterval(plain.frequency(), 1, intervals(turned, 0.1).frequency());
    }

    @Test
    void withoutNoiseThereIsNoSpread() {
        ModeSpread mode = spread(fit(10, 50, 0), SpreadPlan.DEFAULT).of(1).orElseThrow();
        assertEquals(0, mode.deviation(), 1e-10, "rounding");
        assertEquals(1, mode.found());
    }

    @Test
    void aHigherLevelGivesAWiderIntervalAndMoreRunsANarrowerOne() {
        FittedOperator operator = fit(20, 50, 0.3);
        double ninety = width(spread(operator, SpreadPlan.DEFAULT));
        assertTrue(width(spread(operator, new SpreadPlan(200, 0.5, 1))) < ninety);
        assertTrue(width(spread(fit(80, 50, 0.3), SpreadPlan.DEFAULT)) < 0.75 * ninety, "four times the runs: half the width");
    }

    private static double width(SamplingSpread spread) {
        Interval growth = spread.of(1).flatMap(ModeSpread::intervals).map(ModeIntervals::growth).orElseThrow();
        return growth.high() - growth.low();
    }

    @Test
    void manyRunsAreDrawnWholeAndFewAreCutIntoBlocks() {
        assertEquals("whole runs, 8 of them", spread(fit(8, 50, 0.3), SpreadPlan.DEFAULT).drawn());
        SamplingSpread blocks = spread(fit(7, 51, 0.3), SpreadPlan.DEFAULT);
        assertEquals("blocks of 8 of 350 observations", blocks.drawn());
        assertEquals(350 / 8.0, blocks.pieces(), 2);
    }

    @Test
    void aModeThatCannotBeFoundAgainHasNoInterval() {
        // one oscillation among channels of white noise: what is fitted to the noise is another thing every time
        Complex forgets = new Complex(-50, 0);
        Recordings noise = new Recordings(List.of(ONE.get(0), forgets, forgets, forgets), 8, 40, 0, 1, 0.3, AS_IT_IS, 0, 1);
        FittedOperator operator = Motions.fit(noise.next(new Random(3)), new LinearEstimator(), 8);
        Spectrum plain = SpectrumExtractor.extract(operator, Progress.NONE);
        SamplingSpread spread = SamplingSpread.of(operator, plain, SpreadPlan.DEFAULT, Progress.NONE);
        Spectrum with = spread.in(plain);
        assertTrue(Motions.nearest(with, -0.2, 3).intervals().isPresent());
        assertTrue(with.modes().stream().anyMatch(mode -> mode.intervals().isEmpty()));
        assertTrue(with.doubts().stream().anyMatch(doubt -> doubt.code().equals("modes-without-interval")));
        assertEquals(plain.rates(), with.rates());
    }

    @Test
    void cancelIsHeard() {
        Progress stop = new Progress() {
            @Override
            public void report(double fraction, String message) {
                // not looked at
            }

            @Override
            public void checkCancelled() {
                throw new Cancelled("stop");
            }
        };
        FittedOperator operator = fit(8, 50, 0.3);
        Spectrum spectrum = SpectrumExtractor.extract(operator, Progress.NONE);
        assertThrows(Cancelled.class, () -> SamplingSpread.of(operator, spectrum, SpreadPlan.DEFAULT, stop));
    }
}
