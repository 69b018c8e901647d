package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.NormalityDeparture;

/**
 * Whether the compression commutes with its adjoint, {@code ‖ÃÃ* - Ã*Ã‖_F / ‖Ã‖_F²}, and its {@link NormalityDeparture}.
 * A normal operator, and only a normal one, has an orthogonal eigenbasis. Informs.
 */
public final class NormalityDefect implements Check {

    @Override
    public String id() {
        return "normality-defect";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        DMatrixRMaj action = evidence.fitted().compression().action();
        double defect = of(action);
        return List.of(new Finding(0, id(), defect, Double.NaN, true, String.format(Locale.ROOT,
                "The compressed operator fails to commute with its adjoint by %.3g of its squared size; departure from normality %.3g.%s",
                defect, NormalityDeparture.of(action), Imposed.sentence(evidence.operator(), NormalityDefect::of))));
    }

    /** Returns the relative commutator norm; 0 for the zero matrix. */
    public static double of(DMatrixRMaj a) {
        DMatrixRMaj commutator = Matrices.productTranspose(a, a);
        CommonOps_DDRM.subtractEquals(commutator, Matrices.transposeProduct(a, a));
        double size = NormOps_DDRM.normF(a);
        return size == 0 ? 0 : NormOps_DDRM.normF(commutator) / (size * size);
    }
}
