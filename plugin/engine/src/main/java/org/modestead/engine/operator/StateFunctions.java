package org.modestead.engine.operator;

import java.util.Arrays;
import java.util.stream.DoubleStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.FitFault;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebra.Svd;
import org.modestead.engine.linalg.LinearAlgebra.SymmetricEigen;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.ThinSvd;

/**
 * Orthonormal functions of states from the eigenvectors of their products. With A the weighted earlier states (m x N), A' the later ones and
 * {@code A Aᵀ = U S² Uᵀ}:
 *
 * <pre>
 *   map    = Aᵀ U S⁻² R⁻¹,  A Aᵀ U S⁻² = Q R      Q orthonormal to rounding, where U is so to rounding times (s_1/s_r)²
 *   action = Qᵀ A' map,   second = (A' map)ᵀ(A' map),   observable = Qᵀ A
 * </pre>
 *
 * <p>Further functions come from what is left of A, {@code Tᵀ A} with T the orthonormal complement of Q, by singular values, which their
 * weakness beside the first does not blur; those that are there stay as they are.
 *
 * @param states of the recording
 * @param eigen of the products of the weighted earlier ones
 * @param largest R
 */
record StateFunctions(StatesCompression states, SymmetricEigen eigen, int largest) {

    /** Share of the largest squared singular value below which the rounding of products, ε of the largest, would turn a function by 1e-8. */
    private static final double CLEAR = 1e-8;

    /** Returns whether the leading r functions can be made from products of states. */
    boolean clear(int r) {
        return eigen.values()[r - 1] > CLEAR * eigen.values()[0];
    }

    /** Returns the singular values, R. */
    double[] singular() {
        return Arrays.stream(eigen.values()).limit(largest).map(Math::sqrt).toArray();
    }

    /**
     * Functions with their values at the states.
     *
     * @param map N x k
     * @param values M x k, at all states
     * @param earlier Q, m x k, weighted at the earlier states; orthonormal columns
     * @param singular k
     */
    record Made(DMatrixRMaj map, DMatrixRMaj values, DMatrixRMaj earlier, double[] singular) {}

    /** Returns the leading r functions. */
    Made leading(int r) {
        DMatrixRMaj combined = Matrices.block(eigen.vectors(), 0, eigen.vectors().numRows, 0, r);
        CommonOps_DDRM.divideCols(combined, eigen.values());
        DMatrixRMaj map = Matrices.transposeProduct(states.states(), states.spread(combined));
        DMatrixRMaj values = Matrices.product(states.states(), map);
        DMatrixRMaj earlier = states.weighted(values, 0);
        DMatrixRMaj upper = upper(earlier);
        LinearAlgebra algebra = LinearAlgebra.installed();
        return new Made(algebra.divideByUpper(map, upper), algebra.divideByUpper(values, upper), algebra.divideByUpper(earlier, upper),
                Arrays.copyOf(singular(), r));
    }

    /**
     * Returns all further ones.
     *
     * @param there the leading ones
     * @param observable Qᵀ A of those
     */
    Made beyond(Made there, DMatrixRMaj observable) {
        DMatrixRMaj rest = complement(there.earlier());
        Svd left = ThinSvd.of(onStates(rest), largest - there.singular().length);
        DMatrixRMaj map = left.v();
        CommonOps_DDRM.divideCols(map, left.values());
        CommonOps_DDRM.subtractEquals(map, Matrices.product(there.map(), Matrices.product(observable, map)));
        return new Made(map, Matrices.product(states.states(), map), Matrices.product(rest, left.u()), left.values());
    }

    /** The directions of the states that Q leaves, orthonormal. */
    private DMatrixRMaj complement(DMatrixRMaj q) {
        DMatrixRMaj out = Matrices.block(eigen.vectors(), 0, q.numRows, q.numCols, q.numRows);
        CommonOps_DDRM.subtractEquals(out, Matrices.product(q, Matrices.transposeProduct(q, out)));
        return LinearAlgebra.installed().divideByUpper(out, upper(out));
    }

    private static DMatrixRMaj upper(DMatrixRMaj nearlyOrthonormal) {
        return LinearAlgebra.installed().cholesky(Matrices.gram(nearlyOrthonormal)).orElseThrow(() -> new FitFault("snapshot matrix",
                "products of its states lose their directions to rounding", "check the data for values of wildly different size"));
    }

    /** A weighted sum over earlier states, {@code aᵀ A}. */
    private DMatrixRMaj onStates(DMatrixRMaj a) {
        return Matrices.transposeProduct(states.spread(a), states.states());
    }

    /** Returns the compression onto functions. */
    OrthonormalCompression compression(Made made) {
        DMatrixRMaj later = later(made);
        return compression(made.map(), Matrices.transposeProduct(made.earlier(), later), Matrices.gram(later), onStates(made.earlier()),
                made.singular());
    }

    private OrthonormalCompression compression(DMatrixRMaj map, DMatrixRMaj action, DMatrixRMaj second, DMatrixRMaj observable, double[] singular) {
        return new OrthonormalCompression(states.basis(), map, action, second, observable, singular, states.now().length, InnerProduct.DATA,
                new Evolution.StepMap(states.step()));
    }

    /** Returns the compression onto functions and further ones, with every entry of the former as it was. */
    OrthonormalCompression compression(OrthonormalCompression former, Made there, Made more) {
        DMatrixRMaj before = later(there);
        DMatrixRMaj later = later(more);
        DMatrixRMaj across = Matrices.transposeProduct(before, later);
        return compression(CommonOps_DDRM.concatColumnsMulti(there.map(), more.map()),
                bordered(former.action(), Matrices.transposeProduct(there.earlier(), later), Matrices.transposeProduct(more.earlier(), before),
                        Matrices.transposeProduct(more.earlier(), later)),
                bordered(former.second(), across, CommonOps_DDRM.transpose(across, null), Matrices.gram(later)),
                CommonOps_DDRM.concatRowsMulti(former.observable(), onStates(more.earlier())),
                DoubleStream.concat(Arrays.stream(there.singular()), Arrays.stream(more.singular())).toArray());
    }

    private static DMatrixRMaj bordered(DMatrixRMaj a, DMatrixRMaj right, DMatrixRMaj below, DMatrixRMaj corner) {
        return CommonOps_DDRM.concatRowsMulti(CommonOps_DDRM.concatColumnsMulti(a, right), CommonOps_DDRM.concatColumnsMulti(below, corner));
    }

    private DMatrixRMaj later(Made made) {
        return states.weighted(made.values(), states.stride());
    }
}
