package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Mode;

/**
 * How far the unit eigenfunctions are from orthogonal: for a mode the largest {@code |<φ, φ'>|} with the eigenfunctions of
 * the other modes that carry a stated share, and with its own conjugate; for the operator the condition number of all. Where the fit
 * was given a structure that makes eigenfunctions orthogonal, that they do not overlap is no evidence, and the check is not passed.
 */
public final class EigenfunctionOverlap implements Check {

    private static final String IMPOSED = "The structure imposed on the fit makes eigenfunctions orthogonal, so that they do not overlap is no"
            + " evidence; fit without it to see whether they do.";

    @Override
    public String id() {
        return "eigenfunction-overlap";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        double threshold = evidence.settings().overlapThreshold();
        boolean imposed = Imposed.orthogonality(evidence.operator()) && evidence.operator().rank() > 1;
        List<Finding> findings = new ArrayList<>();
        findings.add(new Finding(0, id(), evidence.fitted().condition(), Double.NaN, true, String.format(Locale.ROOT,
                "The condition of the eigenfunctions is %.3g; 1 is an orthogonal set.", evidence.fitted().condition())));
        for (Mode mode : evidence.spectrum().modes()) {
            LadderRow row = evidence.clearestOf(mode.number());
            findings.add(new Finding(mode.number(), id(), row.overlap(), threshold, !imposed && row.overlap() <= Math.max(threshold, row.noise().blur()),
                    imposed ? IMPOSED : String.format(Locale.ROOT,
                    "At rank %d it overlaps its own conjugate or another mode that carries the signal by at most %.3g (0 is orthogonal, 1 the same function).",
                    row.rank(), row.overlap())));
        }
        return findings;
    }
}
