package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.spectrum.ModalExpansion;

/**
 * Whether the compression commutes with its adjoint, {@code ‖ÃÃ* - Ã*Ã‖_F / ‖Ã‖_F²}, and Henrici's departure from
 * normality {@code √(‖Ã‖_F² - Σ|λ|²)}. A normal operator, and only a normal one, has an orthogonal eigenbasis. Informs.
 *
 * <p>Henrici, Numer. Math. 4:24, 1962.
 */
public final class NormalityDefect implements Check {

    @Override
    public String id() {
        return "normality-defect";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        ModalExpansion fitted = evidence.fitted();
        DMatrixRMaj action = fitted.compression().action();
        double defect = of(action);
        return List.of(new Finding(0, id(), defect, Double.NaN, true, String.format(Locale.ROOT,
                "The compressed operator fails to commute with its adjoint by %.3g of its squared size; departure from normality %.3g.",
                defect, departure(action, fitted.eigenvalues()))));
    }

    /** Returns the relative commutator norm; 0 for the zero matrix. */
    static double of(DMatrixRMaj a) {
        DMatrixRMaj commutator = Matrices.productTranspose(a, a);
        CommonOps_DDRM.subtractEquals(commutator, Matrices.transposeProduct(a, a));
        double size = NormOps_DDRM.normF(a);
        return size == 0 ? 0 : NormOps_DDRM.normF(commutator) / (size * size);
    }

    /** Returns Henrici's departure from normality, at least 0. */
    static double departure(DMatrixRMaj a, List<Complex> eigenvalues) {
        double squares = Math.pow(NormOps_DDRM.normF(a), 2);
        for (Complex value : eigenvalues) {
            squares -= value.abs() * value.abs();
        }
        return Math.sqrt(Math.max(0, squares));
    }
}
