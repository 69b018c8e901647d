package org.modestead.engine.linalg;

import org.ejml.data.DMatrixRMaj;

/**
 * Henrici's departure from normality {@code √(‖A‖_F² - Σ|λ|²)}, 0 for a normal matrix and only for one.
 *
 * <p>Read off the real Schur form as the size of what stands above its diagonal, which does not cancel: the difference of
 * squares itself would leave {@code √ε ‖A‖} of a normal matrix. A block {@code [[a, b], [c, d]]} of a conjugate pair adds
 * {@code (a-d)² + (b+c)²}. O(n³). Henrici, Numer. Math. 4:24, 1962.
 */
public final class NormalityDeparture {

    private NormalityDeparture() {}

    /**
     * @param a n x n, finite; not modified
     * @return at least 0
     * @throws org.modestead.engine.FitFault if an entry is not finite or the Schur form does not converge
     */
    public static double of(DMatrixRMaj a) {
        return RealSchur.of(a).departure();
    }
}
