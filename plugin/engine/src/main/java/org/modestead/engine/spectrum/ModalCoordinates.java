package org.modestead.engine.spectrum;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;

/**
 * Where the states of a recording stand in the modes of a spectrum: {@code z_j(t) = φ_j(x(t))}, the eigenfunctions of unit length in the
 * inner product of the fit. As far as the mode holds, {@code z_j(t + τ) = e^(λ_j τ) z_j(t)}; with the joint weights ξ the prepared
 * values of the newest sample are rebuilt by {@code Σ_j ξ_jk z_j(t)}, a conjugate pair by twice the real part of its first member.
 *
 * <p>Nothing is fitted, so any recording prepared as that of the fit will do.
 */
public final class ModalCoordinates {

    // States evaluated at once: bounds the memory to this many rows of basis functions.
    private static final int BLOCK = 1024;

    private ModalCoordinates() {}

    /** Takes the coordinates one by one. */
    @FunctionalInterface
    public interface Taker {
        /**
         * @param time of the newest sample of the state
         * @param mode with a coordinate
         * @param value z, of the mode's first eigenvalue
         */
        void take(double time, Mode mode, Complex value);
    }

    /** Returns the modes that have a coordinate: members of a cluster of nearly equal eigenvalues have none that is their own. */
    public static List<Mode> modes(Spectrum spectrum) {
        return spectrum.modes().stream().filter(mode -> mode.cluster() == 0).toList();
    }

    /**
     * Hands over the coordinates of every state of a run, in order of time, then of the modes; samples that only lead in are left out.
     *
     * @param snapshots the run is of, prepared as those of the fit
     * @param operator fitted
     * @param spectrum of that operator
     * @param progress asked before each thousand states
     */
    public static void of(Snapshots snapshots, Run run, FittedOperator operator, Spectrum spectrum, Progress progress, Taker taker) {
        StateRun states = snapshots.embed(run);
        OrthonormalCompression chosen = operator.chosen();
        DMatrixRMaj arguments = chosen.arguments(states);
        List<Mode> modes = modes(spectrum);
        for (int from = Math.max(0, run.leadIn() - snapshots.delay().reach()); from < states.count(); from += BLOCK) {
            progress.checkCancelled();
            int to = Math.min(states.count(), from + BLOCK);
            ZMatrixRMaj values = ComplexMatrices.product(chosen.evaluate(Matrices.block(arguments, from, to, 0, arguments.numCols)), spectrum.vectors());
            for (int k = 0; k < values.numRows; k++) {
                for (Mode mode : modes) {
                    int j = mode.indices().get(0);
                    taker.take(states.times()[from + k], mode, new Complex(values.getReal(k, j), values.getImag(k, j)));
                }
            }
        }
    }
}
