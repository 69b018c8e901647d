package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.wellposed.Grade;

/** Backtests of operators whose errors are known in closed form. */
class RollingOriginTest {

    private static final double PHI = 0.9;

    // Grows by 1.1 a step in training and by 1.3 in the holdout.
    private static final Fixture.Signal FASTER = t -> Math.pow(1.1, Math.min(t, 20)) * Math.pow(1.3, Math.max(t - 20, 0));

    private static Snapshots growing(Fixture.Signal signal) {
        return Fixture.snapshots(List.of("m"), List.of(Fixture.run("a", 0, 21, 0, 1, signal)), List.of(),
                List.of(Fixture.run("a", 20, 37, 1, 1, signal)), OptionalDouble.of(1));
    }

    private static BacktestResult growth(Fixture.Signal signal, Refit refit) {
        Snapshots snapshots = growing(signal);
        FittedOperator operator = OperatorFitter.fit(snapshots, new LinearEstimator(), new RankRule.Fixed(1), 0,
                Progress.NONE);
        return RollingOrigin.run(snapshots, operator, Optional.empty(), plan(5, refit, 1, 4), Progress.NONE);
    }

    private static BacktestPlan plan(int origins, Refit refit, double... horizons) {
        List<Double> scored = IntStream.range(0, horizons.length).mapToObj(k -> horizons[k]).toList();
        return new BacktestPlan(new ForecastPlan(Route.PROJECTION, Origin.RECORDING_END,
                OptionalDouble.of(horizons[horizons.length - 1]), 0.9, 0, scored), origins, refit);
    }

    /** First-order autoregression of unit variance, independent runs that start anywhere in it. */
    private static List<Run> wandering(String name, int runs, int samples, Random random) {
        List<Run> out = new ArrayList<>();
        for (int r = 0; r < runs; r++) {
            double[] y = new double[samples];
            y[0] = random.nextGaussian();
            for (int k = 1; k < samples; k++) {
                y[k] = PHI * y[k - 1] + Math.sqrt(1 - PHI * PHI) * random.nextGaussian();
            }
            out.add(Fixture.run(name + r, 0, samples, 0, 1, t -> y[(int) t]));
        }
        return out;
    }

