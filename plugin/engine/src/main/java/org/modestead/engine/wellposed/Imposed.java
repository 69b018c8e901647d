package org.modestead.engine.wellposed;

import java.util.Locale;
import java.util.function.ToDoubleFunction;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.ImposedStructure;
import org.modestead.engine.operator.OrthonormalCompression;

/** What a defect is worth where the fit was given a structure: nothing, so the defect without it is told. */
final class Imposed {

    private Imposed() {}

    /** Returns a sentence with the defect of the action that the data give, or nothing where no structure was imposed. */
    static String sentence(FittedOperator operator, ToDoubleFunction<DMatrixRMaj> defect) {
        OrthonormalCompression chosen = operator.chosen();
        return chosen.imposed().map(imposing -> String.format(Locale.ROOT,
                " The fit was made %s, so this is no evidence; without that it would be %.3g.", imposing.structure().words(),
                defect.applyAsDouble(imposing.free()))).orElse("");
    }

    /** Returns whether orthogonal eigenfunctions were imposed, so that none overlap. */
    static boolean orthogonality(FittedOperator operator) {
        return operator.chosen().imposed().map(ImposedStructure::structure).filter(structure -> structure.orthogonal()).isPresent();
    }
}
