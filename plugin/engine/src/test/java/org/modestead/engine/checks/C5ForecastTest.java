package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.Progress;
import org.modestead.engine.forecast.BacktestPlan;
import org.modestead.engine.forecast.BacktestResult;
import org.modestead.engine.forecast.ForecastPlan;
import org.modestead.engine.forecast.ForecastResult;
import org.modestead.engine.forecast.ForecastRow;
import org.modestead.engine.forecast.Forecaster;
import org.modestead.engine.forecast.Origin;
import org.modestead.engine.forecast.PassengerSeries;
import org.modestead.engine.forecast.Refit;
import org.modestead.engine.forecast.RollingOrigin;
import org.modestead.engine.forecast.Route;
import org.modestead.engine.forecast.ScoreRow;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.JudgeSettings;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.engine.wellposed.WellPosedness;

/** CHECKS C5.7 to C5.11: recorded series through fit, verdict and backtest. Baselines there are derived, digits printed. */
class C5ForecastTest {

    private static final double[] PASSENGERS = PassengerSeries.values();
    private static final double[] CARBON_DIOXIDE = RecordedSeries.carbonDioxide();
    private static final double[] SUNSPOTS = RecordedSeries.sunspots(1700, 1988);
    private static final double[] LYNX = RecordedSeries.lynx();
    private static final double[] NILE = RecordedSeries.nile();
    /** Ten printed digits of errors of order 10 to 100. */
    private static final double DIGITS = 1e-7;

    private static double[] each(double[] y, DoubleUnaryOperator f) {
        return DoubleStream.of(y).map(f).toArray();
    }

    private static Run samples(double[] y, int from, int to, int leadIn, double offset) {
        double[] times = IntStream.range(from, to).asDoubleStream().toArray();
        double[] values = DoubleStream.of(Arrays.copyOfRange(y, from, to)).map(v -> v - offset).toArray();
        return new Run("a", times, Fits.column(values), new DMatrixRMaj(times.length, 0), leadIn);
    }

    /** One run, its last samples held out and those before them kept for the bands; step 1; less its training mean. */
    private static Snapshots snapshots(double[] y, int calibration, int holdout, int depth, boolean centred) {
        int trained = y.length - calibration - holdout;
        double offset = centred ? Arrays.stream(y, 0, trained).average().orElseThrow() : 0;
        List<Run> kept = calibration == 0 ? List.of()
                : List.of(samples(y, trained - 1, trained + calibration, 1, offset));
        List<Run> held = holdout == 0 ? List.of() : List.of(samples(y, y.length - holdout - 1, y.length, 1, offset));
        return new Snapshots(List.of(new Channel("y", "")), List.of(), new TimeAxis(TimeAxis.Kind.NUMBER, ""),
                List.of(samples(y, 0, trained, 0, offset)), kept, held, OptionalDouble.of(1), new DelayEmbedding(depth, 1),
                new Preparation(0, new double[] {offset}, new double[1], new double[] {1}), List.of(), List.of());
    }

    private static FittedOperator fit(Snapshots snapshots, int rank) {
        return Fits.fit(snapshots, new LinearEstimator(), rank);
    }

    private static List<Mode> modes(double[] y, int depth, int rank, boolean centred) {
        return SpectrumExtractor.extract(fit(snapshots(y, 0, 0, depth, centred), rank), Progress.NONE).modes();
    }

    private static double nearestPeriod(List<Mode> modes, double period) {
        return nearest(modes, period).period();
    }

    private static Mode nearest(List<Mode> modes, double period) {
        return modes.stream().filter(Mode::oscillates)
                .min(Comparator.comparingDouble(mode -> Math.abs(mode.period() - period))).orElseThrow();
    }

    private static List<ScoreRow> scores(double[] y, int holdout, int depth, int rank, int season) {
        return backtest(y, holdout, depth, rank, season).scores();
    }

