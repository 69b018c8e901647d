package org.modestead.engine.operator;

import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.modestead.engine.FitFault;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.linalg.LinearAlgebra.Svd;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.ThinSvd;

/**
 * A compression held by two tall factors F, F' (m samples x p functions), which is both smaller and more accurate than
 * its four arrays: singular values of F are found to {@code ε s_1}, those of a formed Gram matrix only to
 * {@code √ε s_1}.
 *
 * <pre>
 *   data inner product:  G = FᵀF,  M = FᵀF',  N = F'ᵀF'   (p x p; basis = the p functions)
 *   kernel space:        G = FFᵀ,  M = F'Fᵀ,  N = F'F'ᵀ   (m x m; basis = m sections or occupation functions,
 *                                                          written in p orthonormal feature functions)
 * </pre>
 *
 * <p>With {@code F = U S Wᵀ}: in the data inner product {@code Q = W S⁻¹} and {@code Ã = Uᵀ F' W S⁻¹}; in the kernel
 * space {@code Q = U S⁻¹}, {@code Ã = S⁻¹ Uᵀ F' W}, and the orthonormal functions are {@code q = W} in the features.
 *
 * @param features p functions: those of the dictionary, or orthonormal features of the kernel's space
 * @param now F, m x p; for the data inner product already multiplied by the square roots of the weights
 * @param next F', m x p, the same functions after the action
 * @param target m x N: in the data inner product g at the samples, multiplied by the square roots of the weights; in the
 *     kernel space {@code <g_k, b_i>}
 * @param innerProduct which of the two readings
 * @param evolution step map or generator
 * @param correction for noise, in the data inner product only
 * @param inputs what known inputs add to the p functions, where they were projected out of F, F' and the target; in the data
 *     inner product only
 */
public record FactoredCompression(
        FunctionBasis features,
        DMatrixRMaj now,
        DMatrixRMaj next,
        DMatrixRMaj target,
        InnerProduct innerProduct,
        Evolution evolution,
        NoiseCorrection correction,
        Optional<InputEffect> inputs)
        implements Compression {

    private static final double NOISE = 4 * Math.ulp(1.0);

    /** Checks that a correction meets the inner product it is made for. */
    public FactoredCompression {
        if (correction != NoiseCorrection.NONE && innerProduct != InnerProduct.DATA) {
            throw new IllegalArgumentException(correction + " in the inner product " + innerProduct);
        }
        if (inputs.isPresent() && innerProduct != InnerProduct.DATA) {
            throw new IllegalArgumentException("inputs in the inner product " + innerProduct);
        }
    }

    /** Without inputs. */
    public FactoredCompression(FunctionBasis features, DMatrixRMaj now, DMatrixRMaj next, DMatrixRMaj target,
            InnerProduct innerProduct, Evolution evolution, NoiseCorrection correction) {
        this(features, now, next, target, innerProduct, evolution, correction, Optional.empty());
    }

    /** Without a correction and without inputs. */
    public FactoredCompression(FunctionBasis features, DMatrixRMaj now, DMatrixRMaj next, DMatrixRMaj target,
            InnerProduct innerProduct, Evolution evolution) {
        this(features, now, next, target, innerProduct, evolution, NoiseCorrection.NONE);
    }

    @Override
    public FunctionBasis basis() {
        return features;
    }

    @Override
    public DMatrixRMaj gram() {
        return product(now, now);
    }

    @Override
    public DMatrixRMaj action() {
        return innerProduct == InnerProduct.DATA ? Matrices.transposeProduct(now, next) : Matrices.productTranspose(next, now);
    }

    @Override
    public DMatrixRMaj second() {
        return product(next, next);
    }

    @Override
    public DMatrixRMaj observable() {
        return innerProduct == InnerProduct.DATA ? Matrices.transposeProduct(now, target) : target;
    }

    private DMatrixRMaj product(DMatrixRMaj a, DMatrixRMaj b) {
        return innerProduct == InnerProduct.DATA ? Matrices.transposeProduct(a, b) : Matrices.productTranspose(a, b);
    }

    @Override
    public OrthonormalCompression whiten(int largest) {
        Svd svd = ThinSvd.of(now, largest);
        double first = svd.values().length == 0 ? 0 : svd.values()[0];
        double rounding = NOISE * Math.max(now.numRows, now.numCols) * Math.max(first, sizeWithInputs());
        if (inputs.isPresent() && first <= rounding) {
            throw new FitFault("inputs", "they explain all that the states do", "let the free motion show: record runs in which it"
                    + " is not driven alone, or leave the inputs in");
        }
        if (!(first > 0) || Double.isInfinite(first)) {
            throw new FitFault("snapshot matrix", "its largest singular value is " + first,
                    "the basis functions must be finite and must not all vanish on the data");
        }
        int rank = 0;
        while (rank < Math.min(svd.values().length, largest) && svd.values()[rank] > rounding) {
            rank++;
        }
        double[] singular = java.util.Arrays.copyOf(svd.values(), rank);
        DMatrixRMaj u = leading(svd.u(), rank);
        DMatrixRMaj w = leading(svd.v(), rank);
        return innerProduct == InnerProduct.DATA ? inData(u, w, singular) : inSpace(u, w, singular);
    }

    /** What is left of the functions after inputs were projected out carries the rounding of the whole. */
    private double sizeWithInputs() {
        return inputs.map(effect -> Math.hypot(NormOps_DDRM.normF(now), NormOps_DDRM.normF(effect.now()))).orElse(0.0);
    }

    /** Nobody else has the whole, so it need not be copied. */
    private static DMatrixRMaj leading(DMatrixRMaj vectors, int rank) {
        return rank == vectors.numCols ? vectors : Matrices.block(vectors, 0, vectors.numRows, 0, rank);
    }

    private OrthonormalCompression inData(DMatrixRMaj u, DMatrixRMaj map, double[] singular) {
        CommonOps_DDRM.divideCols(map, singular);
        DMatrixRMaj moved = Matrices.product(next, map);
        DMatrixRMaj action = Matrices.transposeProduct(u, moved);
        OrthonormalCompression plain = new OrthonormalCompression(features, map, action,
                Matrices.transposeProduct(moved, moved), Matrices.transposeProduct(u, target), singular, now.numRows,
                innerProduct, evolution);
        OrthonormalCompression free = inputs.map(effect -> plain.separated(effect.combined(map))).orElse(plain);
        return correction == NoiseCorrection.NONE ? free : free.corrected(NoisyStep.of(correction, u, moved, action));
    }

    private OrthonormalCompression inSpace(DMatrixRMaj u, DMatrixRMaj w, double[] singular) {
        DMatrixRMaj scaled = u.copy();
        CommonOps_DDRM.divideCols(scaled, singular);
        DMatrixRMaj moved = Matrices.transposeProduct(scaled, next);
        return new OrthonormalCompression(features, w, Matrices.product(moved, w), Matrices.productTranspose(moved, moved),
                Matrices.transposeProduct(scaled, target), singular, now.numRows, innerProduct, evolution);
    }
}
