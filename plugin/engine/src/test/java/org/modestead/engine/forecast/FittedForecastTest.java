package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

/** Forecasts by operators that were really fitted, against exact solutions and recorded futures. */
class FittedForecastTest {

    private static FittedOperator fit(Snapshots snapshots, Estimator estimator, int rank) {
        return OperatorFitter.fit(snapshots, estimator, new RankRule.Fixed(rank), 0, Progress.NONE);
    }

    private static DMatrixRMaj start(double value) {
        return new DMatrixRMaj(new double[][] {{value}});
    }

    @Test
    void delayFitContinuesDecayAndOscillation() {
        // Three exponentials: with delay depth 6 and rank 3 the fit is exact (CHECKS C7.7).
        Fixture.Signal signal = t -> 2 * Math.exp(-0.02 * t) + Math.exp(-0.01 * t) * Math.cos(0.5 * t);
        List<Run> training = List.of(Fixture.run("a", 0, 120, 0, 1, signal));
        Snapshots snapshots = Fixture.snapshots(List.of("m"), training, List.of(), List.of(), OptionalDouble.of(1),
                new DelayEmbedding(6, 1), Preparation.identity(1));
        ForecastRoute route = new ProjectionRoute(fit(snapshots, new LinearEstimator(), 3), 1);
        DMatrixRMaj out = route.forecast(snapshots.training().get(0).values(), 60);
        for (int k = 1; k <= 60; k++) {
            // Singular values of the delay matrix span about 1e2, so some 1e-13 a step; 60 steps stay below 1e-9.
            assertEquals(signal.at(119 + k), out.get(k - 1, 0), 1e-9);
        }
    }

    @Test
    void kernelStepMapForecastsALogisticFlowWhoseModesAreNotInItsSpace() {
        // CHECKS C2.9: from 0.1, x(2) = 0.450853060379284. CHECKS C3.12: no eigenfunction in the Gaussian kernel's space.
        List<Run> training = new ArrayList<>();
        for (int r = 1; r <= 9; r++) {
            double x0 = 0.02 * r * r;
            if (x0 < 1) {
                training.add(Fixture.run("r" + r, 0, 31, 0, 0.1, t -> x0 * Math.exp(t) / (1 + x0 * (Math.exp(t) - 1))));
            }
        }
        Snapshots snapshots = Fixture.snapshots(List.of(""), training, List.of(), List.of(), OptionalDouble.of(0.1));
        KernelSpec gaussian = new KernelSpec("gaussian", Map.of("scale", 0.7));
        FittedOperator operator = fit(snapshots, new KernelStepEstimator(KernelFamilies.create(gaussian), 100), 8);
        DMatrixRMaj out = new ProjectionRoute(operator, 0.1).forecast(start(0.1), 20);
        // One step errs by about 1e-6 in this space at rank 8; the flow stretches errors up to e² in 20 steps.
        assertEquals(0.450853060379284, out.get(19, 0), 1e-4);
    }

    @Test
    void generatorFromOccupationFunctionsForecastsAtAnyStep() {
        // DESIGN section 4: x' = x, 40 runs from [-1, 1] of length 0.4, kernel exp(xy).
        List<Run> training = new ArrayList<>();
        for (int r = 0; r < 40; r++) {
            double x0 = -1 + r / 19.5;
            training.add(Fixture.run("r" + r, 0, 41, 0, 0.01, t -> x0 * Math.exp(t)));
        }
        Snapshots snapshots = Fixture.snapshots(List.of(""), training, List.of(), List.of(), OptionalDouble.of(0.01));
        KernelSpec exponential = new KernelSpec("exponential", Map.of("rate", 1.0));
        Estimator estimator = new OccupationEstimator(KernelFamilies.create(exponential), new SegmentPlan(0, 0), 1);
        FittedOperator operator = fit(snapshots, estimator, 8);
        for (double step : new double[] {0.01, 0.1, 0.25}) {
            DMatrixRMaj out = new ProjectionRoute(operator, step).forecast(start(0.5), 2);
            // At rank 8 the odd functions reach x up to x^7: what is left of x is about 2e-8, of the forecast 2e-7.
            assertEquals(0.5 * Math.exp(2 * step), out.get(1, 0), 1e-6, "step " + step);
        }
    }

    @Test
    void modesOfADelayFitForecastAsTheProjectionDoes() {
        Fixture.Signal signal = t -> 2 * Math.exp(-0.02 * t) + Math.exp(-0.01 * t) * Math.cos(0.5 * t);
        List<Run> training = List.of(Fixture.run("a", 0, 120, 0, 1, signal));
        Snapshots snapshots = Fixture.snapshots(List.of("m"), training, List.of(), List.of(), OptionalDouble.of(1),
                new DelayEmbedding(6, 1), Preparation.identity(1));
        FittedOperator operator = fit(snapshots, new LinearEstimator(), 3);
        ForecastRoute modal = new ModalRoute(operator, SpectrumExtractor.extract(operator, Progress.NONE), 1);
        DMatrixRMaj out = modal.forecast(training.get(0).values(), 60);
        for (int k = 1; k <= 60; k++) {
            // As for the projection; the eigenvectors of three well separated exponentials add little.
            assertEquals(signal.at(119 + k), out.get(k - 1, 0), 1e-9);
        }
    }

    @Test
    void logarithmOfPassengersIsForecastBetterThanLastYear() {
        // CHECKS C5.7: delay depth 48, rank 13 on the logarithm; the last 12 months are held out.
        double[] y = PassengerSeries.values();
        Fixture.Signal log = t -> Math.log(y[(int) Math.round(t)]);
        List<Run> training = List.of(Fixture.run("a", 0, 132, 0, 1, log));
        List<Run> holdout = List.of(Fixture.run("a", 131, 144, 1, 1, log));
        Snapshots snapshots = Fixture.snapshots(List.of(""), training, List.of(), holdout, OptionalDouble.of(1),
                new DelayEmbedding(48, 1), Preparation.identity(1));
        FittedOperator operator = fit(snapshots, new LinearEstimator(), 13);
        Spectrum spectrum = SpectrumExtractor.extract(operator, Progress.NONE);
        ForecastPlan plan = new ForecastPlan(Route.AUTO, Origin.BEFORE_HOLDOUT, OptionalDouble.empty(), 0.9, 0,
                List.of(12.0));
        ForecastResult result = Forecaster.run(snapshots, operator, spectrum, Optional.empty(), plan, Progress.NONE);
        List<String> methods = result.scores().stream().map(ScoreRow::method).toList();
        assertEquals(List.of("modal", "projection", "persistence", "seasonal-naive", "drift", "mean"), methods,
                "the season is guessed");
        double seasonal = result.scores().get(3).rmse();
        assertEquals(0.111560, seasonal, 1e-6, "RMSE of log(y) against log(y one year before), computed from the series");
        assertTrue(result.scores().get(0).rmse() < seasonal, result.scores().toString());
        assertTrue(result.scores().get(1).rmse() < seasonal, result.scores().toString());
    }
}
