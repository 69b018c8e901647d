package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.spectrum.Mode;

/**
 * Growth of {@code ‖φ‖_H / ‖φ‖_L2(data)} over the last four rungs. Bounded: the eigenfunction belongs to the space. Growing
 * from rung to rung: it only imitates an eigenfunction on the sampled region. In the data inner product both norms are the
 * same and the question has no content.
 */
public final class SpaceNormGrowth implements Check {

    @Override
    public String id() {
        return "space-norm-growth";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        List<Finding> findings = new ArrayList<>();
        if (evidence.operator().compression().innerProduct() == InnerProduct.DATA) {
            findings.add(new Finding(0, id(), 1, Double.NaN, true,
                    "The space is the average over the data, so its norm cannot tell an eigenfunction from an imitation."));
            return findings;
        }
        double threshold = evidence.settings().normGrowthThreshold();
        for (Mode mode : evidence.spectrum().modes()) {
            List<LadderRow> rows = evidence.lastRungsOf(mode.number());
            if (rows.size() < Settling.LEAST_RUNGS) {
                continue;
            }
            double growth = rows.get(rows.size() - 1).normRatio() / rows.get(0).normRatio();
            boolean steady = true;
            for (int k = 1; k < rows.size(); k++) {
                steady &= rows.get(k).normRatio() > rows.get(k - 1).normRatio();
            }
            findings.add(new Finding(mode.number(), id(), growth, threshold, !(growth > threshold && steady), String.format(Locale.ROOT,
                    "Its norm in the space relative to its size on the data goes from %.3g to %.3g over ranks %d to %d%s.",
                    rows.get(0).normRatio(), rows.get(rows.size() - 1).normRatio(), rows.get(0).rank(), rows.get(rows.size() - 1).rank(),
                    growth > threshold && steady ? ": growing from rung to rung, it only imitates an eigenfunction" : "")));
        }
        return findings;
    }
}
