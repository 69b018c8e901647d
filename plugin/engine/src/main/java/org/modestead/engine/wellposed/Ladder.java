package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.TreeSet;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.PredictionError;
import org.modestead.engine.recording.SampleNoise;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Matching;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.TrainingSample;

/**
 * The operator at nested ranks: does a mode stay what it is when functions join? Modes of neighbouring rungs are matched
 * by optimal assignment on {@code |λ - λ'|/scale + 1 - |<φ, φ'>| + |w - w'|/(2 max(w, w'))}, outwards from the fitted rank.
 *
 * <p>Unless its top is set, the ladder climbs on above the fitted rank as far as rounding allows. Where noise takes over is told rung by
 * rung and mode by mode, see {@link NoiseEffect}.
 *
 * @param rungs by rising rank, at least one
 * @param rows every mode of the spectrum on every rung where it was found, and as mode 0 the strongest of every rung
 * @param predictionErrors per rung, relative one-step error on the judging runs
 * @param normEffects per rung, factor by which noise changes the mean norm of the modes that carry the signal
 * @param twins per mode of the spectrum, see {@link TwinRates}
 * @param halves per mode of the spectrum, see {@link HalfRates}
 * @param noise its level, one a channel
 * @param noiseShare standard deviation of the noise over that of the signal, root mean square over the channels
 * @param longest duration of the longest training run
 */
