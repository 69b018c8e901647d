package org.modestead.engine.wellposed;

import java.util.ArrayList;
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
 *
 * <p>Noise of the data adds to both norms, in squares. How much it adds is seen by adding as much again, with the level of
 * {@link SampleNoise}: {@code clear² = 2 ‖.‖² - ‖.‖²_noisier}, the straight line through one and two doses of noise read off at none
 * (simulation extrapolation, Cook and Stefanski, J. Am. Stat. Assoc. 89:1314, 1994, with a line). Where more than half of the
 * eigenfunction's squared size is noise, nothing is taken off.
 */
final class Residuals {

    private static final double[] SHARES = {0.25, 0.5, 1};

    /** Share of the squared size that must not be noise for the noise to be taken off. */
    static final double MOSTLY_NOISE = 0.5;

    private Residuals() {}

    /**
     * @param raw as the data give it
     * @param clear what is left of it when the share of the noise is taken off, see {@link Residuals}
     */
    record Pair(double raw, double clear) {

        static final Pair UNKNOWN = new Pair(Double.NaN, Double.NaN);
    }

    /**
     * @param expansion on one rung
     * @param judging runs
     * @param eigenfunctions per run p x r values of the expansion's eigenfunctions
     * @param disturbed the same on copies of the runs with further noise, a whole number of copies one after the other, possibly none
     * @return length r, one an eigenpair; NaN where φ vanishes
     */
    static List<Pair> of(ModalExpansion expansion, JudgingRuns judging, List<ZMatrixRMaj> eigenfunctions, List<ZMatrixRMaj> disturbed) {
        int runs = judging.runs().size();
        int copies = disturbed.size() / runs;
        double[][] plain = squares(expansion, judging, eigenfunctions);
        double[][] noisier = new double[plain.length][plain[0].length];
        for (int copy = 0; copy < copies; copy++) {
            double[][] one = squares(expansion, judging, disturbed.subList(copy * runs, (copy + 1) * runs));
            for (int j = 0; j < one.length; j++) {
                for (int k = 0; k < one[j].length; k++) {
                    noisier[j][k] += one[j][k] / copies;
                }
            }
        }
        List<Pair> out = new ArrayList<>();
        for (int j = 0; j < plain.length; j++) {
            out.add(worst(plain[j], copies == 0 ? plain[j] : noisier[j]));
        }
        return out;
    }

    private static double[][] squares(ModalExpansion expansion, JudgingRuns judging, List<ZMatrixRMaj> eigenfunctions) {
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
        return squares;
    }

    /** Returns what inputs have added to each eigenfunction since the run's first state; no entries where none are separated. */
    static Complex[][] driven(ModalExpansion expansion, StateRun run) {
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

    /** Returns the time over which a mode of a rate is judged. */
    static double ownTime(Complex rate, double longest) {
        double time = longest / 2;
        time = rate.re() == 0 ? time : Math.min(time, 1 / Math.abs(rate.re()));
        return rate.im() == 0 ? time : Math.min(time, 2 * Math.PI / Math.abs(rate.im()));
    }

    private static void add(double[] times, ZMatrixRMaj values, Complex[] driven, int j, Complex rate, double target, double[] squares,
            int at) {
        LaggedPairs.walk(times, target, (from, to, tau) -> {
            Complex next = ComplexMatrices.entry(values, to, j);
            double miss = free(values, driven, to, j).minus(rate.times(tau).exp().times(free(values, driven, from, j))).abs();
            squares[at] += miss * miss;
            squares[at + 1] += next.abs() * next.abs();
        });
    }

    /** Returns an eigenfunction's value without what inputs have added. */
    static Complex free(ZMatrixRMaj values, Complex[] driven, int k, int j) {
        Complex value = ComplexMatrices.entry(values, k, j);
        return driven.length == 0 ? value : value.minus(driven[k]);
    }

    private static Pair worst(double[] plain, double[] noisier) {
        Pair worst = Pair.UNKNOWN;
        for (int k = 0; k < plain.length; k += 2) {
            if (plain[k + 1] > 0) {
                double raw = Math.sqrt(plain[k] / plain[k + 1]);
                double miss = Math.max(0, 2 * plain[k] - noisier[k]);
                double size = 2 * plain[k + 1] - noisier[k + 1];
                double clear = size < MOSTLY_NOISE * plain[k + 1] ? raw : Math.sqrt(miss / size);
                worst = Double.isNaN(worst.raw()) ? new Pair(raw, clear)
                        : new Pair(Math.max(worst.raw(), raw), Math.max(worst.clear(), clear));
            }
        }
        return worst;
    }
}
