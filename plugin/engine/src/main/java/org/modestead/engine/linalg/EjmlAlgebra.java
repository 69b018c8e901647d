package org.modestead.engine.linalg;

import java.util.Arrays;
import java.util.Comparator;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.SingularOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;
import org.modestead.engine.FitFault;

/** The dense operations by EJML: works everywhere, on one core. */
public final class EjmlAlgebra implements LinearAlgebra {

    @Override
    public String name() {
        return "EJML";
    }

    @Override
    public DMatrixRMaj multiply(DMatrixRMaj a, DMatrixRMaj b) {
        DMatrixRMaj out = new DMatrixRMaj(a.numRows, b.numCols);
        CommonOps_DDRM.mult(a, b, out);
        return out;
    }

    @Override
    public DMatrixRMaj multiplyTransA(DMatrixRMaj a, DMatrixRMaj b) {
        DMatrixRMaj out = new DMatrixRMaj(a.numCols, b.numCols);
        CommonOps_DDRM.multTransA(a, b, out);
        return out;
    }

    @Override
    public DMatrixRMaj multiplyTransB(DMatrixRMaj a, DMatrixRMaj b) {
        DMatrixRMaj out = new DMatrixRMaj(a.numRows, b.numRows);
        CommonOps_DDRM.multTransB(a, b, out);
        return out;
    }

    @Override
    public SymmetricEigen symmetricEigen(DMatrixRMaj a) {
        requireFinite("symmetric eigenvalues", a);
        int n = a.numRows;
        EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, true, true);
        if (!eigen.decompose(a.copy())) {
            throw notConverged("symmetric eigenvalues", a);
        }
        double[] found = IntStream.range(0, n).mapToDouble(i -> eigen.getEigenvalue(i).real).toArray();
        int[] order = falling(found);
        DMatrixRMaj vectors = new DMatrixRMaj(n, n);
        double[] values = new double[n];
        for (int j = 0; j < n; j++) {
            values[j] = found[order[j]];
            CommonOps_DDRM.insert(eigen.getEigenVector(order[j]), vectors, 0, j);
        }
        return new SymmetricEigen(values, signed(vectors));
    }

    @Override
    public Svd svd(DMatrixRMaj a) {
        requireFinite("singular values", a);
        SingularValueDecomposition_F64<DMatrixRMaj> svd = DecompositionFactory_DDRM.svd(a.numRows, a.numCols, true, true, true);
        if (!svd.decompose(a.copy())) {
            throw notConverged("singular values", a);
        }
        DMatrixRMaj u = svd.getU(null, false);
        DMatrixRMaj v = svd.getV(null, false);
        double[] values = svd.getSingularValues();
        int k = Math.min(a.numRows, a.numCols);
        SingularOps_DDRM.descendingOrder(u, false, values, k, v, false);
        return new Svd(u, Arrays.copyOf(values, k), v);
    }

    @Override
    public GeneralEigen eigen(DMatrixRMaj a) {
        return RealSchur.of(a).eigen();
    }

    private static int[] falling(double[] values) {
        return IntStream.range(0, values.length).boxed().sorted(Comparator.comparingDouble(i -> -values[i]))
                .mapToInt(Integer::intValue).toArray();
    }

    /** Fixes the sign of each column by its largest entry, so that equal input gives equal bytes everywhere. */
    private static DMatrixRMaj signed(DMatrixRMaj vectors) {
        for (int j = 0; j < vectors.numCols; j++) {
            double largest = 0;
            for (int i = 0; i < vectors.numRows; i++) {
                double entry = vectors.get(i, j);
                largest = Math.abs(entry) > Math.abs(largest) * (1 + 1e-9) ? entry : largest;
            }
            if (largest < 0) {
                CommonOps_DDRM.scaleCol(-1, vectors, j);
            }
        }
        return vectors;
    }

    private static void requireFinite(String what, DMatrixRMaj a) {
        for (int i = 0; i < a.getNumElements(); i++) {
            if (!Double.isFinite(a.data[i])) {
                throw new FitFault(what, "row " + i / a.numCols + ", column " + i % a.numCols + " of a " + a.numRows + " x " + a.numCols
                        + " matrix holds " + a.data[i], "scale the data, or choose functions that stay finite on them");
            }
        }
    }

    private static FitFault notConverged(String what, DMatrixRMaj a) {
        return new FitFault(what, "no convergence on a " + a.numRows + " x " + a.numCols + " matrix",
                "check the data for values that are not finite or of wildly different size");
    }
}
