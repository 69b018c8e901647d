package org.modestead.engine.spread;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import java.util.stream.IntStream;
import org.hipparchus.distribution.continuous.NormalDistribution;
import org.hipparchus.distribution.continuous.TDistribution;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.ModeIntervals;

class IntervalFiguresTest {

    @Test
    void quantilesAgreeWithASecondLibrary() {
        NormalDistribution normal = new NormalDistribution(0, 1);
        for (double x = -4; x <= 4; x += 0.1) {
            assertEquals(normal.cumulativeProbability(x), NormalQuantiles.probability(x), 1e-7, "stated error");
        }
        for (double p : new double[] {0.005, 0.025, 0.05, 0.3, 0.5, 0.9, 0.95, 0.975, 0.995}) {
            assertEquals(normal.inverseCumulativeProbability(p), NormalQuantiles.normal(p), 1e-4, "1e-7 over the density");
        }
        for (double p : new double[] {0.025, 0.05, 0.5, 0.95, 0.975}) {
            for (int n : new int[] {3, 5, 7, 20, 100}) {
                assertEquals(new TDistribution(n).inverseCumulativeProbability(p), NormalQuantiles.student(p, n), 0.02, p + " " + n);
            }
        }
    }

    @Test
    void biasOfTheReplicatesIsTakenOffAndTheirSpreadKept() {
        // replicates 1.01, 1.02, ..., 1.99 of a figure fitted as 1.4: median 1.5, 5 % and 95 % quantiles 1.05 and 1.95
        double[] values = IntStream.rangeClosed(1, 99).mapToDouble(k -> 1 + k / 100.0).toArray();
        Interval interval = new Replicated(1.4, values).interval(0.9, 1e9, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
        assertEquals(1.3 - 0.45, interval.low(), 1e-6);
        assertEquals(1.3 + 0.45, interval.high(), 1e-6);
        Interval half = new Replicated(1.4, values).interval(0.5, 1e9, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
        assertEquals(0.45 * 0.6744898 / 1.6448536, half.high() - 1.3, 1e-6, "ratio of the normal quantiles");
    }

    @Test
    void normalReplicatesOfFewPiecesGiveStudentsInterval() {
        Random random = new Random(3);
        double[] values = random.doubles(200_000).map(new NormalDistribution(0, Math.sqrt(7.0 / 8))::inverseCumulativeProbability).toArray();
        Interval interval = new Replicated(0, values).interval(0.9, 8, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
        // the mean of 8 pieces of deviation √8: replicates spread by √(7/8), its interval is ± t with 7 degrees
        assertEquals(new TDistribution(7).inverseCumulativeProbability(0.95), interval.high(), 0.03);
        assertEquals(-interval.high(), interval.low(), 0.03);
    }

    @Test
    void figuresStayWhereTheyCanBe() {
        double[] values = IntStream.rangeClosed(1, 99).mapToDouble(k -> k / 100.0).toArray();
        assertEquals(0, new Replicated(0.2, values).interval(0.9, 100, 0, 1).low());
        // fitted at an end: the quantiles themselves, with the end
        Interval atEnd = new Replicated(1, values).interval(0.9, 1e9, 0, 1);
        assertEquals(0.05, atEnd.low(), 1e-6);
        assertEquals(1, atEnd.high());
        // replicates stretched beyond what can be, as those of blocks are
        double[] stretched = IntStream.rangeClosed(1, 99).mapToDouble(k -> k < 20 ? -7 : 1).toArray();
        assertEquals(new Interval(-1, 1), new Replicated(1, stretched).interval(0.9, 20, -1, 1));
        Interval positive = new Replicated(0.1, values).positive(0.9, 100);
        assertTrue(positive.low() > 0 && positive.high() > positive.low());
    }

    private static ModeIntervals growth(double low, double high) {
        return new ModeIntervals(0.9, new Interval(low, high), new Interval(0, 2 * Math.PI), Interval.UNKNOWN, Interval.UNKNOWN);
    }

    @Test
    void doublingTimeRunsThroughInfinityWhereGrowthPassesZero() {
        double ln2 = Math.log(2);
        assertEquals(new Interval(ln2 / 0.5, ln2 / 0.25), growth(0.25, 0.5).doublingTime(0.3));
        assertEquals(new Interval(-ln2 / 0.25, -ln2 / 0.5), growth(-0.5, -0.25).doublingTime(-0.3));
        assertEquals(new Interval(ln2 / 0.5, Double.NaN), growth(-0.25, 0.5).doublingTime(0.1));
        assertEquals(new Interval(Double.NaN, -ln2 / 0.5), growth(-0.5, 0.25).doublingTime(-0.1));
        assertEquals(new Interval(Double.NaN, Double.NaN), growth(0, 0).doublingTime(0));
    }

    @Test
    void aFrequencyThatMayBeZeroHasNoLongestPeriod() {
        assertEquals(new Interval(0, 1), growth(0, 1).frequency());
        assertEquals(new Interval(1, Double.NaN), growth(0, 1).period());
    }

    @Test
    void anEndThatIsNotThereExcludesNothing() {
        assertTrue(new Interval(1, Double.NaN).holds(1e9));
        assertTrue(!new Interval(1, Double.NaN).holds(0.5));
    }

    @Test
    void plansOutOfRangeAreRefused() {
        assertThrows(FitFault.class, () -> new SpreadPlan(19, 0.9, 1));
        assertThrows(FitFault.class, () -> new SpreadPlan(200, 1, 1));
    }
}
