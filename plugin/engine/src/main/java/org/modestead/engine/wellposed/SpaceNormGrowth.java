package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.spectrum.Mode;

/**
 * Growth of {@code ‖φ‖_H / ‖φ‖_L2(data)} over the ladder. Bounded: the eigenfunction belongs to the space. Growing without
 * bound (see {@link NormTrend}): it only imitates an eigenfunction on the sampled region. In the data inner product both norms are the
 * same and the question has no content, nor has it for a cluster, whose members are directions that rounding picked.
 *
 * <p>An imitation needs its growing norm to predict at all. Where the norm rests up to the rung that predicts best and grows on the rungs after it alone, it is
 * those rungs that fit more than the motion, and the mode needs none of that.
 */
public final class SpaceNormGrowth implements Check {

    @Override
    public String id() {
        return "space-norm-growth";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        List<Finding> findings = new ArrayList<>();
        if (evidence.operator().functions().innerProduct() == InnerProduct.DATA) {
            findings.add(new Finding(0, id(), 1, Double.NaN, true,
                    "The space is the average over the data, so its norm cannot tell an eigenfunction from an imitation."));
            return findings;
        }
        double threshold = evidence.settings().normGrowthThreshold();
        List<Integer> clear = Evidence.clear(IntStream.range(0, evidence.rungs().size()).boxed().toList(),
                k -> evidence.carryingNormNoise().get(k) <= Evidence.NOISY_NORM);
        for (Mode mode : evidence.spectrum().modes()) {
            if (mode.cluster() != 0) {
                continue;
            }
            if (Closure.missed(mode.number(), evidence).isPresent()) {
                findings.add(new Finding(mode.number(), id(), 1, threshold, true, "The space is finite and has been seen whole: no norm can grow."));
                continue;
            }
            List<LadderRow> rows = evidence.clearNormsOf(mode.number());
            if (rows.size() >= Settling.LEAST_RUNGS) {
                List<LadderRow> predicting = rows.stream().filter(row -> row.rank() <= evidence.bestPredicting()).toList();
                boolean rests = predicting.size() >= Settling.LEAST_RUNGS && !trend(predicting, threshold).growing();
                findings.add(finding(mode.number(), rests ? predicting : rows, threshold));
            } else if (clear.size() >= Settling.LEAST_RUNGS && evidence.carries(mode)) {
                findings.add(finding(mode.number(), "It cannot be followed down the ladder; the norm of the modes that carry the signal",
                        clear.stream().map(evidence.carryingNorm()::get).toList(), clear.stream().map(evidence.rungs()::get).toList(), threshold));
            }
        }
        return findings;
    }

    private static NormTrend trend(List<LadderRow> rows, double threshold) {
        return NormTrend.of(rows.stream().map(LadderRow::normRatio).toList(), threshold);
    }

    private Finding finding(int mode, List<LadderRow> rows, double threshold) {
        return finding(mode, "Its norm", rows.stream().map(LadderRow::normRatio).toList(), rows.stream().map(LadderRow::rank).toList(), threshold);
    }

    private Finding finding(int mode, String what, List<Double> ratios, List<Integer> ranks, double threshold) {
        int top = ratios.size() - 1;
        NormTrend trend = NormTrend.of(ratios, threshold);
        return new Finding(mode, id(), trend.factor(), threshold, !trend.growing(), String.format(Locale.ROOT,
                "%s in the space relative to the size on the data goes from %.3g to %.3g over ranks %d to %d%s.", what, ratios.get(0),
                ratios.get(top), ranks.get(0), ranks.get(top),
                trend.growing() ? ": growing from rung to rung, such functions only imitate eigenfunctions" : ""));
    }
}
