package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;

/**
 * Relative difference of joint and solo weights of a mode: 0 when its eigenfunction is orthogonal to the others, so that
 * its weight means the same alone and in company.
 */
public final class JointSoloGap implements Check {

    @Override
    public String id() {
        return "joint-solo-gap";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        double threshold = evidence.settings().gapThreshold();
        return evidence.spectrum().modes().stream().map(mode -> {
            LadderRow row = evidence.clearestOf(mode.number());
            return new Finding(mode.number(), id(), row.gap(), threshold, row.gap() <= Math.max(threshold, row.noise().blur()), String.format(Locale.ROOT,
                    "At rank %d its weights fitted together with the other modes and alone differ by %.3g of their size.", row.rank(), row.gap()));
        }).toList();
    }
}
