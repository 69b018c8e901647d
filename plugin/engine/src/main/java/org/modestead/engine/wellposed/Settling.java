package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Mode;

/**
 * Whether rate and weight of a mode stop changing as functions join: how far they are, on the last four telling rungs, from those of the
 * last one, the worst of four left out (where two modes cross on the ladder, one rung may show neither). Twice what noise of the
 * data's own size changes is taken off. A mode that is not found on the rungs next to the fitted rank counts as changed altogether (1).
 *
 * <p>Where no function is left to join, because the fitted rank takes in all the data hold, the ladder has no upper part and
 * its lower rungs lack functions that the signal needs. There the question is answered by {@link Closure}.
 */
public final class Settling implements Check {

    /** Two rungs carry noise of their own, and the worst of two tries is not its bound. */
    private static final double TWICE = 2;

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
        List<LadderRow> usable = evidence.usableRungsOf(mode);
        if (usable.size() < LEAST_RUNGS) {
            return few(mode, usable, found.size(), evidence);
        }
        List<LadderRow> telling = evidence.tellingRungsOf(mode);
        List<LadderRow> rows = telling.subList(Math.max(0, telling.size() - Evidence.LAST_RUNGS), telling.size());
        double rate = distance(rows, evidence.longest(), true);
        double weight = distance(rows, evidence.longest(), false);
        double value = Math.max(rate, weight);
        return new Finding(mode, id(), value, threshold, value <= threshold, String.format(Locale.ROOT,
                "On the last rungs that tell of it (ranks %d to %d) its rate differs by up to %.3g and its weight by up to %.3g.",
                rows.get(0).rank(), rows.get(rows.size() - 1).rank(), rate, weight));
    }

    /** Two rungs that agree are less than settling needs, and more than nothing. */
    private Finding few(int mode, List<LadderRow> usable, int found, Evidence evidence) {
        double threshold = evidence.settings().settleThreshold();
        double change = usable.size() < 2 ? Double.NaN
                : Math.max(distance(usable, evidence.longest(), true), distance(usable, evidence.longest(), false));
        String sentence = "Only on " + usable.size() + " of " + found + " rungs does noise of the size found in the data leave it as it is";
        return change <= threshold ? new Finding(mode, id(), change, threshold, false, String.format(Locale.ROOT, "%s, and these agree to %.3g.", sentence, change))
                : new Finding(mode, id(), Double.NaN, threshold, false, sentence + ".");
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

    /** From the last rung; of three distances the middle one. */
    private static double distance(List<LadderRow> rows, double longest, boolean ofRate) {
        LadderRow last = rows.get(rows.size() - 1);
        double[] distances = rows.subList(0, rows.size() - 1).stream().mapToDouble(row -> {
            double change = ofRate ? Ladder.relativeChange(row.rate(), last.rate(), longest)
                    : NoiseEffect.relativeDifference(row.weight(), last.weight());
            double noise = ofRate ? Math.max(row.noise().rate(), last.noise().rate()) : Math.max(row.noise().weight(), last.noise().weight());
            return Math.max(0, change - TWICE * noise);
        }).sorted().toArray();
        return distances[distances.length < Evidence.LAST_RUNGS - 1 ? distances.length - 1 : distances.length - 2];
    }
}
