package org.modestead.engine.spread;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.ToDoubleFunction;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeIntervals;
import org.modestead.engine.spectrum.Spectrum;

/**
 * How far rates, damping and amplitudes would have come out otherwise with another recording of the same kind: bootstrap over
 * runs, or over blocks where runs are few ({@link Resampling}), within the functions of the fit ({@link Frame}).
 *
 * <p><b>What an interval holds.</b> The spread of the estimator in use, and that part of its bias that shrinks as recordings
 * grow. <b>What it does not hold:</b> bias that stays, since every replicate has it too. Noise in the states makes least squares
 * report too much damping however long the recording is (CHECKS C7.4), a rank too low merges modes, and a step too
 * coarse folds them: none of this is spread. Correct the noise (total least squares), or judge by the ladder and the holdout.
 *
 * <p>Measured on simulated recordings in {@code CoverageTest}.
 *
 * @param plan level, replicates and seed
 * @param modes one entry a mode that is no cluster and has a finite rate, by number
 * @param drawn what was drawn, in words: {@code whole runs, 24 of them}
 * @param pieces number of independent pieces, runs or blocks, behind the intervals
 * @param doubts what a reader of the intervals must know
 */
public record SamplingSpread(SpreadPlan plan, List<ModeSpread> modes, String drawn, double pieces, List<Doubt> doubts) {

    /** A mode must be found again in this share of the replicates to have intervals. */
    public static final double FOUND = 0.8;

    private static final int FEW_PIECES = 8;
    private static final int NAMED = 8;

    /** Takes immutable copies. */
    public SamplingSpread {
        modes = List.copyOf(modes);
        doubts = List.copyOf(doubts);
    }

    /**
     * Repeats the fit and finds every mode again.
     *
     * @param operator fitted; its snapshots are those of the fit
     * @param spectrum of that operator
     * @param plan how often, at which level
     * @param progress polled for cancel
     * @return never null; without modes where the estimator offers nothing to resample
     */
    public static SamplingSpread of(FittedOperator operator, Spectrum spectrum, SpreadPlan plan, Progress progress) {
        List<Mode> modes = spectrum.modes().stream()
                .filter(mode -> mode.cluster() == 0 && Double.isFinite(mode.rate().abs())).toList();
        Replicates replicates = Replicates.of(operator, plan, progress.part(0, 0.9));
        if (replicates.refits().isEmpty()) {
            return new SamplingSpread(plan, List.of(), "", 0, List.of(new Doubt("no-intervals",
                    "No intervals: this fit offers nothing that could be resampled, or none of the resampled fits succeeded.")));
        }
        Followed followed = Followed.of(operator, spectrum, modes, replicates.frame(), replicates.stretch());
        List<List<Optional<Followed.Found>>> found = replicates.refits().parallelStream().map(refit -> {
            progress.checkCancelled();
            return followed.in(refit);
        }).toList();
        List<ModeSpread> out = new ArrayList<>();
        for (int m = 0; m < modes.size(); m++) {
            int at = m;
            out.add(spread(modes.get(m), found.stream().flatMap(all -> all.get(at).stream()).toList(), plan, replicates));
        }
        progress.report(1, "intervals");
        return new SamplingSpread(plan, out, replicates.resampling().words(), replicates.resampling().units(),
                doubts(spectrum, out, replicates.resampling()));
    }

    private static ModeSpread spread(Mode mode, List<Followed.Found> found, SpreadPlan plan, Replicates replicates) {
        double share = (double) found.size() / plan.replicates();
        if (found.size() < 2) {
            return new ModeSpread(mode.number(), share, List.of(), Double.NaN, Optional.empty());
        }
        Figures figures = new Figures(found, replicates.stretch());
        Replicated growth = figures.of(mode.rate().re(), one -> one.rate().re());
        Replicated turning = figures.of(mode.rate().im(), one -> one.rate().im());
        Optional<ModeIntervals> intervals = share < FOUND ? Optional.empty() : Optional.of(intervals(mode, figures, growth, turning,
                plan.level(), replicates.resampling().units()));
        List<Complex> rates = IntStream.range(0, found.size())
                .mapToObj(b -> new Complex(growth.values()[b], Math.max(0, turning.values()[b]))).toList();
        return new ModeSpread(mode.number(), share, rates, Math.hypot(growth.deviation(), turning.deviation()), intervals);
    }

    private static ModeIntervals intervals(Mode mode, Figures figures, Replicated growth, Replicated turning, double level,
            double pieces) {
        Replicated damping = figures.of(mode.dampingRatio(), Followed.Found::dampingRatio);
        Replicated amplitude = figures.of(mode.amplitude(), Followed.Found::amplitude);
        double infinite = Double.POSITIVE_INFINITY;
        Interval size = mode.amplitude() > 0 && Double.isFinite(amplitude.deviation()) ? amplitude.positive(level, pieces) : Interval.UNKNOWN;
        return new ModeIntervals(level, growth.interval(level, pieces, -infinite, infinite),
                turning.interval(level, pieces, 0, infinite), damping.interval(level, pieces, -1, 1), size);
    }

    /** Figures of the replicates, stretched where the weights were shrunk. */
    private record Figures(List<Followed.Found> found, double stretch) {
        Replicated of(double fitted, ToDoubleFunction<Followed.Found> figure) {
            return new Replicated(fitted, found.stream().mapToDouble(figure).map(value -> fitted + stretch * (value - fitted)).toArray());
        }
    }

    private static List<Doubt> doubts(Spectrum spectrum, List<ModeSpread> spreads, Resampling resampling) {
        List<Doubt> doubts = new ArrayList<>();
        List<Integer> known = spreads.stream().filter(s -> s.intervals().isPresent()).map(ModeSpread::mode).toList();
        List<String> without = spectrum.modes().stream().map(Mode::number).filter(number -> !known.contains(number))
                .map(String::valueOf).toList();
        if (!without.isEmpty()) {
            String names = without.stream().limit(NAMED).collect(Collectors.joining(", "));
            doubts.add(new Doubt("modes-without-interval", String.format(Locale.ROOT, "%d of %d modes have no intervals (%s%s): they gather"
                    + " several eigenvalues or were found again in fewer than %.0f %% of the resampled fits, so not even their"
                    + " rate is certain.", without.size(), spectrum.modes().size(), names, without.size() > NAMED ? ", ..." : "",
                    100 * FOUND)));
        }
        if (resampling.units() < FEW_PIECES) {
            doubts.add(new Doubt("few-pieces", String.format(Locale.ROOT, "The intervals rest on %.0f independent pieces of the"
                    + " recording; fewer than %d tell the spread only roughly.", resampling.units(), FEW_PIECES)));
        }
        return doubts;
    }

    /** Returns what is known of a mode. */
    public Optional<ModeSpread> of(int mode) {
        return modes.stream().filter(spread -> spread.mode() == mode).findFirst();
    }

    /** Returns the spectrum with intervals at its modes. */
    public Spectrum in(Spectrum spectrum) {
        List<Mode> with = spectrum.modes().stream()
                .map(mode -> of(mode.number()).flatMap(ModeSpread::intervals).map(mode::with).orElse(mode)).toList();
        return spectrum.with(with, doubts);
    }
}
