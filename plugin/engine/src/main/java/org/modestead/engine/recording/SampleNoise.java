package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Blocks;

/**
 * Standard deviation of the noise on single samples, one a channel: what a cubic through two neighbours on either side misses
 * of a sample, {@code e_k = y_k - Σ w_j y_j}, divided by {@code √(1 + Σ w_j²)} and averaged robustly (median of {@code |e|} over 0.6745).
 * Smooth motion leaves next to nothing, so the figure is an upper bound that is close where the sampling is fine. Where it is coarse,
 * {@link NearestStates} bounds it closer. A further upper bound is what the best one-step prediction of runs not fitted misses, since no prediction foresees noise; the lower of both counts.
 *
 * <p>Differencing after Gasser, Sroka and Jennen-Steinmetz, Biometrika 73:625, 1986 (there with a line, here with a cubic; formula from
 * memory).
 *
 * @param deviations n, in prepared units, of samples before smoothing
 * @param smoothing that the samples went through, and added noise goes through
 */
public record SampleNoise(double[] deviations, Smoothing smoothing) {

    private static final int NEIGHBOURS = 2;

    /** Channels looked at together, so that samples of one time are read in a row. */
    private static final int BLOCK = 256;

    /** Median of |x| for x normal with standard deviation 1. */
    static final double MEDIAN_OF_NORMAL = 0.6744897501960817;

    /**
     * Measures it on all runs that fit or judge.
     *
     * @param snapshots prepared; runs of fewer than five samples say nothing
     */
    public static SampleNoise rough(Snapshots snapshots) {
        int n = snapshots.channels().size();
        Smoothing smoothing = snapshots.smoothing();
        List<Run> runs = new ArrayList<>(snapshots.training());
        runs.addAll(snapshots.holdout());
        boolean asked = !IntStream.range(0, n).allMatch(smoothing::touches);
        double[] out = asked ? fromNeighbours(runs, n) : new double[n];
        IntStream.range(0, n).filter(smoothing::touches).forEach(c -> out[c] = smoothing.noise().get(c));
        SampleNoise level = new SampleNoise(out, smoothing);
        return asked ? level.atMost(NearestStates.bounds(runs, n)) : level;
    }

    private static double[] fromNeighbours(List<Run> runs, int n) {
        List<double[][]> weights = runs.stream().map(run -> weights(run.times())).toList();
        int count = weights.stream().mapToInt(own -> own.length).sum();
        double[] out = new double[n];
        Blocks.of(n, BLOCK, (from, to) -> {
            double[][] misses = new double[to - from][count];
            int at = 0;
            for (int i = 0; i < runs.size(); i++) {
                at = misses(runs.get(i), weights.get(i), from, misses, at);
            }
            for (int c = from; c < to; c++) {
                double[] sorted = misses[c - from];
                Arrays.sort(sorted);
                out[c] = sorted.length == 0 ? 0 : sorted[sorted.length / 2] / MEDIAN_OF_NORMAL;
            }
        });
        return out;
    }

    /** Returns the lower of this level and given bounds on the noise of prepared samples, channel by channel; smoothed ones tell nothing. */
    public SampleNoise atMost(double[] bounds) {
        double[] out = deviations.clone();
        for (int c = 0; c < out.length; c++) {
            out[c] = smoothing.touches(c) ? out[c] : Math.min(out[c], bounds[c]);
        }
        return new SampleNoise(out, smoothing);
    }

    /** Returns the level over the standard deviation of the training samples, root mean square over the channels that move. */
    public double shareOf(Snapshots snapshots) {
        int n = deviations.length;
        double[] sums = new double[n];
        double[] squares = new double[n];
        int count = 0;
        for (Run run : snapshots.training()) {
            for (int k = 0; k < run.samples(); k++, count++) {
                for (int c = 0; c < n; c++) {
                    double value = run.values().data[k * n + c];
                    sums[c] += value;
                    squares[c] += value * value;
                }
            }
        }
        double sum = 0;
        int moving = 0;
        for (int c = 0; c < n; c++) {
            double variance = squares[c] / count - Math.pow(sums[c] / count, 2);
            if (variance > 0) {
                sum += deviations[c] * deviations[c] / variance;
                moving++;
            }
        }
        return moving == 0 ? 0 : Math.sqrt(sum / moving);
    }

