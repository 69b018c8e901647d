package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.wellposed.Grade;

/** What a forecast hands on, from snapshots to tables. */
class ForecasterTest {

    /** Some tens of steps of rounding at values of order 1 to 10. */
    private static final double ROUNDING = 1e-12;

    private static final Fixture.Signal DECAY = t -> 8 * Math.pow(0.9, t);

    private static ForecastPlan plan(Route route, Origin origin, double horizon) {
        return new ForecastPlan(route, origin, OptionalDouble.of(horizon), 0.9, 0, List.of());
    }

    private static Run run(int from, int to, int leadIn, Fixture.Signal... signals) {
        return Fixture.run("a", from, to, leadIn, 1, signals);
    }

    private static Fixture decay(List<Run> training, List<Run> calibration, List<Run> holdout) {
        Snapshots snapshots = Fixture.snapshots(List.of("m"), training, calibration, holdout, OptionalDouble.of(1));
        return Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{0.9}});
    }

    private static Fixture decayWithHoldout() {
        return decay(List.of(run(0, 30, 0, DECAY)), List.of(), List.of(run(29, 50, 1, DECAY)));
    }

    private static Doubt find(ForecastResult result, String code) {
        return result.doubts().stream().filter(doubt -> doubt.code().equals(code)).findFirst().orElseThrow();
    }

    private static List<String> codes(ForecastResult result) {
        return result.doubts().stream().map(Doubt::code).toList();
    }

    @ParameterizedTest
    @CsvSource({"MODAL", "PROJECTION"})
    void recordingEndForecastsEveryRunOnceFromItsLastSample(Route route) {
        ForecastResult result = decayWithHoldout().run(plan(route, Origin.RECORDING_END, 5), Grade.STANDS);
        assertEquals(5, result.forecast().size());
        for (int k = 1; k <= 5; k++) {
            ForecastRow row = result.forecast().get(k - 1);
            assertEquals(49 + k, row.time());
            assertEquals(DECAY.at(49 + k), row.value(), ROUNDING);
        }
    }

    /** The seasonal method needs a season of 18 steps before its origin; the held-out run has 20, which leaves it two of the five leads. */
    @Test
    void aMethodThatReachesTheHorizonFromNowhereIsLeftOutOfTheSentences() {
        Fixture.Signal slow = t -> 8 * Math.pow(0.99, t);
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(run(0, 30, 0, slow)), List.of(),
                List.of(Fixture.run("b", 0, 20, 0, 1, slow)),
                OptionalDouble.of(1));
        ForecastResult result = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{0.99}})
                .run(new ForecastPlan(Route.MODAL, Origin.RECORDING_END, OptionalDouble.of(5), 0.9, 18, List.of()), Grade.STANDS);
        String percent = result.summary().stream().filter(sentence -> sentence.startsWith("In percent")).findFirst().orElseThrow();
        assertTrue(percent.contains("persistence"), percent);
        assertFalse(result.summary().toString().contains("NaN"), result.summary().toString());
    }

    @Test
    void beforeHoldoutForecastsTheHoldoutAtItsOwnTimes() {
        Fixture fixture = decayWithHoldout();
        ForecastPlan plan = new ForecastPlan(Route.AUTO, Origin.BEFORE_HOLDOUT, OptionalDouble.empty(), 0.9, 0, List.of());
        ForecastResult result = fixture.run(plan, Grade.STANDS);
        assertEquals(20, result.forecast().size());
        assertEquals(30, result.forecast().get(0).time());
        assertEquals(49, result.forecast().get(19).time());
        for (ForecastRow row : result.forecast()) {
            assertEquals(DECAY.at(row.time()), row.value(), ROUNDING);
        }
        assertTrue(codes(result).contains("bands-seen"));
    }

    @Test
    void leadInThatHoldsOnlyDelayHistoryDoesNotHideTheLastStateBeforeTheHoldout() {
        // A tail may bring just enough history for its own first state; the state before it lies in training.
        Fixture.Signal cosine = t -> Math.cos(0.3 * t);
        List<Run> training = List.of(run(0, 30, 0, cosine));
        List<Run> holdout = List.of(run(29, 40, 1, cosine));
        Snapshots snapshots = Fixture.snapshots(List.of("m"), training, List.of(), holdout, OptionalDouble.of(1),
                new DelayEmbedding(2, 1), Preparation.identity(1));
        double[][] map = {{2 * Math.cos(0.3), -1}, {1, 0}};
        ForecastResult result = Fixture.linear(snapshots, new Evolution.StepMap(1), map)
                .run(plan(Route.PROJECTION, Origin.BEFORE_HOLDOUT, 10));
        assertEquals(30, result.forecast().get(0).time());
        assertEquals(cosine.at(30), result.forecast().get(0).value(), ROUNDING);
    }

    @Test
    void trendAndScaleComeBackInTheFuture() {
        Preparation preparation = new Preparation(2, new double[] {3}, new double[] {0.5}, new double[] {4});
        Fixture.Signal recorded = t -> 3 + 0.5 * (t - 2) + 4 * DECAY.at(t);
        List<Run> training = List.of(run(0, 30, 0, DECAY));
        Snapshots snapshots = Fixture.snapshots(List.of("m"), training, List.of(), List.of(), OptionalDouble.of(1),
                DelayEmbedding.NONE, preparation);
        ForecastResult result = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{0.9}})
                .run(plan(Route.MODAL, Origin.RECORDING_END, 10));
        for (ForecastRow row : result.forecast()) {
            assertEquals(recorded.at(row.time()), row.value(), 10 * ROUNDING);
        }
        ReconstructionRow tenth = result.reconstruction().get(10);
        assertEquals(recorded.at(10), tenth.observed(), 10 * ROUNDING);
        assertEquals(recorded.at(10), tenth.reconstructed(), 10 * ROUNDING);
    }

    @ParameterizedTest
    @CsvSource({"STANDS, MODAL", "SETTLES, MODAL", "UNDECIDED, PROJECTION", "DRIFTS, PROJECTION", "ABSENT, PROJECTION"})
    void automaticRouteFollowsTheVerdict(Grade grade, Route route) {
        ForecastResult result = decayWithHoldout().run(ForecastPlan.DEFAULT, grade);
        assertEquals(route, result.routeUsed());
        assertTrue(result.summary().get(0).contains(route.word()) && result.summary().get(0).contains(grade.word()));
        assertEquals(route.word(), result.scores().get(0).method());
    }

    @Test
    void uncheckedModesAreDoubted() {
        ForecastResult result = decayWithHoldout().run(ForecastPlan.DEFAULT);
        assertEquals(Route.MODAL, result.routeUsed());
        assertTrue(codes(result).contains("modes-not-checked"));
    }

    @Test
    void modalRouteAgainstTheVerdictIsDoubted() {
        ForecastResult result = decayWithHoldout().run(plan(Route.MODAL, Origin.RECORDING_END, 5), Grade.DRIFTS);
        assertTrue(codes(result).contains("modes-not-trusted"));
    }

    @ParameterizedTest
    @CsvSource({"MODAL", "PROJECTION"})
    void runawayForecastIsCutAndSaysWhen(Route route) {
        Fixture.Signal growth = t -> Math.pow(10, t);
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(run(0, 3, 0, growth)), List.of(), List.of(),
                OptionalDouble.of(1));
        ForecastResult result = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{10}})
                .run(plan(route, Origin.RECORDING_END, 400));
        // Training spans 1 to 100: 1000 widths of 99 around 50.5 end between 1e4 and 1e5, that is after time 4.
        assertEquals(List.of(3.0, 4.0), result.forecast().stream().map(ForecastRow::time).toList());
        Doubt cut = find(result, "forecast-cut");
        assertTrue(cut.sentence().contains("run a at time 5.0"), cut.sentence());
    }

    @ParameterizedTest
    @CsvSource({"MODAL", "PROJECTION"})
    void runawayForecastsCountAtTheLimitInScoring(Route route) {
        Snapshots snapshots = decayWithHoldout().operator().snapshots();
        ForecastResult result = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{1e200}})
                .run(plan(route, Origin.RECORDING_END, 5));
        double width = 8 * (1 - Math.pow(0.9, 29));
        for (ScoreRow row : result.scores().subList(0, 2)) {
            // Every forecast is beyond 1000 widths and counts there; the observed decay adds less than one width.
            assertEquals(1000 * width, row.rmse(), width, row.method());
        }
        assertTrue(find(result, "score-limited").sentence().contains(route.word()));
        assertTrue(result.forecast().isEmpty(), "the first step is already beyond any sense");
    }

    @Test
    void holdoutRunOfItsOwnIsForecastFromItsFirstState() {
        Fixture.Signal cosine = t -> Math.cos(0.3 * t);
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(run(0, 30, 0, cosine)), List.of(),
                List.of(Fixture.run("b", 100, 110, 0, 1, cosine)), OptionalDouble.of(1), new DelayEmbedding(2, 2),
                Preparation.identity(1));
        double d = 1 / (2 * Math.cos(0.3));
        double[][] map = {{Math.cos(0.3) + d * Math.cos(0.6), -d}, {Math.cos(0.3) - d * Math.cos(0.6), d}};
        ForecastResult result = Fixture.linear(snapshots, new Evolution.StepMap(1), map)
                .run(new ForecastPlan(Route.MODAL, Origin.BEFORE_HOLDOUT, OptionalDouble.empty(), 0.9, 0, List.of()));
        // The first state needs samples 100, 101 and 102; 103 to 109 are forecast.
        assertEquals(List.of(103.0, 109.0),
                List.of(result.forecast().get(0).time(), result.forecast().get(6).time()));
        assertEquals(7, result.forecast().size());
        assertEquals(cosine.at(109), result.forecast().get(6).value(), ROUNDING);
    }

    @Test
    void bandsAreInRecordedUnitsAndEndWhereCalibrationEnds() {
        // The map forgets everything, so the error is the sample itself: ±1 prepared, ±4 recorded.
        Fixture.Signal wave = t -> Math.cos(Math.PI * t);
        Preparation scaled = new Preparation(0, new double[] {7}, new double[1], new double[] {4});
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(run(0, 30, 0, wave)), List.of(run(29, 60, 1, wave)),
                List.of(), OptionalDouble.of(1), DelayEmbedding.NONE, scaled);
        ForecastResult result = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{1e-14}})
                .run(plan(Route.PROJECTION, Origin.RECORDING_END, 40));
        ForecastRow first = result.forecast().get(0);
        assertEquals(60, first.time(), "the calibration part is the end of the recording");
        assertEquals(3, first.low(), ROUNDING);
        assertEquals(7, first.value(), ROUNDING);
        assertEquals(11, first.high(), ROUNDING);
        assertTrue(Double.isNaN(result.forecast().get(39).low()), "no calibration origin sees 40 steps ahead");
        assertTrue(codes(result).contains("bands-end"));
    }

    @Test
    void unevenHoldoutIsScoredAgainstInterpolatedValues() {
        Fixture.Signal line = t -> 5 - t;
        Run training = unevenly(line, 0, 0.5, 1, 1.5, 1.7, 2);
        Run holdout = unevenly(line, 2, 2.3, 3, 3.2, 4.1, 5);
        Run tail = new Run("a", holdout.times(), holdout.values(), holdout.inputs(), 1);
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(training), List.of(), List.of(tail),
                OptionalDouble.empty());
        ForecastPlan plan = new ForecastPlan(Route.PROJECTION, Origin.BEFORE_HOLDOUT, OptionalDouble.of(1.5), 0.9, 0,
                List.of(0.5, 1.5));
        ForecastResult result = Fixture.linear(snapshots, new Evolution.Generator(1), new double[][] {{1e-14}}).run(plan);
        // Nothing moves, the truth falls by 0.5 a step: errors 0.5; then 0.5, 1, 1.5.
        assertEquals(0.5, result.scores().get(0).mae(), 1e-9);
        assertEquals(1, result.scores().get(1).mae(), 1e-9);
        assertEquals(List.of(2.5, 3.0, 3.5), result.forecast().stream().map(ForecastRow::time).toList());
    }

    private static Run unevenly(Fixture.Signal signal, double... times) {
        DMatrixRMaj values = new DMatrixRMaj(times.length, 1);
        for (int k = 0; k < times.length; k++) {
            values.data[k] = signal.at(times[k]);
        }
        return new Run("a", times, values);
    }

    @Test
    void leavingTheSampledRegionIsDoubtedWithChannelAndTime() {
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(run(0, 11, 0, t -> Math.exp(0.1 * t))),
                List.of(), List.of(), OptionalDouble.of(1));
        ForecastResult result = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{Math.exp(0.1)}})
                .run(plan(Route.MODAL, Origin.RECORDING_END, 3));
        assertTrue(Math.exp(1.1) > Math.E + 0.1 * (Math.E - 1), "the first forecast lies beyond the margin");
        Doubt left = find(result, "forecast-extrapolates");
        assertTrue(left.sentence().contains("run a, c0 [m] at time 11.0"), left.sentence());
        ForecastResult inside = decayWithHoldout().run(plan(Route.MODAL, Origin.RECORDING_END, 3));
        assertFalse(codes(inside).contains("forecast-extrapolates"));
    }

    @Test
    void unevenTimesAreForecastAtTheMedianTrainingStep() {
        Run run = unevenly(t -> Math.exp(-t), 0, 0.5, 0.9, 1.5, 2, 2.5, 3.2);
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(run), List.of(), List.of(), OptionalDouble.empty());
        ForecastResult result = Fixture.linear(snapshots, new Evolution.Generator(1), new double[][] {{-1}})
                .run(plan(Route.PROJECTION, Origin.RECORDING_END, 2));
        assertEquals(4, result.forecast().size());
        for (int k = 1; k <= 4; k++) {
            assertEquals(3.2 + 0.5 * k, result.forecast().get(k - 1).time(), ROUNDING);
            assertEquals(Math.exp(-3.2 - 0.5 * k), result.forecast().get(k - 1).value(), ROUNDING);
        }
        assertTrue(codes(result).contains("uneven-times"));
    }

    @Test
    void passengersMatchThePublishedBaselines() {
        // CHECKS C5.7: last 12 held out, m = 12. With the identity as step map both routes are persistence.
        double[] y = PassengerSeries.values();
        Fixture.Signal signal = t -> y[(int) Math.round(t)];
        Snapshots snapshots = Fixture.snapshots(List.of("thousand"), List.of(run(0, 132, 0, signal)), List.of(),
                List.of(run(131, 144, 1, signal)), OptionalDouble.of(1));
        ForecastPlan plan = new ForecastPlan(Route.PROJECTION, Origin.BEFORE_HOLDOUT, OptionalDouble.empty(), 0.9, 12,
                List.of(12.0));
        List<ScoreRow> scores = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{1}}).run(plan).scores();
        List<String> methods = scores.stream().map(ScoreRow::method).toList();
        assertEquals(List.of("projection", "modal", "persistence", "seasonal-naive", "drift", "mean"), methods);
        for (ScoreRow row : scores.subList(0, 3)) {
            assertEquals(102.9765345, row.rmse(), 1e-7, row.method() + ", digits published");
            assertEquals(76, row.mae(), ROUNDING, row.method());
        }
        ScoreRow seasonal = scores.get(3);
        assertEquals(50.70831621, seasonal.rmse(), 1e-8);
        assertEquals(47.83333333, seasonal.mae(), 1e-8);
        assertEquals(1.570881226, seasonal.mase(), 1e-9);
        assertEquals(92.66636343, scores.get(4).rmse(), 1e-8);
        assertEquals(226.2656715, scores.get(5).rmse(), 1e-7);
    }

    @Test
    void seasonIsGuessedFromTheStrongestOscillation() {
        double w = 2 * Math.PI / 12;
        Fixture.Signal cosine = t -> Math.cos(w * t);
        Fixture.Signal sine = t -> Math.sin(w * t);
        Snapshots snapshots = Fixture.snapshots(List.of("m", "m"), List.of(run(0, 60, 0, cosine, sine)), List.of(),
                List.of(run(59, 84, 1, cosine, sine)), OptionalDouble.of(1));
        double[][] rotation = {{Math.cos(w), -Math.sin(w)}, {Math.sin(w), Math.cos(w)}};
        Fixture fixture = Fixture.linear(snapshots, new Evolution.StepMap(1), rotation);
        List<ScoreRow> scores = fixture.run(ForecastPlan.DEFAULT).scores();
        List<ScoreRow> seasonal = scores.stream().filter(row -> row.method().equals("seasonal-naive")).toList();
        assertEquals(List.of(1.0, 6.0, 12.0, 24.0), seasonal.stream().map(ScoreRow::horizon).toList());
        // A period of 12 steps repeats exactly.
        assertTrue(seasonal.stream().allMatch(row -> row.rmse() < ROUNDING), seasonal.toString());
    }

    @Test
    void withoutOscillationThereIsNoSeason() {
        List<ScoreRow> scores = decayWithHoldout().run(ForecastPlan.DEFAULT).scores();
        assertTrue(scores.stream().noneMatch(row -> row.method().equals("seasonal-naive")));
    }

    @Test
    void horizonsBeyondTheHoldoutAreLeftOutAndDoubted() {
        ForecastPlan plan = new ForecastPlan(Route.MODAL, Origin.RECORDING_END, OptionalDouble.of(5), 0.9, 0,
                List.of(2.0, 90.0));
        ForecastResult result = decayWithHoldout().run(plan);
        assertTrue(result.scores().stream().allMatch(row -> row.horizon() == 2));
        assertTrue(codes(result).contains("horizon-beyond-holdout"));
    }

    @Test
    void betterBaselineIsNamed() {
        // The true multiplier is 0.9; an operator that claims 0.5 loses to persistence.
        Snapshots snapshots = decayWithHoldout().operator().snapshots();
        Fixture halving = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{0.5}});
        ForecastResult wrong = halving.run(ForecastPlan.DEFAULT);
        assertTrue(codes(wrong).contains("naive-is-better"));
        assertFalse(codes(decayWithHoldout().run(ForecastPlan.DEFAULT)).contains("naive-is-better"));
    }

    @Test
    void channelsOfDifferentUnitsArePooledInPreparedUnits() {
        // Errors of 1 prepared unit in both channels, scales 2 and 50: pooled error 1, not a mean of 2 and 50.
        Fixture.Signal wave = t -> Math.cos(Math.PI * t);
        Preparation scaled = new Preparation(0, new double[2], new double[2], new double[] {2, 50});
        for (List<String> units : List.of(List.of("m", "bar"), List.of("m", "m"))) {
            Snapshots snapshots = Fixture.snapshots(units, List.of(run(0, 30, 0, wave, wave)), List.of(),
                    List.of(run(29, 50, 1, wave, wave)), OptionalDouble.of(1), DelayEmbedding.NONE, scaled);
            double[][] nothing = {{1e-14, 0}, {0, 1e-14}};
            ForecastResult result = Fixture.linear(snapshots, new Evolution.StepMap(1), nothing)
                    .run(plan(Route.PROJECTION, Origin.RECORDING_END, 1));
            double pooled = units.contains("bar") ? 1 : Math.sqrt((2 * 2 + 50 * 50) / 2.0);
            assertEquals(pooled, result.scores().get(0).rmse(), ROUNDING);
            // The wave steps by 2 prepared units, whatever the scale: 1 / 2.
            assertEquals(0.5, result.scores().get(0).mase(), ROUNDING);
            String words = units.contains("bar") ? "prepared units" : "in m;";
            assertTrue(result.summary().stream().anyMatch(sentence -> sentence.contains(words)));
        }
    }

    @Test
    void reconstructionShowsEverySampleOnceAndExactlyWhereTheFunctionsSpanIt() {
        List<ReconstructionRow> rows = decayWithHoldout().run(ForecastPlan.DEFAULT).reconstruction();
        assertEquals(50, rows.size());
        for (int k = 0; k < 50; k++) {
            assertEquals(k, rows.get(k).time());
            assertEquals(rows.get(k).observed(), rows.get(k).reconstructed(), ROUNDING);
        }
    }

    @Test
    void sameInputGivesTheSameResult() {
        assertEquals(decayWithHoldout().run(ForecastPlan.DEFAULT), decayWithHoldout().run(ForecastPlan.DEFAULT));
    }

    @Test
    void horizonMustBePositive() {
        ForecastFault fault = assertThrows(ForecastFault.class, () -> plan(Route.AUTO, Origin.RECORDING_END, 0));
        assertTrue(fault.getMessage().contains("0.0"), fault.getMessage());
        assertThrows(ForecastFault.class, () -> plan(Route.AUTO, Origin.RECORDING_END, Double.NaN));
    }

    @Test
    void seasonMustBeShorterThanTraining() {
        ForecastPlan plan = new ForecastPlan(Route.AUTO, Origin.RECORDING_END, OptionalDouble.empty(), 0.9, 30, List.of());
        ForecastFault fault = assertThrows(ForecastFault.class, () -> decayWithHoldout().run(plan));
        assertTrue(fault.seen().contains("30"), fault.getMessage());
    }

    @Test
    void originBeforeHoldoutNeedsAHoldout() {
        Fixture fixture = decay(List.of(run(0, 30, 0, DECAY)), List.of(), List.of());
        assertThrows(ForecastFault.class, () -> fixture.run(plan(Route.AUTO, Origin.BEFORE_HOLDOUT, 5)));
        List<String> codes = codes(fixture.run(plan(Route.AUTO, Origin.RECORDING_END, 5)));
        assertTrue(codes.containsAll(List.of("no-holdout", "no-bands")));
    }

    @Test
    void someRunMustBeLongEnoughForAState() {
        Snapshots snapshots = Fixture.snapshots(List.of("m"), List.of(run(0, 4, 0, DECAY)), List.of(), List.of(),
                OptionalDouble.of(1), new DelayEmbedding(2, 4), Preparation.identity(1));
        Fixture fixture = Fixture.linear(snapshots, new Evolution.StepMap(1), new double[][] {{0.9, 0}, {1, 0}});
        ForecastPlan plan = plan(Route.PROJECTION, Origin.RECORDING_END, 1);
        ForecastFault fault = assertThrows(ForecastFault.class, () -> fixture.run(plan));
        assertTrue(fault.getMessage().contains("a (4 samples)"), fault.getMessage());
    }

    @Test
    void snapshotsOfAnotherStepAreRefused() {
        Fixture fixture = decayWithHoldout();
        Snapshots finer = Fixture.snapshots(List.of("m"), List.of(Fixture.run("a", 0, 30, 0, 0.5, DECAY)), List.of(),
                List.of(), OptionalDouble.of(0.5));
        ForecastFault fault = assertThrows(ForecastFault.class, () -> Forecaster.run(finer, fixture.operator(),
                fixture.spectrum(), Optional.empty(), ForecastPlan.DEFAULT, Progress.NONE));
        assertTrue(fault.seen().contains("0.5"), fault.getMessage());
    }
}
