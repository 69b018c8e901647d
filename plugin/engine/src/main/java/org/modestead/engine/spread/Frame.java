package org.modestead.engine.spread;

import java.util.Arrays;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.FitFault;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebra.SymmetricEigen;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.InputEffect;
import org.modestead.engine.operator.ObservedRun;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.Ridge;
import org.modestead.engine.operator.Whitened;

/**
 * The leading R' functions of a fit, within which it is repeated with other weights: what the observations sum to is
 * turned back into a pair of factors of R' rows, and these go the way of the data, through whitening to rank r, noise
 * correction, structure and ridge. So a replicate belongs to the estimator in use, and costs O(R'³) whatever the length of the recording.
 *
 * <p>Functions are held divided by their scale, {@code p = q} in the data inner product and {@code p = q/s} in the kernel's
 * space, so that the sum over the recorded data of {@code p pᵀ} is a multiple of the identity and its root is accurate.
 *
 * <pre>    Σ p pᵀ = V D Vᵀ:  now = √D Vᵀ S,  next = [D^(-1/2) Vᵀ Σ p p'ᵀ; (Σ p'p'ᵀ - their projection)^(1/2)] S</pre>
 *
 * @param functions the leading R', which replicates are made of
 * @param scale s, singular values of the whitening
 * @param rank r of the fit
 * @param ridge of the fit
 */
record Frame(OrthonormalCompression functions, double[] scale, int rank, double ridge) {

    /** Directions beyond the rank that a replicate may turn into; more cost more and are turned into less. */
    private static final int WIDE = 48;
    private static final double NULL = 1e-12;

    static Frame of(FittedOperator operator) {
        Whitened full = operator.functions();
        int rank = operator.rank();
        int width = Math.min(full.rank(), Math.max(rank, Math.min(WIDE, 3 * rank + 12)));
        OrthonormalCompression head = full.leading(width);
        return new Frame(head, head.singular(), rank, operator.ridge());
    }

    /** Returns the observations in the functions p. */
    ObservedRun scaled(ObservedRun run) {
        return functions.innerProduct() == InnerProduct.DATA ? run : run.dividedBy(scale);
    }

    /** Returns R'. */
    int width() {
        return scale.length;
    }

    /** Returns the fit to these sums; empty where they do not hold r directions. */
    Optional<Refit> refit(Moments drawn) {
        Moments sums = drawn.without(functions.inputs().map(InputEffect::count).orElse(0));
        SymmetricEigen eigen = LinearAlgebra.installed().symmetricEigen(sums.gram());
        double[] root = Arrays.stream(eigen.values()).map(d -> Math.sqrt(Math.max(0, d))).toArray();
        if (!(root[0] > 0) || root[Math.min(rank, root.length) - 1] <= NULL * root[0]) {
            return Optional.empty();
        }
        double[] inverse = Arrays.stream(root).map(d -> d > NULL * root[0] ? 1 / d : 0).toArray();
        DMatrixRMaj now = CommonOps_DDRM.transpose(eigen.vectors(), null);
        DMatrixRMaj turn = now.copy();
        CommonOps_DDRM.multRows(root, now);
        CommonOps_DDRM.multRows(inverse, turn);
        DMatrixRMaj next = Matrices.product(turn, sums.cross());
        DMatrixRMaj target = Matrices.product(turn, sums.observable());
        if (functions.noisy().isPresent()) {
            next = CommonOps_DDRM.concatRowsMulti(next, rest(sums.second(), next));
            now = padded(now);
            target = padded(target);
        }
        CommonOps_DDRM.multCols(now, scale);
        CommonOps_DDRM.multCols(next, scale);
        return refit(now, next, target);
    }

    /** A draw that the method cannot be fitted to is one in which no mode is found again. */
    private Optional<Refit> refit(DMatrixRMaj now, DMatrixRMaj next, DMatrixRMaj target) {
        try {
            OrthonormalCompression white = Ridge.apply(functions.again(now, next, target, rank), ridge);
            return white.rank() < rank ? Optional.empty() : Optional.of(Refit.of(white, scale));
        } catch (FitFault impossible) {
            return Optional.empty();
        }
    }

    /** A root of what of the later functions no combination of the earlier ones explains. */
    private static DMatrixRMaj rest(DMatrixRMaj second, DMatrixRMaj explained) {
        DMatrixRMaj left = Matrices.transposeProduct(explained, explained);
        CommonOps_DDRM.subtract(second, left, left);
        SymmetricEigen eigen = LinearAlgebra.installed().symmetricEigen(left);
        DMatrixRMaj root = CommonOps_DDRM.transpose(eigen.vectors(), null);
        CommonOps_DDRM.multRows(Arrays.stream(eigen.values()).map(d -> Math.sqrt(Math.max(0, d))).toArray(), root);
        return root;
    }

    private static DMatrixRMaj padded(DMatrixRMaj a) {
        return CommonOps_DDRM.concatRowsMulti(a, a.createLike());
    }
}
