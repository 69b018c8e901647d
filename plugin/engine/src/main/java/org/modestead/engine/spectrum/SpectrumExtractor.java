package org.modestead.engine.spectrum;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;

/** Extracts modes from a fitted operator. */
public final class SpectrumExtractor {

    private static final double ILL_CONDITIONED = 1e8;
    private static final double NEAR_LIMIT = 0.95;
    private static final double NEGLIGIBLE = 5e-3;

    private SpectrumExtractor() {}

    /**
     * Solves the eigenproblem at the chosen rank and measures the modes on the training states.
     *
     * @param operator fitted
     * @param progress polled for cancel
     * @return modes by falling energy share
     */
    public static Spectrum extract(FittedOperator operator, Progress progress) {
        progress.report(0, "eigenvalues");
        ModalExpansion expansion = ModalExpansion.of(operator.chosen());
        progress.checkCancelled();
        progress.report(0.5, "sizes of the modes");
        TrainingSample sample = TrainingSample.of(operator);
        List<Mode> modes = modes(expansion, sample);
        progress.report(1, "extracted");
        return new Spectrum(expansion.eigenvalues(), expansion.rates(), expansion.vectors(), expansion.joint(), expansion.solo(), modes,
                operator.snapshots().channels(), operator.snapshots().delay(), operator.snapshots().preparation(),
                operator.snapshots().time().unit(),
                doubts(expansion, modes));
    }

    private static List<Mode> modes(ModalExpansion expansion, TrainingSample sample) {
        int[] clusters = Cluster.numbers(expansion);
        ZMatrixRMaj functions = expansion.eigenfunctions(sample.states());
        ZMatrixRMaj starts = expansion.eigenfunctions(sample.starts());
        List<Measured> measured = new ArrayList<>();
        for (List<Integer> group : Cluster.groups(expansion, clusters)) {
            double energy = Contributions.meanSquare(functions, expansion.joint(), group, 0, sample.channels());
            measured.add(new Measured(group, energy, amplitude(expansion, starts, group, clusters, sample.channels())));
        }
        measured.sort(Comparator.comparingDouble(Measured::energy).reversed()
                .thenComparingDouble(m -> Math.abs(expansion.rates().get(m.group().get(0)).im()))
                .thenComparingDouble(m -> expansion.rates().get(m.group().get(0)).re()));
        double total = measured.stream().mapToDouble(Measured::energy).sum();
        List<Mode> modes = new ArrayList<>();
        for (Measured m : measured) {
            int first = m.group().get(0);
            Complex rate = rate(expansion, m.group(), clusters);
            boolean constant = modes.stream().noneMatch(Mode::constant) && clusters[first] == 0
                    && ConstantFunction.is(functions, first, rate, sample.longest());
            modes.add(new Mode(modes.size() + 1, m.group(), rate, m.amplitude(), total > 0 ? m.energy() / total : 0, gap(expansion, first),
                    weights(expansion, starts, m.group(), clusters), constant, clusters[first]));
        }
        return modes;
    }

    private record Measured(List<Integer> group, double energy, double amplitude) {}

    /** A cluster is told by the mean of its members: their differences are rounding. */
    private static Complex rate(ModalExpansion expansion, List<Integer> group, int[] clusters) {
        if (clusters[group.get(0)] == 0) {
            return expansion.rates().get(group.get(0));
        }
        List<Integer> members = group.stream().filter(j -> clusters[j] == clusters[group.get(0)]).toList();
        Complex sum = Complex.ZERO;
        for (int j : members) {
            sum = sum.plus(expansion.rates().get(j));
        }
        Complex mean = sum.times(1.0 / members.size());
        double spread = members.stream().mapToDouble(j -> expansion.rates().get(j).minus(mean).abs()).max().orElse(0);
        return Math.abs(mean.im()) <= 2 * spread ? new Complex(mean.re(), 0) : new Complex(mean.re(), Math.abs(mean.im()));
    }

    /** Read off the oldest sample of the first state, that is where the run begins. */
    private static double amplitude(ModalExpansion expansion, ZMatrixRMaj starts, List<Integer> group, int[] clusters, int channels) {
        int oldest = expansion.joint().numCols - channels;
        if (clusters[group.get(0)] != 0) {
            return Math.sqrt(Contributions.meanSquare(Contributions.of(starts, expansion.joint(), group, oldest, channels)));
        }
        int j = group.get(0);
        double peak = group.size();
        double sum = 0;
        for (int i = 0; i < starts.numRows; i++) {
            for (int k = 0; k < channels; k++) {
                double part = peak * ComplexMatrices.entry(starts, i, j).times(ComplexMatrices.entry(expansion.joint(), j, oldest + k)).abs();
                sum += part * part;
            }
        }
        return Math.sqrt(sum / starts.numRows);
    }

