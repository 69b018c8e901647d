package org.modestead.engine.watch;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.hipparchus.analysis.integration.gauss.GaussIntegrator;
import org.hipparchus.analysis.integration.gauss.GaussIntegratorFactory;
import org.hipparchus.distribution.continuous.NormalDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Control charts against independent computations and simulation. */
class ControlLimitTest {

    private static double height(double weight, double deviations) {
        return deviations * Math.sqrt(weight / (2 - weight));
    }

    /**
     * The integral equation against a Markov chain, another method of other authors (Brook and Evans, Biometrika 59:539, 1972; for this chart
     * Lucas and Saccucci, Technometrics 32:1, 1990), over weights, limits and shifts from run lengths of 2 to 4000.
     */
    @ParameterizedTest
    @CsvSource({"0.05, 2.6", "0.10, 2.8", "0.20, 2.95", "0.25, 3.0", "0.25, 3.6", "0.40, 3.05", "0.50, 3.5"})
    void runLengthsAreThoseOfAMarkovChain(double weight, double deviations) {
        double limit = height(weight, deviations);
        for (double shift : new double[] {0, 0.25, 0.5, 1, 2, 4}) {
            for (double deviation : new double[] {1, 1.3}) {
                double chain = MarkovRunLength.of(weight, limit, shift, deviation);
                // the chain's cells leave an error of their fourth power after one extrapolation: below 1e-4 of the run length
                assertEquals(chain, RunLength.of(weight, limit, shift, deviation), 2e-4 * chain, "shift " + shift);
            }
        }
    }

    /** No averaging: the run length of single windows is 1 over the chance of one beyond the limit, in closed form. */
    @Test
    void withHardlyAnyMemoryTheRunLengthIsThatOfSingleWindows() {
        double chance = 2 * new NormalDistribution().cumulativeProbability(-3);
        assertEquals(1 / chance, MarkovRunLength.of(1 - 1e-9, 3, 0, 1), 1e-3 / chance);
    }

    @Test
    void nodesAndWeightsAreThoseOfAnIndependentLibrary() {
        GaussLegendre rule = GaussLegendre.of(20);
        GaussIntegrator other = new GaussIntegratorFactory().legendre(20);
        for (int i = 0; i < 20; i++) {
            assertEquals(other.getPoint(i), rule.nodes()[i], 1e-14);
            assertEquals(other.getWeight(i), rule.weights()[i], 1e-14);
        }
    }

    @Test
    void aLimitFromManyWindowsIsThatOfKnownParameters() {
        for (double weight : new double[] {0.05, 0.25, 0.5}) {
            ControlLimit limit = ControlLimit.of(weight, 1.0 / 500, 1e7, 1e7);
            // heights are found to 1e-4, which moves a run length of 500 by about ten times that
            assertEquals(500, MarkovRunLength.of(weight, limit.height(), 0, 1), 1);
        }
    }

    @Test
    void fewerWindowsBehindTheCentreWidenTheLimit() {
        double before = 0;
        for (int windows : new int[] {1000, 100, 30, 15, 8, 6}) {
            double height = ControlLimit.of(0.25, 1.0 / 4000, windows, windows - 1).height();
            assertTrue(height > before, windows + " windows: " + height);
            before = height;
        }
    }

    @Test
    void falseAlarmsAreAsSeldomAsAskedForWithEstimatedCentreAndDeviation() {
        // 20 baseline windows, one false alarm wanted in 200 windows: counted over 20000 simulated baselines of 50 windows each
        ControlLimit limit = ControlLimit.of(0.25, 1.0 / 200, 20, 19);
        Random random = new Random(5);
        int baselines = 20_000;
        int windows = 50;
        int alarms = 0;
        double[] scores = new double[windows];
        for (int k = 0; k < baselines; k++) {
            double[] known = random.doubles(20).map(u -> random.nextGaussian()).toArray();
            Scatter scatter = Scatter.of(known);
            for (int t = 0; t < windows; t++) {
                scores[t] = (random.nextGaussian() - scatter.mean()) / scatter.standard();
            }
            alarms += Chart.of(scores, limit, false).events().size();
        }
        // events last a few windows, in which no other can begin: at most the rate, and not less than half of it
        double rate = (double) alarms / baselines / windows;
        assertTrue(rate < 1.05 / 200 && rate > 0.5 / 200, "one in " + 1 / rate);
    }

    @Test
    void oneWindowAloneDoesNotAlarmTwoInARowDo() {
        for (double weight : new double[] {0.05, 0.25, 0.5}) {
            ControlLimit limit = ControlLimit.of(weight, 1.0 / 4000, 20, 19);
            double far = limit.clip();
            assertTrue(Chart.of(new double[] {0, far, 0, 0, 0, 0}, limit, false).events().isEmpty());
            assertEquals(1, Chart.of(new double[] {0, far, far, 0, 0, 0}, limit, false).events().size());
        }
    }

    @Test
    void anAverageThatDwellsAtItsLimitIsOneEvent() {
        ControlLimit limit = ControlLimit.of(0.25, 1.0 / 4000, 20, 19);
        double[] scores = new double[60];
        for (int t = 0; t < scores.length; t++) {
            scores[t] = t < 10 ? 0 : limit.height() * (1 + 0.3 * Math.sin(2.1 * t));
        }
        Chart chart = Chart.of(scores, limit, false);
        assertEquals(1, chart.events().size());
        assertTrue(chart.lasts(chart.events().get(0)));
        // the change began at window 10, the first that is off zero
        assertEquals(10, chart.events().get(0).began());
    }

    @Test
    void anEventEndsWhenTheAverageIsBackWithinHalfItsLimits() {
        ControlLimit limit = ControlLimit.of(0.25, 1.0 / 4000, 20, 19);
        double far = limit.clip();
        Chart chart = Chart.of(new double[] {0, far, far, far, 0, 0, 0, 0, 0, 0}, limit, false);
        assertEquals(1, chart.events().size());
        Chart.Event event = chart.events().get(0);
        assertEquals(2, event.first());
        // 3 windows at the clip leave 0.75 (1 - 0.75³)/0.25 = 1.73 limits; times 0.75⁴ that is 0.55, times 0.75⁵ 0.41
        assertEquals(7, event.last());
    }

    @Test
    void missesInARowAlarmWhenChanceWouldNotDoItThatSeldom() {
        // no miss in 20 windows: q = 0.5/21; q³ (1-q) = 1.3e-5 < 1/4000 < q² (1-q)
        assertEquals(3, MissingRule.of(0, 20, 1.0 / 4000).row());
        // every fourth window missed: q = 5.5/21; q⁶ (1-q) = 2.4e-4 < 1/4000 < q⁵ (1-q)
        assertEquals(6, MissingRule.of(5, 20, 1.0 / 4000).row());
    }
}
