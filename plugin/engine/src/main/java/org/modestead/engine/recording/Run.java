package org.modestead.engine.recording;

import java.util.Arrays;
import java.util.Objects;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Matrices;

/**
 * One uninterrupted recording: {@code p} samples of {@code n} channels and {@code q} inputs at rising times.
 *
 * <p>The arrays are handed over at construction and never written afterwards, by anyone. A missing cell is NaN.
 *
 * @param id the run's name in the table it came from, not empty
 * @param times sample times, length p, strictly rising, in the unit of the {@link TimeAxis}
 * @param values samples, p x n
 * @param inputs known inputs (control), p x q, q may be 0
 * @param leadIn leading samples given only as history (delay coordinates of the first state), in [0, p]; they are
 *     never predicted and never scored
 * @param weight how much each of its samples counts in a fit, at least 0; only the ratio to other runs matters
 */
public record Run(String id, double[] times, DMatrixRMaj values, DMatrixRMaj inputs, int leadIn, double weight) {

    /** Checks that the shapes agree. */
    public Run {
        Objects.requireNonNull(id);
        if (values.numRows != times.length || inputs.numRows != times.length) {
            throw new IllegalArgumentException("run " + id + ": " + times.length + " times, " + values.numRows
                    + " rows of values, " + inputs.numRows + " rows of inputs; the three must agree");
        }
        if (leadIn < 0 || leadIn > times.length) {
            throw new IllegalArgumentException("run " + id + ": lead-in " + leadIn + " of " + times.length + " samples");
        }
        if (!(weight >= 0) || Double.isInfinite(weight)) {
            throw new IllegalArgumentException("run " + id + ": weight " + weight);
        }
    }

    /** A run of weight 1. */
    public Run(String id, double[] times, DMatrixRMaj values, DMatrixRMaj inputs, int leadIn) {
        this(id, times, values, inputs, leadIn, 1);
    }

    /** The same run with another weight. */
    public Run weighted(double other) {
        return new Run(id, times, values, inputs, leadIn, other);
    }

    /** The same run with other values, p x n. */
    public Run withValues(DMatrixRMaj other) {
        return new Run(id, times, other, inputs, leadIn, weight);
    }

    /** The samples [from, to) of this run, without lead-in. */
    public Run cut(int from, int to) {
        return new Run(id, Arrays.copyOfRange(times, from, to), Matrices.block(values, from, to, 0, values.numCols),
                Matrices.block(inputs, from, to, 0, inputs.numCols), 0, weight);
    }

    /**
     * A run without inputs and without lead-in.
     *
     * @param id not empty
     * @param times length p, strictly rising
     * @param values p x n
     */
    public Run(String id, double[] times, DMatrixRMaj values) {
        this(id, times, values, new DMatrixRMaj(times.length, 0), 0);
    }

    /** Returns the number of samples p. */
    public int samples() {
        return times.length;
    }

    /** Returns last time minus first time, in the time unit. */
    public double duration() {
        return times[times.length - 1] - times[0];
    }
}
