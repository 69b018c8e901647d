package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Mode;

/** Whether an eigenfunction moves as its eigenvalue says on runs the fit never saw; see {@link Residuals}. */
public final class HoldoutResidual implements Check {

    @Override
    public String id() {
        return "holdout-residual";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        List<Finding> findings = new ArrayList<>();
        double threshold = evidence.settings().residualThreshold();
        String where = evidence.heldOut() ? "runs held out" : "the training runs (nothing was held out)";
        for (Mode mode : evidence.spectrum().modes()) {
            double value = evidence.ladderOf(mode.number()).stream().filter(row -> row.rank() == evidence.operator().rank())
                    .mapToDouble(LadderRow::residual).findFirst().orElse(Double.NaN);
            findings.add(new Finding(mode.number(), id(), value, threshold, value <= threshold, sentence(where, value)));
        }
        return findings;
    }

    static String sentence(String where, double value) {
        return Double.isNaN(value)
                ? String.format(Locale.ROOT, "On %s it is weaker than %.0f %% of its size on the training runs, so they"
                        + " cannot judge it: hold out a run that excites it.", where, 100 * Rung.EXCITED)
                : String.format(Locale.ROOT, "On %s it misses its own rule of motion by %.3g of its size.", where, value);
    }
}
