package org.modestead.engine.kernel;

import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;
import java.util.function.IntToDoubleFunction;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Blocks;
import org.modestead.engine.linalg.Matrices;

/**
 * A kernel that depends on {@code x·y} only, {@code K(x, y) = f(x·y)}.
 *
 * @param spec family and parameters
 * @param space facts about the space
 * @param profile f, with non-negative Taylor coefficients (Schoenberg 1942)
 * @param coefficients a_n of {@code f(t) = Σ a_n t^n}
 */
record DotProductKernel(KernelSpec spec, SpaceFacts space, DoubleUnaryOperator profile, IntToDoubleFunction coefficients) implements Kernel {

    /** Values of a block, worth handing to another core. */
    private static final int BLOCK = 1 << 14;

    @Override
    public DMatrixRMaj matrix(DMatrixRMaj x, DMatrixRMaj y) {
        DMatrixRMaj out = Matrices.productTranspose(x, y);
        Blocks.of(out.getNumElements(), BLOCK, (from, to) -> {
            for (int i = from; i < to; i++) {
                out.data[i] = profile.applyAsDouble(out.data[i]);
            }
        });
        return out;
    }

    @Override
    public double[] diagonal(DMatrixRMaj x) {
        double[] out = SquaredNorms.ofRows(x);
        for (int i = 0; i < out.length; i++) {
            out[i] = profile.applyAsDouble(out[i]);
        }
        return out;
    }

    /** Monomials are orthogonal with {@code ‖x^α‖² = α!/(|α|! a_|α|)}, because {@code (x·y)^n = Σ n!/α! x^α y^α}. */
    @Override
    public OptionalDouble monomialNormSquared(int... exponents) {
        int total = 0;
        double multinomial = 1;
        for (int exponent : exponents) {
            for (int k = 1; k <= exponent; k++) {
                total++;
                multinomial *= (double) total / k;
            }
        }
        double coefficient = coefficients.applyAsDouble(total);
        return coefficient > 0 ? OptionalDouble.of(1 / (multinomial * coefficient)) : OptionalDouble.empty();
    }
}
