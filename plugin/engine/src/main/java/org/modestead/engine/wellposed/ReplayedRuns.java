package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.SampleNoise;
import org.modestead.engine.recording.Smoothing;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/**
 * The recording as it would be if the modes that carry it existed: every run is the sum of these modes, from where the run itself puts them,
 *
 * <pre>    y(t) = Σ_j ξ_j a_j e^(λ_j (t - t_0)),    a_j = Σ_i conj(e^(λ_j τ_i)) φ_j(x_i) / Σ_i |e^(λ_j τ_i)|²,  τ_i = t_i - t_0</pre>
 *
 * with φ_j, λ_j and the joint weights ξ_j as fitted; a_j fits the eigenfunction's values along the run by least squares.
 *
 * @param training per training run
 * @param holdout per run held out
 * @param like the snapshots they replace
 */
record ReplayedRuns(List<Run> training, List<Run> holdout, Snapshots like) {

    /**
     * @param operator fitted
     * @param spectrum extracted from it
     * @param carrying modes that carry the signal, and the constant
     */
    static ReplayedRuns of(FittedOperator operator, Spectrum spectrum, List<Mode> carrying) {
        Snapshots like = operator.snapshots();
        return new ReplayedRuns(like.training().stream().map(run -> replayed(run, operator, spectrum, carrying)).toList(),
                like.holdout().stream().map(run -> replayed(run, operator, spectrum, carrying)).toList(), like);
    }

    /** Returns whether all samples are numbers. */
    boolean finite() {
        List<Run> all = new ArrayList<>(training);
        all.addAll(holdout);
        return all.stream().allMatch(run -> java.util.Arrays.stream(run.values().data).allMatch(Double::isFinite));
    }

    /** Returns snapshots without noise, and so without smoothing. */
    Snapshots clean() {
        return like.replaced(training, holdout, Smoothing.none(like.channels().size()));
    }

    /** Returns snapshots with noise of a level, smoothed as the recording was. */
    Snapshots noisy(SampleNoise noise, Random random) {
        return like.replaced(noisy(training, noise, random), noisy(holdout, noise, random), like.smoothing());
    }

    private static List<Run> noisy(List<Run> runs, SampleNoise noise, Random random) {
        List<DMatrixRMaj> doses = noise.doses(runs, random);
        return IntStream.range(0, runs.size()).mapToObj(i -> SampleNoise.disturbed(runs.get(i), doses.get(i), 1)).toList();
    }

    private static Run replayed(Run run, FittedOperator operator, Spectrum spectrum, List<Mode> carrying) {
        Snapshots snapshots = operator.snapshots();
        if (run.samples() <= snapshots.delay().reach()) {
            return run;
        }
        StateRun states = snapshots.embed(run);
        ZMatrixRMaj values = ComplexMatrices.product(operator.chosen()
                .evaluate(operator.chosen().arguments(states)), spectrum.vectors());
        DMatrixRMaj out = new DMatrixRMaj(run.samples(), snapshots.channels().size());
        for (Mode mode : carrying) {
            for (int j : mode.indices()) {
                add(run, states.times(), values, spectrum, j, out);
            }
        }
        return run.withValues(out);
    }

    private static void add(Run run, double[] times, ZMatrixRMaj values, Spectrum spectrum, int j, DMatrixRMaj out) {
        Complex rate = spectrum.rates().get(j);
        if (!Double.isFinite(rate.re())) {
            return;
        }
        Complex sum = Complex.ZERO;
        double size = 0;
        for (int i = 0; i < times.length; i++) {
            Complex grown = rate.times(times[i] - times[0]).exp();
            sum = sum.plus(grown.conj().times(ComplexMatrices.entry(values, i, j)));
            size += grown.abs() * grown.abs();
        }
        for (int i = 0; i < run.samples(); i++) {
            Complex part = rate.times(run.times()[i] - times[0]).exp().times(sum.times(1 / size));
            for (int c = 0; c < out.numCols; c++) {
                out.add(i, c, part.times(ComplexMatrices.entry(spectrum.joint(), j, c)).re());
            }
        }
    }
}
