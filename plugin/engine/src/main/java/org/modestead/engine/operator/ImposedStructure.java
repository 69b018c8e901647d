package org.modestead.engine.operator;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebra.Svd;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.NearestStable;

/**
 * A structure that was imposed on an action, and the action before that. With X the coordinates of the snapshots in the
 * orthonormal functions (m x r), Y those after a step, and {@code D = XᵀX}, which is I in the data inner product and {@code S²} in
 * the kernel space, the free action is {@code Ã = D⁻¹ XᵀY} and the misfit is {@code ‖D^(1/2) (A - Ã)‖² + const}. Its minimum is
 *
 * <pre>
 *   self-adjoint   a_ij = (d_i ã_ij + d_j ã_ji) / (d_i + d_j)       Higham, BIT 28:133, 1988 (symmetric Procrustes problem)
 *   skew           a_ij = (d_i ã_ij - d_j ã_ji) / (d_i + d_j)       the same with the other sign
 *   unitary        U Vᵀ with D Ã = U S Vᵀ                            Schönemann, Psychometrika 31:1, 1966
 * </pre>
 *
 * For a stable action see {@link NearestStable}: nearest in the orthonormal functions, {@code ‖A - Ã‖}. As estimators of evolution:
 * Baddoo, Herrmann, McKeon, Kutz and Brunton, Proc. R. Soc. A 479:20220576, 2023; unitary in the data inner product: Colbrook, SIAM J.
 * Numer. Anal. 61:1585, 2023.
 *
 * @param structure imposed
 * @param free action before, r x r
 */
public record ImposedStructure(Structure structure, DMatrixRMaj free) {

    /**
     * Returns the nearest action that has the structure.
     *
     * @param singular s of the whitening, at least r
     */
    DMatrixRMaj action(double[] singular, InnerProduct innerProduct, Evolution evolution) {
        double[] weights = weights(singular, innerProduct);
        return switch (structure) {
            case SELF_ADJOINT -> symmetric(weights, 1);
            case SKEW -> symmetric(weights, -1);
            case UNITARY -> polar(weights);
            case STABLE -> NearestStable.of(free, Structure.region(evolution));
        };
    }

    /** Returns {@code ‖A - Ã‖ / ‖Ã‖}: how much of the free fit the structure takes away. */
    public double change(DMatrixRMaj action) {
        DMatrixRMaj difference = action.copy();
        CommonOps_DDRM.subtractEquals(difference, free);
        double size = NormOps_DDRM.normF(free);
        return size == 0 ? 0 : NormOps_DDRM.normF(difference) / size;
    }

    private double[] weights(double[] singular, InnerProduct innerProduct) {
        double[] out = new double[free.numRows];
        Arrays.setAll(out, i -> innerProduct == InnerProduct.DATA ? 1 : Math.pow(singular[i] / singular[0], 2));
        return out;
    }

    private DMatrixRMaj symmetric(double[] d, int sign) {
        int r = d.length;
        DMatrixRMaj out = new DMatrixRMaj(r, r);
        for (int i = 0; i < r; i++) {
            out.set(i, i, sign > 0 ? free.get(i, i) : 0);
            for (int j = 0; j < i; j++) {
                double value = (d[i] * free.get(i, j) + sign * d[j] * free.get(j, i)) / (d[i] + d[j]);
                out.set(i, j, value);
                out.set(j, i, sign * value);
            }
        }
        return out;
    }

    private DMatrixRMaj polar(double[] d) {
        DMatrixRMaj weighted = free.copy();
        CommonOps_DDRM.multRows(d, weighted);
        Svd svd = LinearAlgebra.installed().svd(weighted);
        return Matrices.productTranspose(svd.u(), svd.v());
    }
}
