package org.modestead.engine.recording;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * The samples of one stretch without missing cells, in the three stages training, calibration, holdout.
 *
 * <p>A missing cell is interpolated in its own column from samples of its own and earlier stages only, so that nothing a
 * fit reads depends on what judges it. Rows before the first number of some column, and after the last one of a stage,
 * cannot be interpolated: the former are left out, the latter go to the next stage or, at the very end, are left out.
 *
 * @param times rows' times; arrays may hold more rows than used
 * @param values rows' channels
 * @param inputs rows' inputs
 * @param from first row used
 * @param ends one past the last row of each stage, three entries, never falling, at least {@code from}
 * @param filled interpolated cells of each column, channels first, then inputs
 */
record StagedRows(double[] times, DMatrixRMaj values, DMatrixRMaj inputs, int from, int[] ends, long[] filled) {

    /**
     * Prepares one stretch.
     *
     * @param missing the run and its missing cells
     * @param stretch rows of the run
     * @param cut where the stages end in the run
     */
    static StagedRows of(MissingCells missing, Stretch stretch, Cut cut) {
        Run run = missing.run();
        int[] ends = {stretch.clamp(cut.trainingEnd()), stretch.clamp(cut.calibrationEnd()), stretch.to()};
        long[] filled = new long[run.values().numCols + run.inputs().numCols];
        if (!missing.in(stretch)) {
            return new StagedRows(run.times(), run.values(), run.inputs(), stretch.from(), ends, filled);
        }
        double[] times = Arrays.copyOfRange(run.times(), stretch.from(), stretch.to());
        DMatrixRMaj values = rows(run.values(), stretch);
        DMatrixRMaj inputs = rows(run.inputs(), stretch);
        int from = Math.max(firstComplete(values), firstComplete(inputs));
        for (int j = 0; j < ends.length; j++) {
            int end = ends[j] - stretch.from();
            ends[j] = Math.max(from, Math.min(lastComplete(values, end), lastComplete(inputs, end)));
        }
        HoleFilling holes = new HoleFilling(missing, stretch, values, inputs);
        int done = from;
        for (int end : ends) {
            holes.fill(done, end, filled);
            done = Math.max(done, end);
        }
        return new StagedRows(times, values, inputs, from, ends, filled);
    }

    /** Returns the number of rows used. */
    int length() {
        return ends[2] - from;
    }

    private static DMatrixRMaj rows(DMatrixRMaj all, Stretch stretch) {
        int n = all.numCols;
        DMatrixRMaj part = new DMatrixRMaj(stretch.length(), n);
        System.arraycopy(all.data, stretch.from() * n, part.data, 0, stretch.length() * n);
        return part;
    }

    /** First row at which every column has had a number; the number of rows when some column has none. */
    private static int firstComplete(DMatrixRMaj values) {
        int first = 0;
        for (int c = 0; c < values.numCols; c++) {
            int row = 0;
            while (row < values.numRows && Double.isNaN(values.unsafe_get(row, c))) {
                row++;
            }
            first = Math.max(first, row);
        }
        return first;
    }

    /** Largest end, at most {@code end}, such that every column still has a number at or after the row before it. */
    private static int lastComplete(DMatrixRMaj values, int end) {
        int last = end;
        for (int c = 0; c < values.numCols; c++) {
            int row = end;
            while (row > 0 && Double.isNaN(values.unsafe_get(row - 1, c))) {
                row--;
            }
            last = Math.min(last, row);
        }
        return last;
    }
}
