package org.modestead.engine.wellposed;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
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

    /** Share of the summed squared weights from which another function counts for the overlap. */
    private static final double NOTABLE = 0.05;

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
     * @param rawResidual the same before the share of the noise was taken off
     * @param gap relative difference of joint and solo weights, see {@link Eigenspace}
     * @param overlap largest with its own conjugate and with the functions of other rates that carry the signal
     * @param constant whether it is the constant function, see {@link ConstantFunction}
     */
    record Part(List<Integer> group, Complex rate, double weight, double weightNorm, double normRatio, double residual,
            double rawResidual, double gap, double overlap, boolean constant) {}

    int rank() {
        return expansion.rank();
    }

    static Rung of(OrthonormalCompression compression, DMatrixRMaj sampled, TrainingSample sample, JudgingRuns judging) {
        ModalExpansion expansion = ModalExpansion.of(compression);
        List<Tracks> tracks = judging.tracks(expansion);
        List<Part> parts = parts(expansion, sampled, sample, Residuals.of(expansion, judging, tracks), tracks.get(0).sizes());
        return new Rung(expansion, parts, carryingNorm(parts), captured(compression, sample.channels(), judging));
    }

    /** The same without judging: no residuals, no captured share. */
    static Rung fitted(OrthonormalCompression compression, DMatrixRMaj sampled, TrainingSample sample) {
        ModalExpansion expansion = ModalExpansion.of(compression);
        double[] unjudged = new double[expansion.rank()];
        List<Part> parts = parts(expansion, sampled, sample,
                java.util.Collections.nCopies(expansion.rank(), Residuals.Pair.UNKNOWN), unjudged);
        return new Rung(expansion, parts, carryingNorm(parts), Double.NaN);
    }

    private static List<Part> parts(ModalExpansion expansion, DMatrixRMaj sampled, TrainingSample sample, List<Residuals.Pair> residuals,
            double[] judged) {
        DMatrixRMaj functions = Matrices.block(sampled, 0, sampled.numRows, 0, expansion.rank());
        ZMatrixRMaj values = ComplexMatrices.product(functions, expansion.vectors());
        List<List<Integer>> groups = Cluster.groups(expansion, Cluster.numbers(expansion));
        List<Eigenspace> spaces = IntStream.range(0, groups.size())
                .mapToObj(p -> Eigenspace.of(expansion, groups, p, sample.longest())).toList();
        ZMatrixRMaj carried = ComplexMatrices.product(functions, carriers(spaces, expansion.rank()));
        double[] weights = spaces.stream().mapToDouble(space -> Math.sqrt(Contributions.meanSquare(
                Contributions.of(values, expansion.joint(), space.all(), 0, sample.channels())))).toArray();
        return IntStream.range(0, groups.size()).mapToObj(p -> {
            int j = groups.get(p).get(0);
            double trained = SquaredSize.of(values, j).rootMean(values.numRows);
            Residuals.Pair residual = judged[j] < EXCITED * trained ? Residuals.Pair.UNKNOWN : residuals.get(j);
            return new Part(groups.get(p), expansion.rates().get(j), weights[p], weightNorm(expansion, j, sample.channels()),
                    1 / SquaredSize.of(carried, p).rootMean(carried.numRows), residual.clear(), residual.raw(), spaces.get(p).gap(),
                    overlap(spaces, weights, p), ConstantFunction.is(values, j, expansion.rates().get(j), sample.longest()));
        }).toList();
    }

    private static double weightNorm(ModalExpansion expansion, int j, int channels) {
        double norm = 0;
        for (int k = 0; k < channels; k++) {
            norm = Math.hypot(norm, ComplexMatrices.entry(expansion.joint(), j, k).abs());
        }
        return norm;
    }

    /** The coefficients of the carriers, one a column, so that their values at all states are one product of matrices. */
    private static ZMatrixRMaj carriers(List<Eigenspace> spaces, int rank) {
        ZMatrixRMaj out = new ZMatrixRMaj(rank, spaces.size());
        for (int p = 0; p < spaces.size(); p++) {
            Complex[] carrier = spaces.get(p).carrier();
            for (int k = 0; k < rank; k++) {
                out.set(k, p, carrier[k].re(), carrier[k].im());
            }
        }
        return out;
    }

    /** Largest overlap of the carrier with its own conjugate and with carriers of other rates that add a notable part to the signal. */
    private static double overlap(List<Eigenspace> spaces, double[] weights, int p) {
        double total = Arrays.stream(weights).map(w -> w * w).sum();
        Complex[] own = spaces.get(p).carrier();
        boolean oscillates = spaces.get(p).all().size() > spaces.get(p).columns().size();
        double largest = oscillates ? Eigenspace.inner(conjugate(own), own).abs() : 0;
        for (int q = 0; q < spaces.size(); q++) {
            boolean other = !spaces.get(p).all().contains(spaces.get(q).columns().get(0));
            if (other && weights[q] * weights[q] >= NOTABLE * total) {
                Complex[] its = spaces.get(q).carrier();
                largest = Math.max(largest, Math.max(Eigenspace.inner(its, own).abs(), Eigenspace.inner(conjugate(its), own).abs()));
            }
        }
        return largest;
    }

    private static Complex[] conjugate(Complex[] a) {
        return Arrays.stream(a).map(Complex::conj).toArray(Complex[]::new);
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
