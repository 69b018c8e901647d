package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/**
 * Whether a verdict hangs on which runs were held out. Where they are few, others are held out in their place, as many at a time: the operator is fitted
 * anew, with a rank by the same rule, its modes are judged, and every mode takes the grade that most splits give it, the stricter one of two that
 * are as frequent. A mode that another split does not show, see {@link JudgedAgain#number}, drifts there: it belongs to the runs that were fitted. A split says
 * nothing of a mode that hardly any of its runs excite on one side, see {@link Excitation}, and where no more than half of the splits tell of it the one at
 * hand decides alone. (Cross-validation, Stone, J. R. Stat. Soc. B 36:111, 1974; the vote of fits to parts of the data, Breiman, Machine Learning 24:123, 1996.)
 *
 * <p>Only whole runs change places. Where the end of runs was held out, or other runs judge than those of the fit's own recording, there is one split.
 *
 * @param operator that was judged
 * @param spectrum extracted from it
 * @param settings of the judgement
 * @param others further splits of the same runs, possibly none
 */
record Splits(FittedOperator operator, Spectrum spectrum, JudgeSettings settings, List<Snapshots> others) {

    static final String CHECK = "other-splits";

    /** So many runs held out are no accident of one of them. */
    private static final int ENOUGH = 4;

    /** Numbers in all samples together: of larger recordings no run decides by itself, and fitting them again takes its time. */
    private static final long MOST_NUMBERS = 2_000_000;

    /** @param settings whose number of splits is heeded */
    static Splits of(FittedOperator operator, Spectrum spectrum, Snapshots judging, JudgeSettings settings) {
        return new Splits(operator, spectrum, settings, others(operator.snapshots(), judging, settings.splits() - 1));
    }

    private static List<Snapshots> others(Snapshots fitted, Snapshots judging, int most) {
        Set<String> held = names(judging.holdout());
        List<String> fits = List.copyOf(names(fitted.training().stream().filter(run -> run.weight() > 0).toList()));
        int size = held.size();
        long numbers = Stream.concat(fitted.training().stream(), judging.holdout().stream()).mapToLong(run -> run.values().getNumElements()).sum();
        if (size == 0 || size >= ENOUGH || numbers > MOST_NUMBERS || !held.equals(names(fitted.holdout())) || !Collections.disjoint(held, names(fitted.training()))) {
            return List.of();
        }
        int count = Math.min(most, fits.size() / size);
        List<Snapshots> out = new ArrayList<>();
        for (int k = 0; k < count; k++) {
            int from = (int) ((long) k * (fits.size() - size) / Math.max(1, count - 1));
            out.add(exchanged(fitted, Set.copyOf(fits.subList(from, from + size))));
        }
        return List.copyOf(out);
    }

    private static Snapshots exchanged(Snapshots fitted, Set<String> held) {
        List<Run> training = new ArrayList<>(fitted.training().stream().filter(run -> !held.contains(run.id())).toList());
        training.addAll(fitted.holdout());
        return fitted.replaced(training, fitted.training().stream().filter(run -> held.contains(run.id())).toList(), fitted.smoothing());
    }

    private static Set<String> names(List<Run> runs) {
        return runs.stream().map(Run::id).collect(Collectors.toCollection(TreeSet::new));
    }

    /**
     * @param alone verdict of the split at hand
     * @param progress polled for cancel
     * @return the same where there is no other split
     */
    Verdict weighed(Verdict alone, Progress progress) {
        JudgeSettings once = settings.withSplits(1).withLadder(0, 0);
        List<JudgedAgain> judged = new ArrayList<>();
        for (int k = 0; k < others.size(); k++) {
            Progress part = progress.part((double) k / others.size(), (k + 1.0) / others.size());
            JudgedAgain.of(others.get(k), operator, operator.rule(), once, part).ifPresent(judged::add);
        }
        if (judged.isEmpty()) {
            return alone;
        }
        Excitation excitation = Excitation.of(operator, spectrum);
        List<Finding> findings = new ArrayList<>(alone.findings());
        List<ModeVerdict> verdicts = new ArrayList<>();
        for (ModeVerdict verdict : alone.modes()) {
            Mode mode = spectrum.modes().get(verdict.mode() - 1);
            List<JudgedAgain> telling = mode.constant() ? List.of() : judged.stream().filter(other -> excitation.told(other.snapshots(), mode)).toList();
            boolean told = excitation.told(operator.snapshots(), mode);
            if (2 * (telling.size() + (told ? 1 : 0)) <= others.size() + 1) {
                verdicts.add(verdict);
            } else {
                Vote vote = new Vote(verdict, told, telling.stream().map(other -> other.of(mode)).toList());
                findings.add(vote.finding());
                verdicts.add(vote.verdict());
            }
        }
        return new Verdict(Grading.overall(verdicts), verdicts, findings, alone.ladder(), alone.doubts());
    }

    /**
     * The verdicts on one mode.
     *
     * @param own of the split at hand
     * @param told whether that split can tell of the mode, and so has a vote
     * @param others of the further ones that can, empty where the mode is not found again
     */
    record Vote(ModeVerdict own, boolean told, List<Optional<ModeVerdict>> others) {

        /** The grade of most splits. */
        Grade grade() {
            return Stream.of(Grade.values()).max(Comparator.<Grade>comparingInt(this::votes).thenComparing(Comparator.naturalOrder())).orElseThrow();
        }

        private int votes(Grade grade) {
            return (told && own.grade() == grade ? 1 : 0) + (int) others.stream().filter(other -> other.map(ModeVerdict::grade).orElse(Grade.DRIFTS) == grade).count();
        }

        Finding finding() {
            int all = others.size() + (told ? 1 : 0);
            String grades = Stream.of(Grade.values()).filter(grade -> votes(grade) > 0)
                    .map(grade -> votes(grade) + (votes(grade) == 1 ? " says " : " say ") + grade.word()).collect(Collectors.joining(", "));
            long lost = others.stream().filter(Optional::isEmpty).count();
            return new Finding(own.mode(), CHECK, (double) votes(own.grade()) / all, 0.5, own.grade() == grade(), "Of " + all
                    + " splits that tell of it, each with other runs held out, " + grades
                    + (lost == 0 ? "." : "; not to find it again counts as drifts (" + lost + ")."));
        }

        ModeVerdict verdict() {
            if (own.grade() == grade()) {
                return new ModeVerdict(own.mode(), own.grade(), own.decidedBy(), own.counts(), own.sentence() + " " + finding().sentence());
            }
            List<String> decidedBy = Stream.concat(Stream.of(CHECK), others.stream().flatMap(Optional::stream).filter(other -> other.grade() == grade())
                    .flatMap(other -> other.decidedBy().stream())).distinct().toList();
            return new ModeVerdict(own.mode(), grade(), decidedBy, own.counts(), "Mode " + own.mode() + " " + grade().word() + ": "
                    + Reservation.advice(grade(), decidedBy) + ". " + finding().sentence() + " The split at hand alone says " + own.grade().word() + ".");
        }
    }
}
