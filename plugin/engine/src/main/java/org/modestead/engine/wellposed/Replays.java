package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Random;
import java.util.Set;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.SampleNoise;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/**
 * Whether what speaks against a mode is more than noise does. The recording is replayed as if its modes existed, see {@link ReplayedRuns}.
 * Where the checks find the mode there without noise, they are put to replays with noise of the size found in the data. A finding
 * that is as bad in one of k replays does not count: of k + 1 recordings that differ by their noise alone, the one at hand is the worst with
 * probability 1/(k + 1), and so a mode that exists is blamed by a check. (A parametric bootstrap test, Davison and Hinkley,
 * Bootstrap Methods and their Application, 1997, section 4.2.)
 *
 * <p>Only noise that smoothing has told from motion is replayed: otherwise chance in the motion itself could pass for noise in its
 * measurement. Orthogonality is not asked here, nor is a lack of rungs excused: replays make no evidence. In
 * the data inner product settling is the only witness against an imitation, having no norm that could grow, and is not excused either.
 *
 * @param runs as if the modes existed
 * @param spectrum whose modes are in question
 * @param operator fitted
 * @param noise found in the data
 * @param settings of the judgement
 */
record Replays(ReplayedRuns runs, Spectrum spectrum, FittedOperator operator, SampleNoise noise, JudgeSettings settings) {

    /**
     * Checks whose figures noise makes worse. The residual on runs held out and the growth of the norm are not among them: noise has been
     * taken off the one, and rungs that noise spoils do not count for the other, so what they still say of a mode is not excused.
     */
    private static final Set<String> NOISY = Set.of("settling", "step-consistency", "fitted-rank", "noise-sensitivity", "close-residual",
            "captured-share");

    private static final long SEED = 60103;
    private static final int MOST_RANKS = 30;

    static Replays of(Evidence evidence, SampleNoise noise) {
        List<Mode> carrying = evidence.spectrum().modes().stream().filter(mode -> mode.constant() || evidence.carries(mode)).toList();
        return new Replays(ReplayedRuns.of(evidence.operator(), evidence.spectrum(), carrying), evidence.spectrum(), evidence.operator(), noise,
                evidence.settings().withReplays(0).withSplits(1));
    }

    /** Returns the findings with those passed over that noise makes as well. */
    List<Finding> weighed(List<Finding> findings, Evidence evidence, Progress progress) {
        List<Finding> open = new ArrayList<>(findings.stream().filter(f -> questioned(f, evidence)).toList());
        List<Finding> excused = new ArrayList<>();
        int steps = evidence.settings().replays() + 1;
        if (!open.isEmpty() && runs.finite()) {
            Optional<JudgedAgain> clean = judged(runs.clean(), progress.part(0, 1.0 / steps));
            open.removeIf(f -> clean.isEmpty() || !exists(f, clean.get()));
            Random random = new Random(SEED);
            for (int k = 0; k < evidence.settings().replays() && !open.isEmpty(); k++) {
                progress.checkCancelled();
                Optional<JudgedAgain> replay = judged(runs.noisy(noise, random), progress.part((k + 1.0) / steps, (k + 2.0) / steps));
                List<Finding> asBad = open.stream().filter(f -> replay.isPresent() && asBad(f, replay.get())).toList();
                excused.addAll(asBad);
                open.removeAll(asBad);
            }
        }
        return findings.stream().map(f -> excused.contains(f) ? excused(f) : f).toList();
    }

    private static boolean questioned(Finding f, Evidence evidence) {
        boolean counts = f.mode() == 0 || evidence.carries(evidence.spectrum().modes().get(f.mode() - 1));
        boolean onlyWitness = f.check().equals("settling") && evidence.operator().functions().innerProduct() == InnerProduct.DATA;
        return !f.passed() && !Double.isNaN(f.value()) && counts && NOISY.contains(f.check()) && !onlyWitness;
    }

    private static Finding excused(Finding f) {
        return new Finding(f.mode(), f.check(), f.value(), f.threshold(), true, f.sentence()
                + " The noise in the data makes as much of it where the mode exists, so this is not held against it.");
    }

    private Optional<JudgedAgain> judged(Snapshots snapshots, Progress progress) {
        return JudgedAgain.of(snapshots, operator, new RankRule.Holdout(MOST_RANKS), settings, progress);
    }

    /** Whether the check passes in a replay, and the mode with it. */
    private boolean exists(Finding f, JudgedAgain replay) {
        return same(f, replay).filter(Finding::passed).isPresent() && (f.mode() == 0 || replay.of(mode(f)).filter(Replays::reported).isPresent());
    }

    private static boolean reported(ModeVerdict verdict) {
        return verdict.grade() == Grade.STANDS || verdict.grade() == Grade.SETTLES;
    }

    /** Whether the same check finds as much against the mode in a replay, or the mode is not found. */
    private boolean asBad(Finding f, JudgedAgain replay) {
        Optional<Finding> same = same(f, replay);
        return same.isEmpty() || !same.get().passed() && (Double.isNaN(same.get().value()) || excess(same.get()) >= excess(f));
    }

    private Optional<Finding> same(Finding f, JudgedAgain replay) {
        OptionalInt number = f.mode() == 0 ? OptionalInt.of(0) : replay.number(mode(f));
        return number.isEmpty() ? Optional.empty()
                : replay.verdict().findings().stream().filter(g -> g.mode() == number.getAsInt() && g.check().equals(f.check())).findFirst();
    }

    private Mode mode(Finding f) {
        return spectrum.modes().get(f.mode() - 1);
    }

    /** How far a figure lies beyond its threshold, as a factor; the captured share is to stay above its own. */
    private static double excess(Finding f) {
        return f.check().equals("captured-share") ? f.threshold() / f.value() : Math.max(1, f.value() / f.threshold());
    }
}
