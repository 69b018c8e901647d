package org.modestead.engine.wellposed;

import java.util.List;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.recording.StateRun;

/**
 * Whether the judging runs can tell two modes from one defective mode. With unit eigenfunctions φ_1, φ_2 that overlap by c, and e_1 = φ_1,
 * {@code e_2 = (φ_2 - c φ_1)/s}, {@code s = √(1 - |c|²)}, the fitted motion of their span and the one with a single rate λ are
 *
 * <pre>
 *   two rates:  e_1 -> e^(λ_1 τ) e_1     e_2 -> e^(λ_2 τ) e_2 + (c/s) (e^(λ_2 τ) - e^(λ_1 τ)) e_1
 *   one rate:   e_1 -> e^(λ τ) e_1       e_2 -> e^(λ τ) (e_2 + (λ_2 - λ_1) (c/s) τ e_1)
 * </pre>
 *
 * <p>Both are held against the judging runs, over one step and up to half their length or the time in which the pair fades. λ is λ_1, λ_2
 * or their mean, whichever misses least.
 */
record TwinRates(ZMatrixRMaj vectors, int first, int second, Complex rateOne, Complex rateTwo, Complex overlap) {

    /** Overlap of unit eigenfunctions below which they are hardly halves of a defective one. */
    static final double PARALLEL = 0.25;

    private static final double TWO_FIFTHS = 0.4;
    private static final double HALF = 0.5;

    /** Weight relative to the mode's from which another is taken for its half: halves carry large opposite weights. */
    private static final double NOTABLE = 0.3;
    private static final double MEAN = 0.5;

    /** Difference of the rates, times the time looked at, below which two exponentials and t e^(λt) differ by a part in five hundred. */
    private static final double INDISTINCT = 0.2;

    /** Coupling over the time looked at, from which such a pair is a defective one rather than two functions of one rate. */
    private static final double STRONG = 0.5;

    /** Coupling over the time looked at, from which two functions are hardly more than each other's shadow. */
    private static final double FIRM = 1.4;

    /**
     * Square of the difference of the rates, times the time looked at, over the share of noise, up to which noise hides it: the motion by two rates,
     * {@code sinh(x)/x} times t e^(λt) with {@code x = (λ_2 - λ_1) t/2}, then differs from that by one, {@code x²/6}, by less than half of the noise of a sample.
     */
    private static final double HIDDEN = 10;

    /** Coupling over the time looked at, below which the functions share a rate without being one defective pair. */
    private static final double UNCOUPLED = 0.1;

    /** Squared misses above which noise rules and the judging runs cannot decide. */
    private static final double EXACT = 1e-4;

    /** Squared misses that differ by less than this share are the same. */
    private static final double SHARE = 0.02;
    private static final double PER_PAIR = 10;
    /** A change of the prediction by a thousandth of its size cannot be told from none. */
    private static final double SMALL = 1e-3;
    private static final double[] LAGS = {0, 0.25, 0.5, 1};

    private static TwinRates of(ZMatrixRMaj vectors, List<Complex> rates, int first, int second) {
        Complex overlap = Eigenspace.inner(Eigenspace.column(vectors, first), Eigenspace.column(vectors, second));
        return new TwinRates(vectors, first, second, rates.get(first), rates.get(second), overlap);
    }

    /**
     * The modes of a rung that cannot be told from halves of a defective one.
     *
     * @param rung fitted
     * @param judging runs
     * @param values its eigenfunctions on them, per run p x r
     * @param noisier the same rank fitted to noisier runs
     * @param noiseShare standard deviation of the noise over that of the signal
     * @return per part of the rung whether it has a twin
     */
    static List<Boolean> twins(Rung rung, JudgingRuns judging, List<ZMatrixRMaj> values, List<Rung> noisier, double noiseShare) {
        return rung.parts().stream().map(part -> hasTwin(rung, part, judging, values, noisier, noiseShare)).toList();
    }

    private static boolean hasTwin(Rung rung, Rung.Part part, JudgingRuns judging, List<ZMatrixRMaj> values, List<Rung> noisier, double noiseShare) {
        int column = part.group().get(0);
        for (Rung.Part partner : rung.parts()) {
            for (int other : partner.weight() >= NOTABLE * part.weight() ? partner.group() : List.<Integer>of()) {
                TwinRates pair = of(rung.expansion().vectors(), rung.expansion().rates(), column, other);
                if (other != column && pair.parallel() && pair.coupling(judging) >= UNCOUPLED && (pair.hidden(judging, noiseShare) || pair.isOne(judging, values, noisier, partner.constant()))) {
                    return true;
                }
            }
        }
        return false;
    }

    /**
     * Whether as much noise again changes the squared difference of the rates by more than two fifths in one of two tries, so that noise may have made
     * all of it, while their mean stays. (Where it moves the mean about as far as the rates lie apart, two independent functions share one rate, and
     * their split is no more than that.)
     */
    private boolean splitByNoise(List<Rung> noisier) {
        Complex now = rateOne.minus(rateTwo);
        Complex square = now.times(now);
        Complex mean = rateOne.plus(rateTwo).times(0.5);
        boolean split = false;
        for (Rung rung : noisier) {
            Complex[] near = nearest(rung);
            Complex then = near[0].minus(near[1]);
            split |= then.times(then).minus(square).abs() > TWO_FIFTHS * square.abs();
            if (near[0].plus(near[1]).times(0.5).minus(mean).abs() > MEAN * Math.max(now.abs(), then.abs())) {
                return false;
            }
        }
        return split;
    }

