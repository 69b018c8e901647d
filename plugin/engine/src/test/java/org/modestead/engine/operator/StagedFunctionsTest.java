package org.modestead.engine.operator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Comparator;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/** Few states of very many components: the functions that are asked for come first, and nothing depends on when the others are made. */
class StagedFunctionsTest {

    private static final int COMPONENTS = 175_000;
    private static final int RANK = 4;

    /** Three runs of 9 states, two damped oscillations and noise. */
    private static Snapshots tall(double noise, double... weights) {
        Random random = new Random(5);
        double[] shapes = random.doubles(4L * COMPONENTS, -1, 1).toArray();
        List<Run> runs = IntStream.range(0, weights.length).mapToObj(i -> Motions.run("r" + i, Motions.grid(9, 0.1), t -> {
            double first = Math.exp(-0.1 * t);
            double second = 0.5 * Math.exp(-0.3 * t);
            double[] parts = {first * Math.cos(3 * t + i), first * Math.sin(3 * t + i), second * Math.cos(7 * t - i), second * Math.sin(7 * t - i)};
            double[] row = new double[COMPONENTS];
            for (int c = 0; c < COMPONENTS; c++) {
                for (int k = 0; k < 4; k++) {
                    row[c] += parts[k] * shapes[4 * c + k];
                }
            }
            return row;
        }, noise, random).weighted(weights[i])).toList();
        return Motions.snapshots(0.1, 1, runs, List.of());
    }

    private static FittedOperator fit(Snapshots snapshots) {
        return OperatorFitter.fit(snapshots, new LinearEstimator(), new RankRule.Fixed(RANK), 0, Progress.NONE);
    }

    private static OrthonormalCompression allAtOnce(Snapshots snapshots) {
        return new LinearEstimator().compress(snapshots, Progress.NONE).whiten(400);
    }

    private static List<Complex> eigenvalues(DMatrixRMaj action) {
        return LinearAlgebra.installed().eigen(action).values().stream().sorted(Comparator.comparingDouble(Complex::re)
                .thenComparingDouble(Complex::im)).toList();
    }

    @Test
    void functionsUpToTheRankAreThoseOfTheWholeDecomposition() {
        Snapshots snapshots = tall(1e-3, 1, 3, 0.5);
        FittedOperator operator = fit(snapshots);
        assertInstanceOf(StagedFunctions.class, operator.functions());
        OrthonormalCompression chosen = operator.chosen();
        OrthonormalCompression expected = allAtOnce(snapshots).leading(RANK);
        // rounding of the products times the squared condition of four directions, a few hundred
        assertArrayEquals(expected.singular(), chosen.singular(), 1e-12 * expected.singular()[0]);
        for (int at = 0; at < RANK * RANK; at++) {
            assertEquals(Math.abs(expected.action().data[at]), Math.abs(chosen.action().data[at]), 1e-11);
            assertEquals(Math.abs(expected.second().data[at]), Math.abs(chosen.second().data[at]), 1e-11);
        }
        for (int at = 0; at < chosen.observable().getNumElements(); at++) {
            assertEquals(Math.abs(expected.observable().data[at]), Math.abs(chosen.observable().data[at]), 1e-11);
            assertEquals(Math.abs(expected.map().data[at]), Math.abs(chosen.map().data[at]), 1e-11);
        }
    }

    @Test
    void furtherFunctionsLeaveTheFirstAsTheyAreToTheLastBit() {
        OrthonormalCompression chosen = fit(tall(1e-3, 1, 1, 1)).chosen();
        OrthonormalCompression head = fit(tall(1e-3, 1, 1, 1)).compression().leading(RANK);
        assertArrayEquals(chosen.map().data, head.map().data);
        assertArrayEquals(chosen.action().data, head.action().data);
        assertArrayEquals(chosen.second().data, head.second().data);
        assertArrayEquals(chosen.observable().data, head.observable().data);
        assertArrayEquals(chosen.singular(), head.singular());
    }

    @Test
    void allFunctionsAreOrthonormalAndGiveTheWholeOperator() {
        Snapshots snapshots = tall(1e-3, 1, 3, 0.5);
        FittedOperator operator = fit(snapshots);
        OrthonormalCompression whole = operator.compression();
        OrthonormalCompression expected = allAtOnce(snapshots);
        assertEquals(24, whole.rank());
        assertEquals(24, operator.functions().rank());
        StatePairs pairs = StatePairs.of(snapshots, Snapshots.Part.TRAINING, 1);
        DMatrixRMaj q = pairs.weights().rows(whole.evaluate(pairs.now()), 1 / Math.sqrt(pairs.count()));
        DMatrixRMaj gram = Matrices.gram(q);
        for (int i = 0; i < 24; i++) {
            assertEquals(expected.singular()[i], whole.singular()[i], 1e-12 * expected.singular()[0]);
            for (int j = 0; j < 24; j++) {
                // rounding of one evaluation over the weakest of the directions, a thousandth of the first
                assertEquals(i == j ? 1 : 0, gram.get(i, j), 1e-11);
            }
        }
        List<Complex> found = eigenvalues(whole.action());
        for (Complex value : eigenvalues(expected.action())) {
            assertTrue(found.stream().anyMatch(other -> other.minus(value).abs() < 1e-9), () -> value + " is not among " + found);
        }
    }

    @Test
    void statesThatDependOnEachOtherAreDecomposedAtOnce() {
        FittedOperator operator = fit(tall(0, 1, 1, 1));
        assertInstanceOf(OrthonormalCompression.class, operator.functions());
        assertEquals(4, operator.functions().rank());
    }

    @Test
    void functionsAreMadeOnce() {
        FittedOperator operator = fit(tall(1e-3, 1, 1, 1));
        assertSame(operator.compression(), operator.compression());
        assertSame(operator.chosen(), operator.chosen());
    }
}
