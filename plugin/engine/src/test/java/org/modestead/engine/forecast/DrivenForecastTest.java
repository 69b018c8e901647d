package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.fixtures.Driven;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InputUse;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.SpectrumExtractor;

/** Forecasts of an oscillator under a known force, whose future is known exactly. */
class DrivenForecastTest {

    private static List<Run> training(boolean straight) {
        return List.of(Driven.run("a", 160, 1, 0, Driven.random(1), straight), Driven.run("b", 160, 0, 1, Driven.random(2), straight));
    }

    private static void assertExact(Snapshots snapshots, FittedOperator operator, Run unseen) {
        int memory = snapshots.delay().reach() + 1;
        int steps = unseen.samples() - memory;
        DMatrixRMaj history = Matrices.block(unseen.values(), 0, memory, 0, unseen.values().numCols);
        DMatrixRMaj expected = Matrices.block(unseen.values(), memory, unseen.samples(), 0, unseen.values().numCols);
        for (ForecastRoute route : List.of(new ModalRoute(operator, SpectrumExtractor.extract(operator, Progress.NONE), Driven.STEP),
                new ProjectionRoute(operator, Driven.STEP))) {
            // rounding of the fit, carried over a hundred steps
            assertArrayEquals(expected.data, route.forecast(history, unseen.inputs(), steps).data, 1e-7, route.id());
        }
    }

    @Test
    void bothRoutesFollowAForceThatWasNeverSeen() {
        Run unseen = Driven.run("u", 110, -1, 0.5, Driven.random(77), false);
        Snapshots whole = Driven.snapshots(1, training(false), List.of());
        assertExact(whole, Motions.fit(whole, new LinearEstimator(), 2), unseen);
        Snapshots delays = Driven.snapshots(4, training(false).stream().map(Driven::position).toList(), List.of());
        assertExact(delays, Motions.fit(delays, new LinearEstimator(), 2), Driven.position(unseen));
        assertExact(whole, Motions.fit(whole, new DictionaryEstimator(Dictionary.monomials(2)), 5), unseen);
    }

    @Test
    void bothRoutesFollowAForceThatRunsStraight() {
        Run unseen = Driven.run("u", 110, -1, 0.5, Driven.random(77), true);
        Snapshots whole = Driven.snapshots(1, training(true), List.of());
        Estimator straight = new LinearEstimator(1, NoiseCorrection.NONE, InputUse.STRAIGHT);
        assertExact(whole, Motions.fit(whole, straight, 2), unseen);
    }

    @Test
    void scoresAndReconstructionTakeTheRecordedInputs() {
        Snapshots snapshots = Driven.snapshots(4, training(false).stream().map(Driven::position).toList(),
                List.of(Driven.position(Driven.run("h1", 120, 1, 1, Driven.random(5), false)),
                        Driven.position(Driven.run("h2", 120, -1, 1, Driven.random(6), false))));
        FittedOperator operator = Motions.fit(snapshots, new LinearEstimator(), 2);
        ForecastResult result = Forecaster.run(snapshots, operator, SpectrumExtractor.extract(operator, Progress.NONE), Optional.empty(),
                ForecastPlan.DEFAULT, Progress.NONE);
        result.scores().stream().filter(row -> row.method().equals("modal") || row.method().equals("projection"))
                .forEach(row -> assertEquals(0, row.rmse(), 1e-7, row.toString()));
        assertTrue(result.scores().stream().filter(row -> row.method().equals("persistence")).allMatch(row -> row.rmse() > 0.01));
        result.reconstruction().forEach(row -> assertEquals(row.observed(), row.reconstructed(), 1e-8));
        assertTrue(result.doubts().stream().anyMatch(doubt -> doubt.code().equals("inputs-assumed")));
    }

    @Test
    void beyondTheRecordingInputsAreHeld() {
        Series series = new Series("a", new double[] {0, 1, 2}, new DMatrixRMaj(3, 1), Motions.column(4, 5, 6), 0);
        assertArrayEquals(new double[] {5, 6, 6, 6}, series.inputs(2, 2, 2).data);
        assertArrayEquals(new double[] {4, 5, 6}, series.inputs(1, 2, 1).data);
    }

    @Test
    void backtestsWithRefitsKnowTheInputsOfTheRunTheyGoOnFrom() {
        List<Run> training = training(false).stream().map(Driven::position).toList();
        Run whole = Driven.position(Driven.run("a", 260, 1, 0, Driven.random(1), false));
        Run tail = new Run("a", Arrays.copyOfRange(whole.times(), 156, 260), Matrices.block(whole.values(), 156, 260, 0, 1),
                Matrices.block(whole.inputs(), 156, 260, 0, 1), 4);
        Snapshots snapshots = Driven.snapshots(4, training, List.of(tail));
        FittedOperator operator = Motions.fit(snapshots, new LinearEstimator(), 2);
        BacktestResult result = RollingOrigin.run(snapshots, operator, Optional.empty(), new BacktestPlan(ForecastPlan.DEFAULT, 3,
                Refit.EVERY_ORIGIN), Progress.NONE);
        result.scores().stream().filter(row -> row.method().equals("modal") || row.method().equals("projection"))
                .forEach(row -> assertEquals(0, row.rmse(), 1e-7, row.toString()));
    }
}
