package org.modestead.engine.spectrum;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;

/**
 * Eigenvalues, eigenfunctions and weights of a fitted operator at its chosen rank r.
 *
 * @param eigenvalues r eigenvalues of the compressed operator, as they come (multipliers for a step map)
 * @param rates r rates λ in continuous time, same order
 * @param vectors r x r, columns of unit length: eigenfunction {@code φ_j = Σ_i v_ij q_i}
 * @param joint r x N joint weights, least squares {@code V ξ = <g, q>}: {@code g ≈ Σ_j ξ_j φ_j}
 * @param solo r x N solo weights {@code v_j* <g, q>}: each eigenfunction alone
 * @param modes by falling energy share, numbered from 1
 * @param channels of the snapshots
 * @param delay of the snapshots
 * @param preparation of the snapshots: how prepared units become those of the channels
 * @param timeUnit unit of time, empty when unknown
 * @param doubts what a reader of the results must know
 */
public record Spectrum(
        List<Complex> eigenvalues,
        List<Complex> rates,
        ZMatrixRMaj vectors,
        ZMatrixRMaj joint,
        ZMatrixRMaj solo,
        List<Mode> modes,
        List<Channel> channels,
        DelayEmbedding delay,
        Preparation preparation,
        String timeUnit,
        List<Doubt> doubts) {

    /** Takes immutable copies. */
    public Spectrum {
        eigenvalues = List.copyOf(eigenvalues);
        rates = List.copyOf(rates);
        modes = List.copyOf(modes);
        channels = List.copyOf(channels);
        doubts = List.copyOf(doubts);
    }

    /** Returns the rank r. */
    public int rank() {
        return rates.size();
    }

    /** Returns the same spectrum with other modes and further doubts. */
    public Spectrum with(List<Mode> others, List<Doubt> further) {
        List<Doubt> all = new ArrayList<>(doubts);
        all.addAll(further);
        return new Spectrum(eigenvalues, rates, vectors, joint, solo, others, channels, delay, preparation, timeUnit, all);
    }
}
