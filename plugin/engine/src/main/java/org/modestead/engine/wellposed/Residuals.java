package org.modestead.engine.wellposed;

import java.util.List;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.recording.StateRun;
import org.modestead.engine.spectrum.ModalExpansion;

/**
 * How far an eigenfunction is from moving as its eigenvalue says, on runs it is judged on:
 *
 * <pre>    ‖φ(x(t+τ)) - e^(λτ) φ(x(t))‖ / ‖φ(x(t+τ))‖</pre>
 *
 * root mean square over all pairs of states, for τ = one step and up to the mode's own time
 * {@code τ_c = min(T/2, 1/|Re λ|, 2π/|Im λ|)}: shorter would pass anything slow, longer would compare what has died away
 * with noise. The largest over the τ counts. What known inputs add on the way is taken off first, where they are separated.
 */
final class Residuals {

    private static final double[] SHARES = {0.25, 0.5, 1};

    private Residuals() {}

    /**
     * @param expansion on one rung
     * @param judging runs
     * @param eigenfunctions per run p x r values of the expansion's eigenfunctions
     * @return length r, one an eigenpair; NaN where φ vanishes
     */
    static double[] of(ModalExpansion expansion, JudgingRuns judging, List<ZMatrixRMaj> eigenfunctions) {
        int r = expansion.rank();
        double[][] squares = new double[r][2 * (SHARES.length + 1)];
        for (int i = 0; i < judging.runs().size(); i++) {
            StateRun run = judging.runs().get(i);
            ZMatrixRMaj values = eigenfunctions.get(i);
            Complex[][] driven = driven(expansion, run);
            for (int j = 0; j < r; j++) {
                for (int lag = 0; lag <= SHARES.length; lag++) {
                    double target = lag == 0 ? 0 : SHARES[lag - 1] * ownTime(expansion.rates().get(j), judging.longest());
                    add(run.times(), values, driven[j], j, expansion.rates().get(j), target, squares[j], 2 * lag);
                }
            }
        }
        double[] out = new double[r];
        for (int j = 0; j < r; j++) {
            out[j] = worst(squares[j]);
        }
        return out;
    }

    /** Returns what inputs have added to each eigenfunction since the run's first state; no entries where none are separated. */
    private static Complex[][] driven(ModalExpansion expansion, StateRun run) {
        Complex[][] out = new Complex[expansion.rank()][0];
        expansion.compression().inputs().ifPresent(effect -> {
            ZMatrixRMaj pushed = ComplexMatrices.product(effect.pushed(effect.arguments(run)), expansion.vectors());
            for (int j = 0; j < out.length; j++) {
                out[j] = new Complex[run.count()];
                for (int k = 0; k < run.count(); k++) {
                    int before = k - effect.stride();
                    out[j][k] = before < 0 ? Complex.ZERO
                            : out[j][before].times(expansion.eigenvalues().get(j)).plus(ComplexMatrices.entry(pushed, before, j));
                }
            }
        });
        return out;
    }

    private static double ownTime(Complex rate, double longest) {
        double time = longest / 2;
        time = rate.re() == 0 ? time : Math.min(time, 1 / Math.abs(rate.re()));
        return rate.im() == 0 ? time : Math.min(time, 2 * Math.PI / Math.abs(rate.im()));
    }

    private static void add(double[] times, ZMatrixRMaj values, Complex[] driven, int j, Complex rate, double target, double[] squares,
            int at) {
        int to = 1;
        for (int from = 0; from < times.length - 1; from++) {
            to = Math.max(to, from + 1);
            while (to < times.length - 1 && times[to] - times[from] < target * (1 - 1e-9)) {
                to++;
            }
            double tau = times[to] - times[from];
            if (tau < target * (1 - 1e-9)) {
                return;
            }
            Complex next = ComplexMatrices.entry(values, to, j);
            double miss = free(values, driven, to, j).minus(rate.times(tau).exp().times(free(values, driven, from, j))).abs();
            squares[at] += miss * miss;
            squares[at + 1] += next.abs() * next.abs();
        }
    }

    private static Complex free(ZMatrixRMaj values, Complex[] driven, int k, int j) {
        Complex value = ComplexMatrices.entry(values, k, j);
        return driven.length == 0 ? value : value.minus(driven[k]);
    }

    private static double worst(double[] squares) {
        double worst = Double.NaN;
        for (int k = 0; k < squares.length; k += 2) {
            if (squares[k + 1] > 0) {
                double residual = Math.sqrt(squares[k] / squares[k + 1]);
                worst = Double.isNaN(worst) ? residual : Math.max(worst, residual);
            }
        }
        return worst;
    }
}
