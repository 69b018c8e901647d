package org.modestead.engine.wellposed;

import java.util.List;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Mode;

/**
 * Whether the judging runs tell a mode from half of a defective one: where noise splits a multiple rate with one eigenfunction, two modes
 * with
 * nearly the same function and nearly the same rate appear, or a slow oscillation, and neither is there; see {@link TwinRates}. What
 * rounding splits is found by {@link ClusteredEigenvalues} already.
 */
public final class ResolvedRates implements Check {

    @Override
    public String id() {
        return "resolved-rates";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        return evidence.spectrum().modes().stream().map(mode -> finding(mode, evidence.twins().get(mode.number() - 1) && !CarriedAlone.at(mode.number(), evidence))).toList();
    }

    private Finding finding(Mode mode, boolean twin) {
        return new Finding(mode.number(), id(), twin ? 1 : 0, 0.5, !twin, twin
                ? "Its rate and function are so close to another's, or to its own conjugate's, that the runs fit one defective motion (growth like t e^(λt)) as well."
                : "The runs tell its rate from every other.");
    }
}
