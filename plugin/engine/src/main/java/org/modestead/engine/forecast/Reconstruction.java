package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;

/**
 * Every observed sample as the fitted functions show it: the projection of the full-state observable,
 * {@code g(x) ≈ Σ_j ξ_j φ_j(x) = q(x) <g, q>}, evaluated at each state, newest sample only, with what inputs explain
 * at once where they are separated. Nothing is forecast.
 *
 * @param rows by part (training, calibration, holdout), run, time and channel; lead-in samples are left out
 * @param doubts values that are not finite
 */
record Reconstruction(List<ReconstructionRow> rows, List<Doubt> doubts) {

    // States evaluated at once: bounds the memory to this many rows of basis functions.
    private static final int BLOCK = 1024;

    static Reconstruction of(Snapshots snapshots, FittedOperator operator, Progress progress) {
        OrthonormalCompression chosen = operator.chosen();
        int n = snapshots.channels().size();
        DMatrixRMaj newest = Matrices.block(chosen.observable(), 0, chosen.rank(), 0, n);
        List<ReconstructionRow> rows = new ArrayList<>();
        for (Snapshots.Part part : Snapshots.Part.values()) {
            for (Run run : snapshots.runs(part)) {
                if (run.samples() > snapshots.delay().reach()) {
                    addRun(snapshots, run, chosen, newest, rows, progress);
                }
            }
        }
        return new Reconstruction(rows, doubts(rows));
    }

    private static void addRun(Snapshots snapshots, Run run, OrthonormalCompression chosen, DMatrixRMaj newest,
            List<ReconstructionRow> rows, Progress progress) {
        StateRun states = snapshots.embed(run);
        DMatrixRMaj arguments = chosen.arguments(states);
        int first = Math.max(0, run.leadIn() - snapshots.delay().reach());
        for (int from = first; from < states.count(); from += BLOCK) {
            progress.checkCancelled();
            int to = Math.min(states.count(), from + BLOCK);
            DMatrixRMaj block = Matrices.block(states.states(), from, to, 0, states.states().numCols);
            DMatrixRMaj values = values(chosen, newest, Matrices.block(arguments, from, to, 0, arguments.numCols));
            for (int k = 0; k < values.numRows; k++) {
                addState(snapshots.preparation(), run.id(), states.times()[from + k], k, block, values, rows);
            }
        }
    }

    private static DMatrixRMaj values(OrthonormalCompression chosen, DMatrixRMaj newest, DMatrixRMaj arguments) {
        DMatrixRMaj values = Matrices.product(chosen.evaluate(arguments), newest);
        chosen.inputs().ifPresent(effect -> {
            DMatrixRMaj explained = Matrices.product(effect.values(arguments), effect.observedNow());
            CommonOps_DDRM.addEquals(values, Matrices.block(explained, 0, values.numRows, 0, values.numCols));
        });
        return values;
    }

    private static void addState(Preparation preparation, String run, double time, int row, DMatrixRMaj observed,
            DMatrixRMaj values, List<ReconstructionRow> rows) {
        for (int c = 0; c < values.numCols; c++) {
            rows.add(new ReconstructionRow(run, time, c, preparation.restore(c, time, observed.get(row, c)),
                    preparation.restore(c, time, values.get(row, c))));
        }
    }

    private static List<Doubt> doubts(List<ReconstructionRow> rows) {
        long bad = rows.stream().filter(row -> !Double.isFinite(row.reconstructed())).count();
        return bad == 0 ? List.of() : List.of(new Doubt("reconstruction-not-finite", bad + " of " + rows.size()
                + " reconstructed values are not finite: the functions overflow at these states."));
    }
}
