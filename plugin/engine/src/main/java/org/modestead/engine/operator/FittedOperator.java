package org.modestead.engine.operator;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.MatrixExponential;
import org.modestead.engine.recording.Snapshots;

/**
 * An operator fitted to snapshots: the compression up to the largest rank the data support, and the rank chosen.
 *
 * @param functions up to rank R
 * @param rank chosen r in [1, R]
 * @param rule by which r was chosen, for fits to other data
 * @param rankChoice why r was chosen, in words
 * @param ridge ρ that was applied, see {@link Ridge}
 * @param estimator what filled the compression, kept so that checks can refit with another step
 * @param method what was fitted, in words, for the report
 * @param kernel the kernel, when the estimator uses one
 * @param snapshots what it was fitted to (channels, delays, preparation and the training runs)
 * @param doubts what a reader of the results must know
 */
public record FittedOperator(
        Whitened functions,
        int rank,
        RankRule rule,
        String rankChoice,
        double ridge,
        Estimator estimator,
        String method,
        Optional<KernelSpec> kernel,
        Snapshots snapshots,
        List<Doubt> doubts) {

    /** Takes immutable copies. */
    public FittedOperator {
        Objects.requireNonNull(functions);
        Objects.requireNonNull(rule);
        Objects.requireNonNull(estimator);
        Objects.requireNonNull(kernel);
        doubts = List.copyOf(doubts);
    }

    /** Returns the compression at the chosen rank. */
    public OrthonormalCompression chosen() {
        return functions.leading(rank);
    }

    /** Returns the compression up to the largest rank, which may have to be made first: ask {@link #functions} for what they tell. */
    public OrthonormalCompression compression() {
        return functions.whole();
    }

    /** The same operator judged against other runs: only the runs change, not what was fitted. */
    public FittedOperator on(Snapshots others) {
        return new FittedOperator(functions, rank, rule, rankChoice, ridge, estimator, method, kernel, others, doubts);
    }

    /** Returns step map or generator. */
    public Evolution evolution() {
        return functions.evolution();
    }

    /**
     * Returns the r x r matrix P that carries coefficients forward by a time: {@code g(x(t+h)) ≈ q(x(t))ᵀ P <g, q>}.
     *
     * @param time h in time units; for a step map a whole multiple of its step, at least 0
     * @return the power Ã^k, k = h/Δt, or the exponential exp(h Ã)
     * @throws IllegalArgumentException if h is not a multiple of the step map's step
     */
    public DMatrixRMaj propagator(double time) {
        DMatrixRMaj action = chosen().action();
        if (functions.evolution() instanceof Evolution.StepMap map) {
            return Matrices.power(action, wholeSteps(time, map.step()));
        }
        return MatrixExponential.of(Matrices.scaled(action, time));
    }

    private static int wholeSteps(double time, double step) {
        double steps = time / step;
        long whole = Math.round(steps);
        if (whole < 0 || Math.abs(steps - whole) > 1e-6 * Math.max(1, whole)) {
            throw new IllegalArgumentException("time " + time + " is not a multiple of the step " + step);
        }
        return Math.toIntExact(whole);
    }
}