record Ladder(List<Rung> rungs, List<LadderRow> rows, List<Double> predictionErrors, List<Double> normEffects, List<Boolean> twins,
        List<HalfRates> halves, SampleNoise noise, double noiseShare, double longest) {

    private static final int MOST_RUNGS = 14;
    private static final double TOO_FAR = 1.5;
    private static final double TRUSTED = 1e-11;
    private static final long SEED = 9311;
    private static final int HIGHER = 10;

    /** Rates below this share of one over the longest run cannot be told from zero. */
    static final double RESOLVED = 0.1;

    static Ladder climb(FittedOperator operator, Spectrum spectrum, JudgingRuns unjudged, JudgeSettings settings, Progress progress) {
        TrainingSample sample = TrainingSample.of(operator);
        DMatrixRMaj sampled = operator.compression().evaluate(sample.states());
        List<Integer> ranks = ranks(operator, settings);
        double[] errors = PredictionError.relative(operator.compression(), unjudged.runs(), unjudged.functions(), ranks, progress);
        SampleNoise noise = SampleNoise.rough(operator.snapshots()).atMost(PredictionError.leastOfNewest(operator.compression(),
                unjudged.runs(), unjudged.functions(), ranks, sample.channels()));
        JudgingRuns judging = unjudged.with(operator, noise, progress);
        double noiseShare = noise.shareOf(operator.snapshots());
        List<NoisierFit> noisier = noisierFits(operator, noise, ranks.get(ranks.size() - 1), sample, progress);
        List<Rung> rungs = new ArrayList<>();
        List<List<NoiseEffect>> effects = new ArrayList<>();
        List<Double> normEffects = new ArrayList<>();
        List<Boolean> twins = List.of();
        List<HalfRates> halves = List.of();
        for (int rank : ranks) {
            progress.checkCancelled();
            progress.report((double) rungs.size() / ranks.size(), "ladder, rank " + rank);
            Rung rung = Rung.of(operator.compression().leading(rank), sampled, sample, judging);
            rungs.add(rung);
            List<Rung> others = noisier.stream().filter(fit -> fit.compression().rank() >= rank).map(fit -> fit.rung(rank, sample)).toList();
            if (rank == operator.rank()) {
                List<ZMatrixRMaj> values = judging.eigenfunctions(rung.expansion());
                twins = TwinRates.twins(rung, judging, values, others, noiseShare);
                halves = HalfRates.of(rung.expansion(), judging, values, spectrum.modes().stream().map(mode -> mode.indices().get(0)).toList());
            }
            effects.add(NoiseEffect.of(rung, others, sample.longest()));
            normEffects.add(others.stream().mapToDouble(o -> NoiseEffect.factor(rung.carryingNorm(), o.carryingNorm())).max().orElse(1));
        }
        int fitted = ranks.indexOf(operator.rank());
        List<Boolean> byPart = twins;
        return new Ladder(List.copyOf(rungs), rows(rungs, effects, spectrum, fitted, sample.longest()), Arrays.stream(errors).boxed().toList(),
                normEffects, spectrum.modes().stream().map(mode -> byPart.get(partOf(rungs.get(fitted), mode))).toList(),
                halves, noise, noiseShare, sample.longest());
    }

    /**
     * The operator fitted to noisier runs.
     *
     * @param compression up to the top of the ladder
     * @param sampled its functions at the sampled training states
     */
    private record NoisierFit(OrthonormalCompression compression, DMatrixRMaj sampled) {

        Rung rung(int rank, TrainingSample sample) {
            return Rung.fitted(compression.leading(rank), sampled, sample);
        }
    }

    /** The operator fitted twice more, to training runs with as much noise again; what cannot be fitted is left out. */
    private static List<NoisierFit> noisierFits(FittedOperator operator, SampleNoise noise, int rank, TrainingSample sample, Progress progress) {
        List<NoisierFit> out = new ArrayList<>();
        for (Snapshots noisier : noise.disturbed(operator.snapshots(), 1, SEED)) {
            try {
                OrthonormalCompression fit = OperatorFitter.whitened(operator.estimator(), noisier, rank, operator.ridge(), progress);
                out.add(new NoisierFit(fit, fit.evaluate(sample.states())));
            } catch (FitFault fault) {
                progress.checkCancelled();
            }
        }
        return out;
    }

    private static List<Integer> ranks(FittedOperator operator, JudgeSettings settings) {
        int fitted = operator.rank();
        int from = settings.ladderFrom() > 0 ? settings.ladderFrom() : Math.min(2, fitted);
        int to = settings.ladderTo() > 0 ? settings.ladderTo() : Math.min(trusted(operator), Math.max(3 * fitted, fitted + HIGHER));
        if (settings.ladderTo() > operator.functions().rank() || settings.ladderFrom() > fitted) {
            throw new FitFault("ladder", "ranks " + from + " to " + to + " were asked for, the operator has rank " + fitted
                    + " and the data hold " + operator.functions().rank(),
                    "let the ladder start at or below " + fitted + " and end at or below " + operator.functions().rank());
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
        double[] singular = operator.functions().singular();
        int rank = operator.rank();
        while (rank < singular.length && Math.pow(singular[rank] / singular[0], 2) > TRUSTED) {
            rank++;
        }
        return rank;
    }

    private static List<LadderRow> rows(List<Rung> rungs, List<List<NoiseEffect>> effects, Spectrum spectrum, int fitted, double longest) {
        int[][] tracks = new int[rungs.size()][];
        tracks[fitted] = spectrum.modes().stream().mapToInt(mode -> partOf(rungs.get(fitted), mode)).toArray();
        Sighting[] above = sightings(rungs.get(fitted), tracks[fitted]);
        Sighting[] below = above.clone();
        for (int k = fitted + 1; k < rungs.size(); k++) {
            tracks[k] = follow(above, rungs.get(k), longest);
        }
        for (int k = fitted - 1; k >= 0; k--) {
            tracks[k] = follow(below, rungs.get(k), longest);
        }
        List<LadderRow> rows = new ArrayList<>();
        for (Mode mode : spectrum.modes()) {
            for (int k = 0; k < rungs.size(); k++) {
                int at = tracks[k][mode.number() - 1];
                if (at >= 0) {
                    rows.add(row(rungs.get(k).rank(), mode.number(), rungs.get(k).parts().get(at), effects.get(k).get(at)));
                }
            }
        }
        for (int k = 0; k < rungs.size(); k++) {
            Rung rung = rungs.get(k);
            List<NoiseEffect> own = effects.get(k);
            rung.strongest().ifPresent(part -> rows.add(row(rung.rank(), 0, part, own.get(rung.parts().indexOf(part)))));
        }
        return List.copyOf(rows);
    }

    private static LadderRow row(int rank, int mode, Rung.Part part, NoiseEffect noise) {
        return new LadderRow(rank, mode, part.rate(), part.weight(), part.weightNorm(), part.normRatio(), part.residual(),
                part.rawResidual(), part.gap(), part.overlap(), noise);
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

    /** Where a mode was seen last. */
    private record Sighting(Rung rung, int part) {}

    private static Sighting[] sightings(Rung rung, int[] parts) {
        return Arrays.stream(parts).mapToObj(part -> new Sighting(rung, part)).toArray(Sighting[]::new);
    }

    /**
     * Finds the modes on another rung, whether or not the rung between has them, and notes where they were seen. The constant function is none of them, however
     * near to it a mode of a low rank may look.
     */
    private static int[] follow(Sighting[] seen, Rung to, double longest) {
        double[][] cost = new double[seen.length][to.parts().size()];
        for (int a = 0; a < cost.length; a++) {
            Rung.Part left = seen[a].rung().parts().get(seen[a].part());
            for (int b = 0; b < cost[a].length; b++) {
                Rung.Part right = to.parts().get(b);
                cost[a][b] = right.constant() && !left.constant() ? 2 * TOO_FAR
                        : Math.min(1, relativeChange(left.rate(), right.rate(), longest)) + 1
                        - overlap(seen[a].rung(), left.group().get(0), to, right.group().get(0)) + NoiseEffect.weight(left, right) / 2;
            }
        }
        int[] matched = Matching.of(cost, TOO_FAR);
        for (int a = 0; a < matched.length; a++) {
            matched[a] = matched[a] < 0 ? sameRate(seen[a], to, longest) : matched[a];
            seen[a] = matched[a] < 0 ? seen[a] : new Sighting(to, matched[a]);
        }
        return matched;
    }

    /** Modes of one rate may be fewer on another rung, and are then looked for together; -1 where there is none. */
    private static int sameRate(Sighting seen, Rung to, double longest) {
        Complex rate = seen.rung().parts().get(seen.part()).rate();
        int best = -1;
        double least = Eigenspace.SAME_RATE;
        for (int b = 0; b < to.parts().size(); b++) {
            double change = relativeChange(rate, to.parts().get(b).rate(), longest);
            if (change < least && !to.parts().get(b).constant()) {
                least = change;
                best = b;
            }
        }
        return best;
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
