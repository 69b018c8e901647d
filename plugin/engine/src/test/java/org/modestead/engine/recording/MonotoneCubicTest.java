package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.modestead.engine.recording.Curves.evaluate;
import static org.modestead.engine.recording.Curves.fine;
import static org.modestead.engine.recording.Curves.sampled;
import static org.modestead.engine.recording.Curves.uneven;
import static org.modestead.engine.recording.Curves.worstError;

import java.util.Arrays;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import org.ejml.data.DMatrixRMaj;
import org.hipparchus.analysis.interpolation.AkimaSplineInterpolator;
import org.hipparchus.analysis.interpolation.HermiteInterpolator;
import org.hipparchus.analysis.interpolation.SplineInterpolator;
import org.hipparchus.analysis.polynomials.PolynomialFunction;
import org.junit.jupiter.api.Test;

class MonotoneCubicTest {

    @Test
    void samplesAreKeptBitForBit() {
        double[] times = {0, 0.7, 1.1, 2, 3.3};
        double[] values = {0.1, -2, 7, 7, 1e-9};
        assertArrayEquals(values, evaluate(times, values, times));
    }

    @Test
    void twoSamplesGiveAStraightLine() {
        assertArrayEquals(new double[] {1.5, 2}, evaluate(new double[] {0, 2}, new double[] {1, 3}, new double[] {0.5, 1}));
    }

    @Test
    void errorFallsWithTheFourthPowerOfTheStepWhereTheSignalKeepsRising() {
        DoubleUnaryOperator rising = t -> Math.exp(0.8 * t) + t;
        double[] order = new double[4];
        for (int i = 0; i < order.length; i++) {
            double coarse = worstError(fine(0, 4, (20 << i) + 1), rising, 0, 4);
            double half = worstError(fine(0, 4, (40 << i) + 1), rising, 0, 4);
            order[i] = Math.log(coarse / half) / Math.log(2);
        }
        // the end slopes converge from below
        assertTrue(order[3] > 3.8 && order[3] < 4.2, () -> Arrays.toString(order));
    }

    @Test
    void errorFallsAtLeastWithTheThirdPowerAtTheTopsOfAnOscillationAlsoAtUnevenTimes() {
        DoubleUnaryOperator wave = t -> Math.sin(2 * Math.PI * t + 0.3);
        double coarse = 0;
        double fine = 0;
        for (int seed = 0; seed < 20; seed++) {
            coarse = Math.max(coarse, worstError(uneven(161, 4, new Random(seed)), wave, 0, 4));
            fine = Math.max(fine, worstError(uneven(641, 4, new Random(seed)), wave, 0, 4));
        }
        double order = Math.log(coarse / fine) / Math.log(4);
        assertTrue(order > 2.9, "order " + order);
    }

    @Test
    void aTopBetweenTwoSamplesIsNotCutOff() {
        // 10 samples a cycle, a top half-way between two samples: the neighbours reach cos(18 degrees) = 0.951 only
        DoubleUnaryOperator wave = t -> Math.cos(2 * Math.PI * (t - 2.05));
        double[] times = fine(0, 4, 41);
        double top = evaluate(times, sampled(times, wave), new double[] {2.05})[0];
        assertEquals(1, top, 0.005, "error of a cubic at this step");
    }

    @Test
    void theLimiterLeavesAWaveOfFortySamplesACycleAloneWhateverItsPhase() {
        double[] times = fine(0, 3, 121);
        // an unlimited Hermite cubic with exact slopes: h^4/384 times the fourth derivative
        double unlimited = Math.pow(2 * Math.PI / 40, 4) / 384;
        for (int phase = 0; phase < 50; phase++) {
            double lead = phase / 2000.0;
            double worst = worstError(times, t -> Math.sin(2 * Math.PI * (t + lead)), 1, 2);
            assertTrue(worst < 1.2 * unlimited, "slopes add a little: " + worst / unlimited);
        }
    }

