package org.modestead.engine.wellposed;

import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.StateRun;
import org.modestead.engine.spectrum.Cluster;
import org.modestead.engine.spectrum.ConstantFunction;
import org.modestead.engine.spectrum.Contributions;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.TrainingSample;

/**
 * The compression at one rank of the ladder, with the sizes of everything on it.
 *
 * @param expansion eigenpairs and weights
 * @param parts one a mode
 * @param carryingNorm geometric mean of the norm ratios of all modes but the constant, weighted by squared contribution
 * @param captured share of the signal's variance on the judging runs that the projection holds, at most 1
 */
record Rung(ModalExpansion expansion, List<Part> parts, double carryingNorm, double captured) {

    /** Size of an eigenfunction on the judging runs, relative to the training runs, below which they do not excite it. */
    static final double EXCITED = 0.05;

    /**
     * One mode of a rung.
     *
     * @param group columns of the expansion
     * @param rate λ of the first of them
     * @param weight root mean square over the training states of its contribution to the newest sample
     * @param weightNorm norm of its joint weights on the newest sample
     * @param normRatio ‖φ‖_H / ‖φ‖_L2(data)
     * @param residual see {@link Residuals}; NaN where the judging runs do not excite the mode: what is left of it
     *     there is noise, and noise is evidence neither for nor against it
     * @param constant whether it is the constant function, see {@link ConstantFunction}
     */
    record Part(List<Integer> group, Complex rate, double weight, double weightNorm, double normRatio, double residual,
            boolean constant) {}

    int rank() {
        return expansion.rank();
    }

    static Rung of(OrthonormalCompression compression, DMatrixRMaj sampled, TrainingSample sample, JudgingRuns judging) {
        ModalExpansion expansion = ModalExpansion.of(compression);
        DMatrixRMaj functions = Matrices.block(sampled, 0, sampled.numRows, 0, compression.rank());
        ZMatrixRMaj values = ComplexMatrices.product(functions, expansion.vectors());
        List<ZMatrixRMaj> unseen = judging.eigenfunctions(expansion);
        double[] residuals = Residuals.of(expansion, judging, unseen);
        double[] judged = JudgingRuns.sizes(unseen);
        List<Part> parts = Cluster.groups(expansion, Cluster.numbers(expansion)).stream()
                .map(group -> part(expansion, values, group, sample, residuals, judged)).toList();
        return new Rung(expansion, parts, carryingNorm(parts), captured(compression, sample.channels(), judging));
    }

    private static Part part(ModalExpansion expansion, ZMatrixRMaj values, List<Integer> group, TrainingSample sample, double[] residuals,
            double[] judged) {
        int j = group.get(0);
        int channels = sample.channels();
        double size = 0;
        for (int i = 0; i < values.numRows; i++) {
            size = Math.hypot(size, ComplexMatrices.entry(values, i, j).abs());
        }
        double norm = 0;
        for (int k = 0; k < channels; k++) {
            norm = Math.hypot(norm, ComplexMatrices.entry(expansion.joint(), j, k).abs());
        }
        double weight = Math.sqrt(Contributions.meanSquare(Contributions.of(values, expansion.joint(), group, 0, channels)));
        double trained = size / Math.sqrt(values.numRows);
        return new Part(group, expansion.rates().get(j), weight, norm, 1 / trained, judged[j] < EXCITED * trained ? Double.NaN : residuals[j],
                ConstantFunction.is(values, j, expansion.rates().get(j), sample.longest()));
    }

    /** Returns the mode, not the constant, that adds most to the signal on this rung; empty when there is none but the constant. */
    Optional<Part> strongest() {
        return parts.stream().filter(part -> !part.constant()).max(Comparator.comparingDouble(Part::weight));
    }

    private static double carryingNorm(List<Part> parts) {
        double logarithms = 0;
        double total = 0;
        for (Part part : parts) {
            if (!part.constant()) {
                double share = part.weight() * part.weight();
                logarithms += share * Math.log(part.normRatio());
                total += share;
            }
        }
        return total == 0 ? Double.NaN : Math.exp(logarithms / total);
    }

    /** {@code 1 - ‖g - Pg‖²/‖g - mean g‖²} over the newest samples of the judging runs, less what inputs explain. */
    private static double captured(OrthonormalCompression compression, int channels, JudgingRuns judging) {
        DMatrixRMaj weights = Matrices.block(compression.observable(), 0, compression.rank(), 0, channels);
        double missed = 0;
        double[] sum = new double[channels];
        double squares = 0;
        int count = 0;
        for (int i = 0; i < judging.runs().size(); i++) {
            StateRun run = judging.runs().get(i);
            DMatrixRMaj projected = Matrices.product(Matrices.block(judging.functions().get(i), 0, run.count(), 0, compression.rank()), weights);
            DMatrixRMaj signal = compression.signal(run);
            for (int row = 0; row < run.count(); row++) {
                for (int k = 0; k < channels; k++) {
                    double value = signal.get(row, k);
                    missed += Math.pow(value - projected.get(row, k), 2);
                    sum[k] += value;
                    squares += value * value;
                }
            }
            count += run.count();
        }
        double spread = squares;
        for (double s : sum) {
            spread -= s * s / count;
        }
        return spread <= 0 ? 1 : 1 - missed / spread;
    }
}
