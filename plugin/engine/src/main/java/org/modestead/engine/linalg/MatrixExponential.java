package org.modestead.engine.linalg;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.MatrixFeatures_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.modestead.engine.FitFault;

/**
 * The exponential of a square matrix by scaling and squaring with the [13/13] Padé approximant.
 *
 * <p>Higham, "The scaling and squaring method for the matrix exponential revisited", SIAM J. Matrix Anal. Appl.
 * 26:1179, 2005, algorithm 2.3 with the degree 13 branch only: at the small sizes met here the saving of the lower
 * degrees is not worth their code. Backward error at most unit roundoff for {@code ‖A/2^s‖₁ ≤ 5.37}.
 */
public final class MatrixExponential {

    private static final double THETA_13 = 5.371920351148152;
    private static final double[] B = {
        64764752532480000.0, 32382376266240000.0, 7771770303897600.0, 1187353796428800.0, 129060195264000.0,
        10559470521600.0, 670442572800.0, 33522128640.0, 1323241920.0, 40840800.0, 960960.0, 16380.0, 182.0, 1.0
    };

    private MatrixExponential() {}

    /**
     * Returns e^A.
     *
     * @param a n x n, finite; not modified
     * @return new n x n matrix
     * @throws FitFault if an entry is not finite
     */
    public static DMatrixRMaj of(DMatrixRMaj a) {
        double norm = NormOps_DDRM.inducedP1(a);
        if (!Double.isFinite(norm) || MatrixFeatures_DDRM.hasUncountable(a)) {
            throw new FitFault("matrix exponential", "an entry is not finite", "a finite operator is needed");
        }
        int squarings = norm > THETA_13 ? (int) Math.ceil(Math.log(norm / THETA_13) / Math.log(2)) : 0;
        DMatrixRMaj out = pade(Matrices.scaled(a, Math.pow(2, -squarings)));
        for (int k = 0; k < squarings; k++) {
            out = Matrices.product(out, out);
        }
        return out;
    }

    private static DMatrixRMaj pade(DMatrixRMaj a) {
        DMatrixRMaj a2 = Matrices.product(a, a);
        DMatrixRMaj a4 = Matrices.product(a2, a2);
        DMatrixRMaj a6 = Matrices.product(a4, a2);
        DMatrixRMaj u = Matrices.product(a6, combine(0, a2, B[9], a4, B[11], a6, B[13]));
        CommonOps_DDRM.addEquals(u, combine(B[1], a2, B[3], a4, B[5], a6, B[7]));
        u = Matrices.product(a, u);
        DMatrixRMaj v = Matrices.product(a6, combine(0, a2, B[8], a4, B[10], a6, B[12]));
        CommonOps_DDRM.addEquals(v, combine(B[0], a2, B[2], a4, B[4], a6, B[6]));
        DMatrixRMaj numerator = new DMatrixRMaj(a.numRows, a.numCols);
        DMatrixRMaj denominator = new DMatrixRMaj(a.numRows, a.numCols);
        CommonOps_DDRM.add(v, u, numerator);
        CommonOps_DDRM.subtract(v, u, denominator);
        DMatrixRMaj out = new DMatrixRMaj(a.numRows, a.numCols);
        if (!CommonOps_DDRM.solve(denominator, numerator, out)) {
            throw new FitFault("matrix exponential", "the Padé denominator is singular", "a finite operator is needed");
        }
        return out;
    }

    private static DMatrixRMaj combine(double c0, DMatrixRMaj a2, double c2, DMatrixRMaj a4, double c4, DMatrixRMaj a6, double c6) {
        DMatrixRMaj out = CommonOps_DDRM.identity(a2.numRows);
        CommonOps_DDRM.scale(c0, out);
        CommonOps_DDRM.addEquals(out, c2, a2);
        CommonOps_DDRM.addEquals(out, c4, a4);
        CommonOps_DDRM.addEquals(out, c6, a6);
        return out;
    }
}
