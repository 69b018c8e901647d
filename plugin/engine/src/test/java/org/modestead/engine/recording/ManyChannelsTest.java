package org.modestead.engine.recording;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.fixtures.Motions;

/** Fields of very many channels are worked on in blocks and by matrix products: what is found of a channel is what is found of it among few. */
class ManyChannelsTest {

    private static final int FEW = 100;
    private static final int COPIES = 7;
    private static final int SAMPLES = 90;

    /** Noisy tones, one a channel, each channel so many times. */
    private static List<Run> runs(int copies) {
        Random random = new Random(17);
        return IntStream.range(0, 3).mapToObj(r -> {
            double[][] rows = new double[SAMPLES][FEW];
            for (int k = 0; k < SAMPLES; k++) {
                for (int c = 0; c < FEW; c++) {
                    rows[k][c] = Math.sin(0.15 * k + 0.1 * c + r) * (1 + c % 5) + (c % 3 == 0 ? 0.05 : 0.4) * random.nextGaussian();
                }
            }
            DMatrixRMaj values = new DMatrixRMaj(SAMPLES, FEW * copies);
            for (int k = 0; k < SAMPLES; k++) {
                for (int c = 0; c < values.numCols; c++) {
                    values.set(k, c, rows[k][c % FEW]);
                }
            }
            return new Run("r" + r, Motions.grid(SAMPLES, 0.1), values);
        }).toList();
    }

    @Test
    void theSmoothingOfAChannelIsThatAmongFew() {
        Smoothing few = SmoothingRule.AUTOMATIC.of(runs(1), FEW);
        Smoothing many = SmoothingRule.AUTOMATIC.of(runs(COPIES), FEW * COPIES);
        assertTrue(few.active());
        for (int c = 0; c < FEW * COPIES; c++) {
            assertEquals(few.reach().get(c % FEW), many.reach().get(c));
            assertEquals(few.noise().get(c % FEW), many.noise().get(c));
        }
    }

    @Test
    void blocksOfAParabolaAreItsValuesToTheLastBit() {
        Run run = runs(1).get(0);
        for (int k : new int[] {0, 1, 40, SAMPLES - 1}) {
            LocalParabola parabola = LocalParabola.at(run.times(), k, 6);
            double[] block = new double[30];
            parabola.values(run.values().data, FEW, 50, block);
            assertArrayEquals(IntStream.range(50, 80).mapToDouble(c -> parabola.value(run.values().data, FEW, c)).toArray(), block);
        }
    }

    @Test
    void theNearestStatesByProductsAreThoseByDistances() {
        // every channel seven times over: all distances grow by √7, so that the nearest of each state, and its difference, stays
        double[] few = NearestStates.bounds(runs(1), FEW);
        double[] many = NearestStates.bounds(runs(COPIES), FEW * COPIES);
        assertTrue(Arrays.stream(few).allMatch(bound -> bound > 0 && Double.isFinite(bound)));
        for (int c = 0; c < many.length; c++) {
            assertEquals(few[c % FEW], many[c]);
        }
    }
}
