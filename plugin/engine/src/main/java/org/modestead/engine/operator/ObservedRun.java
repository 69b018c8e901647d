package org.modestead.engine.operator;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.linalg.Matrices;

/**
 * What one run tells of the action on given functions q_1..q_R, one row an observation: a snapshot pair (x, y) or a segment
 * γ from s to e. With whatever estimator, the observations of all runs give the compressed operator by
 *
 * <pre>    Ã = (Σ now nowᵀ)⁻¹ Σ now nextᵀ,    observable = (Σ now nowᵀ)⁻¹ Σ now targetᵀ  (in coordinates of the q)</pre>
 *
 * so that they may be weighted anew, as a bootstrap does, without filling the arrays of the fit again. Where inputs are
 * separated, the first is a regression on q and on functions p of the inputs, whose part is dropped.
 *
 * @param now {@code q(x)}, or {@code ∫ q(γ(t)) dt}, then p; observations x (R + known)
 * @param next {@code q(y)}, or {@code q(e) - q(s)}; observations x R
 * @param target the state x, or {@code ∫ γ(t) dt}; observations x N
 * @param known number of functions p of the inputs
 */
public record ObservedRun(DMatrixRMaj now, DMatrixRMaj next, DMatrixRMaj target, int known) {

    /** Checks that the rows agree. */
    public ObservedRun {
        if (now.numRows != next.numRows || now.numRows != target.numRows) {
            throw new IllegalArgumentException("rows differ: " + now.numRows + ", " + next.numRows + ", " + target.numRows);
        }
    }

    /** Returns the observations of one run by a step map on functions in a kernel's space. */
    static ObservedRun of(StatePairs pairs, OrthonormalCompression functions) {
        return new ObservedRun(functions.evaluate(pairs.now()), functions.evaluate(pairs.next()), pairs.now(), 0).weighted(weight(pairs));
    }

    /**
     * Returns the observations of one run by a step map, with inputs or without.
     *
     * @param ofState the functions of the state that q is combined from
     */
    static ObservedRun of(StatePairs pairs, FunctionBasis ofState, OrthonormalCompression functions) {
        DMatrixRMaj map = Matrices.block(functions.map(), 0, functions.functions(), 0, functions.rank());
        DMatrixRMaj now = Matrices.product(ofState.evaluate(pairs.now()), map);
        DMatrixRMaj next = Matrices.product(ofState.evaluate(pairs.next()), map);
        if (functions.inputs().isEmpty()) {
            return new ObservedRun(now, next, pairs.now(), 0).weighted(weight(pairs));
        }
        InputEffect effect = functions.inputs().get();
        DMatrixRMaj known = effect.values(CommonOps_DDRM.concatColumnsMulti(pairs.now(), pairs.windows(effect.window())));
        return new ObservedRun(CommonOps_DDRM.concatColumnsMulti(now, known), next, pairs.now(), known.numCols).weighted(weight(pairs));
    }

    private static double weight(StatePairs pairs) {
        return pairs.runs().get(0).weight();
    }

    /** Returns the same, each row counting as much as a weight says. */
    ObservedRun weighted(double weight) {
        double root = Math.sqrt(weight);
        return weight == 1 ? this
                : new ObservedRun(Matrices.scaled(now, root), Matrices.scaled(next, root), Matrices.scaled(target, root), known);
    }

    /** Returns the number of observations. */
    public int count() {
        return now.numRows;
    }

    /** Returns the observations of some rows, {@code from} included, {@code to} not. */
    public ObservedRun rows(int from, int to) {
        return new ObservedRun(Matrices.block(now, from, to, 0, now.numCols), Matrices.block(next, from, to, 0, next.numCols),
                Matrices.block(target, from, to, 0, target.numCols), known);
    }

    /** Returns the same with another target. */
    public ObservedRun withTarget(DMatrixRMaj other) {
        return new ObservedRun(now, next, other, known);
    }

    /** Returns the same with every function divided by its scale; without inputs. */
    public ObservedRun dividedBy(double[] scale) {
        DMatrixRMaj before = now.copy();
        DMatrixRMaj after = next.copy();
        CommonOps_DDRM.divideCols(before, scale);
        CommonOps_DDRM.divideCols(after, scale);
        return new ObservedRun(before, after, target, known);
    }
}
