package org.modestead.engine.spectrum;

import java.util.List;
import java.util.function.Function;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;

/**
 * Training states at which eigenfunctions are evaluated to measure sizes: all of them, or evenly spaced ones where there
 * are very many.
 *
 * @param states p x N, with the inputs where they are separated
 * @param starts first state of every run, likewise
 * @param channels n, number of components that are the newest sample; the last n are the oldest one
 * @param longest duration of the longest run in time units
 */
public record TrainingSample(DMatrixRMaj states, DMatrixRMaj starts, int channels, double longest) {

    private static final int MOST = 4000;

    /** Collects the states of the training part. */
    public static TrainingSample of(Snapshots snapshots) {
        return of(snapshots, StateRun::states);
    }

    /** Collects what the functions of an operator are evaluated at over the training part. */
    public static TrainingSample of(FittedOperator operator) {
        return of(operator.snapshots(), operator.chosen()::arguments);
    }

    private static TrainingSample of(Snapshots snapshots, Function<StateRun, DMatrixRMaj> arguments) {
        List<StateRun> runs = snapshots.states(Snapshots.Part.TRAINING);
        int total = runs.stream().mapToInt(StateRun::count).sum();
        if (total == 0) {
            throw new FitFault("training part", "no run is long enough for one state", "use longer runs or a smaller delay depth");
        }
        int every = Math.max(1, (total + MOST - 1) / MOST);
        if (runs.size() == 1 && every == 1) {
            return ofOne(runs.get(0), arguments.apply(runs.get(0)), snapshots.channels().size());
        }
        int n = arguments.apply(runs.get(0)).numCols;
        DMatrixRMaj states = new DMatrixRMaj((total + every - 1) / every, n);
        DMatrixRMaj starts = new DMatrixRMaj(runs.size(), n);
        int seen = 0;
        int kept = 0;
        double longest = 0;
        for (int i = 0; i < runs.size(); i++) {
            StateRun run = runs.get(i);
            DMatrixRMaj all = arguments.apply(run);
            System.arraycopy(all.data, 0, starts.data, i * n, n);
            longest = Math.max(longest, run.times()[run.count() - 1] - run.times()[0]);
            for (int k = 0; k < run.count(); k++, seen++) {
                if (seen % every == 0) {
                    System.arraycopy(all.data, k * n, states.data, kept * n, n);
                    kept++;
                }
            }
        }
        return new TrainingSample(states, starts, snapshots.channels().size(), longest);
    }

    /** All states of a single run, which are not copied. */
    private static TrainingSample ofOne(StateRun run, DMatrixRMaj states, int channels) {
        return new TrainingSample(states, Matrices.block(states, 0, 1, 0, states.numCols), channels, run.times()[run.count() - 1] - run.times()[0]);
    }
}
