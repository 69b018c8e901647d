package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;

/**
 * Whether a sequence of norms over the rungs is bounded or grows without bound, judged from its last distinct values (where
 * motion has a symmetry, every second rung repeats the one before).
 *
 * <p>Growing means: the last three distinct values rise, and either they rise together by more than a factor, or by more
 * than 30 % with an increment that is not shrinking (at least half of the one before). A convergent sequence of projections
 * has shrinking increments.
 *
 * @param growing whether it grows without bound as far as can be seen
 * @param factor last value over the first of those looked at
 */
record NormTrend(boolean growing, double factor) {

    private static final double SAME = 1e-3;
    private static final double NOTABLE = 1.3;
    private static final double SHRINKING = 0.5;
    private static final int LOOKED_AT = 3;

    /**
     * @param norms by rising rank, at least one, positive
     * @param threshold factor above which steady growth counts at once
     */
    static NormTrend of(List<Double> norms, double threshold) {
        List<Double> distinct = new ArrayList<>();
        for (double norm : norms) {
            if (distinct.isEmpty() || Math.abs(norm / distinct.get(distinct.size() - 1) - 1) > SAME) {
                distinct.add(norm);
            }
        }
        List<Double> last = distinct.subList(Math.max(0, distinct.size() - LOOKED_AT), distinct.size());
        double factor = last.get(last.size() - 1) / last.get(0);
        if (last.size() < LOOKED_AT) {
            return new NormTrend(false, factor);
        }
        double before = last.get(1) - last.get(0);
        double after = last.get(2) - last.get(1);
        boolean rising = before > 0 && after > 0;
        return new NormTrend(rising && (factor > threshold || factor > NOTABLE && after > SHRINKING * before), factor);
    }
}
