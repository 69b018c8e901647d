package org.modestead.engine.operator;

import java.util.Arrays;
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
 * The step map on functions of the state by least squares over all pairs, with what known inputs add projected out. With a
 * noise correction the inputs are taken as free of noise: columns that are exact are projected out before total least squares
 * (Van Huffel and Vandewalle, The Total Least Squares Problem, SIAM 1991, section 3.5).
 */
final class StepRegression {

    /** Combinations of input terms that are weaker than this share of the strongest are rounding. */
    private static final double ROUNDING = 1e-12;

    private StepRegression() {}

    /** Functions of the inputs, known before the number of columns is. */
    interface Terms {
        FunctionBasis on(int stateSize, int inputs);
    }

    static FactoredCompression of(StatePairs pairs, FunctionBasis functions, InputUse use, Terms terms,
            NoiseCorrection correction) {
        RowWeights weights = pairs.weights();
        double weight = 1 / Math.sqrt(pairs.count());
        DMatrixRMaj values = functions.values(pairs.now());
        DMatrixRMaj now = weights.rows(values, weight);
        DMatrixRMaj next = weights.rows(functions.values(pairs.next()), weight);
        DMatrixRMaj target = values == pairs.now() ? now : weights.rows(pairs.now(), weight);
        Evolution evolution = new Evolution.StepMap(pairs.step());
        if (use == InputUse.LEFT_IN || pairs.inputs() == 0) {
            return new FactoredCompression(functions, now, next, target, InnerProduct.DATA, evolution, correction);
        }
        InputWindow window = InputWindow.of(use, pairs.inputs(), pairs.reach(), pairs.stride(), pairs.runs());
        FunctionBasis inputTerms = terms.on(pairs.now().numCols, window.size());
        DMatrixRMaj known = weights.rows(inputTerms.evaluate(
                CommonOps_DDRM.concatColumnsMulti(pairs.now(), pairs.windows(window))), weight);
        Projection projection = Projection.on(known, inputTerms);
        DMatrixRMaj targetNext = weights.rows(pairs.next(), weight);
        InputEffect effect = new InputEffect(window, inputTerms, projection.map(), projection.held(now), projection.held(next),
                projection.held(target), projection.held(targetNext));
        return new FactoredCompression(functions, projection.rest(now), projection.rest(next), projection.rest(target),
                InnerProduct.DATA, evolution, correction, Optional.of(effect));
    }

    /**
     * The span of the input terms over all pairs.
     *
     * @param directions P, m x c, orthonormal columns
     * @param map T x c, {@code P = terms map}
     */
    private record Projection(DMatrixRMaj directions, DMatrixRMaj map) {

        static Projection on(DMatrixRMaj known, FunctionBasis terms) {
            DMatrixRMaj scaled = known.copy();
            double[] lengths = new double[known.numCols];
            for (int j = 0; j < lengths.length; j++) {
                double length = NormOps_DDRM.normF(CommonOps_DDRM.extractColumn(known, j, null));
                lengths[j] = length > 0 ? length : 1;
            }
            CommonOps_DDRM.divideCols(scaled, lengths);
            Svd svd = ThinSvd.of(scaled, Math.min(known.numRows, known.numCols));
            int count = (int) Arrays.stream(svd.values()).filter(s -> s > ROUNDING * svd.values()[0]).count();
            if (count >= known.numRows) {
                throw new FitFault("inputs", terms.describe() + " on " + known.numRows + " snapshot pairs",
                        "use longer runs, a smaller delay depth or fewer inputs");
            }
            DMatrixRMaj map = Matrices.block(svd.v(), 0, lengths.length, 0, count);
            CommonOps_DDRM.divideRows(lengths, map);
            CommonOps_DDRM.divideCols(map, Arrays.copyOf(svd.values(), count));
            return new Projection(Matrices.block(svd.u(), 0, known.numRows, 0, count), map);
        }

        DMatrixRMaj held(DMatrixRMaj a) {
            return Matrices.transposeProduct(directions, a);
        }

        /** Projected twice: the second round takes away what rounding left of the first. */
        DMatrixRMaj rest(DMatrixRMaj a) {
            DMatrixRMaj out = a;
            for (int round = 0; round < 2; round++) {
                DMatrixRMaj less = out.copy();
                CommonOps_DDRM.subtractEquals(less, Matrices.product(directions, held(out)));
                out = less;
            }
            return out;
        }
    }
}
