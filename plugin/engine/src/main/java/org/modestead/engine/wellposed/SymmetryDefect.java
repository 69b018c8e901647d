package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.modestead.engine.Progress;

/**
 * Whether the compression is self-adjoint: {@code ‖Ã - Ã*‖_F / ‖Ã‖_F}, 0 when it is, 2 when it is skew.
 * Read from the action alone, before any eigenvalue is computed. Informs; a self-adjoint operator has real rates and
 * orthogonal eigenfunctions.
 */
public final class SymmetryDefect implements Check {

    @Override
    public String id() {
        return "symmetry-defect";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        double defect = of(evidence.operator().chosen().action());
        return List.of(new Finding(0, id(), defect, Double.NaN, true, String.format(Locale.ROOT,
                "The compressed operator differs from its adjoint by %.3g of its size%s.%s", defect,
                defect < 1e-6 ? ": it is self-adjoint to rounding, so its eigenfunctions are orthogonal" : "",
                Imposed.sentence(evidence.operator(), SymmetryDefect::of))));
    }

    /** Returns the defect of a square matrix; 0 for the zero matrix. */
    public static double of(DMatrixRMaj action) {
        DMatrixRMaj difference = action.copy();
        CommonOps_DDRM.subtractEquals(difference, CommonOps_DDRM.transpose(action, null));
        double size = NormOps_DDRM.normF(action);
        return size == 0 ? 0 : NormOps_DDRM.normF(difference) / size;
    }
}
