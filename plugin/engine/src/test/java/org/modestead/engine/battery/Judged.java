package org.modestead.engine.battery;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import org.modestead.engine.Fault;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.SpectrumExtractor;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.JudgeSettings;
import org.modestead.engine.wellposed.Verdict;

/**
 * What was said of snapshots, in a form that can be compared with what is said of the same in other units.
 *
 * @param fit empty where it was refused
 */
record Judged(Optional<Fit> fit) {

    /**
     * @param operator at its rank
     * @param modes of it
     * @param verdict with the documented defaults
     */
    record Fit(FittedOperator operator, List<Mode> modes, Verdict verdict) {

        /** The modes that the overall verdict rests on. */
        List<Mode> counted() {
            return modes.stream().filter(mode -> verdict.of(mode.number()).orElseThrow().counts()).toList();
        }

        Grade grade(Mode mode) {
            return verdict.of(mode.number()).orElseThrow().grade();
        }

        /**
         * What rounding may do to the rates: of the arrays, against the weakest direction that is kept, magnified by the
         * condition of the eigenfunctions. Landmarks stand for a kernel's functions to 1e-5; which samples they are
         * depends on which comes first where the kernel is as large at all of them.
         */
        double accuracy() {
            double[] singular = operator.compression().singular();
            double weakest = singular[operator.rank() - 1] / singular[0];
            double rounding = 100 * Math.ulp(1.0) / (weakest * weakest);
            return (operator.kernel().isPresent() ? 1e-5 : 1e-9) + rounding * ModalExpansion.of(operator.chosen()).condition();
        }

        /** Whether several functions share its rate: then rounding picks which mixture of them is called a mode. */
        boolean shared(Mode mode) {
            return modes.stream().filter(other -> distance(mode, other, 1) < 1e-6 * Math.max(1, mode.rate().abs())).count() > 1;
        }
    }

    static Judged of(Snapshots snapshots, Estimator estimator, int rank) {
        try {
            FittedOperator operator = fitted(snapshots, estimator, rank);
            return new Judged(Optional.of(new Fit(operator, SpectrumExtractor.extract(operator, Progress.NONE).modes(),
                    Motions.judge(operator, JudgeSettings.DEFAULT))));
        } catch (Fault refused) {
            return new Judged(Optional.empty());
        }
    }

    /** At a rank, or at all the data hold where that is less. */
    private static FittedOperator fitted(Snapshots snapshots, Estimator estimator, int rank) {
        try {
            return Motions.fit(snapshots, estimator, rank);
        } catch (FitFault fewer) {
            return OperatorFitter.fit(snapshots, estimator, new RankRule.Energy(1), 0, Progress.NONE);
        }
    }

    /**
     * How another judgement differs: the overall grade, and rate and grade of each mode that counts.
     *
     * @param timeUnit of the other, in units of this one
     * @return empty when it does not
     */
    List<String> differences(Judged other, double timeUnit) {
        List<String> out = new ArrayList<>(modeDifferences(other, timeUnit, Set.of()));
        if (fit.isPresent() && other.fit.isPresent()) {
            Fit mine = fit.get();
            Fit theirs = other.fit.get();
            if (mine.verdict().overall().grade() != theirs.verdict().overall().grade()) {
                out.add(mine.verdict().overall().sentence() + " BUT " + theirs.verdict().overall().sentence());
            }
            if (mine.modes().stream().noneMatch(mine::shared) && mine.counted().size() != theirs.counted().size()) {
                out.add(mine.counted().size() + " modes count, but " + theirs.counted().size());
            }
        }
        return out;
    }

    /**
     * The same of the modes alone, whether they carry enough of the signal in the other to count or not.
     *
     * @param alike grades that are not told apart
     */
    List<String> modeDifferences(Judged other, double timeUnit, Set<Grade> alike) {
        List<String> out = new ArrayList<>();
        if (fit.isEmpty() || other.fit.isEmpty()) {
            return fit.isPresent() == other.fit.isPresent() ? out : List.of("one of the two was refused");
        }
        Fit mine = fit.get();
        Fit theirs = other.fit.get();
        for (Mode mode : mine.counted()) {
            Mode near = theirs.modes().stream().filter(m -> !m.constant())
                    .min(Comparator.comparingDouble(m -> distance(mode, m, timeUnit))).orElseThrow();
            double distance = distance(mode, near, timeUnit);
            if (distance > mine.accuracy() * Math.max(1, mode.rate().abs())) {
                out.add(String.format(Locale.ROOT, "rate %s is %.2g away, accuracy %.2g", mode.rate(), distance,
                        mine.accuracy()));
            }
            boolean same = mine.grade(mode) == theirs.grade(near) || alike.containsAll(List.of(mine.grade(mode), theirs.grade(near)));
            if (!same && !mine.shared(mode)) {
                out.add(mode.rate() + " " + mine.grade(mode) + ", but " + theirs.grade(near));
            }
        }
        return out;
    }

    private static double distance(Mode mode, Mode other, double timeUnit) {
        Complex rate = other.rate().times(timeUnit);
        return rate.minus(mode.rate()).abs();
    }
}
