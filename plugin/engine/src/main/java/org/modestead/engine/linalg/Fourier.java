package org.modestead.engine.linalg;

/** The discrete Fourier transform of a length that is a power of two (Cooley and Tukey, Math. Comp. 19:297, 1965). */
public final class Fourier {

    private Fourier() {}

    /**
     * Returns {@code |X_k|²} with {@code X_k = Σ_n x_n e^(-2πi kn/N)}, k = 0..N/2.
     *
     * @param values N, a power of two, at least 2; not modified
     * @return N/2 + 1 values
     */
    public static double[] squaredMagnitudes(double[] values) {
        int n = values.length;
        if (n < 2 || Integer.bitCount(n) != 1) {
            throw new IllegalArgumentException("a length of " + n + " is not a power of two");
        }
        double[] re = new double[n];
        double[] im = new double[n];
        for (int k = 0; k < n; k++) {
            re[Integer.reverse(k) >>> Integer.numberOfLeadingZeros(n) + 1] = values[k];
        }
        for (int half = 1; half < n; half *= 2) {
            combine(re, im, half);
        }
        double[] out = new double[n / 2 + 1];
        for (int k = 0; k < out.length; k++) {
            out[k] = re[k] * re[k] + im[k] * im[k];
        }
        return out;
    }

    private static void combine(double[] re, double[] im, int half) {
        for (int k = 0; k < half; k++) {
            double cos = StrictMath.cos(Math.PI * k / half);
            double sin = -StrictMath.sin(Math.PI * k / half);
            for (int at = k; at < re.length; at += 2 * half) {
                double x = re[at + half] * cos - im[at + half] * sin;
                double y = re[at + half] * sin + im[at + half] * cos;
                re[at + half] = re[at] - x;
                im[at + half] = im[at] - y;
                re[at] += x;
                im[at] += y;
            }
        }
    }
}
