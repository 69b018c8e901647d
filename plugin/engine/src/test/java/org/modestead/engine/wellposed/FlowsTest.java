package org.modestead.engine.wellposed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.fixtures.Motions.Flow;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.recording.Snapshots;

/**
 * One-dimensional flows whose modes are known to exist or not: in the space of exp(xy) only x' = a x + b has eigenfunctions,
 * orthogonal for b = 0 (CHECKS C3.4). Forty runs from [-1, 1], length 0.4, as in the worked figures.
 */
class FlowsTest {

    private static final double LENGTH = 0.4;
    private static final Kernel EXPONENTIAL = Motions.kernel("exponential", "rate", 1);

    private static Flow flow(String name) {
        return switch (name) {
            case "x" -> (a, t) -> a * Math.exp(t);
            case "1" -> Double::sum;
            case "x^2" -> (a, t) -> a / (1 - a * t);
            case "-x^3" -> (a, t) -> a / Math.sqrt(1 + 2 * a * a * t);
            case "x-x^2" -> (a, t) -> a * Math.exp(t) / (1 + a * (Math.exp(t) - 1));
            case "x+1/2" -> (a, t) -> (a + 0.5) * Math.exp(t) - 0.5;
            case "-x" -> (a, t) -> a * Math.exp(-t);
            default -> throw new IllegalArgumentException(name);
        };
    }

    private static Verdict verdict(String name, Kernel kernel, double noise, int rank, long seed) {
        Snapshots snapshots = Motions.snapshots(LENGTH / 19, 1, Motions.spread(flow(name), 40, -1, 1, 20, LENGTH, noise,
                seed),
                Motions.spread(flow(name), 9, -0.9, 0.9, 20, LENGTH, noise, seed + 100));
        FittedOperator operator = Motions.fit(snapshots, new OccupationEstimator(kernel,
                new SegmentPlan(0, noise > 0 ? 20 : 0), 1), rank);
        return Motions.judge(operator, JudgeSettings.DEFAULT.withLadder(4, rank));
    }

    @ParameterizedTest
    @CsvSource({"x, 6", "x, 8", "x, 10", "-x, 8", "-x, 10"})
    void linearMotionStands(String name, int rank) {
        assertEquals(Grade.STANDS, verdict(name, EXPONENTIAL, 0, rank, 1).overall().grade());
    }

    @ParameterizedTest
    @ValueSource(ints = {8, 9, 10})
    void affineMotionSettles(int rank) {
        assertEquals(Grade.SETTLES, verdict("x+1/2", EXPONENTIAL, 0, rank, 1).overall().grade());
    }

    @ParameterizedTest
    @ValueSource(ints = {6, 7, 8, 9, 10})
    void translationDrifts(int rank) {
        Verdict verdict = verdict("1", EXPONENTIAL, 0, rank, 1);
        assertEquals(Grade.DRIFTS, verdict.overall().grade());
        assertTrue(verdict.overall().decidedBy().contains("settling"));
    }

    @ParameterizedTest
    @CsvSource({"x^2, 8", "x^2, 10", "-x^3, 8", "-x^3, 10", "x-x^2, 8", "x-x^2, 10"})
    void nonlinearMotionIsAbsent(String name, int rank) {
        assertEquals(Grade.ABSENT, verdict(name, EXPONENTIAL, 0, rank, 1).overall().grade());
    }

    @Test
    void weightsOfLinearMotionStayAndThoseOfTheRiccatiFlowExplode() {
        Verdict linear = verdict("x", EXPONENTIAL, 0, 10, 1);
        List<LadderRow> rows = linear.ladder().stream().filter(row -> row.mode() == 1 && row.rank() >= 6).toList();
        // worked figures: the weight of the state on x is 1 at every rank
        assertEquals(1, rows.get(rows.size() - 1).weightNorm(), 1e-3);
        assertEquals(rows.get(0).weightNorm(), rows.get(rows.size() - 1).weightNorm(), 1e-3);
        Verdict riccati = verdict("x^2", EXPONENTIAL, 0, 10, 1);
        double largest = riccati.ladder().stream().filter(row ->
                row.rank() == 10).mapToDouble(LadderRow::weightNorm).max().orElseThrow();
        // worked figures: 1.1, 3, 20, 249 at ranks 4, 6, 8, 10
        assertEquals(249, largest, 50);
    }

    @Test
    void symmetryTellsLinearMotionFromTranslationBeforeAnyEigenvalue() {
        assertTrue(value(verdict("x", EXPONENTIAL, 0, 10, 1), "symmetry-defect") < 1e-9);
        // worked figures: 0.8 to 1.3
        assertTrue(value(verdict("1", EXPONENTIAL, 0, 10, 1), "symmetry-defect") > 0.5);
    }

    private static double value(Verdict verdict, String check) {
        return verdict.findings().stream().filter(f -> f.mode() == 0
                && f.check().equals(check)).findFirst().orElseThrow().value();
    }

    @ParameterizedTest
    @ValueSource(ints = {5, 6, 8, 10})
    void noFlowStandsInTheSpaceOfAGaussianKernel(int rank) {
        // that space holds no polynomial, no constant and no exponential, CHECKS C3.12
        assertNotEquals(Grade.STANDS, verdict("x", Motions.kernel("gaussian", "scale", 1), 0, rank, 1).overall().grade());
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5})
    void theThreeFlowsStillSeparateUnderOnePercentOfNoise(long seed) {
        for (int rank : new int[] {6, 7}) {
            Grade linear = verdict("x", EXPONENTIAL, 0.01, rank, seed).overall().grade();
            assertTrue(linear.compareTo(Grade.SETTLES) <= 0, "x' = x, rank " + rank + ": " + linear.word());
            for (String name : List.of("1", "x^2")) {
                Grade grade = verdict(name, EXPONENTIAL, 0.01, rank, seed).overall().grade();
                assertTrue(grade.compareTo(Grade.DRIFTS) >= 0, name + ", rank " + rank + ": " + grade.word());
            }
        }
    }
}
