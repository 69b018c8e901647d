package org.modestead.engine.wellposed;

import java.util.List;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.recording.StateRun;
import org.modestead.engine.spectrum.ModalExpansion;

/**
 * The rate of an eigenfunction in the first and in the second half of the judging runs. In each half the multiplier over a lag τ, freed of the
 * fitted rate, is that of least squares,
 *
 * <pre>    m = Σ conj(φ(t)) e^(-λτ) φ(t+τ) / Σ |φ(t)|²,    λ_half = λ + log(m)/τ</pre>
 *
 * with τ a quarter of the mode's own time (see {@link Residuals}), at least one step. Noise is taken off both sums as there,
 * and what known inputs add, where they are separated, off φ. The standard error of
 * m is that of a regression whose residuals are independent from one τ to the next.
 *
 * @param change {@code |λ_second - λ_first|}; NaN where the runs cannot tell
 * @param error its standard error
 */
record HalfRates(double change, double error) {

    static final HalfRates UNKNOWN = new HalfRates(Double.NaN, Double.NaN);

    private static final double QUARTER = 0.25;

    /**
     * @param expansion at the fitted rank
     * @param judging runs
     * @param plain its eigenfunctions on them, per run p x r
     * @param columns eigenpairs asked for
     * @return one each
     */
    static List<HalfRates> of(ModalExpansion expansion, JudgingRuns judging, List<ZMatrixRMaj> plain, List<Integer> columns) {
        List<ZMatrixRMaj> disturbed = judging.disturbedEigenfunctions(expansion);
        List<Complex[][]> driven = judging.runs().stream().map(run -> Residuals.driven(expansion, run)).toList();
        return columns.stream().map(j -> one(expansion, judging, plain, disturbed, driven, j)).toList();
    }

    private static HalfRates one(ModalExpansion expansion, JudgingRuns judging, List<ZMatrixRMaj> plain, List<ZMatrixRMaj> disturbed,
            List<Complex[][]> driven, int j) {
        Complex rate = expansion.rates().get(j);
        if (!Double.isFinite(rate.re())) {
            return UNKNOWN;
        }
        double lag = QUARTER * Residuals.ownTime(rate, judging.longest());
        Half[] halves = new Half[2];
        double[] errors = new double[2];
        for (int h = 0; h < 2; h++) {
            Half as = sums(judging.runs(), plain, driven, rate, j, lag, h);
            halves[h] = disturbed.isEmpty() ? as : as.without(sums(judging.runs(), disturbed, driven, rate, j, lag, h).over(disturbed.size() / plain.size()));
            if (halves[h].pairs() == 0 || !(halves[h].size() >= Residuals.MOSTLY_NOISE * as.size())) {
                return UNKNOWN;
            }
            errors[h] = as.error(halves[h].size());
        }
        return new HalfRates(halves[1].excess().minus(halves[0].excess()).abs(), Math.hypot(errors[0], errors[1]));
    }

    /** Sums over one half of all runs; copies of the runs stand one after the other. */
    private static Half sums(List<StateRun> runs, List<ZMatrixRMaj> values, List<Complex[][]> driven, Complex rate, int j, double lag, int half) {
        Half sum = Half.NONE;
        for (int i = 0; i < values.size(); i++) {
            sum = sum.plus(sums(runs.get(i % runs.size()), values.get(i), driven.get(i % runs.size())[j], rate, j, lag, half));
        }
        return sum;
    }

    private static Half sums(StateRun run, ZMatrixRMaj values, Complex[] driven, Complex rate, int j, double lag, int half) {
        double[] t = run.times();
        double middle = (t[0] + t[t.length - 1]) / 2;
        double start = half == 0 ? t[0] : middle;
        double end = half == 0 ? middle : t[t.length - 1];
        Half[] sum = {Half.NONE};
        Decay back = new Decay(rate.times(-1));
        LaggedPairs.walk(t, lag, (from, to, tau) -> {
            if (t[from] >= start && t[to] <= end) {
                back.over(tau);
                Complex now = Residuals.free(values, driven, from, j);
                Complex next = back.factor().times(Residuals.free(values, driven, to, j));
                sum[0] = sum[0].plus(new Half(now.conj().times(next), square(now), square(next), tau, 1, 0));
            }
        });
        return sum[0].spanning(sum[0].pairs() == 0 ? 0 : Math.max(1, (end - start) / (sum[0].lags() / sum[0].pairs())));
    }

    private static double square(Complex z) {
        return z.re() * z.re() + z.im() * z.im();
    }

    /**
     * Sums over pairs of states.
     *
     * @param product of conj(φ) and what follows
     * @param size squared, of φ
     * @param next squared size of what follows
     * @param lags summed
     * @param pairs number
     * @param independent number of lags that follow one another without overlap
     */
    private record Half(Complex product, double size, double next, double lags, int pairs, double independent) {

        static final Half NONE = new Half(Complex.ZERO, 0, 0, 0, 0, 0);

        Half plus(Half other) {
            return new Half(product.plus(other.product), size + other.size, next + other.next, lags + other.lags, pairs + other.pairs,
                    independent + other.independent);
        }

        Half spanning(double count) {
            return new Half(product, size, next, lags, pairs, count);
        }

        Half over(int copies) {
            return new Half(product.times(1.0 / copies), size / copies, next / copies, lags / copies, pairs / copies, independent / copies);
        }

        /** The line through one and two doses of noise, read off at none. */
        Half without(Half noisier) {
            return new Half(product.times(2).minus(noisier.product), 2 * size - noisier.size, next, lags, pairs, independent);
        }

        private double lag() {
            return lags / pairs;
        }

        /** log(m)/τ. */
        Complex excess() {
            Complex m = product.times(1 / size);
            return new Complex(Math.log(m.abs()), Math.atan2(m.im(), m.re())).times(1 / lag());
        }

        /** Standard error of log(m)/τ, from residuals that keep their noise, where the squared size without noise is {@code clear}. */
        double error(double clear) {
            double left = Math.max(0, next - square(product) / size);
            return Math.sqrt(left / (clear * independent)) / lag();
        }
    }
}
