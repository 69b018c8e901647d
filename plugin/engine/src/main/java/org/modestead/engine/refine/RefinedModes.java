package org.modestead.engine.refine;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.Run;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeIntervals;
import org.modestead.engine.spread.NormalQuantiles;

/**
 * The optimised fit told as modes: sizes from the weights of every run, intervals from the covariance of the rates.
 *
 * <p>Intervals are {@code value ± t s} with Student's quantile; that of the damping ratio {@code ζ = -σ/|λ|} goes through its slopes,
 * {@code ∂ζ/∂σ = -ω²/|λ|³} and {@code ∂ζ/∂ω = σω/|λ|³}. They hold for white noise and the right number of terms. What is held fixed has no
 * interval.
 *
 * @param rates as fitted; weights are those of the runs in {@link #runs()}
 * @param runs that were fitted: those of weight above 0, times counted from where asked
 * @param modes by falling energy share, numbered from 1; the first index of each is its term
 */
public record RefinedModes(RefinedRates rates, List<Run> runs, List<Mode> modes) {

    private static final int LEAST_FREEDOM = 3;

    /** Takes immutable copies. */
    public RefinedModes {
        runs = List.copyOf(runs);
        modes = List.copyOf(modes);
    }

    /**
     * Refines and measures. Runs of weight w count w times.
     *
     * @param start model at the start values
     * @param training runs as prepared
     * @param fromRunStart whether the times of each run count from its first sample; otherwise as recorded
     * @param level of the intervals, in (0, 1)
     * @param progress polled for cancel
     * @throws FitFault see {@link RateRefinement#refine}
     */
    public static RefinedModes of(RateModel start, List<Run> training, boolean fromRunStart, double level, Progress progress) {
        List<Run> runs = training.stream().filter(run -> run.weight() > 0).map(run -> fromRunStart ? shifted(run) : run).toList();
        if (runs.isEmpty()) {
            throw new FitFault("optimised fit", "no run has a weight above 0", "give runs that are to count a weight");
        }
        RefinedRates rates = RateRefinement.refine(start, runs.stream().map(RefinedModes::scaled).toList(), progress);
        List<Measured> measured = new ArrayList<>();
        for (int term = 0; term < rates.model().terms().size(); term++) {
            measured.add(measured(rates, runs, term));
        }
        double total = measured.stream().mapToDouble(Measured::energy).sum();
        List<Integer> order = IntStream.range(0, measured.size()).boxed()
                .sorted(Comparator.comparingDouble(term -> -measured.get(term).energy())).toList();
        List<Mode> modes = new ArrayList<>();
        for (int term : order) {
            modes.add(mode(modes.size() + 1, term, rates, measured.get(term), total, level));
        }
        return new RefinedModes(rates, runs, modes);
    }

    private static Run shifted(Run run) {
        double first = run.times()[0];
        return new Run(run.id(), Arrays.stream(run.times()).map(t -> t - first).toArray(), run.values(), run.inputs(), run.leadIn(), run.weight());
    }

    /** The residuals of a run times the root of its weight are those of its samples times that root. */
    private static Run scaled(Run run) {
        return run.weight() == 1 ? run : new Run(run.id(), run.times(), Matrices.scaled(run.values(), Math.sqrt(run.weight())));
    }

    private record Measured(double amplitude, double energy) {}

    private static Measured measured(RefinedRates rates, List<Run> runs, int term) {
        RateModel alone = new RateModel(List.of(rates.model().terms().get(term)));
        int column = IntStream.range(0, term).map(t -> rates.model().terms().get(t).functions()).sum();
        double peaks = 0;
        double squares = 0;
        int samples = 0;
        for (int i = 0; i < runs.size(); i++) {
            Run run = runs.get(i);
            DMatrixRMaj free = rates.weights().get(i);
            DMatrixRMaj all = rates.model().ties().map(ties -> Matrices.product(ties, free)).orElse(free);
            DMatrixRMaj own = Matrices.scaled(Matrices.block(all, column, column + alone.weights(), 0, all.numCols), 1 / Math.sqrt(run.weight()));
            double size = Math.exp(alone.terms().get(0).growth() * run.times()[0]);
            peaks += squared(own) * size * size / runs.size();
            squares += squared(Matrices.product(alone.values(run.times()), own));
            samples += run.samples();
        }
        return new Measured(Math.sqrt(peaks), squares / samples);
    }

    private static double squared(DMatrixRMaj a) {
        return Arrays.stream(a.data, 0, a.getNumElements()).map(value -> value * value).sum();
    }

    private static Mode mode(int number, int term, RefinedRates rates, Measured measured, double total, double level) {
        RateTerm found = rates.model().terms().get(term);
        double angular = found instanceof RateTerm.Pair pair ? Math.abs(pair.angular()) : 0;
        boolean constant = found.equals(RateTerm.constant());
        Complex rate = new Complex(found.growth(), angular);
        Mode mode = new Mode(number, List.of(term), rate, measured.amplitude(), total > 0 ? measured.energy() / total : 0, 0, List.of(),
                constant, 0);
        return rates.degreesOfFreedom() < LEAST_FREEDOM ? mode : mode.with(intervals(mode, term, rates, level));
    }

    private static ModeIntervals intervals(Mode mode, int term, RefinedRates rates, double level) {
        double t = NormalQuantiles.student((1 + level) / 2, rates.degreesOfFreedom());
        double growth = rates.growthErrors()[term];
        double angular = rates.angularErrors()[term];
        double cubed = Math.pow(mode.rate().abs(), 3);
        double alongGrowth = -mode.rate().im() * mode.rate().im() / cubed;
        double alongAngular = mode.rate().re() * mode.rate().im() / cubed;
        double damping = Math.sqrt(Math.max(0, alongGrowth * alongGrowth * growth * growth + alongAngular * alongAngular * angular * angular
                + 2 * alongGrowth * alongAngular * rates.crossCovariances()[term]));
        return new ModeIntervals(level, around(mode.rate().re(), t * growth, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY),
                around(mode.rate().im(), t * angular, 0, Double.POSITIVE_INFINITY), around(mode.dampingRatio(), t * damping, -1, 1),
                Interval.UNKNOWN);
    }

    private static Interval around(double value, double half, double least, double most) {
        return half > 0 ? new Interval(Math.max(least, value - half), Math.min(most, value + half)) : Interval.UNKNOWN;
    }
}
