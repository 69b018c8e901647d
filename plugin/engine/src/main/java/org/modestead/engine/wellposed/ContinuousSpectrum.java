package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;

/**
 * Suspicion of a continuous spectrum: undamped oscillations fill the frequency axis ever more densely as the rank rises
 * while the median residual stops falling and stays above the threshold.
 */
public final class ContinuousSpectrum implements Check {

    private static final double FILLING = 0.25;
    private static final double FALLING = 0.8;

    @Override
    public String id() {
        return "continuous-spectrum";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        int last = evidence.rungs().size() - 1;
        if (last < 2) {
            return List.of();
        }
        double filling = (evidence.undamped().get(last) - evidence.undamped().get(0))
                / (double) (evidence.rungs().get(last) - evidence.rungs().get(0));
        double first = evidence.medianResidual().get(0);
        double top = evidence.medianResidual().get(last);
        boolean suspected = filling >= FILLING && top > FALLING * first && top > evidence.settings().residualThreshold();
        return List.of(new Finding(0, id(), filling, Double.NaN, !suspected, String.format(Locale.ROOT,
                "From rank %d to %d undamped oscillations go from %d to %d and the median residual from %.3g to %.3g%s.", evidence.rungs().get(0),
                evidence.rungs().get(last), evidence.undamped().get(0), evidence.undamped().get(last), first, top,
                suspected ? ": frequencies seem to fill a continuous range, so single ones mean nothing" : "")));
    }
}
