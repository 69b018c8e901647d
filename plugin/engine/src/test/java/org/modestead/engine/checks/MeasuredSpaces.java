package org.modestead.engine.checks;

import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.LinearAlgebra;

/** Rows C3 of the table of checks, by kernels, their norms and their occupation functions. */
final class MeasuredSpaces {

    private MeasuredSpaces() {}

    static List<Found> norms(CheckRow row) {
        MonomialSpace space = C3FunctionSpaceTest.FOCK;
        String series = "power series, norms of the kernel";
        return switch (row.quantity()) {
            case "||sin||^2" -> Found.by(series, space.inner(C3FunctionSpaceTest.sine(), C3FunctionSpaceTest.sine()));
            case "||cos||^2" -> Found.by(series, space.inner(C3FunctionSpaceTest.cosine(), C3FunctionSpaceTest.cosine()));
            case "||x e^x||^2" -> {
                double[] moved = MonomialSpace.product(new double[] {0, 1}, C3FunctionSpaceTest.powers(1));
                yield Found.by(series, space.inner(moved, moved));
            }
            case "||e^{0.3x^2}||^2" -> List.of(Found.of("", series, C3FunctionSpaceTest.bump(0.3, 80)),
                    Found.of("", "occupation function", C3FunctionSpaceTest.squaredNorm(C3FunctionSpaceTest.bumpOfSections())));
            default -> List.of();
        };
    }

    static List<Found> exponentials(CheckRow row) {
        int n = (int) row.after("n=");
        double[] exponents = row.input().contains("int_0..n-1") ? C3ProjectionTest.integers(n)
                : C3ProjectionTest.equispaced(n);
        return row.quantity().equals("cond2")
                ? Found.by("kernel matrix", C3ProjectionTest.condition(Fits.exponential(), exponents))
                : Found.by("observable on the orthonormal functions", C3ProjectionTest.residual(exponents));
    }

    static List<Found> composition(CheckRow row) {
        DMatrixRMaj operator = C3FunctionSpaceTest.FOCK.matrix(MonomialSpace.composition(0.5, 1), C3OperatorTest.SIZE);
        return row.quantity().equals("trace")
                ? List.of(Found.of("", "diagonal, norms of the kernel", CommonOps_DDRM.trace(operator)),
                        Found.of("", "sum of eigenvalues", LinearAlgebra.installed().eigen(operator).values().stream()
                                .mapToDouble(Complex::re).sum()))
                : Found.by("singular value, norms of the kernel", C3OperatorTest.singular(operator)[0]);
    }

    static List<Found> uniformMotion(CheckRow row) {
        double duration = row.after("T=");
        return IntStream.of(201, 301).mapToObj(samples -> Found.of("", "occupation function of " + samples + " samples",
                C3OperatorTest.generator(List.of(Fits.run("uniform", samples, duration / (samples - 1),
                        time -> new double[] {time}))).gram().get(0, 0))).toList();
    }
}
