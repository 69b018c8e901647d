package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.DoubleStream;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.Snapshots.Part;

/**
 * What may be fitted when a forecast of one run starts: the training part and that run up to the origin.
 *
 * <p>Other runs of calibration and holdout stay unseen, whenever they were recorded: runs may be separate experiments
 * whose clocks all start at 0, so that times do not tell what came first.
 */
final class KnownAt {

    private static final double CONTIGUOUS = 1.5;
    private static final double ROUNDING = 1e-6;

    private KnownAt() {}

    /**
     * @param all with the preparation made from the training part
     * @param run id of the run that is forecast
     * @param time of the origin, included
     * @param step Δt in time units, positive; a longer pause than 1.5 steps starts a new run
     * @return with nothing in calibration and holdout
     */
    static Snapshots of(Snapshots all, String run, double time, double step) {
        List<Run> known = new ArrayList<>(all.training());
        for (Part part : List.of(Part.CALIBRATION, Part.HOLDOUT)) {
            all.runs(part).stream().filter(later -> later.id().equals(run))
                    .forEach(later -> append(known, later, time + ROUNDING * step, step));
        }
        return all.replaced(known, List.of(), all.smoothing());
    }

    private static void append(List<Run> known, Run later, double until, double step) {
        int last = last(known, later.id());
        double end = last < 0 ? Double.NEGATIVE_INFINITY : end(known.get(last));
        int from = count(later.times(), end + ROUNDING * step);
        int to = count(later.times(), until);
        if (from >= to) {
            return;
        }
        Run more = later.cut(from, to);
        if (last >= 0 && more.times()[0] - end <= CONTIGUOUS * step) {
            known.set(last, joined(known.get(last), more));
        } else {
            known.add(more);
        }
    }

    private static int last(List<Run> known, String id) {
        return known.stream().map(Run::id).toList().lastIndexOf(id);
    }

    private static double end(Run run) {
        return run.times()[run.samples() - 1];
    }

    private static int count(double[] times, double until) {
        int count = 0;
        while (count < times.length && times[count] <= until) {
            count++;
        }
        return count;
    }

    private static Run joined(Run before, Run after) {
        double[] times = DoubleStream.concat(Arrays.stream(before.times()),
                Arrays.stream(after.times())).toArray();
        return new Run(before.id(), times, CommonOps_DDRM.concatRowsMulti(before.values(), after.values()),
                CommonOps_DDRM.concatRowsMulti(before.inputs(), after.inputs()), before.leadIn(), before.weight());
    }
}
