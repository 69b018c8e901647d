package org.modestead.engine.linalg;

import java.util.Arrays;
import java.util.Comparator;
import java.util.Optional;
import java.util.stream.IntStream;
import org.ejml.EjmlVersion;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.SingularOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.CholeskyDecomposition_F64;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.ejml.interfaces.decomposition.QRDecomposition;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;
import org.modestead.engine.FitFault;

/** The dense operations by EJML: works everywhere, on one core. */
public final class EjmlAlgebra implements LinearAlgebra {

    @Override
    public String name() {
        return "EJML " + EjmlVersion.VERSION + " (pure Java)";
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

    /** The full product: every entry is summed in the order of the rows, so it is symmetric to the last bit. */
    @Override
    public DMatrixRMaj gram(DMatrixRMaj a) {
        return multiplyTransA(a, a);
    }

    @Override
    public Optional<DMatrixRMaj> cholesky(DMatrixRMaj a) {
        CholeskyDecomposition_F64<DMatrixRMaj> cholesky = DecompositionFactory_DDRM.chol(a.numRows, false);
        return cholesky.decompose(a.copy()) ? Optional.of(cholesky.getT(null)) : Optional.empty();
    }

    @Override
    public DMatrixRMaj divideByUpper(DMatrixRMaj a, DMatrixRMaj upper) {
        return multiply(a, Triangular.inverseOfUpper(upper));
    }

    @Override
    public Qr qr(DMatrixRMaj a) {
        Entries.requireFinite("orthonormal columns", a);
        QRDecomposition<DMatrixRMaj> qr = DecompositionFactory_DDRM.qr(a.numRows, a.numCols);
        // It says no to dependent columns, but decomposes them.
        qr.decompose(a.copy());
        return new Qr(qr.getQ(null, true), qr.getR(null, true));
    }

    @Override
    public SymmetricEigen symmetricEigen(DMatrixRMaj a) {
        Entries.requireFinite("symmetric eigenvalues", a);
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
        return new SymmetricEigen(values, Entries.signed(vectors));
    }

    @Override
    public Svd svd(DMatrixRMaj a) {
        Entries.requireFinite("singular values", a);
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

    private static FitFault notConverged(String what, DMatrixRMaj a) {
        return new FitFault(what, "no convergence on a " + a.numRows + " x " + a.numCols + " matrix",
                "check the data for values that are not finite or of wildly different size");
    }
}
