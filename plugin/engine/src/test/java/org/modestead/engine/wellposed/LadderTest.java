package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Snapshots;

class LadderTest {

    private static Snapshots tones() {
        return Motions.snapshots(0.1, 10, List.of(Motions.run("a", 300, 0.1, t -> new double[] {
            2 * Math.cos(t) + Math.cos(3 * t) + 0.5 * Math.cos(7 * t) + 0.2 * Math.cos(11 * t)
                    + 0.1 * Math.exp(-0.1 * t)})), List.of());
    }

    private static List<Integer> ranks(FittedOperator operator, JudgeSettings settings) {
        return Motions.judge(operator, settings).ladder().stream().map(LadderRow::rank).distinct().sorted().toList();
    }

    @Test
    void askedForEndsAreTheEndsAndTheFittedRankIsARung() {
        FittedOperator operator = Motions.fit(tones(), new LinearEstimator(), 6);
        List<Integer> ranks = ranks(operator, JudgeSettings.DEFAULT.withLadder(3, 9));
        assertTrue(ranks.contains(6));
        assertTrue(ranks.get(0) >= 3 && ranks.get(ranks.size() - 1) <= 9, ranks.toString());
    }

    @Test
    void aLadderThatDoesNotFitTheOperatorIsAFault() {
        FittedOperator operator = Motions.fit(tones(), new LinearEstimator(), 4);
        assertThrows(FitFault.class, () -> Motions.judge(operator, JudgeSettings.DEFAULT.withLadder(5, 8)));
        FitFault fault = assertThrows(FitFault.class, () -> Motions.judge(operator,
                JudgeSettings.DEFAULT.withLadder(2, 500)));
        assertTrue(fault.getMessage().contains("500"), fault.getMessage());
    }

    @Test
    void aModeIsFollowedThroughTheRungsUntilItIsExact() {
        // x' = -x on monomials: leading directions mix them, all six together hold x itself
        Snapshots snapshots = Motions.snapshots(0.1, 1, Motions.spread((a, t) -> a * Math.exp(-t), 8, -1, 1, 12, 1.1, 0, 1),
                List.of());
        Verdict verdict = Motions.judge(Motions.fit(snapshots, new DictionaryEstimator(Dictionary.monomials(5)), 6),
                JudgeSettings.DEFAULT.withLadder(3, 6));
        int mode = verdict.ladder().stream().filter(row -> row.rank() == 6
                && Math.abs(row.rate().re() + 1) < 1e-6).findFirst().orElseThrow().mode();
        List<LadderRow> rows = verdict.ladder().stream().filter(row -> row.mode() == mode).toList();
        assertEquals(4, rows.size());
        assertEquals(-1, rows.get(3).rate().re(), 1e-9);
    }

    @Test
    void everyRowBelongsToAModeAndAppearsOnceARung() {
        List<LadderRow> rows = Motions.judge(Motions.fit(tones(), new LinearEstimator(), 9), JudgeSettings.DEFAULT).ladder();
        assertEquals(rows.size(), rows.stream().map(row -> row.rank() + "/" + row.mode()).distinct().count());
    }

    @Test
    void theChangeOfARateIsRelativeButNotBelowWhatARunResolves() {
        assertEquals(0.5, Ladder.relativeChange(new Complex(-1, 0), new Complex(-2, 0), 10), 1e-15);
        // 0.1 over a run of 10 is 0.01: a change of 0.001 is a tenth of that
        assertEquals(0.1, Ladder.relativeChange(new Complex(0.001, 0), Complex.ZERO, 10), 1e-15);
        assertEquals(0, Ladder.relativeChange(Complex.ZERO, Complex.ZERO, 10));
    }

    @Test
    void theRateOfAMultiplierOfZeroIsFarFromEveryOtherAndNearItself() {
        Complex gone = new Complex(Double.NEGATIVE_INFINITY, 0);
        assertEquals(0, Ladder.relativeChange(gone, gone, 10));
        assertEquals(2, Ladder.relativeChange(gone, new Complex(-1, 0), 10));
        assertEquals(2, Ladder.relativeChange(new Complex(-1, 0), gone, 10));
    }
}
