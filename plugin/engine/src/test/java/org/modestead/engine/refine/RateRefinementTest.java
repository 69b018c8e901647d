package org.modestead.engine.refine;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.stream.IntStream;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Cancelled;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.recording.Run;

class RateRefinementTest {

    private static final double GROWTH = -0.15;
    private static final double ANGULAR = 2.3;
    private static final double DECAY = -0.6;

    /** A ringing pair and a decay in two channels, at uneven times, each run with weights of its own. */
    private static List<Run> runs(long seed, int count, double noise) {
        Random random = new Random(seed);
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            double[] times = new double[40];
            double[] weights = random.doubles(6, 0.5, 2).toArray();
            DMatrixRMaj values = new DMatrixRMaj(times.length, 2);
            double t = 0;
            for (int k = 0; k < times.length; k++) {
                t += 0.05 + 0.3 * random.nextDouble();
                times[k] = t;
                double cosine = Math.exp(GROWTH * t) * Math.cos(ANGULAR * t);
                double sine = Math.exp(GROWTH * t) * Math.sin(ANGULAR * t);
                for (int c = 0; c < 2; c++) {
                    values.set(k, c, weights[3 * c] * cosine + weights[3 * c + 1] * sine
                            + weights[3 * c + 2] * Math.exp(DECAY * t) + noise * random.nextGaussian());
                }
            }
            runs.add(new Run("run " + i, times, values));
        }
        return runs;
    }

    private static RateModel start() {
        return new RateModel(List.of(new RateTerm.Pair(-0.1, 2.4, true, true), new RateTerm.Real(-1, true)));
    }

    @Property(tries = 40, seed = "20261201")
    void exactRatesAreFoundAtUnevenTimesFromAnyNumberOfRuns(@ForAll long seed,
            @ForAll @IntRange(min = 1, max = 4) int count) {
        RefinedRates refined = RateRefinement.refine(start(), runs(seed, count, 0), Progress.NONE);
        RateTerm.Pair pair = (RateTerm.Pair) refined.model().terms().get(0);
        // rounding of the samples, times the condition of three functions over some 8 time units
        assertEquals(GROWTH, pair.growth(), 1e-9);
        assertEquals(ANGULAR, pair.angular(), 1e-9);
        assertEquals(DECAY, ((RateTerm.Real) refined.model().terms().get(1)).growth(), 1e-9);
        assertEquals(RefinedRates.Convergence.CONVERGED, refined.convergence());
        assertEquals(count, refined.weights().size());
        assertEquals(count * 2 * (40 - 3) - 3, refined.degreesOfFreedom());
    }

    @Property(tries = 40, seed = "20261201")
    void anotherTimeUnitScalesRatesAndErrorsAlike(@ForAll long seed,
            @ForAll @DoubleRange(min = 0.01, max = 100) double unit) {
        List<Run> runs = runs(seed, 2, 0.02);
        List<Run> others = runs.stream().map(run -> new Run(run.id(),
                Arrays.stream(run.times()).map(t -> t * unit).toArray(), run.values())).toList();
        RateModel scaled = new RateModel(List.of(new RateTerm.Pair(-0.1 / unit, 2.4 / unit, true, true),
                new RateTerm.Real(-1 / unit, true)));
        RefinedRates plain = RateRefinement.refine(start(), runs, Progress.NONE);
        RefinedRates other = RateRefinement.refine(scaled, others, Progress.NONE);
        RateTerm.Pair pair = (RateTerm.Pair) plain.model().terms().get(0);
        // both searches end within 1e-6 standard errors of the same minimum
        double tolerance = 1e-5 * plain.growthErrors()[0];
        assertEquals(pair.growth(), ((RateTerm.Pair) other.model().terms().get(0)).growth() * unit, tolerance);
        assertEquals(plain.growthErrors()[0], other.growthErrors()[0] * unit, 1e-5 * plain.growthErrors()[0]);
        assertEquals(plain.residualSum(), other.residualSum(), 1e-9 * plain.residualSum());
    }

    @Test
    void theDerivativeIsThatOfTheProjectedResidual() {
        List<Run> runs = runs(5, 2, 0.1);
        ProjectedFit fit = ProjectedFit.of(start(), runs);
        DMatrixRMaj jacobian = fit.jacobian(true);
        double[] at = start().free().stream().mapToDouble(FreeRate::value).toArray();
        double h = 1e-6;
        for (int k = 0; k < at.length; k++) {
            double[] up = at.clone();
            double[] down = at.clone();
            up[k] += h;
            down[k] -= h;
            DMatrixRMaj above = ProjectedFit.of(start().at(up), runs).stacked();
            DMatrixRMaj below = ProjectedFit.of(start().at(down), runs).stacked();
            for (int i = 0; i < jacobian.numRows; i++) {
                // central difference: h² plus rounding / h
                assertEquals((above.data[i] - below.data[i]) / (2 * h), jacobian.get(i, k), 1e-8,
                        "row " + i + ", column " + k);
            }
        }
    }

    @Test
    void standardErrorsMatchTheSpreadOfRepeatedRecordings() {
        int repeats = 200;
        double sum = 0;
        double squares = 0;
        double quoted = 0;
        Run exact = runs(11, 1, 0).get(0);
        Random random = new Random(12);
        for (int repeat = 0; repeat < repeats; repeat++) {
            DMatrixRMaj values = exact.values().copy();
            for (int i = 0; i < values.getNumElements(); i++) {
                values.data[i] += 0.01 * random.nextGaussian();
            }
            RefinedRates refined = RateRefinement.refine(start(), List.of(new Run("r", exact.times(), values)),
                    Progress.NONE);
            double angular = ((RateTerm.Pair) refined.model().terms().get(0)).angular();
            sum += angular;
            squares += (angular - ANGULAR) * (angular - ANGULAR);
            quoted += refined.angularErrors()[0] / repeats;
        }
        double spread = Math.sqrt(squares / repeats);
        // a standard deviation from 200 values is known to 5 %; four of them
        assertEquals(1, quoted / spread, 0.2);
        assertEquals(ANGULAR, sum / repeats, 4 * quoted / Math.sqrt(repeats));
    }

    @Test
    void moreRunsMakeTheErrorsSmaller() {
        double one = RateRefinement.refine(start(), runs(3, 1, 0.05), Progress.NONE).growthErrors()[0];
        double many = RateRefinement.refine(start(), runs(3, 16, 0.05), Progress.NONE).growthErrors()[0];
        // sixteen times the samples: about a quarter; weights differ from run to run
        assertTrue(many < one / 2, many + " against " + one);
    }

    @Test
    void whatIsFixedStaysAndHasNoError() {
        RateModel model = new RateModel(List.of(new RateTerm.Pair(GROWTH, 2.4, false, true),
                new RateTerm.Real(DECAY, false)));
        RefinedRates refined = RateRefinement.refine(model, runs(2, 1, 0.01), Progress.NONE);
        assertEquals(GROWTH, ((RateTerm.Pair) refined.model().terms().get(0)).growth());
        assertEquals(new RateTerm.Real(DECAY, false), refined.model().terms().get(1));
        assertArrayEquals(new double[] {0, 0}, refined.growthErrors());
        assertTrue(refined.angularErrors()[0] > 0);
    }

    @Test
    void eitherOfAConjugatePairStartsTheSameTerm() {
        assertEquals(RateTerm.from(new Complex(-0.1, 2)), RateTerm.from(new Complex(-0.1, -2)));
        assertEquals(new RateTerm.Real(-3, true), RateTerm.from(new Complex(-3, 0)));
    }

    @Test
    void twoFreeTermsThatCoincideHaveNoStandardError() {
        RateModel twins = new RateModel(List.of(new RateTerm.Real(DECAY, true), new RateTerm.Real(DECAY, true)));
        RefinedRates refined = RateRefinement.refine(twins, List.of(decaying()), Progress.NONE);
        assertTrue(Double.isNaN(refined.growthErrors()[0]) && Double.isNaN(refined.growthErrors()[1]),
                "the data cannot tell them apart");
    }

    private static Run decaying() {
        double[] times = IntStream.range(0, 10).mapToDouble(k -> 0.2 * k).toArray();
        return new Run("decay", times, DMatrixRMaj.wrap(10, 1,
                Arrays.stream(times).map(t -> Math.exp(DECAY * t)).toArray()));
    }

    @Test
    void whatCannotBeFittedIsRefusedWithTheReason() {
        assertEquals("no rate is free", refused(new RateModel(List.of(RateTerm.constant())), List.of(decaying())).seen());
        Run three = new Run("three", new double[] {0, 1, 2}, new DMatrixRMaj(3, 1));
        assertEquals("the samples leave -3 degrees of freedom beyond rates and weights",
                refused(start(), List.of(three)).seen());
        Run late = new Run("late", new double[] {1e4, 1e4 + 1, 1e4 + 2, 1e4 + 3}, new DMatrixRMaj(4, 1));
        assertEquals("the start rates leave the range of numbers between the times 10000.0 and 10003.0",
                refused(new RateModel(List.of(new RateTerm.Real(-1, true))), List.of(late)).seen());
        DMatrixRMaj holes = new DMatrixRMaj(4, 1);
        holes.set(2, 0, Double.NaN);
        assertEquals("optimised fit, run gap", refused(new RateModel(List.of(new RateTerm.Real(-1, true))),
                List.of(new Run("gap", new double[] {0, 1, 2, 3}, holes))).where());
    }

    @Test
    void aStartThatFadesWithinTheRecordingIsNoObstacle() {
        // e^(-500 t) is nothing after the first sample, whose share it takes
        RateModel model = new RateModel(List.of(new RateTerm.Real(-0.5, true), new RateTerm.Real(-500, true)));
        RefinedRates refined = RateRefinement.refine(model, List.of(decaying()), Progress.NONE);
        assertEquals(DECAY, ((RateTerm.Real) refined.model().terms().get(0)).growth(), 1e-9);
        assertFalse(Double.isNaN(refined.growthErrors()[0]));
        assertTrue(Double.isNaN(refined.growthErrors()[1]), "one sample does not decide a rate");
        assertThrows(FitFault.class, () -> RateRefinement.refine(new RateModel(List.of(
                new RateTerm.Real(Double.NEGATIVE_INFINITY, true))), List.of(decaying()), Progress.NONE));
    }

    private static FitFault refused(RateModel model, List<Run> runs) {
        return assertThrows(FitFault.class, () -> RateRefinement.refine(model, runs, Progress.NONE));
    }

    @Test
    void tiesMustHaveARowForEveryFunction() {
        assertThrows(IllegalArgumentException.class, () -> new RateModel(List.of(RateTerm.constant()),
                Optional.of(new DMatrixRMaj(2, 1))));
        assertThrows(IllegalArgumentException.class, () -> new RateModel(List.of()));
    }

    @Test
    void theSearchCanBeCancelled() {
        Progress cancelled = new Progress() {
            @Override
            public void report(double fraction, String message) {
                // nobody watches
            }

            @Override
            public void checkCancelled() {
                throw new Cancelled("stopped");
            }
        };
        assertThrows(Cancelled.class, () -> RateRefinement.refine(start(), runs(1, 1, 0), cancelled));
    }
}
