package org.modestead.engine.wellposed;

import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
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
 * segments twice as long, or half where the runs are too short) and the rate of each carrying mode is compared on the highest rung of the
 * ladder that tells of it: on a lower one the mode may not be there yet.
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
        int highest = evidence.carrying().mapToInt(mode -> rankOf(mode, evidence)).max().orElse(evidence.operator().rank());
        try {
            return compare(evidence, OperatorFitter.whitened(other.get(), evidence.operator().snapshots(), highest, evidence.operator().ridge(), progress));
        } catch (FitFault fault) {
            return List.of(new Finding(0, id(), Double.NaN, Double.NaN, true, "The second step could not be fitted: " + fault.getMessage()));
        }
    }

    private static int rankOf(Mode mode, Evidence evidence) {
        return evidence.lastTellingOf(mode.number()).rank();
    }

    private List<Finding> compare(Evidence evidence, OrthonormalCompression again) {
        Map<Integer, List<Complex>> rates = new HashMap<>();
        return evidence.carrying().filter(mode -> mode.frequency() < again.evolution().aliasingLimit()).map(mode -> {
            int rank = rankOf(mode, evidence);
            return rank > again.rank()
                    ? new Finding(mode.number(), id(), Double.NaN, Double.NaN, true, "Fitted with another step the data hold only rank "
                            + again.rank() + ", so its rate cannot be compared.")
                    : finding(mode, evidence, rates.computeIfAbsent(rank, r -> ModalExpansion.of(again.leading(r)).rates()));
        }).toList();
    }

    /** Compared with the nearest, though two modes may look for one: functions that share a rate may show it as one or as several. */
    private Finding finding(Mode mode, Evidence evidence, List<Complex> others) {
        Complex rate = evidence.lastTellingOf(mode.number()).rate();
        Complex own = new Complex(rate.re(), Math.abs(rate.im()));
        double threshold = evidence.settings().stepThreshold();
        double value = others.stream().mapToDouble(other -> Ladder.relativeChange(own, other, evidence.longest())).min().orElse(1);
        return new Finding(mode.number(), id(), value, threshold, value <= threshold, String.format(Locale.ROOT,
                "Fitted with another step its rate differs by %.3g.", value));
    }
}
