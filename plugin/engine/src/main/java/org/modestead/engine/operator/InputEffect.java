package org.modestead.engine.operator;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.StateRun;

/**
 * What known inputs add to functions q of the state, so that the action A is that of the free motion:
 *
 * <pre>    q(y) = q(x) A + p(x, u) L,    L = next - now A</pre>
 *
 * with functions p of state and inputs that are orthonormal over the training pairs. Projecting p out of q(x) and q(y) and
 * regressing what is left gives the same A as the joint regression on both (Frisch and Waugh, Econometrica 1:387, 1933).
 *
 * <p>Proctor, Brunton and Kutz, SIAM J. Appl. Dyn. Syst. 15:142, 2016; the projection as in subspace identification,
 * Verhaegen and Dewilde, Int. J. Control 56:1187, 1992.
 *
 * @param window which samples of the inputs act
 * @param terms T functions of {@code [x, u]}, columns of the state first
 * @param map T x c: {@code p_a = Σ_i map_ia terms_i}
 * @param now c x R, {@code <q(x), p>} over the training pairs
 * @param next c x R, {@code <q(y), p>}
 * @param observedNow c x N, {@code <g(x), p>} for the full-state observable g
 * @param observedNext c x N, {@code <g(y), p>}
 */
public record InputEffect(
        InputWindow window,
        FunctionBasis terms,
        DMatrixRMaj map,
        DMatrixRMaj now,
        DMatrixRMaj next,
        DMatrixRMaj observedNow,
        DMatrixRMaj observedNext) {

    /** Returns c, the number of independent functions of the inputs. */
    public int count() {
        return map.numCols;
    }

    /** Returns the sampling steps from one state to the other. */
    public int stride() {
        return window.stride();
    }

    /** Returns what the inputs are taken to do between samples. */
    public InputUse use() {
        return window.use();
    }

    /** The same for the combinations {@code q W} of the functions. */
    InputEffect combined(DMatrixRMaj w) {
        return new InputEffect(window, terms, map, Matrices.product(now, w), Matrices.product(next, w), observedNow, observedNext);
    }

    /** The same for the leading r functions. */
    InputEffect leading(int r) {
        return new InputEffect(window, terms, map, Matrices.block(now, 0, count(), 0, r), Matrices.block(next, 0, count(), 0, r),
                observedNow, observedNext);
    }

    /** Returns {@code [x, u]} for every state of a run: what functions of state and inputs are evaluated at. */
    public DMatrixRMaj arguments(StateRun run) {
        return CommonOps_DDRM.concatColumnsMulti(run.states(), window.of(run));
    }

    /**
     * Returns {@code [x, u]} for one state of a run that is still growing.
     *
     * @param state 1 x N
     * @param inputs p x q samples of the inputs; after the last they are taken as held
     * @param newest index of the state's newest sample
     */
    public DMatrixRMaj arguments(DMatrixRMaj state, DMatrixRMaj inputs, int newest) {
        return CommonOps_DDRM.concatColumnsMulti(state, window.at(inputs, newest));
    }

    /** Returns p at arguments {@code [x, u]}, rows x c. */
    public DMatrixRMaj values(DMatrixRMaj arguments) {
        return Matrices.product(terms.evaluate(arguments), map);
    }

    /**
     * Returns what the inputs add, from each state to the one a stride d later, to the functions less what inputs explain of them at once,
     * {@code q° = q - p now}:
     *
     * <pre>    q°(x_(k+d)) = q°(x_k) A + pushed_k,    pushed_k = p_k next - p_(k+d) now</pre>
     *
     * @param arguments of neighbouring states, rows x (N + inputs)
     * @return (rows - d) x R
     */
    public DMatrixRMaj pushed(DMatrixRMaj arguments) {
        DMatrixRMaj values = values(arguments);
        int count = values.numRows - stride();
        DMatrixRMaj out = Matrices.product(Matrices.block(values, 0, count, 0, count()), next);
        CommonOps_DDRM.subtractEquals(out, Matrices.product(Matrices.block(values, stride(), values.numRows, 0, count()), now));
        return out;
    }
}
