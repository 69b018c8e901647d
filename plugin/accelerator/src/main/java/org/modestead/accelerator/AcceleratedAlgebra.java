package org.modestead.accelerator;

import java.util.List;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.linalg.EjmlAlgebra;
import org.modestead.engine.linalg.GeneralEigen;
import org.modestead.engine.linalg.LinearAlgebra;

/**
 * OpenBLAS for work that repays it, EJML for everything else. The library is loaded when the first such work comes, so that small recordings
 * do not wait for it. Which of the two does a piece of work depends on the shapes alone: the same input gives the same bytes.
 *
 * <p>Where the library cannot be loaded EJML does everything and a doubt says so. {@code -Dmodestead.accelerator=off} keeps it out.
 */
public final class AcceleratedAlgebra implements LinearAlgebra {

    /** Multiplications from which a product is large: a few thousandths of a second in EJML. */
    private static final double LARGE_PRODUCT = 4e6;
    /** The same for decompositions, counted as rows times columns times the smaller of them. */
    private static final double LARGE_DECOMPOSITION = 1e6;
    /** More entries than a buffer outside the heap can hold. */
    private static final long MOST_ENTRIES = 200_000_000;

    private final LinearAlgebra small = new EjmlAlgebra();

    @Override
    public String name() {
        return Library.used() ? Library.get().map(library -> library.name() + ", small matrices " + small.name()).orElse(small.name())
                : small.name();
    }

    @Override
    public List<Doubt> doubts() {
        return Library.used() ? Library.doubts() : List.of();
    }

    private LinearAlgebra forProduct(double multiplications) {
        return multiplications >= LARGE_PRODUCT ? library() : small;
    }

    private LinearAlgebra forDecomposition(DMatrixRMaj a) {
        double work = (double) a.numRows * a.numCols * Math.min(a.numRows, a.numCols);
        return work >= LARGE_DECOMPOSITION && (long) a.numRows * a.numCols <= MOST_ENTRIES ? library() : small;
    }

    private LinearAlgebra library() {
        return Library.get().map(LinearAlgebra.class::cast).orElse(small);
    }

    @Override
    public DMatrixRMaj multiply(DMatrixRMaj a, DMatrixRMaj b) {
        return forProduct((double) a.numRows * a.numCols * b.numCols).multiply(a, b);
    }

    @Override
    public DMatrixRMaj multiplyTransA(DMatrixRMaj a, DMatrixRMaj b) {
        return forProduct((double) a.numRows * a.numCols * b.numCols).multiplyTransA(a, b);
    }

    @Override
    public DMatrixRMaj multiplyTransB(DMatrixRMaj a, DMatrixRMaj b) {
        return forProduct((double) a.numRows * a.numCols * b.numRows).multiplyTransB(a, b);
    }

    @Override
    public DMatrixRMaj gram(DMatrixRMaj a) {
        return forProduct((double) a.numRows * a.numCols * a.numCols).gram(a);
    }

    @Override
    public Optional<DMatrixRMaj> cholesky(DMatrixRMaj a) {
        return forDecomposition(a).cholesky(a);
    }

    @Override
    public DMatrixRMaj divideByUpper(DMatrixRMaj a, DMatrixRMaj upper) {
        return forProduct((double) a.numRows * a.numCols * a.numCols).divideByUpper(a, upper);
    }

    @Override
    public Qr qr(DMatrixRMaj a) {
        return forDecomposition(a).qr(a);
    }

    @Override
    public SymmetricEigen symmetricEigen(DMatrixRMaj a) {
        return forDecomposition(a).symmetricEigen(a);
    }

    @Override
    public Svd svd(DMatrixRMaj a) {
        return forDecomposition(a).svd(a);
    }

    @Override
    public GeneralEigen eigen(DMatrixRMaj a) {
        return forDecomposition(a).eigen(a);
    }
}
