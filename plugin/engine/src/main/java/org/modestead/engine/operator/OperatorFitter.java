package org.modestead.engine.operator;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.modestead.engine.Doubt;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.recording.Snapshots;

/** Fits an operator: compress, whiten, choose the rank. */
public final class OperatorFitter {

    private static final int LARGEST_RANK = 400;
    private static final double THIN = 1e-6;
    private static final double STRAINED = 0.2;
    private static final double LITTLE_FREE = 1e-3;

    private OperatorFitter() {}

    /**
     * @param snapshots whose training part is fitted
     * @param estimator which fills the compression
     * @param rule how the rank is chosen
     * @param ridge ρ, see {@link Ridge}; at least 0
     * @param progress polled for cancel
     * @return never null
     * @throws FitFault if the rank asked for is more than the data hold, or the data do not suit the estimator
     */
    public static FittedOperator fit(Snapshots snapshots, Estimator estimator, RankRule rule, double ridge, Progress progress) {
        progress.report(0, "filling the arrays");
        Compression compression = estimator.compress(snapshots, progress.part(0, 0.5));
        return fit(compression, snapshots, estimator, rule, ridge, progress);
    }

    /**
     * Fits what was filled elsewhere.
     *
     * @param compression as the estimator would have filled it
     * @param snapshots what of the recording is at hand for later steps
     * @param estimator with which a fit is repeated
     * @param rule how the rank is chosen
     * @param ridge ρ, see {@link Ridge}; at least 0
     * @param progress polled for cancel
     * @return never null
     * @throws FitFault if the rank asked for is more than the data hold
     */
    public static FittedOperator fit(Compression compression, Snapshots snapshots, Estimator estimator, RankRule rule, double ridge,
            Progress progress) {
        progress.checkCancelled();
        progress.report(0.5, "whitening");
        Whitened full = ridge == 0 ? compression.whitened(largest(rule)) : Ridge.apply(compression.whiten(largest(rule)), ridge);
        progress.checkCancelled();
        progress.report(0.8, "choosing the rank");
        RankChoice choice = RankSelection.choose(rule, full, estimator, ridge, snapshots, progress.part(0.8, 1));
        Whitened made = full.at(choice.rank());
        progress.report(1, "fitted");
        return new FittedOperator(made, choice.rank(), rule, choice.reason(), ridge, estimator, method(estimator, full), estimator.kernel(), snapshots,
                doubts(made, choice.rank(), snapshots));
    }

    /**
     * Fills the arrays of a further fit and whitens them; polled for cancel between the two, either of which may take long.
     *
     * @param estimator which fills the compression
     * @param snapshots of the recording
     * @param largest cap on the rank
     * @param ridge ρ, see {@link Ridge}; at least 0
     * @param progress polled for cancel
     * @throws FitFault if the data do not suit the estimator
     */
    public static OrthonormalCompression whitened(Estimator estimator, Snapshots snapshots, int largest, double ridge, Progress progress) {
        progress.checkCancelled();
        Compression compression = estimator.compress(snapshots, progress);
        progress.checkCancelled();
        OrthonormalCompression whitened = Ridge.apply(compression.whiten(largest), ridge);
        progress.checkCancelled();
        return whitened;
    }

    private static String method(Estimator estimator, Whitened full) {
        return estimator.describe() + full.inputs().map(effect -> ", inputs " + effect.use().words()).orElse("");
    }

    private static double freeShare(Whitened full, InputEffect effect) {
        double free = Arrays.stream(full.singular()).map(s -> s * s).sum();
        double explained = 0;
        for (int j = 0; j < full.rank(); j++) {
            double scale = full.singular()[j];
            for (int a = 0; a < effect.count(); a++) {
                explained += Math.pow(scale * effect.now().get(a, j), 2);
            }
        }
        return free / (free + explained);
    }

    /** The hard threshold needs the median of all singular values, whatever their number. */
    private static int largest(RankRule rule) {
        return rule instanceof RankRule.HardThreshold ? Integer.MAX_VALUE : LARGEST_RANK;
    }

    private static List<Doubt> doubts(Whitened full, int rank, Snapshots snapshots) {
        List<Doubt> doubts = new ArrayList<>(LinearAlgebra.installed().doubts());
        double thin = full.singular()[rank - 1] / full.singular()[0];
        if (thin < THIN) {
            doubts.add(new Doubt("ill-conditioned", String.format(Locale.ROOT,
                    "At rank %d the weakest direction carries %.2g of the strongest: noise of that relative size decides it.", rank, thin)));
        }
        int fitted = rank + full.inputs().map(InputEffect::count).orElse(0);
        if (full.snapshots() < 3 * fitted) {
            doubts.add(new Doubt("few-snapshots", String.format(Locale.ROOT,
                    "Rank %d%s was fitted to %d snapshots; fewer than three a direction leave little to average over.", rank,
                    fitted == rank ? "" : " and " + (fitted - rank) + " input terms", full.snapshots())));
        }
        if (!snapshots.inputs().isEmpty() && full.inputs().isEmpty()) {
            doubts.add(new Doubt("inputs-not-separated", "Input columns are kept with the snapshots but this fit does not separate their"
                    + " effect from the free motion: it may show their frequencies as modes."));
        }
        full.inputs().filter(effect -> freeShare(full, effect) < LITTLE_FREE).ifPresent(effect -> doubts.add(new Doubt("inputs-explain-states",
                String.format(Locale.ROOT, "The inputs of the moment explain all but %.2g of the states' mean square, as under feedback or in a"
                        + " steady state: free motion hardly shows, so its rates rest on little. Vary inputs independently of the state.",
                        freeShare(full, effect)))));
        OrthonormalCompression chosen = full.leading(rank);
        chosen.imposed().filter(imposing -> imposing.change(chosen.action()) > STRAINED).ifPresent(imposing -> doubts.add(new Doubt(
                "structure-strained", String.format(Locale.ROOT, "Making the operator %s changes it by %.2g of its size: the data hardly agree"
                        + " with that.", imposing.structure().words(), imposing.change(chosen.action())))));
        if (full.evolution() instanceof Evolution.Generator generator && generator.contraction() < 1) {
            doubts.add(new Doubt("scaled-generator", String.format(Locale.ROOT,
                    "Eigenvalues are those of the generator scaled by %.4g; they tend to rates only as the contraction tends to 1.",
                    generator.contraction())));
        }
        return doubts;
    }
}
