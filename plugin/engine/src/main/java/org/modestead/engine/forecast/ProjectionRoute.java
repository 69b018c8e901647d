package org.modestead.engine.forecast;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InputEffect;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.DelayEmbedding;

/**
 * Forecast by the compressed operator, one step at a time, without eigenvectors.
 *
 * <pre>    y(t + Δt) = q(x(t)) P(Δt) B,    P(Δt) = Ã for a step map, exp(Δt Ã) for a generator</pre>
 *
 * <p>Only the newest sample is taken from the product; it is stacked with the known and the already forecast ones
 * (delays shift by their spacing) and the functions are evaluated anew. The modes need not exist for this to work.
 *
 * <p>Where inputs are separated, {@code y(t + Δt) = q°(x, u) P B + p(x, u) <g(y), p>}; see {@link
 * org.modestead.engine.operator.InputEffect}.
 *
 * <p><b>Weakness.</b> a one-step error enters every later step; outside the sampled region the functions are
 * extrapolated. For the scaled generator with a &lt; 1 it reads the action as that of the flow.
 */
public final class ProjectionRoute implements ForecastRoute {

    private final OrthonormalCompression compression;
    private final DelayEmbedding delay;
    private final DMatrixRMaj oneStep;

    /**
     * @param operator that carries the state forward
     * @param step Δt in time units, positive; for a step map its own step
     */
    public ProjectionRoute(FittedOperator operator, double step) {
        compression = operator.chosen();
        delay = operator.snapshots().delay();
        int channels = operator.snapshots().channels().size();
        DMatrixRMaj newest = Matrices.block(compression.observable(), 0, compression.rank(), 0, channels);
        oneStep = Matrices.product(operator.propagator(step), newest);
    }

    @Override
    public String id() {
        return Route.PROJECTION.word();
    }

    @Override
    public int memory() {
        return delay.reach() + 1;
    }

    @Override
    public DMatrixRMaj forecast(DMatrixRMaj history, int steps) {
        int n = history.numCols;
        int known = memory();
        DMatrixRMaj samples = new DMatrixRMaj(known + steps, n);
        System.arraycopy(history.data, (history.numRows - known) * n, samples.data, 0, known * n);
        for (int k = known; k < known + steps; k++) {
            DMatrixRMaj functions = compression.evaluate(DelayState.at(samples, k - 1, delay));
            System.arraycopy(Matrices.product(functions, oneStep).data, 0, samples.data, k * n, n);
        }
        return Matrices.block(samples, known, known + steps, 0, n);
    }

    @Override
    public DMatrixRMaj forecast(DMatrixRMaj history, DMatrixRMaj inputs, int steps) {
        if (compression.inputs().isEmpty()) {
            return forecast(history, steps);
        }
        DrivenRun run = DrivenRun.of(compression, delay, history, inputs, steps);
        InputEffect effect = run.effect();
        for (int k = history.numRows; k < history.numRows + steps; k++) {
            DMatrixRMaj now = run.arguments(k - 1);
            DMatrixRMaj next = Matrices.product(effect.values(now), effect.observedNext());
            DMatrixRMaj newest = Matrices.block(next, 0, 1, 0, history.numCols);
            CommonOps_DDRM.addEquals(newest, Matrices.product(compression.evaluate(now), oneStep));
            run.write(k, newest);
        }
        return run.last(steps);
    }
}
