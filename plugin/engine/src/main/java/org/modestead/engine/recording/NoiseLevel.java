package org.modestead.engine.recording;

/**
 * The variance of white noise on a channel, told from how far each sample lies from the straight line through its neighbours:
 *
 * <pre>    ε_i = a_i y_(i-1) + b_i y_(i+1) - y_i,    σ² = mean of ε_i² / (a_i² + b_i² + 1)</pre>
 *
 * with a and b those of linear interpolation, at even or uneven times. Bends of the signal within three samples add to it.
 *
 * <p>Gasser, Sroka and Jennen-Steinmetz, Biometrika 73:625, 1986.
 *
 * @param sums of squared, scaled deviations, one a channel
 * @param count of them
 */
record NoiseLevel(double[] sums, long count) {

    static NoiseLevel none(int channels) {
        return new NoiseLevel(new double[channels], 0);
    }

    /** Returns this with the training samples of a piece. */
    NoiseLevel and(Piece piece) {
        int n = sums.length;
        int samples = piece.samples(Snapshots.Part.TRAINING);
        double[] out = sums.clone();
        double[] t = piece.times();
        double[] y = piece.values().data;
        for (int i = 1; i < samples - 1; i++) {
            double b = (t[i] - t[i - 1]) / (t[i + 1] - t[i - 1]);
            double a = 1 - b;
            for (int c = 0; c < n; c++) {
                double deviation = a * y[(i - 1) * n + c] + b * y[(i + 1) * n + c] - y[i * n + c];
                out[c] += deviation * deviation / (a * a + b * b + 1);
            }
        }
        return new NoiseLevel(out, count + Math.max(0, samples - 2));
    }

    /** Returns this and another together. */
    NoiseLevel and(NoiseLevel other) {
        double[] out = sums.clone();
        for (int c = 0; c < out.length; c++) {
            out[c] += other.sums[c];
        }
        return new NoiseLevel(out, count + other.count);
    }

    /** Returns the mean over channels of the variance relative to that of a pool; 1 where it cannot be told. */
    double relativeTo(NoiseLevel pool) {
        double sum = 0;
        for (int c = 0; c < sums.length; c++) {
            boolean told = count > 0 && pool.sums[c] > 0;
            sum += told ? sums[c] / count / (pool.sums[c] / pool.count) : 1;
        }
        return sum / sums.length;
    }
}
