package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

class SplitsTest {

    /** x' = -x, y' = -2y: x and y are eigenfunctions, orthogonal in the space of (1 + x·y)². */
    private static List<Run> decays(int runs, double noise, long seed) {
        Random random = new Random(seed);
        List<Run> all = new ArrayList<>();
        for (int i = 0; i < runs; i++) {
            double x = 2 * random.nextDouble() - 1;
            double y = 2 * random.nextDouble() - 1;
            all.add(Motions.run("r" + i, Motions.grid(40, 0.05), t -> new double[] {x * Math.exp(-t), y * Math.exp(-2 * t)}, noise, random));
        }
        return all;
    }

    private static Snapshots split(List<Run> training, List<Run> holdout) {
        return Motions.snapshots(0.05, 1, training, holdout);
    }

    private static Snapshots split(List<Run> runs, int held) {
        return split(runs.subList(0, runs.size() - held), runs.subList(runs.size() - held, runs.size()));
    }

    private static List<Snapshots> others(Snapshots fitted, Snapshots judging, JudgeSettings settings) {
        FittedOperator operator = Motions.fit(fitted, new LinearEstimator(), 2);
        return Splits.of(operator, SpectrumExtractor.extract(operator, Progress.NONE), judging, settings).others();
    }

    private static Set<String> names(List<Run> runs) {
        return runs.stream().map(Run::id).collect(Collectors.toCollection(TreeSet::new));
    }

    @Test
    void everyRunIsHeldOutOnceAndTheOthersAreFitted() {
        Snapshots fitted = split(decays(5, 0, 1), 1);
        List<Snapshots> others = others(fitted, fitted, JudgeSettings.DEFAULT);
        assertEquals(List.of(Set.of("r0"), Set.of("r1"), Set.of("r2"), Set.of("r3")), others.stream().map(other -> names(other.holdout())).toList());
        for (Snapshots other : others) {
            Set<String> rest = new TreeSet<>(Set.of("r0", "r1", "r2", "r3", "r4"));
            rest.removeAll(names(other.holdout()));
            assertEquals(rest, names(other.training()));
        }
    }

    @Test
    void piecesOfARunChangePlacesTogether() {
        List<Run> runs = new ArrayList<>(decays(4, 0, 1));
        Run whole = runs.remove(0);
        runs.add(0, whole.cut(0, 20));
        runs.add(1, whole.cut(25, 40));
        Snapshots fitted = split(runs, 1);
        for (Snapshots other : others(fitted, fitted, JudgeSettings.DEFAULT)) {
            assertTrue(names(other.training()).stream().noneMatch(names(other.holdout())::contains), other.holdout().toString());
            assertEquals(5, other.training().size() + other.holdout().size());
        }
    }

    @Test
    void ofManyRunsAsManyAreHeldOutAsBeforeSpreadOverAll() {
        Snapshots fitted = split(decays(20, 0, 1), 3);
        List<Set<String>> held = others(fitted, fitted, JudgeSettings.DEFAULT).stream().map(other -> names(other.holdout())).toList();
        assertEquals(4, held.size());
        assertEquals(12, held.stream().flatMap(Set::stream).distinct().count(), "no run twice: " + held);
    }

    @Test
    void thereIsOneSplitWhereOthersWouldNotBeOfItsKind() {
        Snapshots four = split(decays(16, 0, 1), 4);
        assertEquals(List.of(), others(four, four, JudgeSettings.DEFAULT), "four runs are no accident of one");
        Snapshots one = split(decays(5, 0, 1), 1);
        assertEquals(List.of(), others(one, one, JudgeSettings.DEFAULT.withSplits(1)), "as asked for");
        assertEquals(List.of(), others(one, split(decays(5, 0, 1), 2), JudgeSettings.DEFAULT), "other runs judge than those kept from the fit");
        Run run = decays(1, 0, 1).get(0);
        Snapshots tail = split(List.of(run.cut(0, 30)), List.of(run.cut(30, 40)));
        assertEquals(List.of(), others(tail, tail, JudgeSettings.DEFAULT), "the end of a run is no run");
        Snapshots nothing = split(decays(5, 0, 1), List.of());
        assertEquals(List.of(), others(nothing, nothing, JudgeSettings.DEFAULT), "nothing held out");
    }

    @Test
    void mostSplitsDecideTheStricterGradeWhereTwoAreAsFrequent() {
        assertEquals(Grade.STANDS, vote(Grade.ABSENT, Grade.STANDS, Grade.STANDS).grade());
        assertEquals(Grade.DRIFTS, vote(Grade.STANDS, Grade.DRIFTS).grade());
        assertEquals(Grade.UNDECIDED, vote(Grade.STANDS, Grade.UNDECIDED, Grade.STANDS, Grade.UNDECIDED, Grade.SETTLES).grade());
        Splits.Vote lost = new Splits.Vote(verdict(Grade.STANDS), true, List.of(Optional.empty(), Optional.empty()));
        assertEquals(Grade.DRIFTS, lost.grade());
        assertEquals("Of 3 splits that tell of it, each with other runs held out, 1 says stands, 2 say drifts; not to find it again counts as drifts (2).",
                lost.finding().sentence());
        assertEquals(List.of("other-splits", "why-drifts"), vote(Grade.STANDS, Grade.DRIFTS).verdict().decidedBy());
        assertEquals(List.of("why-stands"), vote(Grade.STANDS, Grade.STANDS).verdict().decidedBy());
    }

    @Test
    void aSplitWhoseRunsDoNotExciteAModeHasNoVote() {
        Splits.Vote vote = new Splits.Vote(verdict(Grade.UNDECIDED), false, List.of(Optional.of(verdict(Grade.STANDS))));
        assertEquals(Grade.STANDS, vote.grade());
        List<Run> runs = new ArrayList<>();
        double[] second = {1, 1, 0, 0, 0, 1};
        for (int i = 0; i < second.length; i++) {
            double y = second[i];
            runs.add(Motions.run("r" + i, Motions.grid(40, 0.05), t -> new double[] {Math.exp(-t), y * Math.exp(-2 * t)}, 0, new Random(1)));
        }
        Snapshots fitted = split(runs, 1);
        FittedOperator operator = Motions.fit(fitted, new LinearEstimator(), 2);
        Spectrum spectrum = SpectrumExtractor.extract(operator, Progress.NONE);
        Excitation excitation = Excitation.of(operator, spectrum);
        Mode slow = Motions.nearest(spectrum, -1, 0);
        Mode fast = Motions.nearest(spectrum, -2, 0);
        assertEquals(List.of(true, true, false, false), others(fitted, fitted, JudgeSettings.DEFAULT).stream().map(other -> excitation.told(other, fast)).toList(),
                "y is excited in runs 0, 1 and 5 only");
        assertTrue(others(fitted, fitted, JudgeSettings.DEFAULT).stream().allMatch(other -> excitation.told(other, slow)));
        Snapshots alone = split(List.of(runs.get(2), runs.get(3)), List.of(runs.get(0)));
        assertEquals(false, excitation.told(alone, fast), "no run that fits excites it");
    }

    private static Splits.Vote vote(Grade own, Grade... others) {
        return new Splits.Vote(verdict(own), true, Stream.of(others).map(grade -> Optional.of(verdict(grade))).toList());
    }

    private static ModeVerdict verdict(Grade grade) {
        return new ModeVerdict(1, grade, List.of("why-" + grade.word()), true, "Mode 1 " + grade.word() + ".");
    }
}