    @Test
    void aStepIsNeverOvershotWhereASplineSwingsByATenth() {
        double[] times = Recordings.grid(20, 1);
        double[] values = sampled(times, t -> t < 10 ? 0 : 1);
        double[] targets = fine(0, 19, 1901);
        double[] found = evaluate(times, values, targets);
        assertTrue(Arrays.stream(found).allMatch(y -> y >= 0 && y <= 1));
        var spline = new SplineInterpolator().interpolate(times, values);
        double swing = Arrays.stream(targets).map(spline::value).max().orElseThrow();
        assertTrue(swing > 1.1, "the comparison means nothing if the spline does not swing: " + swing);
    }

    @Test
    void curveEqualsTheHermiteCubicWithSlopesOfTwoNeighbouringCubicsByHipparchus() {
        double[] times = uneven(14, 3, new Random(7));
        double[] values = sampled(times, Math::exp);
        for (int i = 3; i < 9; i++) {
            double target = times[i] + 0.37 * (times[i + 1] - times[i]);
            HermiteInterpolator expected = new HermiteInterpolator();
            expected.addSamplePoint(times[i], new double[] {values[i]}, new double[] {slope(times, values, i)});
            expected.addSamplePoint(times[i + 1], new double[] {values[i + 1]}, new double[] {slope(times, values, i + 1)});
            // both are sums of a few terms of size up to 20
            assertEquals(expected.value(target)[0], evaluate(times, values, new double[] {target})[0], 1e-13);
        }
    }

    private static double slope(double[] times, double[] values, int i) {
        return (cubicSlope(times, values, i - 2, times[i]) + cubicSlope(times, values, i - 1, times[i])) / 2;
    }

    private static double cubicSlope(double[] times, double[] values, int first, double at) {
        HermiteInterpolator cubic = new HermiteInterpolator();
        for (int k = first; k < first + 4; k++) {
            cubic.addSamplePoint(times[k], new double[] {values[k]});
        }
        PolynomialFunction polynomial = cubic.getPolynomials()[0];
        return polynomial.polynomialDerivative().value(at);
    }

    @Test
    void aWaveOfTwelveSamplesACycleIsFollowedBetterThanByHipparchusAkima() {
        DoubleUnaryOperator wave = t -> Math.sin(2 * Math.PI * t);
        double[] times = fine(0, 6, 73);
        var akima = new AkimaSplineInterpolator().interpolate(times, sampled(times, wave));
        double worst = Arrays.stream(fine(1, 5, 4001)).map(t -> Math.abs(akima.value(t) - wave.applyAsDouble(t))).max()
                .orElseThrow();
        assertTrue(worstError(times, wave, 1, 5) < worst);
    }

    @Test
    void everyColumnIsInterpolatedAsIfAlone() {
        double[] times = uneven(30, 5, new Random(3));
        DMatrixRMaj both = new DMatrixRMaj(30, 2);
        for (int k = 0; k < 30; k++) {
            both.set(k, 0, Math.sin(times[k]));
            both.set(k, 1, k % 7 == 0 ? 3 : -1);
        }
        double[] targets = fine(0, 5, 200);
        DMatrixRMaj out = new DMatrixRMaj(200, 2);
        int between = new MonotoneCubic(times, both, 0, 30).evaluate(targets, 0, 200, out);
        double[] first = evaluate(times, Recordings.column(new Run("A", times, both), 0), targets);
        double[] second = evaluate(times, Recordings.column(new Run("A", times, both), 1), targets);
        assertEquals(198, between, "all but both ends");
        assertArrayEquals(first, Recordings.column(new Run("A", targets, out), 0));
        assertArrayEquals(second, Recordings.column(new Run("A", targets, out), 1));
    }

    @Test
    void sizesFarFromOneKeepTheirDigits() {
        double[] times = {0, 1, 2, 3, 4, 5, 6};
        double[] targets = {2.5, 3.25};
        double[] plain = evaluate(times, new double[] {0, 1, 4, 9, 16, 25, 36}, targets);
        double[] tiny = evaluate(times, sampled(times, t -> t * t * 0x1p-1000), targets);
        for (int k = 0; k < targets.length; k++) {
            assertEquals(plain[k], tiny[k] * 0x1p1000, 1e-12);
        }
    }
}
