package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Mode;

/**
 * Whether rate and weight of a mode stop changing as functions join: the largest relative change from rung to rung over the
 * last four rungs on which it was found. A mode that is not found on the rungs next to the fitted rank counts as changed
 * altogether (1).
 *
 * <p>Where no function is left to join, because the fitted rank takes in all the data hold, the ladder has no upper part and
 * its lower rungs lack functions that the signal needs. There the question is answered by {@link Closure}.
 */
public final class Settling implements Check {

    /** Fewest rungs that can show settling. */
    static final int LEAST_RUNGS = 3;

    @Override
    public String id() {
        return "settling";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        List<Finding> findings = new ArrayList<>();
        double threshold = evidence.settings().settleThreshold();
        for (Mode mode : evidence.spectrum().modes()) {
            Optional<Finding> closed = closed(mode.number(), evidence, threshold);
            if (closed.isPresent()) {
                findings.add(closed.get());
                continue;
            }
            findings.add(climbed(mode.number(), evidence, threshold));
        }
        return findings;
    }

    private Finding climbed(int mode, Evidence evidence, double threshold) {
        if (evidence.rungs().size() < LEAST_RUNGS) {
            return new Finding(mode, id(), Double.NaN, threshold, false, "There are only " + evidence.rungs().size()
                    + " rungs on the ladder; at least " + LEAST_RUNGS + " are needed to see whether it settles.");
        }
        List<LadderRow> found = evidence.ladderOf(mode);
        if (found.size() < LEAST_RUNGS) {
            return new Finding(mode, id(), 1, threshold, false, "It is found on only " + found.size() + " of " + evidence.rungs().size() + " rungs.");
        }
        List<LadderRow> clear = evidence.clearRungsOf(mode);
        List<LadderRow> rows = clear.subList(Math.max(0, clear.size() - Evidence.LAST_RUNGS), clear.size());
        if (rows.size() < LEAST_RUNGS) {
            return new Finding(mode, id(), Double.NaN, threshold, false, "Only on " + rows.size() + " of " + found.size()
                    + " rungs does noise of the size found in the data change it by less than " + threshold + " of its size.");
        }
        double rate = change(rows, evidence.longest(), true);
        double weight = change(rows, evidence.longest(), false);
        double value = Math.max(rate, weight);
        return new Finding(mode, id(), value, threshold, value <= threshold, String.format(Locale.ROOT,
                "Over the last rungs that noise leaves alone (ranks %d to %d) its rate changes by up to %.3g and its weight by up to %.3g.",
                rows.get(0).rank(), rows.get(rows.size() - 1).rank(), rate, weight));
    }

    private Optional<Finding> closed(int mode, Evidence evidence, double threshold) {
        OptionalDouble missed = Closure.missed(mode, evidence);
        if (missed.isEmpty()) {
            return Optional.empty();
        }
        return Optional.of(new Finding(mode, id(), missed.getAsDouble(), threshold, true, String.format(Locale.ROOT,
                "No function is left to join, and among those there are it misses its own rule of motion by only %.3g: nothing can change it.",
                missed.getAsDouble())));
    }

    private static double change(List<LadderRow> rows, double longest, boolean ofRate) {
        double largest = 0;
        for (int k = 1; k < rows.size(); k++) {
            LadderRow before = rows.get(k - 1);
            LadderRow after = rows.get(k);
            double size = Math.max(before.weight(), after.weight());
            double change = ofRate ? Ladder.relativeChange(before.rate(), after.rate(), longest)
                    : size == 0 ? 0 : Math.abs(after.weight() - before.weight()) / size;
            largest = Math.max(largest, change);
        }
        return largest;
    }
}
