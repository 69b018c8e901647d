package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.SampleNoise;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;
import org.modestead.engine.spectrum.ModalExpansion;

/**
 * Runs on which eigenfunctions are judged: those held out, or the training runs where nothing was held out, with the
 * orthonormal functions evaluated once.
 *
 * @param heldOut whether the fit never saw them
 * @param runs with at least two states each
 * @param functions per run, p x R values of the orthonormal functions
 * @param disturbed the same for copies of the runs with further noise, copy after copy, possibly none
 * @param sideways R x P, the functions at the states of all runs one after the other, one function a row; then the same of every copy
 * @param longest duration of the longest run
 */
record JudgingRuns(boolean heldOut, List<StateRun> runs, List<DMatrixRMaj> functions, List<DMatrixRMaj> disturbed,
        List<DMatrixRMaj> sideways, double longest) {

    /** Told where the training runs have to judge. */
    static final Doubt NOTHING_HELD_OUT = new Doubt("nothing-held-out", "No run was held out: residuals were measured on the data the fit saw.");

    private static final int MOST_COPIES = 8;
    private static final int ENOUGH_STATES = 4000;
    private static final long SEED = 7541;

    static JudgingRuns of(FittedOperator operator) {
        Snapshots snapshots = operator.snapshots();
        List<StateRun> held = usable(snapshots, Snapshots.Part.HOLDOUT);
        boolean heldOut = !held.isEmpty();
        List<StateRun> runs = heldOut ? held : usable(snapshots, Snapshots.Part.TRAINING);
        List<DMatrixRMaj> functions = new ArrayList<>();
        for (StateRun run : runs) {
            functions.add(operator.compression().evaluate(operator.compression().arguments(run)));
        }
        double longest = runs.stream().mapToDouble(run -> run.times()[run.count() - 1] - run.times()[0]).max().orElse(0);
        return new JudgingRuns(heldOut, runs, functions, List.of(), List.of(sideways(functions)), longest);
    }

    /**
     * The same with copies of the runs that carry as much noise again, in pairs with opposite signs, so that what is odd in the noise
     * cancels.
     *
     * @param operator that was judged
     * @param noise its level
     * @param progress polled for cancel
     */
    JudgingRuns with(FittedOperator operator, SampleNoise noise, Progress progress) {
        int states = runs.stream().mapToInt(StateRun::count).sum();
        int copies = Math.max(2, Math.min(MOST_COPIES, 2 * (ENOUGH_STATES / (2 * states) + 1)));
        Snapshots snapshots = operator.snapshots();
        List<Run> recorded = snapshots.runs(heldOut ? Snapshots.Part.HOLDOUT : Snapshots.Part.TRAINING).stream()
                .filter(run -> run.samples() - snapshots.delay().reach() > 1).toList();
        List<DMatrixRMaj> noisier = noise.copies(recorded, copies / 2, new Random(SEED)).stream().flatMap(List::stream)
                .map(run -> {
                    progress.checkCancelled();
                    return operator.compression().evaluate(operator.compression().arguments(snapshots.embed(run)));
                }).toList();
        List<DMatrixRMaj> all = new ArrayList<>(sideways);
        for (int copy = 0; copy < copies; copy++) {
            all.add(sideways(noisier.subList(copy * runs.size(), (copy + 1) * runs.size())));
        }
        return new JudgingRuns(heldOut, runs, functions, noisier, List.copyOf(all), longest);
    }

    /**
     * Evaluates the eigenfunctions at all states of the runs.
     *
     * @param expansion on one rung
     * @return per run p x r
     */
    List<ZMatrixRMaj> eigenfunctions(ModalExpansion expansion) {
        return eigenfunctions(expansion, functions);
    }

    /** The same on the copies with further noise. */
    List<ZMatrixRMaj> disturbedEigenfunctions(ModalExpansion expansion) {
        return eigenfunctions(expansion, disturbed);
    }

    private static List<ZMatrixRMaj> eigenfunctions(ModalExpansion expansion, List<DMatrixRMaj> values) {
        return values.stream().map(evaluated -> ComplexMatrices.product(
                Matrices.block(evaluated, 0, evaluated.numRows, 0, expansion.rank()), expansion.vectors())).toList();
    }

    /** The eigenfunctions along the runs, one run after the other; then along every copy with further noise. */
    List<Tracks> tracks(ModalExpansion expansion) {
        return sideways.stream().map(functions -> Tracks.of(expansion, functions)).toList();
    }

    private static DMatrixRMaj sideways(List<DMatrixRMaj> functions) {
        int states = functions.stream().mapToInt(values -> values.numRows).sum();
        DMatrixRMaj out = new DMatrixRMaj(functions.get(0).numCols, states);
        int at = 0;
        for (DMatrixRMaj values : functions) {
            CommonOps_DDRM.insert(CommonOps_DDRM.transpose(values, null), out, 0, at);
            at += values.numRows;
        }
        return out;
    }

    private static List<StateRun> usable(Snapshots snapshots, Snapshots.Part part) {
        return snapshots.states(part).stream().filter(run -> run.count() > 1).toList();
    }
}
