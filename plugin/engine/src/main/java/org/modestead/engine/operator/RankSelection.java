package org.modestead.engine.operator;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.recording.Snapshots;

/** Applies a rank rule. */
final class RankSelection {

    /** Neighbours of a noise floor differ by less, and so do those of motion that is no sum of few modes. */
    private static final double CLEAR = 5;

    private RankSelection() {}

    /** @throws FitFault if the rule asks for what cannot be */
    static RankChoice choose(RankRule rule, Whitened full, Estimator estimator, double ridge, Snapshots snapshots,
            Progress progress) {
        if (rule instanceof RankRule.Fixed fixed) {
            return fixed(fixed.rank(), full);
        }
        if (rule instanceof RankRule.Energy energy) {
            return energy(energy.share(), full.singular());
        }
        if (rule instanceof RankRule.HardThreshold) {
            return hardThreshold(full);
        }
        if (rule instanceof RankRule.Drop drop) {
            return drop(full.singular(), drop.largest()).orElseGet(() -> unclear(holdout(drop.largest(), full, estimator, ridge, snapshots, progress)));
        }
        return holdout(((RankRule.Holdout) rule).largest(), full, estimator, ridge, snapshots, progress);
    }

    private static Optional<RankChoice> drop(double[] singular, int largest) {
        for (int rank = Math.min(largest, singular.length - 1); rank >= 1; rank--) {
            if (CLEAR * singular[rank] <= singular[rank - 1]) {
                return Optional.of(new RankChoice(rank, String.format(Locale.ROOT,
                        "singular values above the last clear drop, to %.3g of the one before", singular[rank] / singular[rank - 1])));
            }
        }
        return Optional.empty();
    }

    private static RankChoice unclear(RankChoice choice) {
        return new RankChoice(choice.rank(), "no singular value drops clearly below the one before; " + choice.reason());
    }

    private static RankChoice fixed(int rank, Whitened full) {
        if (rank < 1 || rank > full.rank()) {
            throw new FitFault("rank", "rank " + rank + " was asked for but " + full.snapshots() + " snapshots of "
                    + full.basis().describe() + " hold only " + full.rank() + " independent directions",
                    "choose a rank from 1 to " + full.rank() + ", or add data");
        }
        return new RankChoice(rank, "fixed");
    }

    private static RankChoice energy(double share, double[] singular) {
        if (!(share > 0 && share <= 1)) {
            throw new FitFault("rank", "the share of energy is " + share, "give a share above 0 and at most 1");
        }
        double total = Arrays.stream(singular).map(s -> s * s).sum();
        double sum = 0;
        int rank = 0;
        while (rank < singular.length && sum < share * total) {
            sum += singular[rank] * singular[rank];
            rank++;
        }
        return new RankChoice(Math.max(rank, 1), String.format(Locale.ROOT, "holds %.6g of the squared singular values, %.6g asked for",
                sum / total, share));
    }

    private static RankChoice hardThreshold(Whitened full) {
        int rows = full.snapshots();
        int columns = full.innerProduct() == InnerProduct.DATA ? full.functions() : rows;
        double beta = (double) Math.min(rows, columns) / Math.max(rows, columns);
        double omega = ((0.56 * beta - 0.95) * beta + 1.82) * beta + 1.43;
        double[] padded = Arrays.copyOf(full.singular(), Math.max(full.rank(), Math.min(rows, columns)));
        double median = median(padded);
        int rank = (int) Arrays.stream(full.singular()).filter(s -> s > omega * median).count();
        return new RankChoice(Math.max(rank, 1), String.format(Locale.ROOT,
                "singular values above the hard threshold %.6g (%.4g times their median)", omega * median, omega));
    }

    private static double median(double[] falling) {
        int middle = falling.length / 2;
        return falling.length % 2 == 1 ? falling[middle] : (falling[middle - 1] + falling[middle]) / 2;
    }

    private static RankChoice holdout(int largest, Whitened full, Estimator estimator, double ridge,
            Snapshots snapshots, Progress progress) {
        if (largest < 1) {
            throw new FitFault("rank", "the largest rank to try is " + largest, "give at least 1");
        }
        InnerSplit split = InnerSplit.of(snapshots);
        OrthonormalCompression trial = OperatorFitter.whitened(estimator, split.fitting(), Math.min(largest, full.rank()), ridge, progress);
        PredictionError.Best best = PredictionError.bestRank(trial, split.judging(), progress);
        return new RankChoice(best.rank(), String.format(Locale.ROOT,
                "best one-step prediction on a quarter of the training data left out: relative error %.4g", best.error()));
    }
}
