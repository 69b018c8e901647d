package org.modestead.engine.linalg;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.FitFault;

/** What every implementation of {@link LinearAlgebra} asks of the entries it is given, and promises of those it returns. */
public final class Entries {

    private static final double CLEARLY = 1 + 1e-9;

    private Entries() {}

    /**
     * Refuses a matrix with an entry that is not finite.
     *
     * @param what was to be computed
     * @throws FitFault naming the first such entry
     */
    public static void requireFinite(String what, DMatrixRMaj a) {
        for (int i = 0; i < a.getNumElements(); i++) {
            if (!Double.isFinite(a.data[i])) {
                throw new FitFault(what, "row " + i / a.numCols + ", column " + i % a.numCols + " of a " + a.numRows + " x " + a.numCols
                        + " matrix holds " + a.data[i], "scale the data, or choose functions that stay finite on them");
            }
        }
    }

    /**
     * Fixes the sign of each column by its largest entry, so that equal input gives equal bytes everywhere.
     *
     * @param vectors changed in place
     * @return the same matrix
     */
    public static DMatrixRMaj signed(DMatrixRMaj vectors) {
        for (int j = 0; j < vectors.numCols; j++) {
            double largest = 0;
            for (int i = 0; i < vectors.numRows; i++) {
                double entry = vectors.get(i, j);
                largest = Math.abs(entry) > Math.abs(largest) * CLEARLY ? entry : largest;
            }
            if (largest < 0) {
                CommonOps_DDRM.scaleCol(-1, vectors, j);
            }
        }
        return vectors;
    }
}
