package org.modestead.engine.operator;

import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.QRDecomposition;
import org.modestead.engine.linalg.Matrices;

/**
 * A measured step from which the action of any rank is corrected for noise. A corrected action of lower rank is no block of
 * that of a higher one, so what was measured is kept and every rank is corrected for itself.
 *
 * @param correction not {@link NoiseCorrection#NONE}
 * @param moved (R + k) x r: the orthonormal functions q_1..q_r after a step, in an orthonormal frame that begins with
 *     q_1..q_R, R at least r; so {@code movedᵀ moved} is the second moment, and its head the measured action. For the extrapolation
 *     only the measured action
 * @param moments what noise adds, for the extrapolation
 */
public record NoisyStep(NoiseCorrection correction, DMatrixRMaj moved, Optional<NoiseMoments> moments) {

    /** For the extrapolation. */
    static NoisyStep of(DMatrixRMaj action, NoiseMoments moments) {
        return new NoisyStep(NoiseCorrection.EXTRAPOLATION, action, Optional.of(moments));
    }

    /**
     * @param now m x R, orthonormal columns: samples of the functions
     * @param next m x R, samples one step later
     * @param action {@code nowᵀ next}, R x R
     */
    static NoisyStep of(NoiseCorrection correction, DMatrixRMaj now, DMatrixRMaj next, DMatrixRMaj action) {
        DMatrixRMaj rest = Matrices.product(now, action);
        CommonOps_DDRM.subtract(next, rest, rest);
        QRDecomposition<DMatrixRMaj> qr = DecompositionFactory_DDRM.qr(rest.numRows, rest.numCols);
        qr.decompose(rest);
        return new NoisyStep(correction, CommonOps_DDRM.concatRowsMulti(action, qr.getR(null, true)), Optional.empty());
    }

    /** The same step seen by the leading r functions. */
    NoisyStep leading(int r) {
        return new NoisyStep(correction, Matrices.block(moved, 0, moments.isPresent() ? r : moved.numRows, 0, r), moments.map(m -> m.leading(r)));
    }

    /** Returns {@code <A q_j, q_i>} as the data give it, r x r. */
    DMatrixRMaj measured() {
        return Matrices.block(moved, 0, moved.numCols, 0, moved.numCols);
    }

    /**
     * Returns the action without the bias that noise gives it, r x r.
     *
     * @param singular of the functions, at least r
     */
    DMatrixRMaj corrected(double[] singular) {
        if (moments.isPresent()) {
            return moments.get().corrected(moved);
        }
        return correction == NoiseCorrection.TOTAL_LEAST_SQUARES ? TotalLeastSquares.action(moved, singular)
                : ForwardBackward.action(measured(), Matrices.transposeProduct(moved, moved));
    }
}
