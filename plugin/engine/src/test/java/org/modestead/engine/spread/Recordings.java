package org.modestead.engine.spread;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/**
 * Simulated recordings with known rates: each oscillation is a plane turned and shrunk by {@code e^(λΔt)} a step (a real rate is
 * a line), pushed by independent noise each step, seen through a mixing matrix, and measured with noise.
 *
 * @param rates λ, imaginary part at least 0
 * @param runs number of runs
 * @param samples of each
 * @param burnIn steps before the first sample
 * @param start deviation of the states before the burn-in
 * @param push deviation of the noise of a step
 * @param mixing channels x 2 states a rate; empty for the states themselves
 * @param noise deviation of the measurement noise
 * @param depth of the delays
 */
record Recordings(List<Complex> rates, int runs, int samples, int burnIn, double start, double push, double[][] mixing,
        double noise, int depth) {

    static final double STEP = 0.1;

    Snapshots next(Random random) {
        List<Run> list = new ArrayList<>();
        for (int i = 0; i < runs; i++) {
            list.add(run("r" + i, random));
        }
        return Motions.snapshots(STEP, depth, list, List.of());
    }

    private Run run(String id, Random random) {
        int states = 2 * rates.size();
        double[] x = random.doubles(states).map(u -> start * random.nextGaussian()).toArray();
        int channels = mixing.length == 0 ? states : mixing.length;
        DMatrixRMaj values = new DMatrixRMaj(samples, channels);
        for (int t = -burnIn; t < samples; t++) {
            for (int c = 0; c < channels && t >= 0; c++) {
                values.set(t, c, seen(c, x) + noise * random.nextGaussian());
            }
            x = moved(x, random);
        }
        return new Run(id, Motions.grid(samples, STEP), values);
    }

    private double seen(int channel, double[] x) {
        if (mixing.length == 0) {
            return x[channel];
        }
        double sum = 0;
        for (int i = 0; i < x.length; i++) {
            sum += mixing[channel][i] * x[i];
        }
        return sum;
    }

    private double[] moved(double[] x, Random random) {
        double[] y = new double[x.length];
        for (int j = 0; j < rates.size(); j++) {
            Complex multiplier = rates.get(j).times(STEP).exp();
            y[2 * j] = multiplier.re() * x[2 * j] - multiplier.im() * x[2 * j + 1] + push * random.nextGaussian();
            y[2 * j + 1] = multiplier.im() * x[2 * j] + multiplier.re() * x[2 * j + 1] + push * random.nextGaussian();
        }
        return y;
    }
}
