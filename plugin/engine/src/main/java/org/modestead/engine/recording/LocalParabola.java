package org.modestead.engine.recording;

import java.util.Arrays;

/**
 * Value at one sample of the least-squares parabola through 2h + 1 samples near it: h on either side, and at the ends of a run the
 * nearest ones. Of three samples a line is fitted, since a parabola meets all three.
 *
 * <p>Savitzky and Golay, Anal. Chem. 36:1627, 1964 (there for even steps; here by orthogonal polynomials at any times).
 *
 * @param first sample of the window
 * @param weights of samples first .. first + 2h, which sum to 1
 */
record LocalParabola(int first, double[] weights) {

    /**
     * @param times rising, at least 2h + 1
     * @param at sample
     * @param h samples on either side, at least 1
     */
    static LocalParabola at(double[] times, int at, int h) {
        int size = 2 * h + 1;
        int first = Math.max(0, Math.min(at - h, times.length - size));
        double width = times[first + size - 1] - times[first];
        int terms = h == 1 ? 2 : 3;
        double[][] basis = new double[terms][];
        double[] weights = new double[size];
        for (int j = 0; j < terms; j++) {
            basis[j] = orthonormal(power(times, at, first, size, width, j), basis, j);
            for (int i = 0; i < size; i++) {
                weights[i] += basis[j][size] * basis[j][i];
            }
        }
        return new LocalParabola(first, weights);
    }

    /** {@code ((t_i - t_at)/width)^j} at the samples of the window, and last at the sample itself. */
    private static double[] power(double[] times, int at, int first, int size, double width, int j) {
        double[] out = new double[size + 1];
        for (int i = 0; i < size; i++) {
            out[i] = Math.pow((times[first + i] - times[at]) / width, j);
        }
        out[size] = j == 0 ? 1 : 0;
        return out;
    }

    /** Gram-Schmidt over the samples of the window; the last entry goes along. Once more for rounding. */
    private static double[] orthonormal(double[] raw, double[][] basis, int count) {
        int size = raw.length - 1;
        for (int twice = 0; twice < 2; twice++) {
            for (int l = 0; l < count; l++) {
                double dot = dot(raw, basis[l], size);
                for (int i = 0; i <= size; i++) {
                    raw[i] -= dot * basis[l][i];
                }
            }
        }
        double norm = Math.sqrt(dot(raw, raw, size));
        for (int i = 0; i <= size; i++) {
            raw[i] /= norm;
        }
        return raw;
    }

    private static double dot(double[] a, double[] b, int size) {
        double sum = 0;
        for (int i = 0; i < size; i++) {
            sum += a[i] * b[i];
        }
        return sum;
    }

    /** Returns the value for one channel of p x n samples. */
    double value(double[] samples, int n, int channel) {
        double sum = 0;
        for (int i = 0; i < weights.length; i++) {
            sum += weights[i] * samples[(first + i) * n + channel];
        }
        return sum;
    }

    /**
     * The values for neighbouring channels, each summed as {@link #value} sums it, row by row: with very many channels a column of the samples is
     * spread over all memory.
     *
     * @param samples p x n
     * @param from first channel
     * @param out written, one a channel
     */
    void values(double[] samples, int n, int from, double[] out) {
        Arrays.fill(out, 0);
        for (int i = 0; i < weights.length; i++) {
            double weight = weights[i];
            int start = (first + i) * n + from;
            for (int c = 0; c < out.length; c++) {
                out[c] += weight * samples[start + c];
            }
        }
    }

    /** Returns the weight of the sample at which it is taken. */
    double own(int at) {
        return weights[at - first];
    }

    /** Returns Σ w²: the variance that white noise of variance 1 leaves. */
    double gain() {
        return dot(weights, weights, weights.length);
    }
}
