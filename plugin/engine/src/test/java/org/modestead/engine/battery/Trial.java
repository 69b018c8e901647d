package org.modestead.engine.battery;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.ExtrapolatedEstimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.SmoothingRule;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.JudgeSettings;
import org.modestead.engine.wellposed.Verdict;

/**
 * One case at one quality of data, judged with the documented defaults.
 *
 * @param truth of the case
 * @param noise standard deviation over that of the signal
 * @param runs in all; a quarter of them, at least one, is held out
 * @param seed of starts and noise
 */
record Trial(Case truth, double noise, int runs, long seed) {

    private static final double HELD_OUT = 0.25;

    /**
     * What was said.
     *
     * @param trial judged
     * @param given empty where the fit was refused
     * @param why overall sentence, or the refusal
     */
    record Outcome(Trial trial, Optional<Grade> given, String why) {

        boolean right() {
            return given.isPresent() && trial.truth().truth().allows(given.get());
        }

        /** A report of a mode that is not there. */
        boolean falseReport() {
            return given.isPresent() && trial.truth().truth().forbidsReport() && given.get() == Grade.STANDS;
        }

        @Override
        public String toString() {
            return String.format(Locale.ROOT, "%s, noise %.3g, %d runs, seed %d: wanted %s, given %s. %s",
                    trial.truth().id(),
                    trial.noise(), trial.runs(), trial.seed(), trial.truth().truth().word(),
                            given.map(Grade::word).orElse("refused"), why);
        }
    }

    Outcome judge() {
        return judge(JudgeSettings.DEFAULT);
    }

    Outcome judge(JudgeSettings settings) {
        try {
            Verdict verdict = Motions.judge(fitted(), settings);
            return new Outcome(this, Optional.of(verdict.overall().grade()), verdict.overall().sentence());
        } catch (Fault fault) {
            return new Outcome(this, Optional.empty(), fault.getMessage());
        }
    }

    /** The tool chooses the rank, up to that of the look. */
    private FittedOperator fitted() {
        List<Run> all = truth.system().runs(runs, noise, seed);
        int training = runs - (int) Math.max(1, Math.round(HELD_OUT * runs));
        Snapshots plain = Motions.snapshots(truth.system().step(), truth.look().depth(), all.subList(0, training),
                all.subList(training, runs));
        Snapshots snapshots = SmoothingRule.AUTOMATIC.smooth(plain);
        return OperatorFitter.fit(snapshots, new ExtrapolatedEstimator(truth.look().estimator()), new RankRule.Holdout(30), 0, Progress.NONE);
    }
}
