package org.modestead.engine.recording;

import java.util.Arrays;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.engine.RecordingFault;

/**
 * The pauses of one run: steps longer than a factor times its median step.
 *
 * @param run the run
 * @param typicalStep its median step, in time units
 * @param limit longest step that is no gap, in time units
 * @param after rows after which a gap follows, rising
 */
record Gaps(Run run, double typicalStep, double limit, int[] after) {
    private static final int NAMED = 5;
    private static final double UNEVEN_SHARE = 0.1;

    /**
     * Finds the gaps.
     *
     * @param run with rising times, at least two samples
     * @param factor above 1
     */
    static Gaps find(Run run, double factor) {
        StepEstimate step = StepEstimate.of(run.times());
        double limit = factor * step.typical() + step.tolerance();
        double[] times = run.times();
        int[] after = new int[8];
        int count = 0;
        for (int i = 0; step.longest() > limit && i + 1 < times.length; i++) {
            if (times[i + 1] - times[i] > limit) {
                if (count == after.length) {
                    after = Arrays.copyOf(after, 2 * count);
                }
                after[count++] = i;
            }
        }
        return new Gaps(run, step.typical(), limit, Arrays.copyOf(after, count));
    }

    int count() {
        return after.length;
    }

    /** Returns the time between the samples around gap g. */
    double length(int g) {
        return run.times()[after[g] + 1] - run.times()[after[g]];
    }

    /** Returns whether a gap follows a row. */
    boolean follows(int row) {
        return Arrays.binarySearch(after, row) >= 0;
    }

    /** Returns the time lost in all gaps together: their length less one usual step each. */
    double lost() {
        double lost = 0;
        for (int g = 0; g < after.length; g++) {
            lost += length(g) - typicalStep;
        }
        return lost;
    }

    /** Returns how a run with gaps is refused. */
    RecordingFault refusal(Wording wording) {
        return new RecordingFault("run " + run.id() + ", samples " + (after[0] + 1) + " and " + (after[0] + 2),
                "a gap of " + wording.span(length(0)) + " from " + wording.time(run.times()[after[0]]) + " to "
                        + wording.time(run.times()[after[0] + 1]) + ", the median step is " + wording.span(typicalStep)
                        + " (" + Wording.count(count(), "gap") + " in this run)",
                "have gaps split or interpolated, or raise the gap factor");
    }

    /** Returns what a reader must know about the gaps of this run, if it has any. */
    Optional<Doubt> doubt(GapPolicy policy, Wording wording) {
        if (count() == 0) {
            return Optional.empty();
        }
        StringBuilder text = new StringBuilder("Run ").append(run.id()).append(" has ").append(Wording.count(count(), "gap"))
                .append(policy == GapPolicy.SPLIT ? ", split there: " : ", bridged by interpolation: ");
        for (int g = 0; g < Math.min(count(), NAMED); g++) {
            text.append(g == 0 ? "" : ", ").append(wording.span(length(g))).append(" after ")
                    .append(wording.time(run.times()[after[g]]));
        }
        if (count() > NAMED) {
            text.append(" and ").append(count() - NAMED).append(" more");
        }
        text.append("; the median step is ").append(wording.span(typicalStep));
        if (count() > UNEVEN_SHARE * (run.samples() - 1)) {
            text.append("; so many gaps mean uneven sampling rather than pauses, for which a larger gap factor is right");
        }
        return Optional.of(new Doubt("gaps", text.append('.').toString()));
    }
}
