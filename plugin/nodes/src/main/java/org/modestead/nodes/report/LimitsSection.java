package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.nodes.document.ReportDocument.Points;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.words.Digits;

/** What the method cannot tell, said for this fit. */
final class LimitsSection {

    private LimitsSection() {}

    static Section of(ReportSource source) {
        List<String> limits = new ArrayList<>();
        limits.add("A mode is spoken of in one function space, over these channels, and in the region that the runs have visited. This report does not"
                + " prove that it exists elsewhere, nor that what is missing here exists in no other space.");
        limits.add("A mode that no run excited cannot be found, and one that a single run excited cannot be judged on others.");
        source.operator().map(FittedOperator::evolution).filter(Evolution.StepMap.class::isInstance).map(Evolution.StepMap.class::cast)
                .ifPresent(map -> limits.add("Motion faster than " + Digits.frequency(map.aliasingLimit(), source.unit().frequency())
                        + ", half the sampling rate, appears folded and cannot be told from slower motion."));
        limits.add("Intervals tell how figures scatter from recording to recording, not a bias that stays, such as the damping that measurement noise"
                + " feigns in least squares.");
        if (!source.forecast().isEmpty()) {
            limits.add("Forecast bands hold as far as future errors resemble those they were calibrated on; where a forecast leaves the range that the"
                    + " fit has seen, nothing is calibrated.");
        }
        if (source.snapshots().map(Snapshots::inputs).filter(inputs -> !inputs.isEmpty()).isPresent()) {
            limits.add("Inputs are separated only as far as they varied independently of the state.");
        }
        return new Section("limits", "Limits", List.of(new Points(limits)));
    }
}
