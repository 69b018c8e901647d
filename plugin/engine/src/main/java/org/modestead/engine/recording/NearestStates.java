package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.linalg.Blocks;
import org.modestead.engine.linalg.Matrices;

/**
 * How differently nearly equal states go on: of every sample and the one before it, the nearest other such pair is looked for (channels
 * in units of
 * their spread), and the samples that follow both are compared. Motion that obeys a rule takes neighbours to neighbours, noise of standard
 * deviation σ sets them apart by {@code √2 σ}, so {@code median |difference| / (0.6745 √2)} bounds σ from above where samples are too far
 * apart in time for
 * a smooth curve through them.
 *
 * <p>The idea of the Gamma test, Stefánsson, Končar and Jones, Neural Comput. Appl. 5:131, 1997, at the first neighbour (from memory).
 */
final class NearestStates {

    private static final int MOST = 1500;
    private static final int ASKED = 300;

    /** With more channels all distances come from matrix products. */
    private static final int MANY = 128;

    /** Channels worked on together. */
    private static final int BLOCK = 1024;

    private final int n;
    private final List<State> states;
    private final double[] mean;
    private final double[] spread;

    private NearestStates(List<State> states, int n) {
        this.n = n;
        this.states = states;
        this.mean = new double[n];
        this.spread = new double[n];
        measure();
    }

    /**
     * A sample together with the one before.
     *
     * @param samples of its run, p x n
     * @param k row of the sample; the one before and the one after are there
     */
    private record State(double[] samples, int k) {

        double now(int n, int channel) {
            return samples[k * n + channel];
        }

        double before(int n, int channel) {
            return samples[(k - 1) * n + channel];
        }

        double after(int n, int channel) {
            return samples[(k + 1) * n + channel];
        }
    }

    /**
     * @param runs of n channels
     * @param n number of channels
     * @return n bounds; infinite where there are too few samples
     */
    static double[] bounds(List<Run> runs, int n) {
        List<State> states = states(runs);
        double[] out = new double[n];
        Arrays.fill(out, Double.POSITIVE_INFINITY);
        return states.size() < ASKED / 10 ? out : new NearestStates(states, n).bounds(out);
    }

    private double[] bounds(double[] out) {
        int every = Math.max(1, states.size() / ASKED);
        int[] asked = IntStream.range(0, states.size()).filter(i -> i % every == 0).toArray();
        int[] near = n > MANY ? nearestByProducts(asked) : Arrays.stream(asked).map(this::nearest).toArray();
        Blocks.of(n, BLOCK, (from, to) -> {
            double[] sorted = new double[asked.length];
            for (int c = from; c < to; c++) {
                for (int i = 0; i < asked.length; i++) {
                    sorted[i] = Math.abs(states.get(asked[i]).after(n, c) - states.get(near[i]).after(n, c));
                }
                Arrays.sort(sorted);
                out[c] = sorted[sorted.length / 2] / (SampleNoise.MEDIAN_OF_NORMAL * Math.sqrt(2));
            }
        });
        return out;
    }

    /** Evenly thinned where there are very many. */
    private static List<State> states(List<Run> runs) {
        int total = runs.stream().mapToInt(run -> Math.max(0, run.samples() - 2)).sum();
        int every = Math.max(1, total / MOST);
        List<State> out = new ArrayList<>();
        int seen = 0;
        for (Run run : runs) {
            for (int k = 1; k + 1 < run.samples(); k++, seen++) {
                if (seen % every == 0) {
                    out.add(new State(run.values().data, k));
                }
            }
        }
        return out;
    }

    private void measure() {
        double[] squares = new double[n];
        for (State state : states) {
            for (int c = 0; c < n; c++) {
                double value = state.now(n, c);
                mean[c] += value / states.size();
                squares[c] += value * value / states.size();
            }
        }
        for (int c = 0; c < n; c++) {
            double variance = squares[c] - mean[c] * mean[c];
            spread[c] = variance > 0 ? Math.sqrt(variance) : 1;
        }
    }

    private int nearest(int of) {
        int best = of == 0 ? 1 : 0;
        double least = Double.POSITIVE_INFINITY;
        for (int j = 0; j < states.size(); j++) {
            double distance = j == of ? Double.POSITIVE_INFINITY : distance(states.get(of), states.get(j), least);
            if (distance < least) {
                least = distance;
                best = j;
            }
        }
        return best;
    }

    /** Squared, or something not below a limit as soon as it is reached. */
    private double distance(State a, State b, double limit) {
        double distance = 0;
        for (int c = 0; c < n && distance < limit; c++) {
            double d = (b.now(n, c) - a.now(n, c)) / spread[c];
            distance += d * d;
        }
        for (int c = 0; c < n && distance < limit; c++) {
            double d = (b.before(n, c) - a.before(n, c)) / spread[c];
            distance += d * d;
        }
        return distance;
    }

    /** {@code |a - b|² = |a|² + |b|² - 2 a·b} of states off their mean, in units of the spread; what is lost to rounding is far below any noise. */
    private int[] nearestByProducts(int[] asked) {
        double[] squares = new double[states.size()];
        DMatrixRMaj products = new DMatrixRMaj(asked.length, states.size());
        for (int from = 0; from < n; from += BLOCK) {
            DMatrixRMaj block = scaled(from, Math.min(n, from + BLOCK));
            CommonOps_DDRM.addEquals(products, Matrices.productTranspose(Matrices.rows(block, asked), block));
            for (int k = 0; k < block.getNumElements(); k++) {
                squares[k / block.numCols] += block.data[k] * block.data[k];
            }
        }
        return IntStream.range(0, asked.length).map(i -> nearest(asked[i], i, products, squares)).toArray();
    }

    private static int nearest(int of, int row, DMatrixRMaj products, double[] squares) {
        int best = of == 0 ? 1 : 0;
        for (int j = 0; j < squares.length; j++) {
            if (j != of && squares[j] - 2 * products.get(row, j) < squares[best] - 2 * products.get(row, best)) {
                best = j;
            }
        }
        return best;
    }

    /** States in the channels of a block, now and before. */
    private DMatrixRMaj scaled(int from, int to) {
        int width = to - from;
        DMatrixRMaj out = new DMatrixRMaj(states.size(), 2 * width);
        for (int i = 0; i < states.size(); i++) {
            for (int c = 0; c < width; c++) {
                out.data[2 * i * width + c] = (states.get(i).now(n, from + c) - mean[from + c]) / spread[from + c];
                out.data[(2 * i + 1) * width + c] = (states.get(i).before(n, from + c) - mean[from + c]) / spread[from + c];
            }
        }
        return out;
    }
}
