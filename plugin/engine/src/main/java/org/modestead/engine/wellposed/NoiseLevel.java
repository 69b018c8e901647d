package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.Ridge;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/**
 * Standard deviation of the noise on single samples, one a channel: what a cubic through two neighbours on either side misses
 * of a sample, {@code e_k = y_k - Σ w_j y_j}, divided by {@code √(1 + Σ w_j²)} and averaged robustly (median of {@code |e|} over 0.6745).
 * Smooth motion leaves next to nothing, so the figure is an upper bound that is close where the sampling is fine. A second upper
 * bound is what the best one-step prediction of runs not fitted misses, since no prediction foresees noise; the lower of both counts.
 *
 * <p>Differencing after Gasser, Sroka and Jennen-Steinmetz, Biometrika 73:625, 1986 (there with a line, here with a cubic; formula from memory).
 *
 * @param deviations n, in prepared units
 */
record NoiseLevel(double[] deviations) {

    private static final int NEIGHBOURS = 2;
    private static final long SEED = 9311;
    private static final double MEDIAN_OF_NORMAL = 0.6744897501960817;

    /** From all runs that fit or judge. */
    static NoiseLevel rough(Snapshots snapshots) {
        int n = snapshots.channels().size();
        double[] out = new double[n];
        for (int c = 0; c < n; c++) {
            List<double[]> misses = new ArrayList<>();
            for (Snapshots.Part part : List.of(Snapshots.Part.TRAINING, Snapshots.Part.HOLDOUT)) {
                for (Run run : snapshots.runs(part)) {
                    misses.add(misses(run, c));
                }
            }
            double[] sorted = misses.stream().flatMapToDouble(Arrays::stream).map(Math::abs).sorted().toArray();
            out[c] = sorted.length == 0 ? 0 : sorted[sorted.length / 2] / MEDIAN_OF_NORMAL;
        }
        return new NoiseLevel(out);
    }

    /** Returns the lower of this level and given bounds, channel by channel. */
    NoiseLevel atMost(double[] bounds) {
        double[] out = deviations.clone();
        for (int c = 0; c < out.length; c++) {
            out[c] = Math.min(out[c], bounds[c]);
        }
        return new NoiseLevel(out);
    }

    /**
     * Fits the operator twice more to its training runs with as much noise again, the second time with the opposite sign: what is odd in the
     * noise shows in one of them at least.
     *
     * @param operator as fitted
     * @param rank highest wanted
     * @param progress polled for cancel
     * @return up to that rank; those that cannot be fitted are left out
     */
    List<OrthonormalCompression> refits(FittedOperator operator, int rank, Progress progress) {
        Snapshots s = operator.snapshots();
        Random random = new Random(SEED);
        List<DMatrixRMaj> doses = s.training().stream().map(run -> noise(run, random)).toList();
        List<OrthonormalCompression> out = new ArrayList<>();
        for (double sign : new double[] {1, -1}) {
            List<Run> training = new ArrayList<>();
            for (int i = 0; i < doses.size(); i++) {
                training.add(disturbed(s.training().get(i), doses.get(i), sign));
            }
            Snapshots noisier = new Snapshots(s.channels(), s.inputs(), s.time(), training, s.calibration(), s.holdout(), s.step(), s.delay(),
                    s.preparation(), s.facts(), s.doubts());
            try {
                out.add(Ridge.apply(operator.estimator().compress(noisier, progress).whiten(rank), operator.ridge()));
            } catch (FitFault fault) {
                progress.checkCancelled();
            }
        }
        return out;
    }

    private static double[] misses(Run run, int channel) {
        int count = Math.max(0, run.samples() - 2 * NEIGHBOURS);
        double[] out = new double[count];
        for (int k = 0; k < count; k++) {
            int at = k + NEIGHBOURS;
            double miss = run.values().get(at, channel);
            double squares = 1;
            for (int j = k; j <= at + NEIGHBOURS; j++) {
                if (j != at) {
                    double weight = lagrange(run.times(), k, at + NEIGHBOURS, at, j);
                    miss -= weight * run.values().get(j, channel);
                    squares += weight * weight;
                }
            }
            out[k] = miss / Math.sqrt(squares);
        }
        return out;
    }

    /** Weight of sample j in the polynomial through samples first..last but one, at the time of that one. */
    private static double lagrange(double[] t, int first, int last, int at, int j) {
        double weight = 1;
        for (int i = first; i <= last; i++) {
            if (i != at && i != j) {
                weight *= (t[at] - t[i]) / (t[j] - t[i]);
            }
        }
        return weight;
    }

    /** White noise of this level for every sample of a run, p x n. */
    DMatrixRMaj noise(Run run, Random random) {
        DMatrixRMaj out = new DMatrixRMaj(run.values().numRows, run.values().numCols);
        for (int k = 0; k < out.getNumElements(); k++) {
            out.data[k] = deviations[k % deviations.length] * random.nextGaussian();
        }
        return out;
    }

    static Run disturbed(Run run, DMatrixRMaj noise, double sign) {
        DMatrixRMaj values = run.values().copy();
        for (int k = 0; k < values.getNumElements(); k++) {
            values.data[k] += sign * noise.data[k];
        }
        return new Run(run.id(), run.times(), values, run.inputs(), run.leadIn());
    }
}
