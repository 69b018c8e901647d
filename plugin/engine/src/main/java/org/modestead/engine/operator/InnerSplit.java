package org.modestead.engine.operator;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.FitFault;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;

/**
 * Training data split once more, for choices made before the final fit: the last quarter of the runs when there are at
 * least four, otherwise the last quarter of every run. Runs of weight 0 take no part; holdout and calibration parts are not looked at
 * and not handed on.
 *
 * @param fitting snapshots whose training part is the first three quarters and whose holdout part is the last one
 * @param judging states of the last quarter
 */
public record InnerSplit(Snapshots fitting, List<StateRun> judging) {

    private static final int ENOUGH_RUNS = 4;

    /** Takes an immutable copy. */
    public InnerSplit {
        judging = List.copyOf(judging);
    }

    /**
     * Splits the training part of snapshots.
     *
     * @throws FitFault if the training runs are too short to leave a quarter out
     */
    public static InnerSplit of(Snapshots snapshots) {
        List<Run> runs = snapshots.training().stream().filter(run -> run.weight() > 0).toList();
        List<Run> first = new ArrayList<>();
        List<Run> last = new ArrayList<>();
        if (runs.size() >= ENOUGH_RUNS) {
            int cut = runs.size() - runs.size() / 4;
            first.addAll(runs.subList(0, cut));
            last.addAll(runs.subList(cut, runs.size()));
        } else {
            for (Run run : runs) {
                int cut = run.samples() - run.samples() / 4;
                first.add(run.cut(0, cut));
                last.add(run.cut(Math.max(0, cut - 1 - snapshots.delay().reach()), run.samples()));
            }
        }
        Snapshots fitting = snapshots.replaced(first, last, snapshots.smoothing());
        List<StateRun> judging = fitting.states(Snapshots.Part.HOLDOUT).stream().filter(run -> run.count() > 1).toList();
        if (judging.isEmpty()) {
            throw new FitFault("choice by held-out data", "the training runs are too short to leave a quarter out",
                    "use longer runs, a smaller delay depth, or choose by another rule");
        }
        return new InnerSplit(fitting, judging);
    }
}