    private static BacktestResult wandering(int calibration, int holdout, BacktestPlan plan) {
        Random random = new Random(20261201);
        int samples = (int) plan.forecast().horizon().orElseThrow() + 1;
        Snapshots snapshots = Fixture.snapshots(List.of("m"), wandering("t", 20, 50, random),
                wandering("c", calibration, samples, random), wandering("h", holdout, samples, random),
                OptionalDouble.of(1));
        FittedOperator exact = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{PHI}}).operator();
        return RollingOrigin.run(snapshots, exact, Optional.empty(), plan, Progress.NONE);
    }

    private static double rmse(BacktestResult result, String method, double horizon) {
        return Scores.rmse(result.errors().stream().filter(row -> row.method().equals(method) && row.horizon() == horizon)
                .mapToDouble(ErrorRow::error).toArray());
    }

    @Test
    void errorsOfTheExactOperatorAndOfPersistenceOnAnAutoregressionAreThoseOfTheory() {
        // CHECKS C5.6: sqrt(1 - φ^2h) and sqrt(2 (1 - φ^h)), φ = 0.9
        BacktestResult result = wandering(0, 2000, plan(2000, Refit.NEVER, 1, 2, 5, 10));
        double[] optimal = {.435889894354, .586429876456, .807044955315, .937242415498};
        double[] persistence = {.447213595500, .616441400297, .904997237565, 1.14133392125};
        double[] horizons = {1, 2, 5, 10};
        for (int k = 0; k < horizons.length; k++) {
            // 2000 independent errors: four times 1/sqrt(2 · 2000)
            assertEquals(optimal[k], rmse(result, "projection", horizons[k]), 0.064 * optimal[k]);
            assertEquals(persistence[k], rmse(result, "persistence", horizons[k]), 0.064 * persistence[k]);
        }
    }

    @Test
    void bandsWidenAsTheAutoregressionForgets() {
        // Closed form: half width 1.645 sqrt(1 - φ^2h), which tends to that of the series itself; the interval score tends
        // to 2 φ_normal(1.645) / 0.05 = 4.125 standard deviations.
        BacktestResult result = wandering(2000, 2000, plan(2000, Refit.NEVER, 1, 40));
        // 2000 independent scores at each lead: the 90 % quantile of |e| scatters by 2 %, coverage by 1 %.
        ScoreRow near = result.scores().get(0);
        assertEquals(0.9, near.coverage(), 0.04);
        assertEquals(4.125 * Math.sqrt(1 - PHI * PHI), near.intervalScore(), 0.08 * near.intervalScore());
        double sum = IntStream.rangeClosed(1, 40).mapToDouble(h -> Math.sqrt(1 - Math.pow(PHI, 2 * h))).sum();
        ScoreRow far = result.scores().get(1);
        assertEquals(0.9, far.coverage(), 0.04);
        assertEquals(4.125 * sum / 40, far.intervalScore(), 0.08 * far.intervalScore());
    }

    @Test
    void asADistributionTheExactOperatorScoresWhatANormalForecastDoes() {
        // Closed form: deviation times 1/√π (CHECKS C5.3), deviation √(1 - φ²); a score scatters by about 0.45 deviations, so
        // 2000 of them by 1 %, the 2000 errors of calibration by as much: four times both
        String sentence = wandering(2000, 2000, plan(2000, Refit.NEVER, 1)).summary().stream()
                .filter(line -> line.contains("CRPS")).findFirst().orElseThrow();
        double deviation = Math.sqrt(1 - PHI * PHI);
        assertEquals(deviation / Math.sqrt(Math.PI), distributionScore(sentence, "projection"), 0.08 * deviation);
        assertTrue(distributionScore(sentence, "projection") < distributionScore(sentence, "persistence"), sentence);
    }

    private static double distributionScore(String sentence, String method) {
        return Double.parseDouble(sentence.replaceFirst(".*" + method + " ([0-9.]+[0-9]).*", "$1"));
    }

    @Test
    void hundredIntervalsHoldAsManyObservationsAsTheBinomialAllows() {
        // CHECKS C5.5: 84 to 95 of 100 at 90 %
        double coverage = wandering(500, 100, plan(100, Refit.NEVER, 1)).scores().get(0).coverage();
        assertTrue(coverage >= 0.84 && coverage <= 0.95, "coverage " + coverage);
    }

    @Test
    void refittingUsesEverySampleUpToTheOriginAndNoneAfterIt() {
        List<ErrorRow> own = growth(FASTER, Refit.EVERY_ORIGIN).errors().stream()
                .filter(row -> row.method().equals("projection") && row.horizon() == 1).toList();
        assertEquals(List.of(20.0, 23.0, 26.0, 29.0, 32.0), own.stream().map(ErrorRow::origin).toList());
        for (ErrorRow row : own) {
            double product = 0;
            double square = 0;
            for (int t = 0; t < row.origin(); t++) {
                product += FASTER.at(t) * FASTER.at(t + 1);
                square += FASTER.at(t) * FASTER.at(t);
            }
            double now = FASTER.at(row.origin());
            // least squares multiplier in closed form; rounding of values up to 300
            assertEquals((product / square - 1.3) * now, row.error(), 1e-10 * now);
        }
    }

    @Test
    void withoutRefittingTheOperatorStaysThatOfTraining() {
        growth(FASTER, Refit.NEVER).errors().stream()
                .filter(row -> row.method().equals("projection") && row.horizon() == 1)
                .forEach(row -> assertEquals((1.1 - 1.3) * FASTER.at(row.origin()), row.error(),
                        1e-10 * FASTER.at(row.origin())));
    }

    @ParameterizedTest
    @EnumSource
    void whatComesAfterTheHorizonChangesNoError(Refit refit) {
        List<ErrorRow> known = early(growth(FASTER, refit));
        List<ErrorRow> other = early(growth(t -> t <= 24 ? FASTER.at(t) : -7 * t, refit));
        assertFalse(known.isEmpty());
        assertEquals(known, other);
    }

    private static List<ErrorRow> early(BacktestResult result) {
        return result.errors().stream().filter(row -> row.origin() + 4 <= 24).toList();
    }

    @Test
    void everyMethodStartsFromTheSameOrigins() {
        BacktestResult result = growth(FASTER, Refit.EVERY_ORIGIN);
        List<String> methods = result.scores().stream().map(ScoreRow::method).distinct().toList();
        assertEquals(List.of("projection", "modal", "persistence", "drift", "mean"), methods);
        methods.forEach(method -> assertEquals(10, result.errors().stream()
                .filter(row -> row.method().equals(method)).count(), method + ": 5 origins, 2 horizons"));
        assertTrue(result.summary().get(1).contains("5 origins"), result.summary().get(1));
        assertTrue(result.summary().get(1).contains("anew"), result.summary().get(1));
    }

    @Test
    void modesThatStandCarryTheForecastAndThatIsSaid() {
        Fixture.Signal cosine = t -> Math.exp(-0.02 * t) * Math.cos(0.4 * t);
        Fixture.Signal sine = t -> Math.exp(-0.02 * t) * Math.sin(0.4 * t);
        List<Run> runs = IntStream.range(0, 8).mapToObj(r -> Fixture.run("r" + r, 5 * r, 5 * r + 60, 0, 1, cosine, sine))
                .toList();
        Snapshots snapshots = Fixture.snapshots(List.of("m", "m"), runs.subList(0, 6), List.of(), runs.subList(6, 8),
                OptionalDouble.of(1));
        FittedOperator operator = OperatorFitter.fit(snapshots, new LinearEstimator(), new RankRule.Fixed(2), 0,
                Progress.NONE);
        BacktestResult result = RollingOrigin.run(snapshots, operator, Optional.of(Fixture.verdict(Grade.STANDS)),
                BacktestPlan.DEFAULT, Progress.NONE);
        assertEquals("Forecast by the modal route: the verdict on the modes is 'stands'.", result.summary().get(0));
        assertEquals("modal", result.scores().get(0).method());
        // A closed linear motion: rounding over some tens of steps.
        result.scores().stream().filter(row -> row.method().equals("modal"))
                .forEach(row -> assertEquals(0, row.rmse(), 1e-10));
    }

    @Test
    void errorsComeInRecordedUnits() {
        Preparation scaled = new Preparation(0, new double[] {5}, new double[1], new double[] {4});
        Fixture.Signal wave = t -> Math.cos(Math.PI * t);
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(Fixture.run("a", 0, 30, 0, 1, wave)), List.of(),
                List.of(Fixture.run("a", 29, 50, 1, 1, wave)), OptionalDouble.of(1), DelayEmbedding.NONE, scaled);
        FittedOperator still = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{1}}).operator();
        BacktestResult result = RollingOrigin.run(snapshots, still, Optional.empty(), plan(4, Refit.NEVER, 1),
                Progress.NONE);
        // The wave turns by 2 prepared units a step, 8 recorded ones.
        result.errors().stream().filter(row -> row.method().equals("persistence"))
                .forEach(row -> assertEquals(8, Math.abs(row.error()), 1e-12));
    }

    @Test
    void withoutHoldoutThereIsNothingToBacktest() {
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(Fixture.run("a", 0, 30, 0, 1, FASTER)), List.of(),
                List.of(), OptionalDouble.of(1));
        FittedOperator operator = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{1}}).operator();
        ForecastFault fault = assertThrows(ForecastFault.class, () -> RollingOrigin.run(snapshots, operator,
                Optional.empty(), BacktestPlan.DEFAULT, Progress.NONE));
        assertTrue(fault.getMessage().contains("holdout"), fault.getMessage());
    }

    @Test
    void seasonLongerThanEveryHoldoutRunIsRefused() {
        Random random = new Random(1);
        Snapshots snapshots = Fixture.snapshots(List.of("m"), wandering("t", 3, 50, random), List.of(),
                wandering("h", 3, 10, random), OptionalDouble.of(1));
        FittedOperator operator = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{1}}).operator();
        ForecastPlan season = new ForecastPlan(Route.AUTO, Origin.RECORDING_END, OptionalDouble.empty(), 0.9, 12, List.of());
        ForecastFault fault = assertThrows(ForecastFault.class, () -> RollingOrigin.run(snapshots, operator,
                Optional.empty(), new BacktestPlan(season, 10, Refit.NEVER), Progress.NONE));
        assertTrue(fault.seen().contains("12"), fault.getMessage());
    }

    @Test
    void fewOriginsAreDoubted() {
        List<String> codes = growth(FASTER, Refit.NEVER).doubts().stream().map(Doubt::code).toList();
        assertFalse(codes.contains("few-origins"), "five are enough to say nothing");
        Snapshots snapshots = growing(FASTER);
        FittedOperator operator = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{1}}).operator();
        assertTrue(RollingOrigin.run(snapshots, operator, Optional.empty(), plan(2, Refit.NEVER, 1), Progress.NONE).doubts()
                .stream().anyMatch(doubt -> doubt.code().equals("few-origins")));
    }

    @Test
    void thereMustBeAnOrigin() {
        ForecastFault fault = assertThrows(ForecastFault.class, () -> plan(0, Refit.NEVER, 1));
        assertTrue(fault.seen().contains("0"), fault.getMessage());
    }

    @Test
    void inputsAreKeptWithTheRunTheyBelongTo() {
        DMatrixRMaj known = new DMatrixRMaj(new double[][] {{7}, {8}, {9}});
        Run training = new Run("a", new double[] {0, 1, 2}, new DMatrixRMaj(3, 1), known, 0);
        Run holdout = new Run("a", new double[] {2, 3, 4}, new DMatrixRMaj(3, 1), new DMatrixRMaj(new double[][] {{9}, {10},
            {11}}), 1);
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(training), List.of(), List.of(holdout),
                OptionalDouble.of(1));
        Run joined = KnownAt.of(snapshots, "a", 3, 1).training().get(0);
        assertEquals(List.of(0.0, 1.0, 2.0, 3.0), IntStream.range(0, 4).mapToObj(k -> joined.times()[k]).toList());
        assertEquals(List.of(7.0, 8.0, 9.0, 10.0), IntStream.range(0, 4).mapToObj(k -> joined.inputs().get(k, 0)).toList());
    }

    @Test
    void aPauseStartsANewRunAndOtherRunsStayUnseen() {
        Run training = Fixture.run("a", 0, 10, 0, 1, t -> t);
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(training), List.of(),
                List.of(Fixture.run("a", 15, 30, 0, 1, t -> t), Fixture.run("b", 0, 30, 0, 1, t -> t)),
                OptionalDouble.of(1));
        Snapshots known = KnownAt.of(snapshots, "a", 20, 1);
        assertEquals(List.of(10, 6), known.training().stream().map(Run::samples).toList());
        assertEquals(List.of("a", "a"), known.training().stream().map(Run::id).toList());
        assertTrue(known.holdout().isEmpty());
    }
}
