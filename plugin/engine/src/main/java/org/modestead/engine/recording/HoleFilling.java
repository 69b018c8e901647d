package org.modestead.engine.recording;

import java.util.BitSet;
import org.ejml.data.DMatrixRMaj;

/**
 * Interpolates missing cells, each column on its own, with {@link MonotoneCubic} through the three numbers before a hole
 * and the three after it: all that its curve there depends on.
 */
final class HoleFilling {
    private static final int NEIGHBOURS = 3;

    private final Run run;
    private final BitSet rows;
    private final Stretch stretch;
    private final DMatrixRMaj values;
    private final DMatrixRMaj inputs;

    /**
     * @param missing the run and its missing cells
     * @param stretch rows of the run that are filled
     * @param values channels of these rows, filled in place
     * @param inputs inputs of these rows, filled in place
     */
    HoleFilling(MissingCells missing, Stretch stretch, DMatrixRMaj values, DMatrixRMaj inputs) {
        this.run = missing.run();
        this.rows = missing.rows();
        this.stretch = stretch;
        this.values = values;
        this.inputs = inputs;
    }

    /**
     * Fills the holes of a stage from numbers before its end.
     *
     * @param from first row of the stage, counted from the start of the stretch
     * @param to one past its last row; every hole that starts in the stage ends before
     * @param filled raised by the number of cells filled in each column, channels first
     */
    void fill(int from, int to, long[] filled) {
        int end = stretch.from() + to;
        for (int row = rows.nextSetBit(stretch.from() + from); row >= 0 && row < end; row = rows.nextSetBit(row + 1)) {
            fillRow(run.values(), values, row, end, filled, 0);
            fillRow(run.inputs(), inputs, row, end, filled, values.numCols);
        }
    }

    private void fillRow(DMatrixRMaj recorded, DMatrixRMaj result, int row, int end, long[] filled, int offset) {
        for (int c = 0; c < recorded.numCols; c++) {
            if (Double.isNaN(result.unsafe_get(row - stretch.from(), c))) {
                filled[offset + c] += fillHole(recorded, result, c, row, end);
            }
        }
    }

    /** Fills one hole that starts at a row, and returns its length. */
    private int fillHole(DMatrixRMaj recorded, DMatrixRMaj result, int column, int row, int end) {
        int length = 1;
        while (Double.isNaN(recorded.unsafe_get(row + length, column))) {
            length++;
        }
        int[] known = new int[2 * NEIGHBOURS];
        int before = 0;
        for (int r = row - 1; r >= stretch.from() && before < NEIGHBOURS; r--) {
            if (!Double.isNaN(recorded.unsafe_get(r, column))) {
                known[NEIGHBOURS - ++before] = r;
            }
        }
        int last = NEIGHBOURS;
        for (int r = row + length; r < end && last < known.length; r++) {
            if (!Double.isNaN(recorded.unsafe_get(r, column))) {
                known[last++] = r;
            }
        }
        DMatrixRMaj curve = curve(recorded, column, known, NEIGHBOURS - before, last, row, length);
        for (int k = 0; k < length; k++) {
            result.unsafe_set(row - stretch.from() + k, column, curve.data[k]);
        }
        return length;
    }

    private DMatrixRMaj curve(DMatrixRMaj recorded, int column, int[] known, int first, int last, int row, int length) {
        double[] times = new double[known.length];
        DMatrixRMaj numbers = new DMatrixRMaj(known.length, 1);
        for (int k = first; k < last; k++) {
            times[k] = run.times()[known[k]];
            numbers.data[k] = recorded.unsafe_get(known[k], column);
        }
        double[] targets = new double[length];
        System.arraycopy(run.times(), row, targets, 0, length);
        DMatrixRMaj curve = new DMatrixRMaj(length, 1);
        new MonotoneCubic(times, numbers, first, last).evaluate(targets, 0, length, curve);
        return curve;
    }
}
