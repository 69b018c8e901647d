package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.modestead.engine.Doubt;

/**
 * Whether the modes exist: overall, mode by mode, and the evidence.
 *
 * @param overall worst grade among the modes that carry a stated share of the signal
 * @param modes one a mode of the spectrum, in its order
 * @param findings every check's outcome
 * @param ladder every mode on every rung, and as mode 0 the strongest mode of every rung
 * @param doubts what a reader of the results must know
 */
public record Verdict(ModeVerdict overall, List<ModeVerdict> modes, List<Finding> findings, List<LadderRow> ladder, List<Doubt> doubts) {

    /** Takes immutable copies. */
    public Verdict {
        Objects.requireNonNull(overall);
        modes = List.copyOf(modes);
        findings = List.copyOf(findings);
        ladder = List.copyOf(ladder);
        doubts = List.copyOf(doubts);
    }

    /** Returns the verdict on a mode, empty for an unknown number. */
    public Optional<ModeVerdict> of(int mode) {
        return modes.stream().filter(verdict -> verdict.mode() == mode).findFirst();
    }
}
