package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.hipparchus.distribution.discrete.BinomialDistribution;
import org.junit.jupiter.api.Test;
import org.modestead.engine.forecast.Backtest.Errors;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/** Width of forecast bands: from which errors, how far ahead, and how often they hold. */
class BandsTest {

    /** Origins 1..count with errors lead * origin, every second one negative. */
    private static List<Errors> errors(int count, int leads) {
        List<Errors> out = new ArrayList<>();
        for (int origin = 1; origin <= count; origin++) {
            DMatrixRMaj values = new DMatrixRMaj(leads, 1);
            for (int lead = 1; lead <= leads; lead++) {
                values.data[lead - 1] = (origin % 2 == 0 ? -1 : 1) * lead * origin;
            }
            out.add(new Errors(0, origin, values));
        }
        return out;
    }

    @Test
    void enoughOriginsGiveEveryLeadItsOwnThreshold() {
        // 99 scores, 90 %: the 90th smallest of lead * (1..99) (CHECKS C5.4).
        Bands bands = Bands.of(errors(99, 8), 8, 1, 0.9);
        for (int lead = 1; lead <= 8; lead++) {
            assertEquals(90 * lead, bands.halfWidth(lead, 0));
        }
        assertEquals(8, bands.reach());
    }

    @Test
    void fewOriginsBorrowFromNeighbouringLeads() {
        // 6 origins alone cannot carry 90 %; lead 1 joins lead 2: 12 scores {1..6, 2,4..12}, k = 12, the largest.
        Bands bands = Bands.of(errors(6, 4), 4, 1, 0.9);
        assertEquals(12, bands.halfWidth(1, 0));
        assertEquals(9, SplitConformal.rank(8, 0.9), "8 scores would be too few");
    }

    @Test
    void noBandWhereTooFewErrorsAreKnown() {
        assertTrue(Double.isNaN(Bands.of(errors(2, 4), 4, 1, 0.9).halfWidth(1, 0)));
        Bands beyond = Bands.of(errors(99, 8), 12, 1, 0.9);
        assertEquals(8, beyond.reach());
        assertTrue(Double.isNaN(beyond.halfWidth(9, 0)), "shorter leads must not stand in for a lead nobody reached");
    }

    @Test
    void halfOfASingleHoldoutCalibratesAndTheOtherHalfJudges() {
        Series series = new Series("a", new double[41], new DMatrixRMaj(41, 1), 1);
        BandSource source = BandSource.of(List.of(), List.of(series), 1);
        assertEquals(21, source.calibration().get(0).length(), "samples 0..20 calibrate, 21..40 are judged");
        assertFalse(source.judges(new Errors(0, 19, new DMatrixRMaj(1, 1))));
        assertTrue(source.judges(new Errors(0, 20, new DMatrixRMaj(1, 1))));
        assertTrue(source.halved());
    }

    @Test
    void halfOfTheHoldoutRunsCalibratesWhereThereAreSeveral() {
        Series series = new Series("a", new double[5], new DMatrixRMaj(5, 1), 1);
        BandSource source = BandSource.of(List.of(), List.of(series, series, series), 1);
        assertEquals(2, source.calibration().size());
        assertFalse(source.judges(new Errors(1, 3, new DMatrixRMaj(1, 1))));
        assertTrue(source.judges(new Errors(2, 0, new DMatrixRMaj(1, 1))));
    }

    @Test
    void calibrationPartLeavesTheWholeHoldoutToJudge() {
        Series series = new Series("a", new double[5], new DMatrixRMaj(5, 1), 1);
        BandSource source = BandSource.of(List.of(series), List.of(series), 1);
        assertTrue(source.judges(new Errors(0, 0, new DMatrixRMaj(1, 1))));
        assertFalse(source.halved());
    }

    @Test
    void bandsHoldExchangeableNoiseAsOftenAsPromised() {
        // White noise around 0 and a map to (nearly) 0: errors are independent, so coverage is k/(n+1) on average.
        Random random = new Random(42);
        double[] noise = random.doubles(1001).map(u -> u - 0.5).toArray();
        Fixture.Signal signal = t -> noise[(int) Math.round(t)];
        List<Run> training = List.of(Fixture.run("a", 0, 600, 0, 1, signal));
        List<Run> calibration = List.of(Fixture.run("a", 599, 800, 1, 1, signal));
        List<Run> holdout = List.of(Fixture.run("a", 799, 1000, 1, 1, signal));
        Snapshots snapshots = Fixture.snapshots(List.of("m"), training, calibration, holdout, OptionalDouble.of(1));
        ForecastPlan plan = new ForecastPlan(Route.PROJECTION, Origin.RECORDING_END, OptionalDouble.of(1), 0.9, 0,
                List.of(1.0));
        ForecastResult result = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{1e-14}}).run(plan);
        ScoreRow row = result.scores().get(0);
        // 200 targets, threshold from 200 scores: Beta(181, 20) mixed into the binomial nearly doubles its variance.
        BinomialDistribution binomial = new BinomialDistribution(200, 0.9);
        double deviation = Math.sqrt(2 * binomial.getNumericalVariance());
        assertEquals(180, 200 * row.coverage(), 2 * deviation);
        // Width 0.9 of a uniform on (-0.5, 0.5): half width 0.45, sampling error
        // sqrt(.9 * .1 / 200) / 2 = 0.011, three times.
        ForecastRow forecast = result.forecast().get(0);
        assertEquals(0.45, forecast.high() - forecast.value(), 0.033);
        assertEquals(forecast.value() - forecast.low(), forecast.high() - forecast.value(), 1e-15);
        assertTrue(result.doubts().stream().anyMatch(doubt -> doubt.code().equals("bands-not-exchangeable")));
    }
}
