package org.modestead.host.bench.recording;

import java.util.Arrays;
import java.util.Comparator;

/** Guesses how many samples the strongest oscillation of a recording takes, to choose how many samples a state stacks. */
final class Rhythm {

    private static final int MOST_SAMPLES = 4096;
    private static final int FEWEST_SAMPLES = 16;

    private Rhythm() {}

    /**
     * Returns the period with the largest power over the longest run, summed over its channels, each in its own standard deviations
     * about its least-squares line; 0 when the run is too short to tell. The rest of the run counts as evenly sampled.
     */
    static double samples(RunScan scan) {
        RunScan.Run run = scan.runs().stream().max(Comparator.comparingInt(found -> found.times().length)).orElseThrow();
        int n = Math.min(MOST_SAMPLES, run.times().length);
        if (n < FEWEST_SAMPLES) {
            return 0;
        }
        double[] power = new double[n / 2];
        for (double[] values : run.values()) {
            double[] series = standard(Arrays.copyOf(values, n));
            for (int k = 2; k < power.length; k++) {
                power[k] += at(series, k);
            }
        }
        int best = 2;
        for (int k = 2; k < power.length; k++) {
            best = power[k] > power[best] ? k : best;
        }
        return (double) n / best;
    }

    private static double at(double[] series, int k) {
        double re = 0;
        double im = 0;
        double angle = 2 * Math.PI * k / series.length;
        for (int i = 0; i < series.length; i++) {
            re += series[i] * StrictMath.cos(angle * i);
            im += series[i] * StrictMath.sin(angle * i);
        }
        return re * re + im * im;
    }

    private static double[] standard(double[] values) {
        int n = values.length;
        double mean = Arrays.stream(values).filter(Double::isFinite).average().orElse(0);
        double[] filled = Arrays.stream(values).map(value -> Double.isFinite(value) ? value - mean : 0).toArray();
        double middle = (n - 1) / 2.0;
        double slope = 0;
        double weight = 0;
        for (int i = 0; i < n; i++) {
            slope += (i - middle) * filled[i];
            weight += (i - middle) * (i - middle);
        }
        double spread = 0;
        for (int i = 0; i < n; i++) {
            filled[i] -= slope / weight * (i - middle);
            spread += filled[i] * filled[i];
        }
        double scale = spread > 0 ? Math.sqrt(n / spread) : 0;
        return Arrays.stream(filled).map(value -> value * scale).toArray();
    }
}
