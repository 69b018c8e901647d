package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.ServiceLoader;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;

/** Decides whether the modes of a spectrum exist: climbs the ladder, puts every check's question, and grades. */
public final class WellPosedness {

    private WellPosedness() {}

    /**
     * @param snapshots those of the operator
     * @param operator fitted
     * @param spectrum extracted from it
     * @param settings thresholds and ladder
     * @param progress polled for cancel
     * @return a verdict for every mode and overall, with all evidence
     * @throws org.modestead.engine.FitFault if the ladder asked for does not fit the operator
     */
    public static Verdict judge(Snapshots snapshots, FittedOperator operator, Spectrum spectrum, JudgeSettings settings, Progress progress) {
        Splits splits = Splits.of(operator, spectrum, snapshots, settings);
        double own = 1.0 / (1 + splits.others().size());
        Verdict alone = alone(snapshots, operator, spectrum, settings, progress.part(0, own));
        return splits.weighed(alone, progress.part(own, 1));
    }

    private static Verdict alone(Snapshots snapshots, FittedOperator operator, Spectrum spectrum, JudgeSettings settings, Progress progress) {
        FittedOperator judged = operator.on(snapshots);
        JudgingRuns judging = JudgingRuns.of(judged);
        Ladder ladder = Ladder.climb(judged, spectrum, judging, settings, progress.part(0, 0.6));
        Evidence evidence = Evidence.of(judged, spectrum, ladder, judging.heldOut(), settings);
        List<Finding> plain = examine(evidence, progress.part(0.6, 0.8));
        boolean noisy = settings.replays() > 0 && judging.heldOut() && judged.snapshots().smoothing().active();
        List<Finding> findings = noisy ? Replays.of(evidence, ladder.noise()).weighed(plain, evidence, progress.part(0.8, 1)) : plain;
        List<ModeVerdict> verdicts = spectrum.modes().stream().map(mode -> Grading.grade(mode, evidence, findings)).toList();
        progress.report(1, "judged");
        return new Verdict(Grading.overall(verdicts), verdicts, findings, ladder.rows(), doubts(judging, findings));
    }

    /**
     * Measures only how far the modes miss their own rule of motion on the runs held out, at the fitted rank and noise included; a small part of the time of
     * {@link #judge}, and it decides nothing.
     *
     * @param snapshots those of the operator
     * @param operator fitted
     * @param spectrum extracted from it
     * @param settings thresholds of residual and share
     * @return one finding {@code holdout-residual} a mode, an empty ladder, and every mode but the constant function undecided
     */
    public static Verdict residuals(Snapshots snapshots, FittedOperator operator, Spectrum spectrum, JudgeSettings settings) {
        return QuickLook.of(operator.on(snapshots), spectrum, settings);
    }

    private static List<Finding> examine(Evidence evidence, Progress progress) {
        List<Finding> findings = new ArrayList<>();
        List<Check> checks = checks();
        for (Check check : checks) {
            progress.checkCancelled();
            progress.report((double) checks.indexOf(check) / checks.size(), check.id());
            findings.addAll(check.examine(evidence, progress));
        }
        return findings;
    }

    private static List<Check> checks() {
        return ServiceLoader.load(Check.class, Check.class.getClassLoader()).stream().map(ServiceLoader.Provider::get).toList();
    }

    private static List<Doubt> doubts(JudgingRuns judging, List<Finding> findings) {
        List<Doubt> doubts = new ArrayList<>();
        if (!judging.heldOut()) {
            doubts.add(JudgingRuns.NOTHING_HELD_OUT);
        }
        findings.stream().filter(finding -> finding.mode() == 0 && !finding.passed())
                .forEach(finding -> doubts.add(new Doubt(finding.check(), finding.sentence())));
        return doubts;
    }
}