    private static List<String> summary(double[] y, int holdout, int depth, int rank, int season) {
        return backtest(y, holdout, depth, rank, season).summary();
    }

    /** One origin, before the holdout. */
    private static BacktestResult backtest(double[] y, int holdout, int depth, int rank, int season) {
        Snapshots snapshots = snapshots(y, 0, holdout, depth, false);
        ForecastPlan forecast = new ForecastPlan(Route.AUTO, Origin.RECORDING_END, OptionalDouble.of(holdout), 0.9, season,
                List.of((double) holdout));
        return RollingOrigin.run(snapshots, fit(snapshots, rank), Optional.empty(),
                new BacktestPlan(forecast, 1, Refit.EVERY_ORIGIN), Progress.NONE);
    }

    private static ScoreRow row(List<ScoreRow> scores, String method) {
        return scores.stream().filter(row -> row.method().equals(method)).findFirst().orElseThrow();
    }

    @Test
    void passengersMeetTheBaselines() {
        // CHECKS C5.7
        List<ScoreRow> scores = scores(PASSENGERS, 12, 48, 13, 12);
        assertEquals(102.9765345, row(scores, "persistence").rmse(), DIGITS);
        assertEquals(76, row(scores, "persistence").mae(), DIGITS);
        assertEquals(50.70831621, row(scores, "seasonal-naive").rmse(), DIGITS);
        assertEquals(47.83333333, row(scores, "seasonal-naive").mae(), DIGITS);
        assertEquals(1.570881226, row(scores, "seasonal-naive").mase(), DIGITS);
        assertEquals(92.66636343, row(scores, "drift").rmse(), DIGITS);
        assertEquals(226.2656715, row(scores, "mean").rmse(), DIGITS);
    }

    @Test
    void passengersAreToldInPercentToo() {
        // CHECKS C5.7: 9.987532921 %, five digits in sentences
        assertTrue(summary(PASSENGERS, 12, 48, 13, 12).stream().anyMatch(sentence -> sentence.contains("(MAPE")
                && sentence.contains("seasonal-naive 9.9875 (")));
    }

    @Test
    void sunspotsAreNotToldInPercentSinceSomeYearsHaveHardlyAny() {
        assertFalse(summary(SUNSPOTS, 44, 22, 2, 11).stream().anyMatch(sentence -> sentence.contains("MAPE")));
    }

    @Test
    void delayModesOfTheLogarithmOfPassengersAreTheYearAndItsFractionsAndGrowth() {
        // CHECKS C5.7, d = 48, r = 13, printed to two decimals and five
        List<Mode> modes = modes(each(PASSENGERS, Math::log), 48, 13, false);
        for (double period : new double[] {12.06, 5.98, 4.02, 3.01}) {
            assertEquals(period, nearestPeriod(modes, period), 0.005);
        }
        double growth = modes.stream().filter(mode -> !mode.oscillates()).findFirst().orElseThrow().rate().re();
        assertEquals(1.00178, Math.exp(growth), 5e-6);
    }

    @Test
    void modelOfTheLogarithmBeatsTheModelOfPassengersThemselves() {
        // CHECKS C5.7: the season is multiplicative
        assertTrue(passengerError(true) < passengerError(false), "in thousands of passengers");
    }

    private static double passengerError(boolean logarithm) {
        Snapshots snapshots = snapshots(logarithm ? each(PASSENGERS, Math::log) : PASSENGERS, 0, 12, 48, false);
        FittedOperator operator = fit(snapshots, 13);
        ForecastPlan plan = new ForecastPlan(Route.PROJECTION, Origin.BEFORE_HOLDOUT, OptionalDouble.empty(), 0.9, 12,
                List.of());
        List<ForecastRow> rows = Forecaster.run(snapshots, operator, SpectrumExtractor.extract(operator, Progress.NONE),
                Optional.empty(), plan, Progress.NONE).forecast();
        assertEquals(12, rows.size());
        return Math.sqrt(rows.stream().mapToDouble(row -> (logarithm ? Math.exp(row.value()) : row.value())
                - PASSENGERS[(int) row.time()]).map(e -> e * e).average().orElseThrow());
    }

