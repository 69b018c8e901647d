package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

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

    private NearestStates() {}

    /**
     * @param runs of n channels
     * @param n number of channels
     * @return n bounds; infinite where there are too few samples
     */
    static double[] bounds(List<Run> runs, int n) {
        List<double[]> states = states(runs, n);
        double[] out = new double[n];
        Arrays.fill(out, Double.POSITIVE_INFINITY);
        if (states.size() < ASKED / 10) {
            return out;
        }
        double[] spread = spread(states, n);
        int every = Math.max(1, states.size() / ASKED);
        List<double[]> differences = new ArrayList<>();
        for (int i = 0; i < states.size(); i += every) {
            double[] own = states.get(i);
            double[] near = states.get(nearest(states, i, spread, n));
            double[] difference = new double[n];
            for (int c = 0; c < n; c++) {
                difference[c] = Math.abs(own[2 * n + c] - near[2 * n + c]);
            }
            differences.add(difference);
        }
        for (int c = 0; c < n; c++) {
            int channel = c;
            double[] sorted = differences.stream().mapToDouble(d -> d[channel]).sorted().toArray();
            out[c] = sorted[sorted.length / 2] / (SampleNoise.MEDIAN_OF_NORMAL * Math.sqrt(2));
        }
        return out;
    }

    /** Sample, the one before, the one after; evenly thinned where there are very many. */
    private static List<double[]> states(List<Run> runs, int n) {
        int total = runs.stream().mapToInt(run -> Math.max(0, run.samples() - 2)).sum();
        int every = Math.max(1, total / MOST);
        List<double[]> out = new ArrayList<>();
        int seen = 0;
        for (Run run : runs) {
            for (int k = 1; k + 1 < run.samples(); k++, seen++) {
                if (seen % every == 0) {
                    double[] state = new double[3 * n];
                    System.arraycopy(run.values().data, k * n, state, 0, n);
                    System.arraycopy(run.values().data, (k - 1) * n, state, n, n);
                    System.arraycopy(run.values().data, (k + 1) * n, state, 2 * n, n);
                    out.add(state);
                }
            }
        }
        return out;
    }

    private static double[] spread(List<double[]> states, int n) {
        double[] out = new double[n];
        for (int c = 0; c < n; c++) {
            double mean = 0;
            double squares = 0;
            for (double[] state : states) {
                mean += state[c] / states.size();
                squares += state[c] * state[c] / states.size();
            }
            double variance = squares - mean * mean;
            out[c] = variance > 0 ? Math.sqrt(variance) : 1;
        }
        return out;
    }

    private static int nearest(List<double[]> states, int of, double[] spread, int n) {
        int best = of == 0 ? 1 : 0;
        double least = Double.POSITIVE_INFINITY;
        for (int j = 0; j < states.size(); j++) {
            double distance = j == of ? Double.POSITIVE_INFINITY : 0;
            for (int c = 0; c < 2 * n && distance < least; c++) {
                double d = (states.get(j)[c] - states.get(of)[c]) / spread[c % n];
                distance += d * d;
            }
            if (distance < least) {
                least = distance;
                best = j;
            }
        }
        return best;
    }
}
