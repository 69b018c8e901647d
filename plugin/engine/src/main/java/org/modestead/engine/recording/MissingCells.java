package org.modestead.engine.recording;

import java.util.BitSet;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.RecordingFault;

/**
 * The cells of one run that hold no number.
 *
 * @param run the run
 * @param rows rows with at least one missing cell in a channel or an input
 * @param perColumn missing cells of each column, channels first, then inputs
 */
record MissingCells(Run run, BitSet rows, long[] perColumn) {

    /** Finds them. */
    static MissingCells find(Run run) {
        int n = run.values().numCols;
        BitSet rows = new BitSet();
        long[] perColumn = new long[n + run.inputs().numCols];
        count(run.values(), rows, perColumn, 0);
        count(run.inputs(), rows, perColumn, n);
        return new MissingCells(run, rows, perColumn);
    }

    private static void count(DMatrixRMaj values, BitSet rows, long[] perColumn, int offset) {
        int n = values.numCols;
        for (int row = 0, at = 0; row < values.numRows; row++) {
            for (int c = 0; c < n; c++, at++) {
                if (Double.isNaN(values.data[at])) {
                    perColumn[offset + c]++;
                    rows.set(row);
                }
            }
        }
    }

    /** Returns the number of missing cells. */
    long count() {
        long sum = 0;
        for (long column : perColumn) {
            sum += column;
        }
        return sum;
    }

    boolean inRow(int row) {
        return rows.get(row);
    }

    /** Returns whether some row of a stretch has a missing cell. */
    boolean in(Stretch stretch) {
        int next = rows.nextSetBit(stretch.from());
        return next >= 0 && next < stretch.to();
    }

    /** Returns how a run with missing cells is refused. */
    RecordingFault refusal(Wording wording, List<String> columnNames) {
        int row = rows.nextSetBit(0);
        int n = run.values().numCols;
        int column = 0;
        while (!Double.isNaN(column < n ? run.values().get(row, column) : run.inputs().get(row, column - n))) {
            column++;
        }
        return new RecordingFault(wording.sample(run, row) + ", column " + columnNames.get(column),
                "the cell has no number (" + Wording.count(count(), "such cell") + " in this run)",
                "fill the cells, or have them interpolated or split");
    }
}
