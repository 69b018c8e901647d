package org.modestead.nodes.figure;

import java.util.Arrays;

/**
 * Fewer points that look the same: of every stretch of a line the smallest and the largest value are kept, in order
 * of time, so no peak is lost.
 */
final class Thinning {

    /** Points of a thinned line. */
    record Curve(double[] x, double[] y) {}

    private Thinning() {}

    /**
     * @param x length p, rising; not modified
     * @param y length p; NaN counts as neither smallest nor largest, a stretch of NaN alone keeps one
     * @param most points to keep, at least 4
     * @return the line itself when it is short enough, else at most {@code most} points
     */
    static Curve thin(double[] x, double[] y, int most) {
        if (x.length <= most) {
            return new Curve(x, y);
        }
        int stretches = most / 2;
        int[] kept = new int[2 * stretches];
        int count = 0;
        for (int s = 0; s < stretches; s++) {
            int from = (int) ((long) s * x.length / stretches);
            int to = (int) ((long) (s + 1) * x.length / stretches);
            count = keepExtremes(y, from, to, kept, count);
        }
        int[] indices = Arrays.copyOf(kept, count);
        return new Curve(pick(x, indices), pick(y, indices));
    }

    private static int keepExtremes(double[] y, int from, int to, int[] kept, int count) {
        int low = from;
        int high = from;
        for (int i = from + 1; i < to; i++) {
            low = y[i] < y[low] || Double.isNaN(y[low]) ? i : low;
            high = y[i] > y[high] || Double.isNaN(y[high]) ? i : high;
        }
        kept[count] = Math.min(low, high);
        if (low == high) {
            return count + 1;
        }
        kept[count + 1] = Math.max(low, high);
        return count + 2;
    }

    private static double[] pick(double[] values, int[] indices) {
        return Arrays.stream(indices).mapToDouble(i -> values[i]).toArray();
    }
}