    /** The two rates that are nearest to this pair's. */
    private Complex[] nearest(Rung other) {
        List<Complex> rates = other.expansion().rates();
        double least = Double.POSITIVE_INFINITY;
        Complex[] near = {rateOne, rateTwo};
        for (int i = 0; i < rates.size(); i++) {
            for (int j = 0; j < rates.size(); j++) {
                double distance = rates.get(i).minus(rateOne).abs() + rates.get(j).minus(rateTwo).abs();
                if (i != j && distance < least) {
                    least = distance;
                    near = new Complex[] {rates.get(i), rates.get(j)};
                }
            }
        }
        return near;
    }

    private boolean parallel() {
        return overlap.abs() > PARALLEL && Double.isFinite(rateOne.re()) && Double.isFinite(rateTwo.re());
    }

    /** How much one of the functions pushes the other; functions that share a rate without that are two modes. */
    private double coupling(JudgingRuns judging) {
        return rateTwo.minus(rateOne).times(overlap).times(span(judging) / sine()).abs();
    }

    private boolean hidden(JudgingRuns judging, double noiseShare) {
        return coupling(judging) >= FIRM && Math.pow(rateTwo.minus(rateOne).abs() * span(judging), 2) <= HIDDEN * noiseShare;
    }

    private boolean isOne(JudgingRuns judging, List<ZMatrixRMaj> values, List<Rung> noisier, boolean constant) {
        boolean indistinct = rateTwo.minus(rateOne).abs() * span(judging) <= INDISTINCT && coupling(judging) >= STRONG;
        return indistinct || (constant ? leftByNoise(noisier) : splitByNoise(noisier)) || !toldApart(judging, values);
    }

    /**
     * Whether as much noise again changes the difference from the rate of the constant by more than half. That rate is 0 whatever the noise, so
     * that the difference, not its square, is what noise changes in proportion to itself.
     */
    private boolean leftByNoise(List<Rung> noisier) {
        Complex now = rateOne.minus(rateTwo);
        return noisier.stream().anyMatch(rung -> {
            Complex[] near = nearest(rung);
            return near[0].minus(near[1]).minus(now).abs() > HALF * now.abs();
        });
    }

    private double sine() {
        return Math.sqrt(Math.max(1 - overlap.abs() * overlap.abs(), 1e-300));
    }

    private double span(JudgingRuns judging) {
        double span = judging.longest() / 2;
        for (Complex rate : List.of(rateOne, rateTwo)) {
            span = rate.re() == 0 ? span : Math.min(span, 1 / Math.abs(rate.re()));
        }
        return span;
    }

    /**
     * @param judging runs
     * @param values per run, p x r eigenfunctions
     * @return whether two rates predict them better than one does
     */
    private boolean toldApart(JudgingRuns judging, List<ZMatrixRMaj> values) {
        double s = sine();
        double span = span(judging);
        double[] misses = new double[4];
        int pairs = 0;
        for (double lag : LAGS) {
            double[] one = new double[10];
            for (int i = 0; i < values.size(); i++) {
                pairs += add(judging.runs().get(i), values.get(i), s, lag * span, one);
            }
            for (int k = 0; k < misses.length; k++) {
                misses[k] += (one[4] > 0 ? one[k] / one[4] : 0) + (one[9] > 0 ? one[k + 5] / one[9] : 0);
            }
        }
        double together = Math.min(misses[1], Math.min(misses[2], misses[3]));
        double tolerance = Math.max(SHARE, PER_PAIR * LAGS.length / Math.max(1, pairs));
        return misses[0] > EXACT || together > (1 + tolerance) * misses[0] + LAGS.length * SMALL * SMALL;
    }

    /** Adds the squared misses by two rates and by each of three single ones, and the squared size: of e_2, then of e_1. */
    private int add(StateRun run, ZMatrixRMaj values, double s, double target, double[] sums) {
        List<Decay> decays = List.of(new Decay(rateOne), new Decay(rateTwo), new Decay(rateOne.plus(rateTwo).times(0.5)));
        return LaggedPairs.walk(run.times(), target, (from, to, tau) -> {
            decays.forEach(decay -> decay.over(tau));
            Complex one = decays.get(0).factor();
            Complex two = decays.get(1).factor();
            Complex oneNow = ComplexMatrices.entry(values, from, first);
            Complex twoNow = second(values, from, s);
            Complex oneNext = ComplexMatrices.entry(values, to, first);
            Complex twoNext = second(values, to, s);
            Complex grown = two.minus(one).times(overlap).times(1 / s);
            sums[0] += square(twoNext.minus(two.times(twoNow)).minus(grown.times(oneNow)));
            for (int k = 0; k < decays.size(); k++) {
                Complex factor = decays.get(k).factor();
                Complex slope = rateTwo.minus(rateOne).times(overlap).times(tau / s);
                sums[k + 1] += square(twoNext.minus(factor.times(twoNow.plus(slope.times(oneNow)))));
                sums[k + 6] += square(oneNext.minus(factor.times(oneNow)));
            }
            sums[5] += square(oneNext.minus(one.times(oneNow)));
            sums[4] += square(twoNext);
            sums[9] += square(oneNext);
        });
    }

    private Complex second(ZMatrixRMaj values, int row, double s) {
        return ComplexMatrices.entry(values, row, second).minus(overlap.times(ComplexMatrices.entry(values, row, first))).times(1 / s);
    }

    private static double square(Complex z) {
        return z.re() * z.re() + z.im() * z.im();
    }
}
