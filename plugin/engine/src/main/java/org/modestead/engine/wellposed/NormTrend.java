package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;

/**
 * Whether a sequence of norms over the rungs is bounded or grows without bound. Every second rung may repeat the one before (motion with
 * a symmetry)
 * and single rungs may jump, so thirds of the ladder are compared by their geometric means.
 *
 * <p>Growing means that the last third exceeds the first by more than a factor, or that the three last distinct values rise by more than
 * 30 % with an increment that is not shrinking (at least half of the one before). A convergent sequence of projections has shrinking
 * increments. Still rising means that the last distinct values rise by more than 1 % together.
 *
 * @param growing whether it grows without bound as far as can be seen
 * @param factor geometric mean of the last third over that of the first
 * @param rising whether it has not come to rest
 */
record NormTrend(boolean growing, double factor, boolean rising) {

    private static final double SAME = 1e-3;
    private static final double NOTABLE = 1.3;
    private static final double SHRINKING = 0.5;
    private static final double AT_REST = 1.01;
    private static final int LOOKED_AT = 3;

    /**
     * @param norms by rising rank, at least one, positive
     * @param threshold factor above which growth counts at once
     */
    static NormTrend of(List<Double> norms, double threshold) {
        int third = Math.max(1, norms.size() / 3);
        double factor = mean(norms.subList(norms.size() - third, norms.size())) / mean(norms.subList(0, third));
        List<Double> distinct = new ArrayList<>();
        for (double norm : norms) {
            if (distinct.isEmpty() || Math.abs(norm / distinct.get(distinct.size() - 1) - 1) > SAME) {
                distinct.add(norm);
            }
        }
        List<Double> last = distinct.subList(Math.max(0, distinct.size() - LOOKED_AT), distinct.size());
        boolean rising = last.get(last.size() - 1) > AT_REST * last.get(0);
        if (last.size() < LOOKED_AT) {
            return new NormTrend(norms.size() >= LOOKED_AT && factor > threshold, factor, rising);
        }
        double before = last.get(1) - last.get(0);
        double after = last.get(2) - last.get(1);
        double climb = last.get(2) / last.get(0);
        boolean steady = before > 0 && after > SHRINKING * before && climb > NOTABLE;
        return new NormTrend(factor > threshold || steady, factor, rising);
    }

    private static double mean(List<Double> positive) {
        return Math.exp(positive.stream().mapToDouble(Math::log).average().orElse(0));
    }
}
