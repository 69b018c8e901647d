package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;

/**
 * Rates must not depend on the step of the fit: the operator is fitted again with twice the step (a generator with
 * segments twice as long, or half where the runs are too short) and the rates of the carrying modes are compared, on the highest rung
 * of the ladder that tells of all of them.
 * Disagreement means aliasing, too coarse a step, or motion that is not forward complete. Modes above the sampling limit
 * of the longer step are not compared.
 */
public final class StepConsistency implements Check {

    @Override
    public String id() {
        return "step-consistency";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        Optional<Estimator> other = evidence.operator().estimator().otherStep(evidence.operator().snapshots());
        if (other.isEmpty()) {
            return List.of(new Finding(0, id(), Double.NaN, Double.NaN, true, "The runs are too short to fit a second step."));
        }
        int rank = evidence.carrying().mapToInt(mode -> evidence.lastTellingOf(mode.number()).rank()).min().orElse(evidence.operator().rank());
        ModalExpansion expansion;
        try {
            OrthonormalCompression again = OperatorFitter.whitened(other.get(), evidence.operator().snapshots(), rank, evidence.operator().ridge(), progress);
            if (again.rank() < rank) {
                return List.of(new Finding(0, id(), Double.NaN, Double.NaN, true, "Fitted with another step the data hold only rank "
                        + again.rank() + ", so the rates cannot be compared."));
            }
            expansion = ModalExpansion.of(again);
        } catch (FitFault fault) {
            return List.of(new Finding(0, id(), Double.NaN, Double.NaN, true, "The second step could not be fitted: " + fault.getMessage()));
        }
        return compare(evidence, expansion, rank);
    }

    private List<Finding> compare(Evidence evidence, ModalExpansion other, int rank) {
        List<Mode> modes = evidence.carrying().filter(mode -> mode.frequency() < other.compression().evolution().aliasingLimit()).toList();
        List<Finding> findings = new ArrayList<>();
        double threshold = evidence.settings().stepThreshold();
        for (Mode mode : modes) {
            Complex own = rateAt(evidence, mode, rank);
            // the nearest, though two modes may look for one: functions that share a rate may show it as one or as several
            double value = other.rates().stream().mapToDouble(rate -> Ladder.relativeChange(own, rate, evidence.longest())).min().orElse(1);
            findings.add(new Finding(mode.number(), id(), value, threshold, value <= threshold, String.format(Locale.ROOT,
                    "Fitted with another step its rate differs by %.3g.", value)));
        }
        return findings;
    }

    private static Complex rateAt(Evidence evidence, Mode mode, int rank) {
        Complex rate = evidence.ladderOf(mode.number()).stream().filter(row -> row.rank() == rank).map(LadderRow::rate).findFirst()
                .orElse(mode.rate());
        return new Complex(rate.re(), Math.abs(rate.im()));
    }
}
