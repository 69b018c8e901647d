package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Mode;

/**
 * Whether a mode keeps its rate from the first half of the runs to the second, see {@link HalfRates}. The figure is what the change makes of its
 * size or phase over half a run, {@code |λ_second - λ_first| T/2}, in e-folds or radians. A rate that changes by more than chance and noise
 * explain points to a motion that grows like a power of time, whose rate depends on its size, or whose plant changes. It informs: a
 * mode that other modes still mix with shows such a change as well, so that it alone takes no grade away.
 */
public final class SteadyRate implements Check {

    private static final double SIGMAS = 3;

    /** Change over half a run from which the size half a run ahead is missed by more than half. */
    static final double HALF = 0.5;

    @Override
    public String id() {
        return "steady-rate";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        List<Finding> findings = new ArrayList<>();
        for (Mode mode : evidence.spectrum().modes()) {
            HalfRates halves = evidence.halves().get(mode.number() - 1);
            if (!mode.constant() && mode.cluster() == 0 && !Double.isNaN(halves.change())) {
                findings.add(finding(mode, halves, evidence));
            }
        }
        return findings;
    }

    private Finding finding(Mode mode, HalfRates halves, Evidence evidence) {
        double value = halves.change() * evidence.longest() / 2;
        double error = Math.hypot(halves.error(), evidence.fittedOf(mode.number()).noise().rate() * mode.rate().abs());
        return new Finding(mode.number(), id(), value, HALF, value <= HALF || halves.change() <= SIGMAS * error, String.format(Locale.ROOT,
                "From the first half of the runs to the second its rate changes by %.3g, with a standard error of %.2g.", halves.change(), error));
    }
}
