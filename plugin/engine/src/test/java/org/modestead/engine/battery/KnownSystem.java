package org.modestead.engine.battery;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.recording.Run;

/**
 * A system whose spectrum is known.
 *
 * @param name unique in the battery
 * @param step time between samples
 * @param path one run from a random start
 */
record KnownSystem(String name, double step, Path path) {

    /** A noise-free run, one sample a row. */
    interface Path {
        double[][] draw(Random random);
    }

    /** Runs with white noise of a share of each channel's standard deviation over all runs. */
    List<Run> runs(int count, double noise, long seed) {
        Random random = new Random(seed);
        List<double[][]> paths = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            paths.add(path.draw(random));
        }
        double[] spread = spread(paths);
        List<Run> runs = new ArrayList<>();
        for (double[][] rows : paths) {
            DMatrixRMaj values = new DMatrixRMaj(rows);
            for (int k = 0; k < values.getNumElements(); k++) {
                values.data[k] += noise * spread[k % spread.length] * random.nextGaussian();
            }
            runs.add(new Run("r" + runs.size(), Motions.grid(rows.length, step), values));
        }
        return runs;
    }

    private static double[] spread(List<double[][]> paths) {
        double[] spread = new double[paths.get(0)[0].length];
        for (int c = 0; c < spread.length; c++) {
            double sum = 0;
            double squares = 0;
            int count = 0;
            for (double[][] rows : paths) {
                for (double[] row : rows) {
                    sum += row[c];
                    squares += row[c] * row[c];
                    count++;
                }
            }
            spread[c] = Math.sqrt(Math.max(0, squares / count - sum / count * (sum / count)));
        }
        return spread;
    }
}
