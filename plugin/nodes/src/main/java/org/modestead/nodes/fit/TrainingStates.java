package org.modestead.nodes.fit;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;

/** All training states in one matrix, one a row. */
final class TrainingStates {

    private TrainingStates() {}

    static DMatrixRMaj of(Snapshots snapshots) {
        List<StateRun> runs = snapshots.states(Snapshots.Part.TRAINING);
        int count = runs.stream().mapToInt(StateRun::count).sum();
        if (count == 0) {
            throw new FitFault("training states", "no training run is long enough for a state of "
                    + snapshots.delay().depth()
                    + " samples", "lower the delay depth or record longer runs");
        }
        DMatrixRMaj all = new DMatrixRMaj(count, snapshots.stateSize());
        int row = 0;
        for (StateRun run : runs) {
            System.arraycopy(run.states().data, 0, all.data, row * all.numCols, run.count() * all.numCols);
            row += run.count();
        }
        return all;
    }
}
