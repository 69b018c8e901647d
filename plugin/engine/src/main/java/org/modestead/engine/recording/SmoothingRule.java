package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.linalg.Blocks;

/** Whether noise is smoothed away before a fit. */
public enum SmoothingRule {
    /** Samples are left as recorded. */
    NONE,
    /**
     * Each channel with the window whose parabolas foretell samples left out of them best, over all training runs:
     * {@code Σ ((y_k - ŷ_k)/(1 - w_kk))²} is least (Stone, J. R. Stat. Soc. B 36:111, 1974). A channel is left alone where the best window
     * is as short as the shortest ones, so that motion cannot be told from noise, and where most of what it carries is noise.
     */
    AUTOMATIC;

    private static final int[] REACHES = {1, 2, 3, 4, 5, 6, 8, 10, 13, 16, 20, 25, 32, 40, 50};

    /** Noise of a larger share of the spread is left: what smoothing would leave could be an accident of the noise. */
    private static final double MOST_NOISE = 0.3;

    /** Windows up to this reach are no evidence of noise: fast motion is missed by less there as well. */
    private static final int TOO_SHORT = 2;

    /** A window is at most this part of the shortest run: longer ones would make a parabola of it. */
    private static final int PART_OF_RUN = 2;

    private static final int LEAST_SAMPLES = 5;

    /** So many samples tell the window; of longer recordings every so-manieth is left out in turn. */
    private static final double ENOUGH = 20_000;

    /** Channels looked at together: their samples under the longest window stay near the processor. */
    private static final int BLOCK = 256;

    /**
     * @param training runs that fit
     * @param n channels
     */
    Smoothing of(List<Run> training, int n) {
        List<Run> runs = training.stream().filter(run -> run.samples() >= LEAST_SAMPLES).toList();
        if (this == NONE || runs.isEmpty()) {
            return Smoothing.none(n);
        }
        List<Integer> reach = new ArrayList<>();
        List<Double> noise = new ArrayList<>();
        Miss[] best = best(runs, n);
        double[] variance = variances(runs, n);
        for (int c = 0; c < n; c++) {
            boolean told = best[c].reach() > TOO_SHORT && best[c].noise() < MOST_NOISE * MOST_NOISE * variance[c];
            reach.add(told ? best[c].reach() : 0);
            noise.add(told ? Math.sqrt(best[c].noise()) : 0);
        }
        return new Smoothing(reach, noise);
    }

    /**
     * Smooths snapshots that were built by hand, every run as a whole, with windows told from the training runs.
     *
     * @param plain not smoothed yet
     * @return the same snapshots where there is nothing to smooth
     */
    public Snapshots smooth(Snapshots plain) {
        Smoothing smoothing = of(plain.training(), plain.channels().size());
        return smoothing.active() ? plain.with(smoothing, plain.training().stream().map(smoothing::apply).toList(),
                plain.calibration().stream().map(smoothing::apply).toList(), plain.holdout().stream().map(smoothing::apply).toList()) : plain;
    }

    /**
     * @param reach h
     * @param left mean square by which samples left out are missed
     * @param noise variance of the noise that what is missed with them in tells: {@code Σ (y - ŷ)² / Σ (1 - 2 w_kk + Σ w²)}
     */
    private record Miss(int reach, double left, double noise) {}

    private static Miss[] best(List<Run> runs, int n) {
        int shortest = runs.stream().mapToInt(Run::samples).min().orElseThrow();
        Miss[] best = misses(runs, n, REACHES[0]);
        for (int h : REACHES) {
            if (h <= TOO_SHORT || PART_OF_RUN * (2 * h + 1) <= shortest) {
                Miss[] misses = misses(runs, n, h);
                for (int c = 0; c < n; c++) {
                    best[c] = misses[c].left() < best[c].left() ? misses[c] : best[c];
                }
            }
        }
        return best;
    }

    private static Miss[] misses(List<Run> runs, int n, int h) {
        Miss[] out = new Miss[n];
        Blocks.of(n, BLOCK, (from, to) -> System.arraycopy(misses(runs, h, from, to), 0, out, from, to - from));
        return out;
    }

    private static Miss[] misses(List<Run> runs, int h, int from, int to) {
        int stride = Math.max(1, (int) (samples(runs) / ENOUGH));
        double[] left = new double[to - from];
        double[] kept = new double[to - from];
        double[] values = new double[to - from];
        double freedom = 0;
        int count = 0;
        for (Run run : runs) {
            int n = run.values().numCols;
            for (int k = 0; k < run.samples(); k += stride) {
                LocalParabola parabola = LocalParabola.at(run.times(), k, h);
                double own = parabola.own(k);
                parabola.values(run.values().data, n, from, values);
                for (int c = 0; c < values.length; c++) {
                    double miss = run.values().data[k * n + from + c] - values[c];
                    left[c] += Math.pow(miss / (1 - own), 2);
                    kept[c] += miss * miss;
                }
                freedom += 1 - 2 * own + parabola.gain();
                count++;
            }
        }
        Miss[] out = new Miss[values.length];
        for (int c = 0; c < out.length; c++) {
            out[c] = new Miss(h, left[c] / count, kept[c] / freedom);
        }
        return out;
    }

    private static double[] variances(List<Run> runs, int n) {
        double samples = samples(runs);
        double[] means = new double[n];
        double[] out = new double[n];
        for (Run run : runs) {
            for (int k = 0; k < run.samples(); k++) {
                for (int c = 0; c < n; c++) {
                    means[c] += run.values().data[k * n + c] / samples;
                }
            }
        }
        for (Run run : runs) {
            for (int k = 0; k < run.samples(); k++) {
                for (int c = 0; c < n; c++) {
                    double away = run.values().data[k * n + c] - means[c];
                    out[c] += away * away / samples;
                }
            }
        }
        return out;
    }

    private static double samples(List<Run> runs) {
        return runs.stream().mapToInt(Run::samples).sum();
    }
}
