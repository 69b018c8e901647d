package org.modestead.engine.operator;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.FunctionBasis;

/**
 * The four arrays that every estimator fills, with m basis functions b_1..b_m and the full-state observable g of N
 * components:
 *
 * <pre>
 *   gram        G_ij = &lt;b_j, b_i&gt;                     m x m
 *   action      M_ij = &lt;A b_j, b_i&gt;                   m x m
 *   second      N_ij = &lt;A b_j, A b_i&gt; (data) or &lt;A* b_j, A* b_i&gt; (kernel space)   m x m
 *   observable  B_ik = &lt;g_k, b_i&gt;                     m x N
 * </pre>
 *
 * <p>Where m is large, the arrays are held by factors and never formed; see {@link FactoredCompression}.
 */
public sealed interface Compression permits GramCompression, FactoredCompression, CorrectedCompression, StatesCompression {

    /** Returns the functions b. */
    FunctionBasis basis();

    /** Returns G, formed if need be. */
    DMatrixRMaj gram();

    /** Returns M, formed if need be. */
    DMatrixRMaj action();

    /** Returns N, formed if need be. */
    DMatrixRMaj second();

    /** Returns B. */
    DMatrixRMaj observable();

    /**
     * Finds orthonormal functions q_1..q_R spanning the leading part of the basis: {@code Q* G Q = I}, ordered by
     * falling singular value, and the compression onto them, {@code Q* M Q}.
     *
     * @param largest cap on R, at least 1; R is also cut at the numerical rank of G
     * @return with R at least 1
     * @throws org.modestead.engine.FitFault if G is zero or not finite
     */
    OrthonormalCompression whiten(int largest);

    /**
     * The same, with functions that nobody asks for left to be made where that is much work.
     *
     * @param largest cap on R, at least 1
     * @throws org.modestead.engine.FitFault if G is zero or not finite
     */
    default Whitened whitened(int largest) {
        return whiten(largest);
    }
}
