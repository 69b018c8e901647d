package org.modestead.engine.operator;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.EndState;
import org.modestead.engine.basis.OccupationFunctions.Segment;
import org.modestead.engine.basis.Quadrature;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.StateRun;

/** Cuts runs into segments that share their end points, so that nothing of a run is left out. */
final class Segments {

    private Segments() {}

    static List<Segment> of(List<StateRun> runs, SegmentPlan plan) {
        List<Segment> segments = new ArrayList<>();
        for (StateRun run : runs) {
            int steps = run.count() - 1;
            if (steps < 1) {
                continue;
            }
            int length = plan.samples() == 0 ? steps : Math.min(plan.samples(), steps);
            int count = Math.max(1, Math.round((float) steps / length));
            for (int k = 0; k < count; k++) {
                int from = k * length;
                int to = k == count - 1 ? steps : from + length;
                segments.add(segment(run, from, to, plan.endSmoothing()));
            }
        }
        return segments;
    }

    private static Segment segment(StateRun run, int from, int to, int smoothing) {
        double[] times = Arrays.copyOfRange(run.times(), from, to + 1);
        DMatrixRMaj states = Matrices.block(run.states(), from, to + 1, 0, run.states().numCols);
        return new Segment(times, states, Quadrature.weights(times), EndState.of(run.times(), run.states(), from, smoothing),
                EndState.of(run.times(), run.states(), to, smoothing), run.weight());
    }
}