    /**
     * Returns copies of snapshots whose training runs carry as much noise again, in pairs with opposite signs, so that what is odd in the
     * noise shows, or cancels.
     *
     * @param snapshots not written
     * @param pairs number of pairs
     * @param seed of the noise
     */
    public List<Snapshots> disturbed(Snapshots snapshots, int pairs, long seed) {
        return copies(snapshots.training(), pairs, new Random(seed)).stream()
                .map(training -> snapshots.with(smoothing, training, snapshots.calibration(), snapshots.holdout())).toList();
    }

    /**
     * Returns noisier copies of runs: {@code 2 pairs} lists, the second of a pair with the noise of the first taken off instead of added.
     *
     * @param runs not written
     * @param pairs number of pairs
     * @param random draws the noise
     */
    public List<List<Run>> copies(List<Run> runs, int pairs, Random random) {
        List<List<Run>> out = new ArrayList<>();
        for (int pair = 0; pair < pairs; pair++) {
            List<DMatrixRMaj> doses = doses(runs, random);
            for (double sign : new double[] {1, -1}) {
                out.add(IntStream.range(0, runs.size()).mapToObj(i -> disturbed(runs.get(i), doses.get(i), sign)).toList());
            }
        }
        return out;
    }

    /** How far samples lie from the cubics through their neighbours, for channels from one on; returns the next free column. */
    private static int misses(Run run, double[][] weights, int from, double[][] out, int column) {
        int n = run.values().numCols;
        double[] y = run.values().data;
        for (int k = 0; k < weights.length; k++) {
            double[] own = weights[k];
            double size = own[NEIGHBOURS];
            for (int c = 0; c < out.length; c++) {
                double miss = y[(k + NEIGHBOURS) * n + from + c];
                for (int j = 0; j < own.length; j++) {
                    if (j != NEIGHBOURS) {
                        miss -= own[j] * y[(k + j) * n + from + c];
                    }
                }
                out[c][column + k] = Math.abs(miss / size);
            }
        }
        return column + weights.length;
    }

    /** Per sample with enough neighbours their weights, and in its own place {@code √(1 + Σ w²)}. */
    private static double[][] weights(double[] times) {
        double[][] out = new double[Math.max(0, times.length - 2 * NEIGHBOURS)][2 * NEIGHBOURS + 1];
        for (int k = 0; k < out.length; k++) {
            double squares = 1;
            for (int j = 0; j < out[k].length; j++) {
                if (j != NEIGHBOURS) {
                    out[k][j] = lagrange(times, k, k + 2 * NEIGHBOURS, k + NEIGHBOURS, k + j);
                    squares += out[k][j] * out[k][j];
                }
            }
            out[k][NEIGHBOURS] = Math.sqrt(squares);
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

    /**
     * Draws noise of this level for every sample, smoothed as the samples were. It is drawn run by run in the order of their ids, shorter ids first, and
     * of their times, and channel by channel as {@link ChannelsByShape} tells: neither the order in which runs are given nor order, sign or unit of the channels
     * moves anything.
     *
     * @param runs not written
     * @param random draws the noise
     * @return per run as given p x n
     */
    public List<DMatrixRMaj> doses(List<Run> runs, Random random) {
        if (runs.isEmpty()) {
            return List.of();
        }
        ChannelsByShape channels = ChannelsByShape.of(runs);
        DMatrixRMaj[] out = new DMatrixRMaj[runs.size()];
        IntStream.range(0, out.length).boxed().sorted(Comparator.<Integer>comparingInt(i -> runs.get(i).id().length())
                        .thenComparing(i -> runs.get(i).id()).thenComparingDouble(i -> runs.get(i).times()[0]))
                .forEachOrdered(i -> out[i] = noise(runs.get(i), channels, random));
        return List.of(out);
    }

    private DMatrixRMaj noise(Run run, ChannelsByShape channels, Random random) {
        DMatrixRMaj out = new DMatrixRMaj(run.values().numRows, run.values().numCols);
        for (int k = 0; k < out.numRows; k++) {
            for (int place = 0; place < out.numCols; place++) {
                int channel = channels.at(place);
                out.set(k, channel, channels.sign(channel) * deviations[channel] * random.nextGaussian());
            }
        }
        return smoothing.apply(run.times(), out);
    }

    /** Returns a run with noise added, or taken off for the sign -1. */
    public static Run disturbed(Run run, DMatrixRMaj noise, double sign) {
        DMatrixRMaj values = run.values().copy();
        for (int k = 0; k < values.getNumElements(); k++) {
            values.data[k] += sign * noise.data[k];
        }
        return run.withValues(values);
    }
}
