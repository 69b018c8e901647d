package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Mode;

/**
 * Whether the figures at the fitted rank are those of the rungs on which the mode was judged. A mode may exist, and the fitted rank
 * may still be too low to show it well, or so high that noise spoils it.
 */
public final class FittedRank implements Check {

    @Override
    public String id() {
        return "fitted-rank";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        return evidence.spectrum().modes().stream().map(mode -> finding(mode, evidence)).toList();
    }

    private Finding finding(Mode mode, Evidence evidence) {
        double threshold = evidence.settings().settleThreshold();
        List<LadderRow> good = evidence.goodRungsOf(mode.number());
        Optional<LadderRow> whole = Closure.row(mode.number(), evidence);
        if (good.size() < Settling.LEAST_RUNGS && whole.isEmpty()) {
            return new Finding(mode.number(), id(), 0, threshold, true, "Its figures are told by the fitted rank alone.");
        }
        LadderRow last = whole.orElseGet(() -> good.get(good.size() - 1));
        LadderRow fitted = evidence.fittedOf(mode.number());
        double value = Ladder.relativeChange(fitted.rate(), last.rate(), evidence.longest());
        return new Finding(mode.number(), id(), value, threshold, value <= threshold, value <= threshold
                ? String.format(Locale.ROOT, "At the fitted rank its rate is that of the rungs it was judged on, to %.3g.", value)
                : String.format(Locale.ROOT, "At the fitted rank %d its rate differs by %.3g from that at rank %d, which predicts better: fit with rank %d.",
                        evidence.operator().rank(), value, last.rank(), last.rank()));
    }

    /** Whether the mode was judged on other rungs and the fitted rank spoils it. */
    static boolean spoilt(int mode, Evidence evidence) {
        return evidence.goodRungsOf(mode).size() >= Settling.LEAST_RUNGS
                && evidence.goodRungsOf(mode).stream().noneMatch(row -> row.rank() == evidence.operator().rank());
    }
}
