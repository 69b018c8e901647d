package org.modestead.engine.watch;

/**
 * Nodes and weights of Gauss and Legendre on [-1, 1], exact for polynomials up to degree 2n - 1. Roots of the Legendre polynomial by
 * Newton's method from {@code cos(π(i + 3/4)/(n + 1/2))} (Abramowitz and Stegun 22.16.6).
 *
 * @param nodes rising, n
 * @param weights n, positive
 */
record GaussLegendre(double[] nodes, double[] weights) {

    private static final int NEWTON = 60;
    private static final double CLOSE = 1e-15;

    /** @param n number of nodes, at least 1 */
    static GaussLegendre of(int n) {
        double[] nodes = new double[n];
        double[] weights = new double[n];
        for (int i = 0; i < n; i++) {
            double x = Math.cos(Math.PI * (i + 0.75) / (n + 0.5));
            double[] at = legendre(n, x);
            for (int k = 0; k < NEWTON && Math.abs(at[0] / at[1]) > CLOSE; k++) {
                x -= at[0] / at[1];
                at = legendre(n, x);
            }
            nodes[n - 1 - i] = x;
            weights[n - 1 - i] = 2 / ((1 - x * x) * at[1] * at[1]);
        }
        return new GaussLegendre(nodes, weights);
    }

    /** The polynomial of degree n and its derivative. */
    private static double[] legendre(int n, double x) {
        double before = 1;
        double now = x;
        for (int k = 2; k <= n; k++) {
            double next = ((2 * k - 1) * x * now - (k - 1) * before) / k;
            before = now;
            now = next;
        }
        return new double[] {now, n * (x * now - before) / (x * x - 1)};
    }
}
