package org.modestead.engine.spread;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.hipparchus.distribution.discrete.BinomialDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeIntervals;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

/**
 * Of 200 simulated recordings the 90 % intervals hold the truth in as many as the binomial distribution allows: 99 % of the
 * counts of 200 draws of probability 0.9. The costly ones run with {@code -Dcoverage=full}.
 */
class CoverageTest {

    private static final int RECORDINGS = 200;
    private static final SpreadPlan PLAN = SpreadPlan.DEFAULT;
    private static final List<String> FIGURES = List.of("growth", "turning", "frequency", "period", "damping ratio", "doubling time");
    private static final double[][] AS_IT_IS = {};
    private static final double[][] FOUR = {{1, 0.2, 0.5, -0.3}, {0.3, 1, -0.4, 0.8}, {-0.6, 0.5, 1, 0.1}, {0.4, -0.7, 0.3, 1}};
    private static final double[][] THREE = {FOUR[0], FOUR[1], FOUR[2]};
    private static final List<Complex> ONE = List.of(new Complex(-0.2, 3));
    private static final List<Complex> TWO = List.of(new Complex(-0.3, 2), new Complex(-0.2, 5));

    private static void assertCovers(Recordings recordings, Estimator estimator, int rank, int seed) {
        int[][] held = new int[recordings.rates().size()][FIGURES.size()];
        Random random = new Random(seed);
        for (int k = 0; k < RECORDINGS; k++) {
            FittedOperator operator = Motions.fit(recordings.next(random), estimator, rank);
            Spectrum plain = SpectrumExtractor.extract(operator, Progress.NONE);
            Spectrum spectrum = SamplingSpread.of(operator, plain, PLAN, Progress.NONE).in(plain);
            for (int j = 0; j < held.length; j++) {
                Complex truth = recordings.rates().get(j);
                count(held[j], truth, Motions.nearest(spectrum, truth.re(), truth.im()));
            }
        }
        BinomialDistribution counts = new BinomialDistribution(RECORDINGS, PLAN.level());
        int least = counts.inverseCumulativeProbability(0.005);
        int most = counts.inverseCumulativeProbability(0.995);
        for (int j = 0; j < held.length; j++) {
            for (int f = 0; f < FIGURES.size(); f++) {
                boolean certain = recordings.rates().get(j).im() == 0 && f > 0 && f < FIGURES.size() - 1;
                assertTrue(held[j][f] >= least && (held[j][f] <= most || certain), String.format(Locale.ROOT,
                        "%s of %s: %d of %d intervals hold it, %d to %d wanted; all: %s", FIGURES.get(f), recordings.rates().get(j),
                        held[j][f], RECORDINGS, least, most, Arrays.deepToString(held)));
            }
        }
    }

    private static void count(int[] held, Complex truth, Mode mode) {
        ModeIntervals intervals = mode.intervals().orElseThrow();
        Mode wanted = new Mode(1, List.of(0), truth, 1, 1, 0, List.of(), false, 0);
        double[] values = {truth.re(), truth.im(), wanted.frequency(), wanted.period(), wanted.dampingRatio(), wanted.doublingTime()};
        List<Interval> all = List.of(intervals.growth(), intervals.turning(), intervals.frequency(), intervals.period(),
                intervals.dampingRatio(), intervals.doublingTime(mode.rate().re()));
        for (int f = 0; f < values.length; f++) {
            held[f] += all.get(f).holds(values[f]) ? 1 : 0;
        }
    }

    @Test
    void pushedOscillationInManyRuns() {
        assertCovers(new Recordings(ONE, 20, 50, 0, 2, 0.3, AS_IT_IS, 0, 1), new LinearEstimator(), 2, 99);
    }

    @Test
    void pushedOscillationInFewRuns() {
        assertCovers(new Recordings(ONE, 8, 50, 0, 2, 0.3, AS_IT_IS, 0, 1), new LinearEstimator(), 2, 99);
    }

    @Test
    void pushedOscillationInOneLongRun() {
        assertCovers(new Recordings(ONE, 1, 1000, 200, 1, 0.3, AS_IT_IS, 0, 1), new LinearEstimator(), 2, 99);
    }

    @Test
    void ornsteinUhlenbeckProcess() {
        // a plane that shrinks without turning, of which one direction is seen
        Recordings line = new Recordings(List.of(new Complex(-0.5, 0)), 20, 50, 50, 1, 0.3, new double[][] {{1, 0}}, 0, 1);
        assertCovers(line, new LinearEstimator(), 1, 99);
    }

    @Test
    void twoPushedOscillationsInFourChannelsWithALittleMeasurementNoise() {
        assertCovers(new Recordings(TWO, 20, 60, 0, 1, 0.1, FOUR, 0.005, 1), new LinearEstimator(), 4, 99);
    }

    @Test
    @EnabledIfSystemProperty(named = "coverage", matches = "full")
    void generatorFromSegments() {
        assertCovers(new Recordings(ONE, 20, 50, 0, 1, 0, AS_IT_IS, 0.02, 1),
                new OccupationEstimator(Motions.kernel("linear"), new SegmentPlan(10, 0), 1), 2, 99);
    }

    @Test
    @EnabledIfSystemProperty(named = "coverage", matches = "full")
    void measurementNoiseWithDeepDelaysAndNoiseCorrection() {
        for (NoiseCorrection correction : List.of(NoiseCorrection.TOTAL_LEAST_SQUARES, NoiseCorrection.FORWARD_BACKWARD)) {
            assertCovers(new Recordings(TWO, 15, 80, 0, 1, 0, THREE, 0.05, 20), new LinearEstimator(correction), 4, 99);
        }
    }

    @Test
    @EnabledIfSystemProperty(named = "coverage", matches = "full")
    void measurementNoiseOfAFifthWithDeepDelaysAndTotalLeastSquares() {
        assertCovers(new Recordings(TWO, 12, 80, 0, 1, 0, THREE, 0.2, 20),
                new LinearEstimator(NoiseCorrection.TOTAL_LEAST_SQUARES), 4, 99);
    }

    @Test
    void biasThatStaysIsNotSpread() {
        // CHECKS C7.4: least squares reports too much damping, the longer the recording the surer of it
        Recordings noisy = new Recordings(ONE, 20, 200, 100, 1, 0.1, AS_IT_IS, 0.2, 1);
        Random random = new Random(4);
        int held = 0;
        for (int k = 0; k < 20; k++) {
            FittedOperator operator = Motions.fit(noisy.next(random), new LinearEstimator(), 2);
            Spectrum spectrum = SpectrumExtractor.extract(operator, Progress.NONE);
            Mode mode = SamplingSpread.of(operator, spectrum, PLAN, Progress.NONE).in(spectrum).modes().get(0);
            held += mode.intervals().orElseThrow().growth().holds(-0.2) ? 1 : 0;
        }
        assertEquals(0, held, "the intervals of a biased fit miss the truth: they tell its spread");
    }
}
