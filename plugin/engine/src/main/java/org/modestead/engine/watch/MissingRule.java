package org.modestead.engine.watch;

/**
 * How many windows in a row must miss a mode to be an alarm. Where a window misses it by chance with probability q, m misses in a row
 * begin once in {@code 1/(q^m (1-q))} windows; m is the smallest number for which that is as seldom as asked for. With j misses
 * in k windows of the model q is taken as {@code (j + 1/2)/(k + 1)} (Jeffreys).
 *
 * @param chance q
 * @param row m
 */
record MissingRule(double chance, int row) {

    static MissingRule of(int missed, int windows, double rate) {
        double q = (missed + 0.5) / (windows + 1);
        return new MissingRule(q, Math.max(1, (int) Math.ceil(Math.log(rate / (1 - q)) / Math.log(q))));
    }
}
