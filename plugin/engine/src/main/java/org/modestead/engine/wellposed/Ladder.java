package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.TreeSet;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.PredictionError;
import org.modestead.engine.spectrum.Matching;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.TrainingSample;

/**
 * The operator at nested ranks: does a mode stay what it is when functions join? Modes of neighbouring rungs are matched
 * by optimal assignment on {@code |λ - λ'|/scale + 1 - |<φ, φ'>|}, outwards from the fitted rank.
 *
 * <p>Unless its top is set, the ladder ends below the first rung above the fitted rank whose one-step prediction of the judging
 * runs is more than 5 % worse than that of a lower rung: from there on functions carry noise.
 *
 * @param rungs by rising rank, at least one
 * @param rows every mode of the spectrum on every rung where it was found, and as mode 0 the strongest of every rung
 * @param predictionErrors per rung, relative one-step error on the judging runs
 * @param longest duration of the longest training run
 */
record Ladder(List<Rung> rungs, List<LadderRow> rows, List<Double> predictionErrors, double longest) {

    private static final int MOST_RUNGS = 12;
    private static final double TOO_FAR = 1.2;
    private static final double TRUSTED = 1e-11;
    private static final double ROUNDING = 1e-10;

    /** Prediction error over the best so far from which on a rung counts as worse. */
    static final double WORSE = 1.05;

    /** Rates below this share of one over the longest run cannot be told from zero. */
    static final double RESOLVED = 0.1;

    static Ladder climb(FittedOperator operator, Spectrum spectrum, JudgingRuns judging, JudgeSettings settings, Progress progress) {
        TrainingSample sample = TrainingSample.of(operator);
        DMatrixRMaj sampled = operator.compression().evaluate(sample.states());
        List<Integer> ranks = ranks(operator, settings);
        double[] errors = PredictionError.relative(operator.compression(), judging.runs(), judging.functions(), ranks, progress);
        if (settings.ladderTo() == 0) {
            ranks = ranks.subList(0, belowNoise(ranks, errors, operator.rank()));
        }
        List<Rung> rungs = new ArrayList<>();
        for (int rank : ranks) {
            progress.checkCancelled();
            progress.report((double) rungs.size() / ranks.size(), "ladder, rank " + rank);
            rungs.add(Rung.of(operator.compression().leading(rank), sampled, sample, judging));
        }
        List<Double> kept = Arrays.stream(errors).limit(rungs.size()).boxed().toList();
        return new Ladder(List.copyOf(rungs), rows(rungs, spectrum, ranks.indexOf(operator.rank()), sample.longest()), kept,
                sample.longest());
    }

    /** Returns how many rungs are kept. */
    static int belowNoise(List<Integer> ranks, double[] errors, int fitted) {
        double best = Double.POSITIVE_INFINITY;
        for (int k = 0; k < errors.length; k++) {
            if (ranks.get(k) > fitted && errors[k] > WORSE * best && best > ROUNDING) {
                return k;
            }
            best = Math.min(best, errors[k]);
        }
        return errors.length;
    }

    private static List<Integer> ranks(FittedOperator operator, JudgeSettings settings) {
        int fitted = operator.rank();
        int from = settings.ladderFrom() > 0 ? settings.ladderFrom() : Math.max(2, (fitted + 1) / 2);
        int to = settings.ladderTo() > 0 ? settings.ladderTo() : Math.min(trusted(operator), fitted + Math.max(2, (fitted + 1) / 2));
        if (settings.ladderTo() > operator.compression().rank() || settings.ladderFrom() > fitted) {
            throw new FitFault("ladder", "ranks " + from + " to " + to + " were asked for, the operator has rank " + fitted
                    + " and the data hold " + operator.compression().rank(),
                    "let the ladder start at or below " + fitted + " and end at or below " + operator.compression().rank());
        }
        TreeSet<Integer> ranks = new TreeSet<>(List.of(Math.min(from, fitted), fitted, Math.max(to, fitted)));
        int low = ranks.first();
        int high = ranks.last();
        int count = Math.min(MOST_RUNGS, high - low + 1);
        for (int k = 0; k < count; k++) {
            ranks.add(count == 1 ? low : low + Math.round((float) k * (high - low) / (count - 1)));
        }
        return List.copyOf(ranks);
    }

    /** Highest rank whose direction is not rounding noise. */
    static int trusted(FittedOperator operator) {
        double[] singular = operator.compression().singular();
        int rank = operator.rank();
        while (rank < singular.length && Math.pow(singular[rank] / singular[0], 2) > TRUSTED) {
            rank++;
        }
        return rank;
    }

