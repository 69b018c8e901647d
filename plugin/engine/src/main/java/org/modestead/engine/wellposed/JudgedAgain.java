package org.modestead.engine.wellposed;

import java.util.Comparator;
import java.util.Optional;
import java.util.OptionalInt;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

/**
 * The same fit and the same judgement of other snapshots, in which the modes of the first are looked for.
 *
 * @param snapshots fitted again
 * @param spectrum found there
 * @param verdict on it
 * @param longest duration T of the longest run that was fitted
 */
record JudgedAgain(Snapshots snapshots, Spectrum spectrum, Verdict verdict, double longest) {

    private static final double TOO_FAR = 0.5;

    /**
     * @param snapshots to be fitted
     * @param operator fitted to others, whose estimator and ridge are taken
     * @param rule how the rank is chosen
     * @param settings of the judgement
     * @param progress polled for cancel
     * @return empty where these snapshots cannot be fitted or judged so
     */
    static Optional<JudgedAgain> of(Snapshots snapshots, FittedOperator operator, RankRule rule, JudgeSettings settings, Progress progress) {
        try {
            FittedOperator again = OperatorFitter.fit(snapshots, operator.estimator(), rule, operator.ridge(), progress.part(0, 0.3));
            Spectrum found = SpectrumExtractor.extract(again, Progress.NONE);
            return Optional.of(new JudgedAgain(snapshots, found, WellPosedness.judge(snapshots, again, found, settings, progress.part(0.3, 1)),
                    snapshots.training().stream().mapToDouble(Run::duration).max().orElseThrow()));
        } catch (FitFault fault) {
            progress.checkCancelled();
            return Optional.empty();
        }
    }

    /**
     * Returns which mode here is one of the first fit: the nearest in rate and share of the signal,
     * {@code |λ - λ'| / max(|λ|, |λ'|, 0.1/T) + |s - s'| < 0.5}, but never the constant function; empty where it is not found again.
     */
    OptionalInt number(Mode mode) {
        return spectrum.modes().stream().filter(other -> !other.constant() && distance(mode, other) < TOO_FAR)
                .min(Comparator.comparingDouble(other -> distance(mode, other))).stream().mapToInt(Mode::number).findFirst();
    }

    /** Returns the verdict on the mode here that is one of the first fit; empty where it is not found again. */
    Optional<ModeVerdict> of(Mode mode) {
        OptionalInt found = number(mode);
        return found.isEmpty() ? Optional.empty() : verdict.of(found.getAsInt());
    }

    private double distance(Mode a, Mode b) {
        return Ladder.relativeChange(a.rate(), b.rate(), longest) + Math.abs(a.energyShare() - b.energyShare());
    }
}
