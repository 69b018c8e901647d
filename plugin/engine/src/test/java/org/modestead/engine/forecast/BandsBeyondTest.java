package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.hipparchus.distribution.discrete.BinomialDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.SpectrumExtractor;
import org.modestead.engine.spread.ForecastSpread;
import org.modestead.engine.spread.SpreadPlan;

/** Bands beyond the calibrated leads hold as many of the values to come as they promise, where the operator is of the right kind. */
class BandsBeyondTest {

    private static final double STEP = 0.1;
    private static final int CALIBRATED = 20;
    private static final int HORIZON = 80;

    /** A plane turned and shrunk by the multiplier each step and pushed by noise. */
    private static Run run(String id, Complex rate, int samples, double start, double push, Random random) {
        Complex multiplier = rate.times(STEP).exp();
        DMatrixRMaj values = new DMatrixRMaj(samples, 2);
        Complex x = new Complex(start * random.nextGaussian(), start * random.nextGaussian());
        for (int t = 0; t < samples; t++) {
            values.set(t, 0, x.re());
            values.set(t, 1, x.im());
            x = x.times(multiplier).plus(new Complex(push * random.nextGaussian(), push * random.nextGaussian()));
        }
        return new Run(id, Motions.grid(samples, STEP), values);
    }

    private static Snapshots recording(Complex rate, int training, double push, Random random) {
        List<Run> fitted = new ArrayList<>();
        for (int i = 0; i < training; i++) {
            fitted.add(run("t" + i, rate, 40, 1, push, random));
        }
        List<Run> calibration = new ArrayList<>();
        for (int i = 0; i < 40; i++) {
            calibration.add(run("c" + i, rate, CALIBRATED + 1, 1, push, random));
        }
        Snapshots plain = Motions.snapshots(STEP, 1, fitted, List.of(run("h", rate, HORIZON + 1, 1, push, random)));
        return new Snapshots(plain.channels(), List.of(), plain.time(), fitted, calibration, plain.holdout(), plain.step(), plain.delay(),
                plain.preparation(), List.of(), List.of());
    }

    private static ForecastResult forecast(Snapshots snapshots, Route route) {
        FittedOperator operator = Motions.fit(snapshots, new LinearEstimator(), 2);
        ForecastPlan plan = new ForecastPlan(route, Origin.BEFORE_HOLDOUT, OptionalDouble.of(HORIZON * STEP), 0.9, 1, List.of());
        return Forecaster.run(snapshots, operator, SpectrumExtractor.extract(operator, Progress.NONE), Optional.empty(), plan, Progress.NONE);
    }

    private static void assertCovers(Complex rate, int training, double push, Route route) {
        int recordings = 200;
        int[] leads = {5, CALIBRATED, 30, 50, HORIZON};
        int[] held = new int[leads.length];
        Random random = new Random(17);
        for (int k = 0; k < recordings; k++) {
            Snapshots snapshots = recording(rate, training, push, random);
            List<ForecastRow> rows = forecast(snapshots, route).forecast();
            for (int l = 0; l < leads.length; l++) {
                ForecastRow row = rows.get(2 * (leads[l] - 1));
                double truth = snapshots.holdout().get(0).values().get(leads[l], 0);
                held[l] += truth >= row.low() && truth <= row.high() ? 1 : 0;
            }
        }
        BinomialDistribution counts = new BinomialDistribution(recordings, 0.9);
        int least = counts.inverseCumulativeProbability(0.005);
        int most = counts.inverseCumulativeProbability(0.995);
        for (int l = 0; l < leads.length; l++) {
            assertTrue(held[l] >= least && held[l] <= most, String.format(Locale.ROOT, "%s, rate %s: at leads %s the bands hold %s of %d,"
                    + " %d to %d wanted", route, rate, Arrays.toString(leads), Arrays.toString(held), recordings, least, most));
        }
    }

    @Test
    @EnabledIfSystemProperty(named = "coverage", matches = "full")
    void noiseThatPilesUpIsHeld() {
        assertCovers(new Complex(-0.2, 3), 20, 0.1, Route.MODAL);
    }

    @Test
    void whatTheFitDoesNotKnowIsHeld() {
        // hardly damped, two runs: far ahead the phase is uncertain because the frequency is
        assertCovers(new Complex(-0.02, 3), 2, 0.05, Route.PROJECTION);
    }

    @Test
    void upToTheCalibratedLeadNothingIsAddedAndBeyondTheBandGoesOnWithoutAJump() {
        Snapshots snapshots = recording(new Complex(-0.05, 3), 10, 0.05, new Random(3));
        ForecastResult result = forecast(snapshots, Route.MODAL);
        List<ForecastRow> rows = result.forecast().stream().filter(row -> row.channel() == 0).toList();
        double last = rows.get(CALIBRATED - 1).high() - rows.get(CALIBRATED - 1).low();
        double first = rows.get(CALIBRATED).high() - rows.get(CALIBRATED).low();
        double end = rows.get(HORIZON - 1).high() - rows.get(HORIZON - 1).low();
        assertTrue(first >= last && first < 1.2 * last, last + " then " + first);
        assertTrue(end > first, "noise and phase go on to be lost");
        assertTrue(result.doubts().stream().anyMatch(doubt -> doubt.code().equals("bands-extrapolated")));
    }

    @Test
    void noiseOfAPushedPlanePilesUpByTheGeometricSeries() {
        // every component: push² Σ_{k<h} |μ|^(2k), whatever the frequency
        Complex rate = new Complex(-0.2, 3);
        Snapshots snapshots = recording(rate, 60, 0.1, new Random(5));
        FittedOperator operator = Motions.fit(snapshots, new LinearEstimator(), 2);
        DMatrixRMaj noise = ForecastSpread.of(operator, SpreadPlan.DEFAULT, Progress.NONE).orElseThrow().noise(60);
        double squared = Math.exp(-0.4 * STEP);
        double expected = Math.sqrt((1 - Math.pow(squared, 60)) / (1 - squared));
        // damping from 60 runs of 40 steps is known to some 5 %
        assertEquals(expected, noise.get(59, 0) / noise.get(0, 0), 0.1 * expected);
    }
}