    @Test
    void carbonDioxideMeetsTheBaselinesAndIsForecastBetterThanBySeason() {
        // CHECKS C5.8
        List<ScoreRow> scores = scores(CARBON_DIOXIDE, 24, 36, 7, 12);
        assertEquals(3.230628809, row(scores, "persistence").rmse(), DIGITS);
        assertEquals(2.433251426, row(scores, "seasonal-naive").rmse(), DIGITS);
        assertEquals(1.861577027, row(scores, "seasonal-naive").mase(), DIGITS);
        assertEquals(2.479435243, row(scores, "drift").rmse(), DIGITS);
        for (String route : List.of("modal", "projection")) {
            assertTrue(row(scores, route).rmse() < row(scores, "seasonal-naive").rmse(), route);
        }
    }

    @Test
    void carbonDioxideTurnsOnceAndTwiceAYear() {
        // CHECKS C5.8, d = 36, r = 7: both periods within 0.5 %. It prints "periods 1.0003, .4999 (|z| 1.00027, .9997), real
        // mode 1.000316". The sizes are multipliers a month and come out to the last digit; 1.0003 is the frequency of the
        // first pair in cycles a year (its period is 0.99968), and .4999 is neither the period nor half the frequency of
        // the second, which an independent fit has at 0.50036 years as well.
        List<Mode> modes = modes(CARBON_DIOXIDE, 36, 7, false);
        Mode year = nearest(modes, 12);
        Mode half = nearest(modes, 6);
        assertEquals(1, year.period() / 12, 0.005);
        assertEquals(1, half.period() / 6, 0.005);
        assertEquals(1.0003, 12 * year.frequency(), 5e-5);
        assertEquals(0.50036, half.period() / 12, 5e-6);
        assertEquals(1.00027, Math.exp(year.rate().re()), 5e-6);
        assertEquals(0.9997, Math.exp(half.rate().re()), 5e-5);
        assertTrue(modes.stream().filter(mode -> !mode.oscillates())
                .anyMatch(mode -> Math.abs(Math.exp(mode.rate().re()) - 1.000316) < 5e-7), modes.toString());
    }

    @Test
    void sunspotsMeetTheBaselines() {
        // CHECKS C5.9: last 22 years held out, m = 11
        List<ScoreRow> scores = scores(SUNSPOTS, 22, 22, 2, 11);
        assertEquals(36.73960583, row(scores, "seasonal-naive").rmse(), DIGITS);
        assertEquals(52.620587, row(scores, "mean").rmse(), 1e-6, "printed to six decimals");
    }

    @Test
    void sunspotCyclesOfTwoDelayFits() {
        // CHECKS C5.9: d = 22, r = 2 and d = 44, r = 6, printed to two decimals, the slow one to a year
        Mode cycle = nearest(modes(SUNSPOTS, 22, 2, true), 10.8);
        assertEquals(10.82, cycle.period(), 0.005);
        assertTrue(cycle.period() > 10 && cycle.period() < 11.5 && cycle.rate().re() < 0, "quasi-periodic: it fades");
        List<Mode> six = modes(SUNSPOTS, 44, 6, true);
        assertEquals(11.24, nearestPeriod(six, 11.24), 0.005);
        assertEquals(10.20, nearestPeriod(six, 10.2), 0.005);
        assertEquals(97, nearestPeriod(six, 97), 0.5);
    }

