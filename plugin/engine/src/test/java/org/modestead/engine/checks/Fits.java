package org.modestead.engine.checks;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.TreeMap;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;
import org.modestead.engine.wellposed.ExactResidual;

/** Short ways from numbers to snapshots, kernels and fits for the tests of published and derived values. */
final class Fits {

    private Fits() {}

    /** Where a motion is at a time. */
    interface Motion {
        double[] at(double time);
    }

    /** Samples of a motion at 0, step, 2 step, ... */
    static Run run(String id, int samples, double step, Motion motion) {
        double[] times = new double[samples];
        double[][] rows = new double[samples][];
        for (int k = 0; k < samples; k++) {
            times[k] = k * step;
            rows[k] = motion.at(times[k]);
        }
        return new Run(id, times, new DMatrixRMaj(rows));
    }

    /** One run of two samples for every pair x, y of rows. */
    static Snapshots pairs(double step, double[][] x, double[][] y) {
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < x.length; i++) {
            runs.add(new Run("pair" + i, new double[] {0, step}, new DMatrixRMaj(new double[][] {x[i], y[i]})));
        }
        return snapshots(step, 1, runs);
    }

    /** Runs that all train, as they are. */
    static Snapshots snapshots(double step, int depth, List<Run> runs) {
        return snapshots(step, depth, runs, List.of());
    }

    static Snapshots snapshots(double step, int depth, List<Run> runs, List<Run> holdout) {
        List<Channel> channels = new ArrayList<>();
        for (int k = 0; k < runs.get(0).values().numCols; k++) {
            channels.add(new Channel("c" + k, ""));
        }
        return new Snapshots(channels, List.of(), new TimeAxis(TimeAxis.Kind.NUMBER, "s"), runs, List.of(), holdout,
                OptionalDouble.of(step), new DelayEmbedding(depth, 1), Preparation.identity(channels.size()), List.of(),
                        List.of());
    }

    static Kernel kernel(String family, Object... namesAndValues) {
        Map<String, Double> parameters = new TreeMap<>();
        for (int i = 0; i < namesAndValues.length; i += 2) {
            parameters.put((String) namesAndValues[i], ((Number) namesAndValues[i + 1]).doubleValue());
        }
        return KernelFamilies.create(new KernelSpec(family, parameters));
    }

    /** exp(x·y), whose space CHECKS calls F. */
    static Kernel exponential() {
        return kernel("exponential", "rate", 1);
    }

    static FittedOperator fit(Snapshots snapshots, Estimator estimator, int rank) {
        return OperatorFitter.fit(snapshots, estimator, new RankRule.Fixed(rank), 0, Progress.NONE);
    }

    static Spectrum spectrum(Snapshots snapshots, Estimator estimator, int rank) {
        return SpectrumExtractor.extract(fit(snapshots, estimator, rank), Progress.NONE);
    }

    /** The mode whose rate is nearest to a wanted one. */
    static Mode nearest(Spectrum spectrum, double re, double im) {
        return spectrum.modes().stream()
                .min(Comparator.comparingDouble(mode -> Math.hypot(mode.rate().re() - re, mode.rate().im() - im)))
                        .orElseThrow();
    }

    /** A column of numbers, one state of one component a row. */
    static DMatrixRMaj column(double... values) {
        return DMatrixRMaj.wrap(values.length, 1, values.clone());
    }

    /** The index of the eigenvalue nearest to a real one. */
    static int nearest(List<Complex> values, double target) {
        Complex at = new Complex(target, 0);
        return IntStream.range(0, values.size()).boxed().min(Comparator.comparingDouble(j -> values.get(j).minus(at).abs()))
                .orElseThrow();
    }

    /** The residual of one eigenpair over the training data. */
    static double residual(ModalExpansion expansion, int j) {
        return ExactResidual.of(expansion.compression().action(), expansion.compression().second(), expansion.vectors(), j,
                expansion.eigenvalues().get(j));
    }
}
