package org.modestead.engine.refine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.Run;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeIntervals;

class RefinedModesTest {

    private static List<Run> runs(double noise) {
        Random random = new Random(4);
        List<Run> runs = new ArrayList<>();
        for (int k = 0; k < 3; k++) {
            double size = 1 + k;
            double[] times = Motions.grid(60, 0.1);
            for (int i = 0; i < times.length; i++) {
                times[i] += 100 * k;
            }
            double start = times[0];
            runs.add(Motions.run("r" + k, times, t -> new double[] {size * Math.exp(-0.2 * (t - start)) * Math.cos(3 * (t - start) + size),
                2 * Math.exp(-0.5 * (t - start))}, noise, random));
        }
        return runs;
    }

    private static RefinedModes refine(List<Run> runs) {
        RateModel start = new RateModel(List.of(new RateTerm.Pair(-0.1, 2.9, true, true), new RateTerm.Real(-0.7, true)));
        return RefinedModes.of(start, runs, true, 0.95, Progress.NONE);
    }

    @Test
    void sizesAreThoseOfTheParts() {
        List<Mode> modes = refine(runs(0)).modes();
        assertEquals(List.of(1, 2), modes.stream().map(Mode::number).toList());
        Mode ringing = modes.get(0);
        assertEquals(3, ringing.rate().im(), 1e-9);
        // peaks 1, 2, 3 of one channel; 2 of the other in every run
        assertEquals(Math.sqrt((1 + 4 + 9) / 3.0), ringing.amplitude(), 1e-8);
        assertEquals(2, modes.get(1).amplitude(), 1e-8);
        assertEquals(1, modes.stream().mapToDouble(Mode::energyShare).sum(), 1e-12);
        double direct = 0;
        double other = 0;
        for (double size = 1; size <= 3; size++) {
            for (int k = 0; k < 60; k++) {
                direct += Math.pow(size * Math.exp(-0.02 * k) * Math.cos(0.3 * k + size), 2);
                other += Math.pow(2 * Math.exp(-0.05 * k), 2);
            }
        }
        assertEquals(direct / (direct + other), ringing.energyShare(), 1e-9);
    }

    @Test
    void aRunOfWeightTwoIsOneThatIsThereTwiceAndZeroIsNotThere() {
        List<Run> runs = runs(0.05);
        Run again = new Run("again", runs.get(1).times(), runs.get(1).values());
        RefinedModes twice = refine(List.of(runs.get(0), runs.get(1), again, runs.get(2)));
        RefinedModes weighted = refine(List.of(runs.get(0), runs.get(1).weighted(2), runs.get(2)));
        // both searches end within 1e-6 standard errors of the same minimum
        double tolerance = 1e-5 * weighted.rates().angularErrors()[0];
        assertEquals(0, twice.modes().get(0).rate().minus(weighted.modes().get(0).rate()).abs(), tolerance);
        assertEquals(twice.rates().residualSum(), weighted.rates().residualSum(), 1e-8);
        RefinedModes without = refine(runs.subList(0, 2));
        RefinedModes zero = refine(List.of(runs.get(0), runs.get(1), runs.get(2).weighted(0)));
        assertEquals(without.modes().get(0).rate(), zero.modes().get(0).rate());
        assertEquals(without.modes().get(0).amplitude(), zero.modes().get(0).amplitude());
    }

    @Test
    void weightsDoNotChangeTheSizesOfAnExactFit() {
        List<Run> runs = runs(0);
        RefinedModes weighted = refine(List.of(runs.get(0).weighted(5), runs.get(1), runs.get(2).weighted(0.1)));
        assertEquals(Math.sqrt((1 + 4 + 9) / 3.0), weighted.modes().get(0).amplitude(), 1e-8);
    }

    @Test
    void theIntervalOfTheDampingRatioFollowsFromThoseOfTheRate() {
        // growth and angular frequency of a ringing signal are nearly uncorrelated, and ζ ≈ -σ/ω
        RefinedModes refined = refine(runs(0.05));
        Mode ringing = refined.modes().get(0);
        ModeIntervals found = ringing.intervals().orElseThrow();
        double growth = found.growth().high() - found.growth().low();
        double damping = found.dampingRatio().high() - found.dampingRatio().low();
        assertEquals(growth / 3, damping, 0.03 * damping);
        assertTrue(found.turning().holds(3) && found.growth().holds(-0.2));
    }

    @Test
    void covariancesOfGrowthAndFrequencyAreThoseOfTheNormalEquations() {
        // half a swing: growth and frequency are correlated there
        Run run = Motions.run("a", Motions.grid(40, 0.03), t -> new double[] {Math.exp(-t) * Math.sin(2 * t)}, 0.001, new Random(17));
        RateModel start = new RateModel(List.of(new RateTerm.Real(-0.5, true), new RateTerm.Pair(-0.9, 2.2, true, true)));
        RefinedRates rates = RateRefinement.refine(start, List.of(run), Progress.NONE);
        DMatrixRMaj jacobian = ProjectedFit.of(rates.model(), List.of(run)).jacobian(false);
        DMatrixRMaj inverse = Matrices.transposeProduct(jacobian, jacobian);
        CommonOps_DDRM.invert(inverse);
        double variance = Math.pow(rates.residualDeviation(), 2);
        // the normal equations square the condition
        assertEquals(1, variance * inverse.get(1, 2) / rates.crossCovariances()[1], 1e-6);
        assertEquals(0, rates.crossCovariances()[0], "a real term has no frequency");
        assertEquals(1, variance * inverse.get(1, 1) / Math.pow(rates.growthErrors()[1], 2), 1e-6);
    }
}
