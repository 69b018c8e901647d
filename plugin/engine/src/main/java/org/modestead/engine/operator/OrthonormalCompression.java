package org.modestead.engine.operator;

import java.util.Arrays;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.FitFault;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.basis.JoinedFunctions;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.StateRun;

/**
 * The operator seen through R orthonormal functions q_1..q_R, ordered so that the leading r of them are the
 * compression of rank r: nested subspaces, the rungs of the ladder.
 *
 * @param basis functions b_1..b_p from which the q are combined
 * @param map p x R: {@code q_j = Σ_i map_ij b_i}
 * @param action R x R: {@code <A q_j, q_i>}, after ridge, noise correction and structure
 * @param second R x R: {@code <A q_j, A q_i>} in the data inner product, {@code <A* q_j, A* q_i>} in the kernel space
 * @param observable R x N: {@code <g_k, q_i>} for the full-state observable g
 * @param singular R singular values of the whitening, falling, positive
 * @param snapshots number of snapshot pairs or occupation functions behind it
 * @param innerProduct in which the q are orthonormal
 * @param evolution step map or generator
 * @param noisy what was measured, where the action is corrected for noise
 * @param inputs what known inputs add, where they are separated; the q are then orthonormal less what inputs explain of them, and
 *     read state and inputs
 * @param imposed a structure that the action was given, last of all, with the action before that
 */
