package org.modestead.engine.operator;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

class StatePairsTest {

    /** Run b counts up from 100 b: which run and sample a value comes from is written in it. */
    private static Snapshots counted(int depth, int... lengths) {
        List<Run> runs = new java.util.ArrayList<>();
        for (int b = 0; b < lengths.length; b++) {
            double base = 100 * b;
            runs.add(Motions.run("r" + b, lengths[b], 0.5, t -> new double[] {base + 2 * t}));
        }
        return Motions.snapshots(0.5, depth, runs, List.of());
    }

    @Test
    void pairsNeverJoinTwoRuns() {
        for (int stride : new int[] {1, 2, 3}) {
            for (int depth : new int[] {1, 3}) {
                StatePairs pairs = StatePairs.of(counted(depth, 7, 1, 9, 4), Snapshots.Part.TRAINING, stride);
                assertEquals(stride * 0.5, pairs.step());
                for (int i = 0; i < pairs.now().getNumElements(); i++) {
                    assertEquals(pairs.now().data[i] + stride, pairs.next().data[i], 1e-12);
                }
            }
        }
    }

    @Test
    void everyPairOfEveryRunIsThere() {
        assertEquals(6 + 8 + 3, StatePairs.of(counted(1, 7, 1, 9, 4), Snapshots.Part.TRAINING, 1).count());
        assertEquals(4 + 6 + 1, StatePairs.of(counted(3, 7, 1, 9, 4), Snapshots.Part.TRAINING, 1).count());
        assertEquals(5 + 7 + 2, StatePairs.of(counted(1, 7, 1, 9, 4), Snapshots.Part.TRAINING, 2).count());
    }

    @Test
    void runsTooShortForAnyPairAreAFault() {
        FitFault fault = assertThrows(FitFault.class, () -> StatePairs.of(counted(1, 3, 2), Snapshots.Part.TRAINING, 3));
        assertTrue(fault.getMessage().contains("3 states"), fault.getMessage());
        assertFalse(StatePairs.exist(counted(1, 3, 2), 3));
        assertTrue(StatePairs.exist(counted(1, 3, 2), 2));
    }

    @Test
    void unevenTimesAreAFaultThatPointsToTheGenerator() {
        Snapshots uneven = Motions.snapshots(OptionalDouble.empty(), DelayEmbedding.NONE,
                List.of(Motions.run("a", 5, 1, t -> new double[] {t})), List.of());
        FitFault fault = assertThrows(FitFault.class, () -> StatePairs.of(uneven, Snapshots.Part.TRAINING, 1));
        assertTrue(fault.getMessage().contains("generator"), fault.getMessage());
    }
}
