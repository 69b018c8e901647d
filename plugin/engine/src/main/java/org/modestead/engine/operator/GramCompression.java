package org.modestead.engine.operator;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebra.SymmetricEigen;
import org.modestead.engine.linalg.Matrices;

/**
 * A compression whose four arrays are formed entry by entry; for up to a few hundred basis functions.
 *
 * <p>Whitening: {@code G = U S² Uᵀ}, {@code Q = U_R S_R⁻¹}, so {@code QᵀGQ = I} and {@code Ã = Qᵀ M Q}. Directions with
 * {@code s² <= 64 ε s_1²} are rounding noise and are left out.
 *
 * @param basis m functions
 * @param gram G, m x m, symmetric
 * @param action M, m x m
 * @param second N, m x m
 * @param observable B, m x N
 * @param innerProduct of G
 * @param evolution step map or generator
 */
public record GramCompression(
        FunctionBasis basis,
        DMatrixRMaj gram,
        DMatrixRMaj action,
        DMatrixRMaj second,
        DMatrixRMaj observable,
        InnerProduct innerProduct,
        Evolution evolution)
        implements Compression {

    private static final double NOISE = 64 * Math.ulp(1.0);

    @Override
    public OrthonormalCompression whiten(int largest) {
        int m = gram.numRows;
        SymmetricEigen eigen = LinearAlgebra.installed().symmetricEigen(symmetrised());
        double first = eigen.values()[0];
        if (!(first > 0)) {
            throw new FitFault("Gram matrix", "its largest eigenvalue is " + first,
                    "the basis functions must not all vanish on the data");
        }
        int rank = 0;
        while (rank < Math.min(m, largest) && eigen.values()[rank] > NOISE * first) {
            rank++;
        }
        DMatrixRMaj map = Matrices.block(eigen.vectors(), 0, m, 0, rank);
        double[] singular = new double[rank];
        for (int j = 0; j < rank; j++) {
            singular[j] = Math.sqrt(eigen.values()[j]);
            for (int i = 0; i < m; i++) {
                map.data[i * rank + j] /= singular[j];
            }
        }
        return new OrthonormalCompression(basis, map, sandwich(map, action), sandwich(map, second),
                Matrices.transposeProduct(map, observable), singular, m, innerProduct, evolution);
    }

    /** Quadrature and rounding leave G symmetric only to a few units in the last place. */
    private DMatrixRMaj symmetrised() {
        int m = gram.numRows;
        DMatrixRMaj out = new DMatrixRMaj(m, m);
        for (int i = 0; i < m; i++) {
            for (int j = 0; j < m; j++) {
                out.data[i * m + j] = (gram.data[i * m + j] + gram.data[j * m + i]) / 2;
            }
        }
        return out;
    }

    private static DMatrixRMaj sandwich(DMatrixRMaj q, DMatrixRMaj a) {
        return Matrices.transposeProduct(q, Matrices.product(a, q));
    }
}
