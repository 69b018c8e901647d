package org.modestead.engine.recording;

import java.util.Objects;
import org.ejml.data.DMatrixRMaj;

/**
 * The states of one run after preparation and delay embedding.
 *
 * @param id the run's name
 * @param times time of each state (of its newest sample), length p
 * @param states p x N with N = channels * depth, column {@code delay * channels + channel}
 * @param inputs known inputs over the whole reach of each state, p x q (reach + 1): those at its own time first, then those one
 *     sample earlier, and so on
 * @param weight see {@link Run#weight()}
 */
public record StateRun(String id, double[] times, DMatrixRMaj states, DMatrixRMaj inputs, double weight) {

    /** Checks that the shapes agree. */
    public StateRun {
        Objects.requireNonNull(id);
        if (states.numRows != times.length || inputs.numRows != times.length) {
            throw new IllegalArgumentException("run " + id + ": rows of times, states and inputs differ");
        }
    }

    /** A run of weight 1. */
    public StateRun(String id, double[] times, DMatrixRMaj states, DMatrixRMaj inputs) {
        this(id, times, states, inputs, 1);
    }

    /** Returns the mean time from state to state, of two states or more. */
    public double meanStep() {
        return (times[times.length - 1] - times[0]) / (times.length - 1);
    }

    /** Returns the number of states p. */
    public int count() {
        return times.length;
    }
}
