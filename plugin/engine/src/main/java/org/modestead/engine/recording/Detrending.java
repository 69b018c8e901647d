package org.modestead.engine.recording;

import java.util.Arrays;
import java.util.List;

/**
 * The trend of every channel over the training samples of all runs together.
 *
 * <pre>    trend = offset + slope * (time - origin)</pre>
 *
 * @param origin mean training time with a linear trend, else 0
 * @param offset per channel
 * @param slope per channel, 0 without a linear trend
 */
record Detrending(double origin, double[] offset, double[] slope) {

    /**
     * Fits by least squares.
     *
     * @param training recorded values; only the training samples are read
     * @param n number of channels
     * @param detrend kind of trend
     */
    static Detrending fit(List<Piece> training, int n, Detrend detrend) {
        if (detrend == Detrend.NONE) {
            return new Detrending(0, new double[n], new double[n]);
        }
        double[] mean = mean(training, n);
        if (detrend == Detrend.MEAN) {
            return new Detrending(0, mean, new double[n]);
        }
        double origin = meanTime(training);
        return new Detrending(origin, mean, slope(training, mean, origin));
    }

    /** Returns the mean of every channel over the training samples, summed about the first sample. */
    static double[] mean(List<Piece> training, int n) {
        double[] first = Arrays.copyOf(training.get(0).values().data, n);
        double[] sum = new double[n];
        long count = 0;
        for (Piece piece : training) {
            int samples = piece.samples(Snapshots.Part.TRAINING);
            double[] data = piece.values().data;
            for (int k = 0, at = 0; k < samples; k++) {
                for (int c = 0; c < n; c++, at++) {
                    sum[c] += data[at] - first[c];
                }
            }
            count += samples;
        }
        for (int c = 0; c < n; c++) {
            sum[c] = first[c] + sum[c] / count;
        }
        return sum;
    }

    private static double meanTime(List<Piece> training) {
        double first = training.get(0).times()[0];
        double sum = 0;
        long count = 0;
        for (Piece piece : training) {
            int samples = piece.samples(Snapshots.Part.TRAINING);
            for (int k = 0; k < samples; k++) {
                sum += piece.times()[k] - first;
            }
            count += samples;
        }
        return first + sum / count;
    }

    private static double[] slope(List<Piece> training, double[] mean, double origin) {
        int n = mean.length;
        double[] slope = new double[n];
        double spread = 0;
        for (Piece piece : training) {
            int samples = piece.samples(Snapshots.Part.TRAINING);
            double[] data = piece.values().data;
            for (int k = 0, at = 0; k < samples; k++) {
                double time = piece.times()[k] - origin;
                spread += time * time;
                for (int c = 0; c < n; c++, at++) {
                    slope[c] += time * (data[at] - mean[c]);
                }
            }
        }
        for (int c = 0; c < n; c++) {
            slope[c] /= spread;
        }
        return slope;
    }
}
