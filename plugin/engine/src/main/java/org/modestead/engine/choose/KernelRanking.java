package org.modestead.engine.choose;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.TreeMap;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.operator.InnerSplit;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.wellposed.Grade;

/**
 * Ranks kernels by what they can show on training data that were left out: holdout and calibration parts are never looked at.
 *
 * <ol>
 * <li>Every kernel is fitted to three quarters of the training data, and its prediction error on the rest is measured.
 * <li>The best few of every family are judged on the same split: do the modes in that space exist?
 * </ol>
 *
 * <p>The order: first the better verdict; kernels that were not judged follow those that were, and those that could not be fitted
 * come last. Under one verdict the smaller error comes first; but among the kernels whose errors equal the best of them within noise the
 * simplest comes first: of the smallest rank, then of the smallest scale, then as given.
 */
public final class KernelRanking {

    private static final double FITTING = 0.5;

    private KernelRanking() {}

    /**
     * @param snapshots of which only the training part is used
     * @param candidates kernels to compare
     * @param plan how
     * @param progress polled for cancel
     * @return one row a candidate, best first
     * @throws org.modestead.engine.FitFault if the training runs are too short to leave a quarter out
     */
    public static List<RankedKernel> rank(Snapshots snapshots, List<KernelSpec> candidates, RankingPlan plan, Progress progress) {
        InnerSplit split = InnerSplit.of(snapshots);
        HeldOutData heldOut = HeldOutData.of(split.judging(), plan.stepsAhead());
        List<Candidate> fitted = new ArrayList<>();
        double share = plan.judged() == 0 ? 1 : FITTING;
        for (KernelSpec spec : candidates) {
            double done = share * fitted.size() / candidates.size();
            progress.report(done, spec.label());
            progress.checkCancelled();
            fitted.add(Candidate.of(spec, fitted.size(), split.fitting(), heldOut, plan, progress));
        }
        List<Candidate> judged = judged(fitted, plan.judged(), split.fitting(), progress.part(share, 1));
        double persistence = heldOut.persistence().relative();
        return ordered(judged).stream().map(candidate -> candidate.ranked(persistence)).toList();
    }

    /** The best few of every family get a verdict, the others stay as they are. */
    private static List<Candidate> judged(List<Candidate> fitted, int most, Snapshots split, Progress progress) {
        List<Candidate> leaders = fitted.stream().filter(Candidate::fitted).filter(one -> fitted.stream()
                .filter(other -> other.spec().family().equals(one.spec().family()) && ahead(other, one)).count() < most).toList();
        List<Candidate> out = new ArrayList<>(fitted);
        for (int i = 0; i < leaders.size(); i++) {
            Candidate leader = leaders.get(i);
            progress.checkCancelled();
            out.set(leader.place(), leader.judged(split, progress.part((double) i / leaders.size(), (double) (i + 1) / leaders.size())));
        }
        return out;
    }

    private static boolean ahead(Candidate other, Candidate one) {
        return other.error() < one.error() || other.error() == one.error() && other.place() < one.place();
    }

    private static List<Candidate> ordered(List<Candidate> candidates) {
        List<Candidate> ordered = new ArrayList<>();
        new TreeMap<>(candidates.stream().collect(Collectors.groupingBy(KernelRanking::group)))
                .values().forEach(same -> ordered.addAll(simplestFirst(same)));
        return ordered;
    }

    /** 0, 1, ... by verdict; then not judged; then not fitted. */
    private static int group(Candidate one) {
        int unjudged = Grade.values().length;
        return one.fitted() ? one.verdict().map(verdict -> verdict.grade().ordinal()).orElse(unjudged) : unjudged + 1;
    }

    /** By error, but of those that are as good as the best the simplest first. */
    private static List<Candidate> simplestFirst(List<Candidate> same) {
        if (!same.get(0).fitted()) {
            return same;
        }
        List<Candidate> byError = same.stream().sorted(Comparator.comparingDouble(Candidate::error).thenComparingInt(Candidate::place)).toList();
        BlockErrors best = errors(byError.get(0));
        Comparator<Candidate> simplicity = Comparator.<Candidate>comparingInt(one -> one.fit().orElseThrow().rank())
                .thenComparingDouble(one -> one.spec().scale().orElse(0)).thenComparingInt(Candidate::place);
        return Stream.concat(byError.stream().filter(one -> errors(one).asGoodAs(best)).sorted(simplicity),
                byError.stream().filter(one -> !errors(one).asGoodAs(best))).toList();
    }

    private static BlockErrors errors(Candidate one) {
        return one.fit().orElseThrow().errors();
    }
}
