package org.modestead.engine.refine;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebra.Svd;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.Run;

/**
 * A model at given rates with the best weights: {@code R = Y - Φ Φ⁺ Y} for every run, stacked run by run, row by row.
 *
 * @param model at its rates
 * @param runs fitted
 * @param factors Φ = U S Vᵀ a run
 * @param weights Φ⁺ Y a run, q x c
 * @param residuals R a run, n x c
 */
record ProjectedFit(RateModel model, List<Run> runs, List<Svd> factors, List<DMatrixRMaj> weights,
        List<DMatrixRMaj> residuals) {

    static ProjectedFit of(RateModel model, List<Run> runs) {
        List<Svd> factors = new ArrayList<>();
        List<DMatrixRMaj> weights = new ArrayList<>();
        List<DMatrixRMaj> residuals = new ArrayList<>();
        for (Run run : runs) {
            DMatrixRMaj functions = model.values(run.times());
            Svd svd = LinearAlgebra.installed().svd(functions);
            DMatrixRMaj coefficients = Matrices.transposeProduct(svd.u(), run.values());
            divideRows(coefficients, svd);
            DMatrixRMaj best = Matrices.product(svd.v(), coefficients);
            DMatrixRMaj residual = new DMatrixRMaj(run.values().numRows, run.values().numCols);
            CommonOps_DDRM.subtract(run.values(), Matrices.product(functions, best), residual);
            factors.add(svd);
            weights.add(best);
            residuals.add(residual);
        }
        return new ProjectedFit(model, runs, factors, weights, residuals);
    }

    /** Returns the sum of squared residuals. */
    double residualSum() {
        double sum = 0;
        for (DMatrixRMaj residual : residuals) {
            sum += squares(residual);
        }
        return sum;
    }

    private static double squares(DMatrixRMaj a) {
        double norm = NormOps_DDRM.fastNormF(a);
        return norm * norm;
    }

    /** Returns all residuals in one column. */
    DMatrixRMaj stacked() {
        DMatrixRMaj out = new DMatrixRMaj(residuals.stream().mapToInt(DMatrixRMaj::getNumElements).sum(), 1);
        int at = 0;
        for (DMatrixRMaj residual : residuals) {
            System.arraycopy(residual.data, 0, out.data, at, residual.getNumElements());
            at += residual.getNumElements();
        }
        return out;
    }

    /**
     * Returns the derivative of the residuals with respect to the free parameters, N x k. With {@code P = I - Φ Φ⁺} and
     * {@code D} the derivative of Φ, a column is {@code -(P D Φ⁺ + (P D Φ⁺)ᵀ) Y}.
     *
     * <p>Golub and Pereyra, SIAM J. Numer. Anal. 10:413, 1973. Without the second term (Kaufman, BIT 15:49, 1975) it is the
     * derivative with respect to the rates in the joint problem of rates and weights, after the weights are eliminated,
     * which carries the standard errors.
     *
     * @param whole whether the second term is included
     */
    DMatrixRMaj jacobian(boolean whole) {
        List<FreeRate> free = model.free();
        DMatrixRMaj out = new DMatrixRMaj(residuals.stream().mapToInt(DMatrixRMaj::getNumElements).sum(), free.size());
        int at = 0;
        for (int i = 0; i < runs.size(); i++) {
            for (int k = 0; k < free.size(); k++) {
                DMatrixRMaj change = change(i, model.derivative(runs.get(i).times(), free.get(k)), whole);
                for (int e = 0; e < change.getNumElements(); e++) {
                    out.set(at + e, k, -change.data[e]);
                }
            }
            at += residuals.get(i).getNumElements();
        }
        return out;
    }

    private DMatrixRMaj change(int run, DMatrixRMaj derivative, boolean whole) {
        Svd svd = factors.get(run);
        DMatrixRMaj moved = Matrices.product(derivative, weights.get(run));
        DMatrixRMaj change = new DMatrixRMaj(moved.numRows, moved.numCols);
        CommonOps_DDRM.subtract(moved, Matrices.product(svd.u(), Matrices.transposeProduct(svd.u(), moved)), change);
        if (whole) {
            DMatrixRMaj along = Matrices.transposeProduct(derivative, residuals.get(run));
            DMatrixRMaj slope = Matrices.transposeProduct(svd.v(), along);
            divideRows(slope, svd);
            CommonOps_DDRM.addEquals(change, Matrices.product(svd.u(), slope));
        }
        return change;
    }

    /** Divides by the singular values; those that are rounding take no part, as in the pseudo-inverse. */
    private static void divideRows(DMatrixRMaj a, Svd svd) {
        double[] singular = svd.values();
        double floor = Math.ulp(1.0) * svd.u().numRows * singular[0];
        for (int i = 0; i < a.numRows; i++) {
            double factor = singular[i] > floor ? 1 / singular[i] : 0;
            for (int k = 0; k < a.numCols; k++) {
                a.data[i * a.numCols + k] *= factor;
            }
        }
    }
}
