package org.modestead.engine.spectrum;

import java.util.List;
import java.util.Optional;
import org.modestead.engine.linalg.Fourier;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/**
 * The power of the training runs over frequency, averaged over channels and over pieces that overlap by half, each less its mean and
 * under a Hann window. Welch, IEEE Trans. Audio Electroacoust. 15:70, 1967.
 *
 * @param frequency in cycles per time unit, rising from 0 to half the sampling rate
 * @param density one-sided, mean over the channels, in squared prepared units per frequency; its integral is the variance
 */
public record AveragedPower(double[] frequency, double[] density) {

    private static final int LONGEST = 1024;
    private static final int SHORTEST = 16;

    /** Returns the power; empty where times are uneven or every run is shorter than 16 samples. */
    public static Optional<AveragedPower> of(Snapshots snapshots) {
        int longest = snapshots.training().stream().mapToInt(Run::samples).max().orElse(0);
        if (snapshots.step().isEmpty() || longest < SHORTEST) {
            return Optional.empty();
        }
        int length = Integer.highestOneBit(Math.min(LONGEST, longest));
        double step = snapshots.step().getAsDouble();
        double[] frequency = new double[length / 2 + 1];
        for (int k = 0; k < frequency.length; k++) {
            frequency[k] = k / (length * step);
        }
        return Optional.of(new AveragedPower(frequency, density(snapshots.training(), length, step)));
    }

    private static double[] density(List<Run> runs, int length, double step) {
        double[] sum = new double[length / 2 + 1];
        int pieces = 0;
        for (Run run : runs) {
            for (int from = 0; from + length <= run.samples(); from += length / 2) {
                for (int channel = 0; channel < run.values().numCols; channel++) {
                    addPiece(sum, run, channel, from, length);
                    pieces++;
                }
            }
        }
        double windowPower = 0;
        for (int k = 0; k < length; k++) {
            windowPower += window(k, length) * window(k, length);
        }
        for (int k = 0; k < sum.length; k++) {
            boolean edge = k == 0 || k == length / 2;
            sum[k] *= (edge ? 1 : 2) * step / (windowPower * pieces);
        }
        return sum;
    }

    private static void addPiece(double[] sum, Run run, int channel, int from, int length) {
        double[] piece = new double[length];
        double mean = 0;
        for (int k = 0; k < length; k++) {
            piece[k] = run.values().get(from + k, channel);
            mean += piece[k] / length;
        }
        for (int k = 0; k < length; k++) {
            piece[k] = (piece[k] - mean) * window(k, length);
        }
        double[] power = Fourier.squaredMagnitudes(piece);
        for (int k = 0; k < power.length; k++) {
            sum[k] += power[k];
        }
    }

    private static double window(int k, int length) {
        return 0.5 - 0.5 * StrictMath.cos(2 * Math.PI * k / length);
    }
}
