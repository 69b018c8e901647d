package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.NormOps_DDRM;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.Evolution;

/**
 * For a step map, whether the compression keeps norms: {@code ‖Ã*Ã - I‖_F / √r}, 0 for measure-preserving motion seen
 * whole. Informs.
 */
public final class UnitarityDefect implements Check {

    @Override
    public String id() {
        return "unitarity-defect";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        if (!(evidence.operator().evolution() instanceof Evolution.StepMap)) {
            return List.of();
        }
        double defect = of(evidence.operator().chosen().action());
        return List.of(new Finding(0, id(), defect, Double.NaN, true, String.format(Locale.ROOT,
                "The step map changes norms by %.3g (root mean square over directions); 0 would be motion that neither grows nor fades.%s",
                defect, Imposed.sentence(evidence.operator(), UnitarityDefect::of))));
    }

    private static double of(DMatrixRMaj action) {
        DMatrixRMaj square = Matrices.transposeProduct(action, action);
        for (int i = 0; i < square.numRows; i++) {
            square.add(i, i, -1);
        }
        return NormOps_DDRM.normF(square) / Math.sqrt(square.numRows);
    }
}
