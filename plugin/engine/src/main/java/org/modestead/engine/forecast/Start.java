package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.List;

/**
 * Where a forecast of a backtest starts.
 *
 * @param series index of the series
 * @param origin index of the last known sample
 */
record Start(int series, int origin) {

    /**
     * Returns evenly spaced origins of every series, the first one of each among them.
     *
     * @param memory samples of history before the first origin
     * @param most origins over all series; with more series, one a series
     */
    static List<Start> perSeries(List<Series> all, int memory, int most) {
        List<Start> out = new ArrayList<>();
        int share = Math.max(1, most / Math.max(1, all.size()));
        for (int s = 0; s < all.size(); s++) {
            int first = all.get(s).firstOrigin(memory);
            int count = Math.max(0, all.get(s).ahead(memory));
            int taken = Math.min(share, count);
            for (int k = 0; k < taken; k++) {
                out.add(new Start(s, first + (int) ((long) k * count / taken)));
            }
        }
        return out;
    }

    /**
     * Returns evenly spaced ones of all the origins from which a whole horizon is observed, the first and, with more
     * than one, the last of them included.
     *
     * @param memory samples of history before the first origin
     * @param reach steps that must be observed after each, at least 1
     * @param most largest number of origins over all series, at least 1
     * @return possibly empty
     */
    static List<Start> spread(List<Series> all, int memory, int reach, int most) {
        List<Start> every = new ArrayList<>();
        for (int s = 0; s < all.size(); s++) {
            int first = all.get(s).firstOrigin(memory);
            for (int k = 0; k <= all.get(s).ahead(memory) - reach; k++) {
                every.add(new Start(s, first + k));
            }
        }
        int taken = Math.min(most, every.size());
        List<Start> out = new ArrayList<>();
        for (int k = 0; k < taken; k++) {
            out.add(every.get((int) ((long) k * (every.size() - 1) / Math.max(1, taken - 1))));
        }
        return out;
    }
}