    @ParameterizedTest
    @CsvSource({"MODAL", "PROJECTION"})
    void bandsOfSunspotsWidenToTheSpreadOfTheSeries(Route route) {
        // CHECKS C5.9. Where the cycle is forgotten a forecast errs as much as the series strays from its mean: the half
        // width tends to the 90 % quantile of that. A fifth allows for some ten cycles in the calibration part.
        int calibration = 110;
        Snapshots snapshots = snapshots(SUNSPOTS, calibration, 22, 22, true);
        FittedOperator operator = fit(snapshots, 2);
        ForecastPlan plan = new ForecastPlan(route, Origin.RECORDING_END, OptionalDouble.of(44), 0.9, 11, List.of());
        List<ForecastRow> rows = Forecaster.run(snapshots, operator, SpectrumExtractor.extract(operator, Progress.NONE),
                Optional.empty(), plan, Progress.NONE).forecast();
        double[] stray = DoubleStream.of(snapshots.calibration().get(0).values().data).map(Math::abs).sorted().toArray();
        double spread = stray[(int) (0.9 * stray.length)];
        double[] half = rows.stream().mapToDouble(row -> (row.high() - row.low()) / 2).toArray();
        double early = Arrays.stream(half, 0, 5).average().orElseThrow();
        double late = Arrays.stream(half, 22, 44).average().orElseThrow();
        assertTrue(late > 1.2 * early, early + " to " + late);
        assertEquals(spread, late, spread / 5);
    }

    @Test
    void lynxTurnInNineYearsAndAHalf() {
        // CHECKS C5.10: d = 38, r = 2: 9.658 (logarithm), 9.653 (as counted); published 9.6
        assertEquals(9.653, nearestPeriod(modes(LYNX, 38, 2, true), 9.6), 0.0005);
        assertEquals(9.658, nearestPeriod(modes(each(LYNX, Math::log10), 38, 2, true), 9.6), 0.0005);
    }

    @Test
    void nileIsTheSeriesOfTheLevelShift() {
        // CHECKS C5.11, Cobb 1978
        assertEquals(919.35, DoubleStream.of(NILE).average().orElseThrow(), 1e-9);
        assertEquals(1097.75, Arrays.stream(NILE, 0, 28).average().orElseThrow(), 1e-9);
        assertEquals(849.9722, Arrays.stream(NILE, 28, 100).average().orElseThrow(), 5e-5);
        double variance = DoubleStream.of(NILE).map(y -> (y - 919.35) * (y - 919.35)).sum() / 99;
        assertEquals(169.2275, Math.sqrt(variance), 5e-5);
    }

    @ParameterizedTest
    @CsvSource({"10, 2", "10, 4", "10, 6", "20, 2", "20, 4", "20, 6"})
    void nileHasNoModesAndIsForecastByProjectionWhichIsSaid(int depth, int rank) {
        // CHECKS C5.11: no cycle, any reported mode must carry a "not significant" verdict
        Snapshots snapshots = snapshots(NILE, 0, 20, depth, true);
        FittedOperator operator = fit(snapshots, rank);
        Spectrum spectrum = SpectrumExtractor.extract(operator, Progress.NONE);
        Verdict verdict = WellPosedness.judge(snapshots, operator, spectrum, JudgeSettings.DEFAULT, Progress.NONE);
        verdict.modes().forEach(mode -> assertFalse(List.of(Grade.STANDS, Grade.SETTLES).contains(mode.grade())));
        ForecastResult forecast = Forecaster.run(snapshots, operator, spectrum, Optional.of(verdict), ForecastPlan.DEFAULT,
                Progress.NONE);
        BacktestResult backtest = RollingOrigin.run(snapshots, operator, Optional.of(verdict), BacktestPlan.DEFAULT,
                Progress.NONE);
        String said = "Forecast by the projection route: the verdict on the modes is '" + verdict.overall().grade().word()
                + "'.";
        assertEquals(List.of(Route.PROJECTION, Route.PROJECTION), List.of(forecast.routeUsed(), backtest.routeUsed()));
        assertEquals(List.of(said, said), List.of(forecast.summary().get(0), backtest.summary().get(0)));
        assertEquals("projection", backtest.scores().get(0).method());
    }
}
