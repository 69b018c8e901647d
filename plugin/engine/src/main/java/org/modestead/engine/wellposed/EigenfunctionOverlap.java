package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.ComplexMatrices;
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
        ZMatrixRMaj gram = ComplexMatrices.conjugateTransposeProduct(evidence.spectrum().vectors(), evidence.spectrum().vectors());
        double threshold = evidence.settings().overlapThreshold();
        boolean imposed = Imposed.orthogonality(evidence.operator()) && evidence.operator().rank() > 1;
        List<Finding> findings = new ArrayList<>();
        findings.add(new Finding(0, id(), evidence.fitted().condition(), Double.NaN, true, String.format(Locale.ROOT,
                "The condition of the eigenfunctions is %.3g; 1 is an orthogonal set.", evidence.fitted().condition())));
        for (Mode mode : evidence.spectrum().modes()) {
            double largest = 0;
            int partner = 0;
            for (Mode other : evidence.spectrum().modes()) {
                boolean counts = other.number() == mode.number() || evidence.carries(other);
                double overlap = counts ? largest(gram, mode, other) : 0;
                partner = overlap > largest ? other.number() : partner;
                largest = Math.max(largest, overlap);
            }
            findings.add(new Finding(mode.number(), id(), largest, threshold, !imposed && largest <= threshold,
                    imposed ? IMPOSED : sentence(largest, partner, mode.number())));
        }
        return findings;
    }

    static double largest(ZMatrixRMaj gram, Mode mode, Mode other) {
        double largest = 0;
        for (int i : mode.indices()) {
            for (int j : other.indices()) {
                largest = i == j ? largest : Math.max(largest, ComplexMatrices.entry(gram, i, j).abs());
            }
        }
        return largest;
    }

    private static String sentence(double overlap, int partner, int own) {
        if (partner == 0) {
            return "It overlaps no mode that carries the signal.";
        }
        return String.format(Locale.ROOT, "It overlaps %s by %.3g (0 is orthogonal, 1 the same function).",
                partner == own ? "its own conjugate" : "mode " + partner, overlap);
    }
}
