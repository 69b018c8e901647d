package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.modestead.engine.Progress;

/**
 * Whether the data determine the rate at all: a rate that as much noise again changes by far more than its own share of the mode, on most
 * rungs where the mode is found, belongs to a motion that no rate of its own carries (a defective one, or a continuum). Where the space is
 * finite and has been seen whole, only the rung that holds all of it is asked.
 */
public final class DeterminedRate implements Check {

    /** Noise of a share ε of the mode moves a well separated rate by about ε; ten times that is beyond chance. */
    private static final double AMPLIFIED = 10;

    @Override
    public String id() {
        return "determined-rate";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        return evidence.spectrum().modes().stream().map(mode -> finding(mode.number(), evidence)).toList();
    }

    private Finding finding(int mode, Evidence evidence) {
        List<LadderRow> found = evidence.ladderOf(mode);
        double limit = Math.max(Evidence.USABLE, AMPLIFIED * evidence.noiseShare() / Math.sqrt(evidence.spectrum().modes().get(mode - 1).energyShare()));
        Optional<LadderRow> whole = Closure.row(mode, evidence);
        List<LadderRow> asked = whole.map(List::of).orElse(found);
        double[] upset = asked.stream().mapToDouble(row -> row.noise().rate()).filter(change -> change > limit).sorted().toArray();
        boolean told = whole.isPresent() ? upset.length == 0 : evidence.usableRungsOf(mode).size() >= Settling.LEAST_RUNGS || upset.length < Settling.LEAST_RUNGS;
        if (told) {
            return new Finding(mode, id(), 0, limit, true, "Noise does not change its rate out of proportion.");
        }
        return new Finding(mode, id(), upset[upset.length / 2], limit, false, String.format(Locale.ROOT, "As much noise again, %.2g of the"
                + " signal, changes its rate by %.3g of its size on %d of %d rungs: the data do not determine it.", evidence.noiseShare(),
                upset[upset.length / 2], upset.length, asked.size()));
    }
}