public record OrthonormalCompression(
        FunctionBasis basis,
        DMatrixRMaj map,
        DMatrixRMaj action,
        DMatrixRMaj second,
        DMatrixRMaj observable,
        double[] singular,
        int snapshots,
        InnerProduct innerProduct,
        Evolution evolution,
        Optional<NoisyStep> noisy,
        Optional<InputEffect> inputs,
        Optional<ImposedStructure> imposed)
        implements Whitened {

    /** Without a noise correction and without inputs. */
    public OrthonormalCompression(FunctionBasis basis, DMatrixRMaj map, DMatrixRMaj action, DMatrixRMaj second,
            DMatrixRMaj observable, double[] singular, int snapshots, InnerProduct innerProduct, Evolution evolution) {
        this(basis, map, action, second, observable, singular, snapshots, innerProduct, evolution, Optional.empty(),
                Optional.empty(), Optional.empty());
    }

    /** The same compression as one of so many snapshots that it was folded from. */
    OrthonormalCompression of(int count) {
        return new OrthonormalCompression(basis, map, action, second, observable, singular, count, innerProduct, evolution, noisy, inputs,
                imposed);
    }

    /** The same functions with the action corrected for noise. */
    OrthonormalCompression corrected(NoisyStep step) {
        return new OrthonormalCompression(basis, map, step.corrected(singular), second, observable, singular, snapshots,
                innerProduct, evolution, Optional.of(step), inputs, Optional.empty());
    }

    /**
     * The same functions less what inputs explain of them at once, {@code q° = q - p <q, p>}.
     *
     * @param effect on the functions q
     */
    OrthonormalCompression separated(InputEffect effect) {
        FunctionBasis joined = new JoinedFunctions(observable.numCols, basis, effect.terms());
        DMatrixRMaj explained = Matrices.scaled(Matrices.product(effect.map(), effect.now()), -1);
        return new OrthonormalCompression(joined, CommonOps_DDRM.concatRowsMulti(map, explained), action, second, observable, singular,
                snapshots, innerProduct, evolution, noisy, Optional.of(effect), Optional.empty());
    }

    /**
     * The same functions with the nearest action that has a structure.
     *
     * @throws FitFault if an operator of this kind cannot have it, or if it meets a noise correction that it does not leave room for
     */
    public OrthonormalCompression constrained(Structure structure) {
        if (!structure.suits(evolution)) {
            throw StructuredEstimator.refused(structure, evolution);
        }
        if (noisy.isPresent() && structure.orthogonal()) {
            throw new FitFault("structure", "a noise correction beside an operator made " + structure.words(),
                    "choose one of the two: the structure takes away the feigned damping, too");
        }
        ImposedStructure imposing = new ImposedStructure(structure, action);
        return new OrthonormalCompression(basis, map, imposing.action(singular, innerProduct, evolution), second, observable, singular,
                snapshots, innerProduct, evolution, noisy, inputs, Optional.of(imposing));
    }

    /** Returns the action as the data give it, before any noise correction and without any structure imposed. */
    public DMatrixRMaj measured() {
        return noisy.map(NoisyStep::measured).orElseGet(() -> imposed.map(ImposedStructure::free).orElse(action));
    }

    /**
     * Whitens other data of these functions and treats them as this compression was treated: noise correction and structure.
     * Inputs must have been projected out already; a ridge is not applied.
     *
     * @param now samples x R, in the scale of the data: every function multiplied by its singular value in the data inner product
     * @param next samples x R, likewise
     * @param target samples x c
     * @param rank at least 1
     * @return of this rank, or less where the data hold less; its basis are the R functions in their scale
     */
    public OrthonormalCompression again(DMatrixRMaj now, DMatrixRMaj next, DMatrixRMaj target, int rank) {
        Optional<NoiseMoments> moments = noisy.flatMap(NoisyStep::moments);
        OrthonormalCompression white = new FactoredCompression(new Coordinates(rank()), now, next, target, innerProduct, evolution,
                moments.isPresent() ? NoiseCorrection.NONE : noisy.map(NoisyStep::correction).orElse(NoiseCorrection.NONE)).whiten(rank);
        OrthonormalCompression free = moments.map(noise -> white.corrected(NoisyStep.of(white.action(), noise.of(inFunctions(white))))).orElse(white);
        return imposed.map(imposing -> free.constrained(imposing.structure())).orElse(free);
    }

    /** How functions combined from these in their scale are combined from these as they are. */
    private DMatrixRMaj inFunctions(OrthonormalCompression other) {
        DMatrixRMaj out = other.map().copy();
        if (innerProduct == InnerProduct.DATA) {
            CommonOps_DDRM.multRows(singular, out);
        }
        return out;
    }

    /** A noise correction is made and a structure imposed anew for them. */
    @Override
    public OrthonormalCompression leading(int r) {
        if (r == rank()) {
            return this;
        }
        if (r < 1 || r > rank()) {
            throw new IllegalArgumentException("rank " + r + " is not in [1, " + rank() + "]");
        }
        OrthonormalCompression head = new OrthonormalCompression(basis, Matrices.block(map, 0, map.numRows, 0, r),
                Matrices.block(imposed.map(ImposedStructure::free).orElse(action), 0, r, 0, r), Matrices.block(second, 0, r, 0, r),
                Matrices.block(observable, 0, r, 0, observable.numCols), Arrays.copyOf(singular, r), snapshots, innerProduct,
                evolution, Optional.empty(), inputs.map(effect -> effect.leading(r)), Optional.empty());
        OrthonormalCompression free = noisy.map(step -> head.corrected(step.leading(r))).orElse(head);
        return imposed.map(imposing -> free.constrained(imposing.structure())).orElse(free);
    }

    @Override
    public OrthonormalCompression whole() {
        return this;
    }

    @Override
    public Whitened at(int r) {
        return this;
    }

    /** Returns what the functions are evaluated at for every state of a run: the states, with the inputs where they are separated. */
    public DMatrixRMaj arguments(StateRun run) {
        return inputs.map(effect -> effect.arguments(run)).orElseGet(run::states);
    }

    /** Returns the states of a run, p x N, less what inputs explain of them at once. */
    public DMatrixRMaj signal(StateRun run) {
        return inputs.map(effect -> less(run.states(), effect.values(effect.arguments(run)), effect.observedNow()))
                .orElseGet(run::states);
    }

    /** Returns the later state of each neighbouring pair of a run, (p - 1) x N, less what the earlier inputs explain of it. */
    public DMatrixRMaj signalAhead(StateRun run) {
        DMatrixRMaj later = Matrices.block(run.states(), 1, run.count(), 0, run.states().numCols);
        return inputs.map(effect -> less(later, Matrices.block(effect.values(effect.arguments(run)), 0, run.count() - 1, 0, effect.count()),
                effect.observedNext())).orElse(later);
    }

    private static DMatrixRMaj less(DMatrixRMaj states, DMatrixRMaj values, DMatrixRMaj weights) {
        DMatrixRMaj out = states.copy();
        CommonOps_DDRM.subtractEquals(out, Matrices.product(values, weights));
        return out;
    }

    /**
     * Evaluates the orthonormal functions.
     *
     * @param states p x N; with the inputs where they are separated, see {@link #arguments}
     * @return p x R with entry (i, j) = q_j(x_i)
     */
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        return Matrices.product(basis.values(states), map);
    }
}
