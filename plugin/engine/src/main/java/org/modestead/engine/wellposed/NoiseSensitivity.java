package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Mode;

/**
 * How well noise of the data's own size lets rate and weight of a mode be known, see {@link NoiseEffect}, on the rung it is judged on. A
 * mode whose figures it moves by more than they must settle to may be reported, but it does not stand.
 */
public final class NoiseSensitivity implements Check {

    @Override
    public String id() {
        return "noise-sensitivity";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        double threshold = evidence.settings().settleThreshold();
        return evidence.spectrum().modes().stream().map(mode -> finding(mode, judgedOn(mode.number(), evidence), threshold)).toList();
    }

    private static LadderRow judgedOn(int mode, Evidence evidence) {
        return Closure.row(mode, evidence).orElseGet(() -> evidence.clearestOf(mode));
    }

    private Finding finding(Mode mode, LadderRow row, double threshold) {
        double change = row.noise().change();
        return new Finding(mode.number(), id(), change, threshold, change <= threshold, String.format(Locale.ROOT,
                "As much noise again as the data carry changes its rate or weight at rank %d by %.3g of its size.", row.rank(), change));
    }
}
