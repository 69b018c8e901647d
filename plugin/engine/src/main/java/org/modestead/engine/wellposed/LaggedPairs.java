package org.modestead.engine.wellposed;

/**
 * Pairs of times of a run that lie a lag apart: from each time to the first that is at least one sample and at least the lag later. Times may be
 * uneven; the walk ends where the run is too short to go on.
 */
final class LaggedPairs {

    /** A lag that is met but for rounding is met. */
    private static final double ROUNDING = 1e-9;

    private LaggedPairs() {}

    /** Sees one pair. */
    @FunctionalInterface
    interface Visitor {

        /**
         * @param from index of the earlier time
         * @param to index of the later one
         * @param tau time between them
         */
        void pair(int from, int to, double tau);
    }

    /**
     * Visits all pairs by rising time.
     *
     * @param times rising
     * @param lag at least 0; 0 for neighbours
     * @param visitor sees each
     * @return their number
     */
    static int walk(double[] times, double lag, Visitor visitor) {
        double target = lag * (1 - ROUNDING);
        int to = 1;
        int pairs = 0;
        for (int from = 0; from < times.length - 1; from++) {
            to = Math.max(to, from + 1);
            while (to < times.length - 1 && times[to] - times[from] < target) {
                to++;
            }
            double tau = times[to] - times[from];
            if (tau < target) {
                return pairs;
            }
            visitor.pair(from, to, tau);
            pairs++;
        }
        return pairs;
    }
}