    private static List<LadderRow> rows(List<Rung> rungs, Spectrum spectrum, int fitted, double longest) {
        int[][] tracks = new int[rungs.size()][];
        tracks[fitted] = new int[spectrum.modes().size()];
        for (Mode mode : spectrum.modes()) {
            tracks[fitted][mode.number() - 1] = partOf(rungs.get(fitted), mode);
        }
        for (int k = fitted + 1; k < rungs.size(); k++) {
            tracks[k] = follow(rungs.get(k - 1), tracks[k - 1], rungs.get(k), longest);
        }
        for (int k = fitted - 1; k >= 0; k--) {
            tracks[k] = follow(rungs.get(k + 1), tracks[k + 1], rungs.get(k), longest);
        }
        List<LadderRow> rows = new ArrayList<>();
        for (Mode mode : spectrum.modes()) {
            Optional<Complex> before = Optional.empty();
            for (int k = 0; k < rungs.size(); k++) {
                int at = tracks[k][mode.number() - 1];
                if (at < 0) {
                    continue;
                }
                Rung.Part part = rungs.get(k).parts().get(at);
                rows.add(row(rungs.get(k).rank(), mode.number(), part, before, longest));
                before = Optional.of(part.rate());
            }
        }
        addStrongest(rungs, rows, longest);
        return List.copyOf(rows);
    }

    /** The strongest mode of every rung, as mode 0: where modes cannot be followed, this shows what becomes of the signal's weights. */
    private static void addStrongest(List<Rung> rungs, List<LadderRow> rows, double longest) {
        Optional<Complex> before = Optional.empty();
        for (Rung rung : rungs) {
            if (rung.strongest().isPresent()) {
                Rung.Part part = rung.strongest().get();
                rows.add(row(rung.rank(), 0, part, before, longest));
                before = Optional.of(part.rate());
            }
        }
    }

    private static LadderRow row(int rank, int mode, Rung.Part part, Optional<Complex> before, double longest) {
        return new LadderRow(rank, mode, part.rate(), part.weight(), part.weightNorm(), part.normRatio(), part.residual(),
                before.map(rate -> relativeChange(rate, part.rate(), longest)).orElse(Double.NaN));
    }

    /**
     * {@code |λ - λ'| / max(|λ|, |λ'|, 0.1/T)}: rates far below one over the longest run T cannot be resolved. A multiplier of 0
     * has the rate -∞, which is far from every other rate and no distance from itself.
     */
    static double relativeChange(Complex a, Complex b, double longest) {
        if (Double.isInfinite(a.re()) || Double.isInfinite(b.re())) {
            return a.re() == b.re() ? 0 : 2;
        }
        return a.minus(b).abs() / Math.max(Math.max(a.abs(), b.abs()), RESOLVED / longest);
    }

    private static int partOf(Rung rung, Mode mode) {
        for (int p = 0; p < rung.parts().size(); p++) {
            if (rung.parts().get(p).group().equals(mode.indices())) {
                return p;
            }
        }
        return -1;
    }

    private static int[] follow(Rung from, int[] track, Rung to, double longest) {
        double[][] cost = new double[from.parts().size()][to.parts().size()];
        for (int a = 0; a < cost.length; a++) {
            for (int b = 0; b < cost[a].length; b++) {
                Rung.Part left = from.parts().get(a);
                Rung.Part right = to.parts().get(b);
                cost[a][b] = Math.min(1, relativeChange(left.rate(), right.rate(), longest)) + 1
                        - overlap(from, left.group().get(0), to, right.group().get(0));
            }
        }
        int[] matched = Matching.of(cost, TOO_FAR);
        int[] out = new int[track.length];
        for (int k = 0; k < track.length; k++) {
            out[k] = track[k] < 0 ? -1 : matched[track[k]];
        }
        return out;
    }

    /** |<φ, φ'>| of unit eigenfunctions: nested ranks share their leading orthonormal functions. */
    private static double overlap(Rung a, int i, Rung b, int j) {
        Complex sum = Complex.ZERO;
        for (int k = 0; k < Math.min(a.rank(), b.rank()); k++) {
            sum = sum.plus(ComplexMatrices.entry(a.expansion().vectors(), k, i).conj()
                    .times(ComplexMatrices.entry(b.expansion().vectors(), k, j)));
        }
        return sum.abs();
    }
}
