package org.modestead.engine.modelfile;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Objects;
import java.util.Set;
import org.modestead.engine.Doubt;
import org.modestead.engine.FitFault;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.PreparedAlike;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;

/**
 * All that is needed to go on elsewhere from what was fitted: the operator with its snapshots, estimator and kernel, its modes, and
 * whether they exist. A model is not handed on without a verdict.
 *
 * @param name for people, may be empty
 * @param notes for people, may be empty
 * @param operator fitted
 * @param spectrum of that operator
 * @param verdict on the modes of that spectrum
 */
public record Model(String name, String notes, FittedOperator operator, Spectrum spectrum, Verdict verdict) {

    /** Checks that the parts belong together, as far as can be told. */
    public Model {
        Objects.requireNonNull(name);
        Objects.requireNonNull(notes);
        if (spectrum.rank() != operator.rank() || !spectrum.channels().equals(operator.snapshots().channels())
                || !spectrum.delay().equals(operator.snapshots().delay())) {
            throw new FitFault("model", "the spectrum (rank " + spectrum.rank() + ", " + spectrum.channels().size()
                    + " channels) is not that of the operator (rank " + operator.rank() + ", " + operator.snapshots().channels().size()
                    + " channels)", "extract the spectrum from this operator");
        }
        if (verdict.modes().size() != spectrum.modes().size()) {
            throw new FitFault("model", "the verdict judges " + verdict.modes().size() + " modes, the spectrum has " + spectrum.modes().size(),
                    "judge this spectrum");
        }
    }

    /** Returns new recordings prepared as those of the fit, as the holdout beside the training runs; see {@link PreparedAlike}. */
    public Snapshots on(Snapshots fresh) {
        return PreparedAlike.of(operator.snapshots(), fresh);
    }

    /** Returns what a reader of any result must know, each doubt once. */
    public List<Doubt> doubts() {
        Set<Doubt> all = new LinkedHashSet<>(operator.snapshots().doubts());
        all.addAll(operator.doubts());
        all.addAll(spectrum.doubts());
        all.addAll(verdict.doubts());
        return new ArrayList<>(all);
    }
}
