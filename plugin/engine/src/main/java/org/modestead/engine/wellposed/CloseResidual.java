package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Mode;

/**
 * Whether the residual of a mode, the noise taken off, is so small that no imitation reaches it on runs of ordinary length. The residual of
 * {@link HoldoutResidual} leaves room for motion that is only nearly of one rate; a mode that stands must do better, on one
 * of the rungs it is judged on.
 */
public final class CloseResidual implements Check {

    @Override
    public String id() {
        return "close-residual";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        return evidence.spectrum().modes().stream().map(mode -> finding(mode, evidence)).toList();
    }

    private Finding finding(Mode mode, Evidence evidence) {
        double value = evidence.tellingRungsOf(mode.number()).stream().mapToDouble(LadderRow::residual).filter(r -> !Double.isNaN(r)).min()
                .orElse(Double.NaN);
        return new Finding(mode.number(), id(), value, Evidence.GOOD, value <= Evidence.GOOD, String.format(Locale.ROOT,
                "At best it misses its own rule of motion by %.3g of its size once the noise is taken off.", value));
    }
}
