package org.modestead.engine.kernel;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;

/**
 * A length scale from the data: the median distance between states. Common practice for radial kernels; a starting
 * point, not an optimum.
 */
public final class ScaleHeuristic {

    /** The length scale as every radial family declares it. */
    static final KernelFamily.Parameter PARAMETER =
            new KernelFamily.Parameter("scale", "Scale", "Length over which the kernel falls, in the unit of the prepared states.", 1e-150, 1);

    private static final int MOST = 1000;

    private ScaleHeuristic() {}

    /**
     * Returns the median of {@code |x_i - x_j|}, i &lt; j, over at most 1000 evenly spaced rows.
     *
     * @param states p x N, at least two different rows
     * @return positive
     * @throws FitFault if more than half of the distances are zero
     */
    public static double medianDistance(DMatrixRMaj states) {
        int count = Math.min(states.numRows, MOST);
        double[] distances = new double[count * (count - 1) / 2];
        int at = 0;
        for (int i = 0; i < count; i++) {
            for (int j = 0; j < i; j++) {
                distances[at++] = distance(states, row(i, count, states.numRows), row(j, count, states.numRows));
            }
        }
        Arrays.sort(distances);
        double median = distances.length == 0 ? 0 : distances[distances.length / 2];
        if (!(median > 0)) {
            throw new FitFault("kernel scale", "the median distance between states is " + median,
                    "give an explicit scale, or remove states that repeat");
        }
        return median;
    }

    private static int row(int i, int count, int rows) {
        return (int) ((long) i * rows / count);
    }

    private static double distance(DMatrixRMaj x, int i, int j) {
        double sum = 0;
        for (int k = 0; k < x.numCols; k++) {
            double d = x.data[i * x.numCols + k] - x.data[j * x.numCols + k];
            sum += d * d;
        }
        return Math.sqrt(sum);
    }
}