    /** ‖joint - solo‖ over the larger of their norms, so that it does not depend on how the channels are turned. */
    private static double gap(ModalExpansion expansion, int j) {
        double[] joint = row(expansion.joint(), j);
        double[] solo = row(expansion.solo(), j);
        double size = Math.max(norm(joint), norm(solo));
        for (int k = 0; k < joint.length; k++) {
            joint[k] -= solo[k];
        }
        return size == 0 ? 0 : norm(joint) / size;
    }

    private static double[] row(ZMatrixRMaj a, int j) {
        return Arrays.copyOfRange(a.data, 2 * j * a.numCols, 2 * (j + 1) * a.numCols);
    }

    private static double norm(double[] parts) {
        double largest = Arrays.stream(parts).map(Math::abs).max().orElse(0);
        if (largest == 0 || Double.isInfinite(largest)) {
            return largest;
        }
        double sum = 0;
        for (double part : parts) {
            sum += (part / largest) * (part / largest);
        }
        return largest * Math.sqrt(sum);
    }

    /** The joint weights; for a cluster what its members add together at the first state, since theirs alone mean nothing. */
    private static List<Complex> weights(ModalExpansion expansion, ZMatrixRMaj starts, List<Integer> group, int[] clusters) {
        List<Complex> weights = new ArrayList<>(expansion.joint().numCols);
        boolean clustered = clusters[group.get(0)] != 0;
        for (int k = 0; k < expansion.joint().numCols; k++) {
            Complex sum = Complex.ZERO;
            for (int j : clustered ? group : group.subList(0, 1)) {
                Complex weight = ComplexMatrices.entry(expansion.joint(), j, k);
                sum = sum.plus(clustered ? weight.times(ComplexMatrices.entry(starts, 0, j)) : weight);
            }
            weights.add(clustered ? new Complex(sum.re(), 0) : sum);
        }
        return weights;
    }

    private static List<Doubt> doubts(ModalExpansion expansion, List<Mode> modes) {
        List<Doubt> doubts = new ArrayList<>();
        if (expansion.condition() > ILL_CONDITIONED) {
            doubts.add(new Doubt("eigenvectors-ill-conditioned", String.format(Locale.ROOT,
                    "The eigenfunctions are nearly dependent (condition %.2g): weights of single modes mean little.", expansion.condition())));
        }
        modes.stream().filter(mode -> mode.cluster() != 0).forEach(mode -> doubts.add(new Doubt("nearly-defective", String.format(
                Locale.ROOT, "Mode %d gathers %d eigenvalues at %.6g%s that rounding cannot tell apart: growth like t e^(λt), not %s.",
                mode.number(), mode.indices().size(), mode.rate().re(),
                mode.oscillates() ? String.format(Locale.ROOT, " ± %.6gi", mode.rate().im()) : "",
                mode.oscillates() ? "two modes" : "an oscillation"))));
        if (expansion.compression().evolution() instanceof Evolution.StepMap map) {
            modes.stream().filter(mode -> mode.energyShare() > NEGLIGIBLE).forEach(mode -> aliasing(expansion, mode, map, doubts));
        }
        return doubts;
    }

    private static void aliasing(ModalExpansion expansion, Mode mode, Evolution.StepMap map, List<Doubt> doubts) {
        Complex eigenvalue = expansion.eigenvalues().get(mode.indices().get(0));
        if (eigenvalue.im() == 0 && eigenvalue.re() < 0) {
            doubts.add(new Doubt("negative-multiplier", String.format(Locale.ROOT,
                    "Mode %d has the negative real multiplier %.6g: no real continuous-time mode at this step has it; sample faster.",
                    mode.number(), eigenvalue.re())));
        } else if (mode.frequency() > NEAR_LIMIT * map.aliasingLimit()) {
            doubts.add(new Doubt("aliasing", String.format(Locale.ROOT,
                    "Mode %d at %.6g cycles per time unit lies at the sampling limit %.6g: it may be a faster motion seen folded.",
                    mode.number(), mode.frequency(), map.aliasingLimit())));
        }
    }
}
