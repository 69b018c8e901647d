package org.modestead.engine.wellposed;

import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Blocks;
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

    /** Eigenfunctions that one core works out in a row. */
    private static final int SHARED = 4;

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
     * @param tracks its eigenfunctions along them, and along a number of copies with further noise, possibly none
     * @return length r, one an eigenpair; NaN where φ vanishes
     */
    static List<Pair> of(ModalExpansion expansion, JudgingRuns judging, List<Tracks> tracks) {
        List<Complex[][]> driven = judging.runs().stream().map(run -> driven(expansion, run)).toList();
        int[] first = tracks.get(0).first();
        Pair[] out = new Pair[first.length];
        Blocks.of(out.length, SHARED, (from, to) -> {
            for (int j = from; j < to; j++) {
                out[j] = first[j] == j ? of(expansion.rates().get(j), judging, tracks, driven, j) : Pair.UNKNOWN;
            }
        });
        return IntStream.range(0, out.length).mapToObj(j -> out[first[j]]).toList();
    }

    private static Pair of(Complex rate, JudgingRuns judging, List<Tracks> tracks, List<Complex[][]> driven, int j) {
        double[] plain = squares(rate, judging, tracks.get(0), driven, j);
        int copies = tracks.size() - 1;
        double[] noisier = new double[plain.length];
        for (Tracks copy : tracks.subList(1, tracks.size())) {
            double[] one = squares(rate, judging, copy, driven, j);
            for (int k = 0; k < one.length; k++) {
                noisier[k] += one[k] / copies;
            }
        }
        return worst(plain, copies == 0 ? plain : noisier);
    }

    /** Squared misses and squared sizes, lag after lag. */
    private static double[] squares(Complex rate, JudgingRuns judging, Tracks tracks, List<Complex[][]> driven, int j) {
        double[] squares = new double[2 * (SHARES.length + 1)];
        int at = 0;
        for (int i = 0; i < judging.runs().size(); i++) {
            double[] times = judging.runs().get(i).times();
            Tracks.Track track = tracks.track(j, at, times.length, driven.get(i)[j]);
            for (int lag = 0; lag <= SHARES.length; lag++) {
                Misses misses = new Misses(rate, track);
                LaggedPairs.walk(times, lag == 0 ? 0 : SHARES[lag - 1] * ownTime(rate, judging.longest()), misses);
                squares[2 * lag] += misses.misses;
                squares[2 * lag + 1] += misses.sizes;
            }
            at += times.length;
        }
        return squares;
    }

    /** Sums over pairs of states of what one eigenfunction misses and of what it is. */
    private static final class Misses implements LaggedPairs.Visitor {
        private final Decay decay;
        private final double[] re;
        private final double[] im;
        private final double[] size;
        private double misses;
        private double sizes;

        Misses(Complex rate, Tracks.Track track) {
            decay = new Decay(rate);
            re = track.re();
            im = track.im();
            size = track.squares();
        }

        @Override
        public void pair(int from, int to, double tau) {
            decay.over(tau);
            double real = re[to] - (decay.re() * re[from] - decay.im() * im[from]);
            double imaginary = im[to] - (decay.re() * im[from] + decay.im() * re[from]);
            misses += real * real + imaginary * imaginary;
            sizes += size[to];
        }
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
