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
 * mode that other modes still mix with shows such a change as well, so that it alone takes no grade away. Where one mode is nearly all of the
 * signal nothing mixes with it; if it does not keep its own rule closely either, it {@linkplain #wanders wanders}.
 */
public final class SteadyRate implements Check {

    private static final double SIGMAS = 3;

    /** Change over half a run from which the size half a run ahead is missed by more than half. */
    static final double HALF = 0.5;

    /** Change over half a run that misses the size half a run ahead by a fifth. */
    private static final double VISIBLE = 0.2;

    private static final double LIKELY = 2;

    /** Share of the signal from which a mode is nearly all of it. */
    private static final double ALONE = 0.9;

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

    /**
     * Whether the rate of a mode that carries nearly all of the signal changes visibly from the first half to the second. The bounds are lower than
     * those of the finding, as they count only together with a residual that is not close.
     */
    static boolean wanders(Mode mode, Evidence evidence) {
        HalfRates halves = evidence.halves().get(mode.number() - 1);
        return mode.energyShare() >= ALONE && overHalf(halves, evidence) >= VISIBLE
                && halves.change() >= LIKELY * error(mode, halves, evidence);
    }

    private static double overHalf(HalfRates halves, Evidence evidence) {
        return halves.change() * evidence.longest() / 2;
    }

    private static double error(Mode mode, HalfRates halves, Evidence evidence) {
        return Math.hypot(halves.error(), evidence.fittedOf(mode.number()).noise().rate() * mode.rate().abs());
    }

    private Finding finding(Mode mode, HalfRates halves, Evidence evidence) {
        double value = overHalf(halves, evidence);
        double error = error(mode, halves, evidence);
        return new Finding(mode.number(), id(), value, HALF, value <= HALF || halves.change() <= SIGMAS * error, String.format(Locale.ROOT,
                "From the first half of the runs to the second its rate changes by %.3g, with a standard error of %.2g.", halves.change(), error));
    }
}
