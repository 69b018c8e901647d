package org.modestead.engine.operator;

import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;

/**
 * States and where they went one step later, over all runs of a part.
 *
 * @param now x, m x N
 * @param next y, m x N
 * @param step time from x to y
 * @param runs they come from, each longer than the stride
 * @param inputs q, number of known inputs
 * @param reach samples before its own time that a state reaches back
 * @param stride sampling steps from x to y
 */
record StatePairs(DMatrixRMaj now, DMatrixRMaj next, double step, List<StateRun> runs, int inputs, int reach, int stride) {

    /**
     * @param snapshots with a uniform step
     * @param part whose runs are paired
     * @param stride sampling steps from x to y, at least 1
     * @throws FitFault if the times are uneven or no run is long enough
     */
    static StatePairs of(Snapshots snapshots, Snapshots.Part part, int stride) {
        double step = snapshots.step().orElseThrow(() -> new FitFault("operator", "the snapshots keep uneven times",
                "resample to a uniform step, or fit the generator, which reads uneven times"));
        List<StateRun> runs = snapshots.states(part).stream().filter(run -> run.count() > stride).toList();
        int m = runs.stream().mapToInt(run -> run.count() - stride).sum();
        if (m == 0) {
            throw new FitFault("operator", "no run is longer than " + stride + " state" + (stride == 1 ? "" : "s") + " after delay embedding",
                    "use longer runs, a smaller delay depth or a smaller step");
        }
        return of(snapshots, runs, m, stride, step);
    }

    /** The pairs of each run by itself; runs without a pair are left out. */
    static Stream<StatePairs> perRun(Snapshots snapshots, Snapshots.Part part, int stride) {
        double step = snapshots.step().orElseThrow();
        return snapshots.states(part).stream().filter(run -> run.count() > stride)
                .map(run -> of(snapshots, List.of(run), run.count() - stride, stride, step));
    }

    private static StatePairs of(Snapshots snapshots, List<StateRun> runs, int m, int stride, double step) {
        int n = snapshots.stateSize();
        // the states of a single run but its last are there already
        DMatrixRMaj now = runs.size() == 1 ? DMatrixRMaj.wrap(m, n, runs.get(0).states().data) : new DMatrixRMaj(m, n);
        DMatrixRMaj next = new DMatrixRMaj(m, n);
        int at = 0;
        for (StateRun run : runs) {
            int count = run.count() - stride;
            if (runs.size() > 1) {
                System.arraycopy(run.states().data, 0, now.data, at * n, count * n);
            }
            System.arraycopy(run.states().data, stride * n, next.data, at * n, count * n);
            at += count;
        }
        return new StatePairs(now, next, stride * step, runs, snapshots.inputs().size(), snapshots.delay().reach(), stride);
    }

    /** Returns the weights of the pairs, those of their runs. */
    RowWeights weights() {
        double[] out = new double[count()];
        int at = 0;
        for (StateRun run : runs) {
            Arrays.fill(out, at, at + run.count() - stride, run.weight());
            at += run.count() - stride;
        }
        return RowWeights.of(out);
    }

    /** Returns the inputs that act between x and y, m x size. */
    DMatrixRMaj windows(InputWindow window) {
        DMatrixRMaj out = new DMatrixRMaj(count(), window.size());
        int at = 0;
        for (StateRun run : runs) {
            int length = (run.count() - stride) * window.size();
            System.arraycopy(window.of(run).data, 0, out.data, at, length);
            at += length;
        }
        return out;
    }

    /** Returns the number of pairs in the training runs, without making the states. */
    static long number(Snapshots snapshots, int stride) {
        return snapshots.runs(Snapshots.Part.TRAINING).stream().filter(run -> run.weight() > 0)
                .mapToLong(run -> Math.max(0, run.samples() - snapshots.delay().reach() - stride)).sum();
    }

    /** Returns whether some training run has a pair at this stride. */
    static boolean exist(Snapshots snapshots, int stride) {
        return snapshots.states(Snapshots.Part.TRAINING).stream().anyMatch(run -> run.count() > stride);
    }

    /** Returns the number of pairs m. */
    int count() {
        return now.numRows;
    }
}
