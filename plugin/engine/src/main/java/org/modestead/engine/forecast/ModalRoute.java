package org.modestead.engine.forecast;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InputEffect;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.spectrum.Spectrum;

/**
 * Forecast by modes.
 *
 * <pre>    y(t + kΔt) = Re Σ_j ξ_j m_j^k φ_j(x(t)),    φ(x) = q(x) V</pre>
 *
 * <p>The multiplier m_j of one step is the eigenvalue μ_j itself for a step map, so that a negative real μ_j, which
 * has no real logarithm, alternates as it should; for a generator it is {@code exp(λ_j Δt)}. Conjugate pairs cancel
 * their imaginary parts to rounding. Only the weights of the newest sample are used.
 *
 * <p>Where inputs are separated, {@code φ(x(t + Δt)) = m φ(x(t)) + p (next - now A) V} and {@code y(t + Δt)} is the sum of the
 * modes and {@code p (<g(y), p> - next B)}; see {@link InputEffect}.
 *
 * <p><b>Weakness.</b> every mode is trusted for ever, and overlapping eigenfunctions give large weights that cancel:
 * use it for modes that stand or settle. For the scaled generator with a &lt; 1 it reads the rates as those of the flow.
 */
public final class ModalRoute implements ForecastRoute {

    private final OrthonormalCompression compression;
    private final DelayEmbedding delay;
    private final ZMatrixRMaj vectors;
    private final ZMatrixRMaj weights;
    private final Complex[] multipliers;
    private final int channels;

    /**
     * @param operator whose functions are evaluated
     * @param spectrum of that operator at its chosen rank
     * @param step Δt in time units, positive; for a step map its own step
     */
    public ModalRoute(FittedOperator operator, Spectrum spectrum, double step) {
        compression = operator.chosen();
        delay = operator.snapshots().delay();
        channels = operator.snapshots().channels().size();
        vectors = spectrum.vectors();
        weights = spectrum.joint();
        multipliers = multipliers(operator.evolution(), spectrum.eigenvalues(), step);
    }

    @Override
    public String id() {
        return Route.MODAL.word();
    }

    @Override
    public int memory() {
        return delay.reach() + 1;
    }

    @Override
    public DMatrixRMaj forecast(DMatrixRMaj history, int steps) {
        DMatrixRMaj q = compression.evaluate(DelayState.at(history, history.numRows - 1, delay));
        ZMatrixRMaj phi = ComplexMatrices.product(q, vectors);
        DMatrixRMaj out = new DMatrixRMaj(steps, channels);
        for (int j = 0; j < multipliers.length; j++) {
            addMode(j, new Complex(phi.getReal(0, j), phi.getImag(0, j)), out);
        }
        return out;
    }

    @Override
    public DMatrixRMaj forecast(DMatrixRMaj history, DMatrixRMaj inputs, int steps) {
        if (compression.inputs().isEmpty()) {
            return forecast(history, steps);
        }
        DrivenRun run = DrivenRun.of(compression, delay, history, inputs, steps);
        InputEffect effect = run.effect();
        DMatrixRMaj push = Matrices.product(effect.now(), Matrices.scaled(compression.action(), -1));
        CommonOps_DDRM.addEquals(push, effect.next());
        DMatrixRMaj direct = Matrices.product(effect.next(), Matrices.scaled(compression.observable(), -1));
        CommonOps_DDRM.addEquals(direct, effect.observedNext());
        DMatrixRMaj now = run.arguments(history.numRows - 1);
        DMatrixRMaj q = compression.evaluate(now);
        CommonOps_DDRM.addEquals(q, Matrices.product(effect.values(now), effect.now()));
        ZMatrixRMaj phi = ComplexMatrices.product(q, vectors);
        for (int k = history.numRows; k < history.numRows + steps; k++) {
            DMatrixRMaj known = effect.values(run.arguments(k - 1));
            phi = carried(phi, ComplexMatrices.product(Matrices.product(known, push), vectors));
            DMatrixRMaj newest = Matrices.block(Matrices.product(known, direct), 0, 1, 0, channels);
            addModes(phi, newest);
            run.write(k, newest);
        }
        return run.last(steps);
    }

    private ZMatrixRMaj carried(ZMatrixRMaj phi, ZMatrixRMaj pushed) {
        ZMatrixRMaj out = new ZMatrixRMaj(1, multipliers.length);
        for (int j = 0; j < multipliers.length; j++) {
            Complex value = ComplexMatrices.entry(phi, 0, j).times(multipliers[j]).plus(ComplexMatrices.entry(pushed, 0, j));
            out.set(0, j, value.re(), value.im());
        }
        return out;
    }

    private void addModes(ZMatrixRMaj phi, DMatrixRMaj row) {
        for (int j = 0; j < multipliers.length; j++) {
            for (int c = 0; c < channels; c++) {
                row.data[c] += phi.getReal(0, j) * weights.getReal(j, c) - phi.getImag(0, j) * weights.getImag(j, c);
            }
        }
    }

    private void addMode(int j, Complex start, DMatrixRMaj out) {
        Complex phi = start;
        for (int k = 0; k < out.numRows; k++) {
            phi = phi.times(multipliers[j]);
            for (int c = 0; c < channels; c++) {
                double value = phi.re() * weights.getReal(j, c) - phi.im() * weights.getImag(j, c);
                out.data[k * channels + c] += value;
            }
        }
    }

    private static Complex[] multipliers(Evolution evolution, List<Complex> eigenvalues, double step) {
        return eigenvalues.stream()
                .map(value -> evolution instanceof Evolution.StepMap ? value : evolution.rate(value).times(step).exp())
                .toArray(Complex[]::new);
    }
}
